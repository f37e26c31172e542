import type { z } from 'zod'
import { careFields, choice, choices, note, text } from '../field.ts'
import { charted } from '../kind.ts'

export const events = {
  blocked: 'Tube blocked',
  displaced: 'Tube displaced',
  'unplanned removal': 'Tube came out',
  bleeding: 'Bleeding',
  'valve with cuff up': 'Valve or cap on with the cuff up',
  'wrong cannula': 'Wrong inner cannula in',
  'pressure injury': 'Pressure injury',
  other: 'Other',
} as const

export const measures = {
  'help called': 'Help called',
  oxygen: 'Oxygen given',
  'valve off': 'Valve or cap taken off',
  'inner cannula out': 'Inner cannula taken out',
  'cannula changed': 'Matching inner cannula fitted',
  suction: 'Suctioned',
  'cuff down': 'Cuff let down',
  'tube back': 'Tube put back or replaced',
  bagged: 'Ventilated by bag',
  'pressure off': 'Pressure taken off',
  other: 'Other, see note',
  nothing: 'Nothing yet',
} as const

export const outcomes = {
  recovered: 'Recovered',
  'not settled': 'Not settled yet',
  moved: 'Moved to higher care',
  died: 'Died',
} as const

export const toldPeople = {
  'charge nurse': 'Charge nurse',
  doctor: 'Doctor',
  specialist: 'Tracheostomy team',
  'emergency team': 'Emergency team',
  family: 'Family',
  nobody: 'Nobody yet',
} as const

const alone = (only: string) => (chosen: readonly string[]) => chosen.length === 1 || !chosen.includes(only)

/** Something that went wrong: what, what was done, how it ended, who knows. Never a refusal of what has happened. */
export const adverseEventSchema = careFields({
  event: choice({ label: 'Event', options: events }),
  what: text({ label: 'Other event', when: { field: 'event', is: ['other'] }, neededThen: true }).optional(),
  tubeNow: choice({
    label: 'Tube now',
    options: { in: 'In place', out: 'Out' },
    when: { field: 'event', is: ['displaced', 'unplanned removal'] },
    neededThen: true,
  }).optional(),
  done: choices({ label: 'Measures taken', options: measures }).refine(
    alone('nothing'),
    'Nothing yet does not go with another measure',
  ),
  outcome: choice({ label: 'Outcome', hint: 'As it is now', options: outcomes }),
  told: choices({ label: 'People told', options: toldPeople }).refine(
    alone('nobody'),
    'Nobody yet does not go with somebody told',
  ),
  note: note({ label: 'Note', hint: 'What happened, not who was at fault' }).optional(),
})

/** Adverse events: ask a record with this. */
export const adverseEvents = charted({ slug: 'adverse-event', schema: adverseEventSchema })

export type AdverseEventData = z.output<typeof adverseEventSchema>

/** Whether the event left the patient without a tube. */
export function leavesTubeOut({ tubeNow, outcome }: AdverseEventData): boolean {
  return tubeNow === 'out' && outcome !== 'died'
}

import type { z } from 'zod'
import { careFields, choice, note, quantity, text, yesNo } from '../field.ts'
import { charted } from '../kind.ts'

const down = { field: 'act', is: ['down'] }
const done = { field: 'act', is: ['down', 'up'] }

export const cuffActs = { down: 'Let down', up: 'Inflated', 'seen down': 'Seen down', 'seen up': 'Seen up' } as const

export const cuffReasons = {
  trial: 'Weaning trial',
  'end of trial': 'End of a trial',
  voice: 'To speak',
  swallow: 'To eat, or to assess swallowing',
  'not borne': 'Cuff down was not borne',
  ventilation: 'For ventilation',
  night: 'For the night',
  'tube care': 'Care or change of the tube',
  other: 'Other, see note',
} as const

export const suctionedFirst = {
  both: 'Mouth and above the cuff',
  mouth: 'Mouth only',
  'above cuff': 'Above the cuff only',
  none: 'Neither',
} as const

export const cuffTolerances = {
  well: 'Well',
  cough: 'Cough',
  'wet voice': 'Wet voice or signs of aspiration',
  distress: 'Distress',
} as const

/** The cuff let down or inflated, or seen so: how it is from then on. */
export const cuffStateSchema = careFields({
  act: choice({ label: 'Cuff', options: cuffActs }),
  why: choice({ label: 'Reason', options: cuffReasons, when: done, neededThen: true }).optional(),
  agreedBy: text({ label: 'Person who agreed to it', when: down, neededThen: true }).optional(),
  suctionFirst: choice({
    label: 'Suction just before',
    hint: 'What lies above the cuff runs down as it empties',
    options: suctionedFirst,
    when: down,
    neededThen: true,
  }).optional(),
  volumeMl: quantity({
    label: 'Volume taken out or put in',
    unit: 'mL',
    min: 0,
    max: 40,
    step: 0.5,
    when: done,
  }).optional(),
  leak: choice({
    label: 'Leak or voice with the cuff up',
    options: yesNo,
    when: { field: 'act', is: ['up', 'seen up'] },
    neededThen: true,
  }).optional(),
  tolerance: choice({ label: 'Tolerance', options: cuffTolerances, when: done, neededThen: true }).optional(),
  note: note({ label: 'Note', more: true }).optional(),
})

/** Cuffs let down, inflated or seen so: ask a record with this, or `cuffState` for what holds now. */
export const cuffStates = charted({ slug: 'cuff-state', schema: cuffStateSchema })

export type CuffStateData = z.output<typeof cuffStateSchema>

/** Whether the cuff is up after this act. */
export function isUp({ act }: CuffStateData): boolean {
  return act === 'up' || act === 'seen up'
}

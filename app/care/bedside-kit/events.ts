import { type AdverseEventData, adverseEvents } from '../adverse-event/schema.ts'
import { cuffChecks } from '../cuff-pressure/schema.ts'
import type { BedMove, CareContext, PatientRecord } from '../kind.ts'
import { suctions } from '../suction/schema.ts'
import { isArrival, transfers } from '../transfer-checklist/schema.ts'
import { tubeCareFrom } from '../tube-care.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'

/** Something after which the kit is looked through again: what must lie there has changed, was used, or was left behind. */
export interface KitEvent {
  readonly at: Date
  readonly words: string
}

/** What happened since care of the tube began that asks for a check, in no order. */
export function kitEvents(context: CareContext): readonly KitEvent[] {
  const { record } = context
  const from = tubeCareFrom(context)
  const came = from.getTime() === record.admittedAt.getTime()
  return [
    { at: from, words: came ? 'the patient came to the ward' : 'the tube was put in' },
    ...tubesIn(record, from),
    ...moves(record, from),
    ...uses(record, from),
  ]
}

function tubesIn(record: PatientRecord, from: Date): readonly KitEvent[] {
  return record
    .since(tubeChanges, from)
    .filter(({ data, performedAt }) => data.reason !== 'on arrival' && performedAt > from)
    .map(({ data, performedAt }) => ({ at: performedAt, words: tubeWords(data) }))
}

/** A tube that did not go in was in its pack at the bedside before. */
function tubeWords({ reason, difficulty }: TubeData): string {
  if (difficulty === 'failed') return 'a tube did not go in, and spares may have been used'
  if (reason === 'displaced') return 'the tube was put back after it was displaced'
  return reason === 'blocked' ? 'the tube was changed because it was blocked' : 'the tube was changed'
}

/** Moves from bed to bed, and those that only a chart tells of: a return from elsewhere, a cuff checked after it. */
function moves(record: PatientRecord, from: Date): readonly KitEvent[] {
  const arrivals = record.since(transfers, from).filter(isArrival)
  const checks = record.since(cuffChecks, from).filter(({ data }) => data.reason === 'transfer')
  return [
    ...record.moves.filter(({ at }) => at > from).map(move => ({ at: move.at, words: moveWords(move) })),
    ...arrivals.map(({ data, performedAt }) => ({ at: performedAt, words: `the patient arrived: ${data.place}` })),
    ...checks.map(({ performedAt }) => ({ at: performedAt, words: 'the patient was moved' })),
  ]
}

function moveWords({ bed, ward }: BedMove): string {
  return `the patient was moved to ${ward === null ? '' : `${ward}, `}bed ${bed}`
}

function uses(record: PatientRecord, from: Date): readonly KitEvent[] {
  const accidents = record.since(adverseEvents, from).filter(({ data }) => mayHaveUsedKit(data))
  const blocks = record.since(suctions, from).filter(({ data }) => data.passed === 'no')
  return [
    ...accidents.map(({ data, performedAt }) => ({ at: performedAt, words: useWords(emergencyWords(data)) })),
    ...blocks.map(({ performedAt }) => ({ at: performedAt, words: useWords('a suction catheter would not pass') })),
  ]
}

const airwayEmergencies: Readonly<Partial<Record<AdverseEventData['event'], string>>> = {
  blocked: 'the tube was blocked',
  displaced: 'the tube was displaced',
  'unplanned removal': 'the tube came out',
  bleeding: 'there was a bleed',
}

/** What is reached for out of the kit. */
const fromKit: readonly AdverseEventData['done'][number][] = [
  ...(['oxygen', 'suction', 'bagged'] as const),
  ...(['tube back', 'cannula changed'] as const),
]

/** Whatever was charted as done of an airway emergency, the kit was at hand for it; of any other event, where it was reached for. */
function mayHaveUsedKit(data: AdverseEventData): boolean {
  if (data.outcome === 'died') return false
  return airwayEmergencies[data.event] !== undefined || data.done.some(measure => fromKit.includes(measure))
}

const emergencyWords = ({ event }: AdverseEventData): string => airwayEmergencies[event] ?? 'there was an adverse event'

const useWords = (event: string): string => `${event}, and the kit may have been used`

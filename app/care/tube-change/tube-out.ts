import { isNewStoma, type Tract } from '../../clinical/tract.ts'
import { days, earlier } from '../../time/duration.ts'
import { daysBetween, localDay } from '../../time/zone.ts'
import { decannulations } from '../decannulation/schema.ts'
import type { CareContext } from '../kind.ts'
import { cameAgain, standsSince } from '../standing.ts'
import { LOCAL_PLAN, type Warning } from '../warning.ts'
import { type TubeData, tubeChanges } from './schema.ts'
import { blindReinsertionBefore, repeatTubeOutWindow } from './settings.ts'
import { tubeTract } from './tube.ts'

/** A tube that did not go in, or that came out of a new opening: red, by the upper airway (domain 5.2). */
export function tubeOut(data: TubeData, context: CareContext): readonly Warning[] {
  const tract = tractOf(data, context)
  const failed = data.difficulty === 'failed'
  const isNew = tract && isNewOpening(tract, context)
  if (!failed && !(data.reason === 'displaced' && isNew)) return []
  const { upperAirway } = context.record.patient
  const oxygen =
    upperAirway === 'not open'
      ? 'Oxygen to the stoma. The mouth does not connect to the lungs.'
      : 'Oxygen to face and stoma.'
  return [
    {
      name: 'tube-out',
      level: 'red',
      action: `Call for help now. ${oxygen}${isNew === false ? '' : ' Do not push the tube back blindly.'} ${LOCAL_PLAN}`,
      cause: `${failed ? 'The tube did not go in.' : 'The tube came out.'} ${openingWords(tract)}`,
      source: 'Bontempo and Manning; critical care texts differ between 5 and 7 days',
    },
  ]
}

/** What is known of the opening as the tube goes in: a first insertion makes it. */
function tractOf(data: TubeData, context: CareContext): Tract | undefined {
  const { record, now, ward } = context
  if (data.reason !== 'first insertion') return tubeTract(context)
  const today = localDay(now, ward.zone)
  return { madeOn: today, changes: [], laryngectomy: record.patient.upperAirway === 'not open', today }
}

/** A laryngectomy stoma is sewn to the skin: only its age counts, not whether a tube in it was changed before. */
function isNewOpening(tract: Tract, { values }: CareContext): boolean {
  const blindDays = values.of(blindReinsertionBefore)
  return tract.laryngectomy ? ageOf(tract) < blindDays : isNewStoma({ ...tract, blindDays })
}

function openingWords(tract: Tract | undefined): string {
  if (!tract) return 'When the opening was made is not charted.'
  const changed = tract.laryngectomy || tract.changes.some(({ uncomplicated }) => uncomplicated)
  return `The opening is ${dayWords(ageOf(tract))} old${changed ? '' : '; no change of its tube has gone well yet'}.`
}

const ageOf = ({ madeOn, today }: Tract): number => daysBetween(madeOn, today)

/** `1 day`, `4 days`. */
export function dayWords(n: number): string {
  return `${n} ${n === 1 ? 'day' : 'days'}`
}

/** A tube that did not go in stands until the tube that did is charted, or that there is none. */
export function standingTubeOut(context: CareContext): readonly Warning[] {
  const { record } = context
  const removal = record.latest(decannulations)
  const acts = removal ? record.since(tubeChanges, removal.performedAt) : record.of(tubeChanges)
  const rule = {
    isSettledBy: () => true,
    warns: (data: TubeData, then: CareContext) => (data.difficulty === 'failed' ? tubeOut(data, then) : []),
  }
  return standsSince(acts, rule, context).map(warning => ({
    ...warning,
    cause: `${warning.cause} Chart the tube that is in now.`,
  }))
}

/** A tube displaced again within days, counting the change that is being charted. */
export function displacedAgain(data: TubeData, context: CareContext): readonly Warning[] {
  return data.reason === 'displaced' ? displacements(1 + displacedSoFar(context), context) : []
}

/** The same, from what is charted. */
export function standingDisplacements(context: CareContext): readonly Warning[] {
  const displaced = context.record.of(tubeChanges).filter(({ data }) => data.reason === 'displaced')
  return displacements(cameAgain(displaced, days(context.values.of(repeatTubeOutWindow)), context).length, context)
}

function displacedSoFar({ record, values, now }: CareContext): number {
  return record
    .since(tubeChanges, earlier(now, days(values.of(repeatTubeOutWindow))))
    .filter(({ data, performedAt }) => data.reason === 'displaced' && performedAt <= now).length
}

function displacements(times: number, { values }: CareContext): readonly Warning[] {
  if (times < 2) return []
  return [
    {
      name: 'tube-out-again',
      level: 'amber',
      action: 'Ask the tracheostomy specialist to review tube, length and ties today.',
      cause: `Displaced ${times} times within ${dayWords(values.of(repeatTubeOutWindow))}.`,
      source: repeatTubeOutWindow.source.says,
    },
  ]
}

import { dwellDay } from '../../clinical/dwell.ts'
import { tractState } from '../../clinical/tract.ts'
import { showDay } from '../../time/display.ts'
import { daysBetween, type LocalDay, localDay } from '../../time/zone.ts'
import type { FormProblem } from '../form-problem.ts'
import type { CareContext } from '../kind.ts'
import { firstChangeDays } from '../tube-change/first-change.ts'
import { tractEstablishedAfter } from '../tube-change/settings.ts'
import { insertedOn, isFirstTube, tubeInPlace, tubeTract } from '../tube-change/tube.ts'
import { dayWords } from '../tube-change/tube-out.ts'
import { openPlan } from './open-plan.ts'
import { contraindications, type TubePlanData } from './schema.ts'

/** What the record knows of the opening and the tube, in words: `Opening made 02-Mar-2026, 8 days old, fresh; tube in for 8 days`. */
export function tractWords(context: CareContext): string | undefined {
  const tube = tubeInPlace(context.record)
  if (!tube) return undefined
  const today = localDay(context.now, context.ward.zone)
  const tract = tubeTract(context)
  const state = tract && tractState({ ...tract, establishedAfterDays: context.values.of(tractEstablishedAfter) })
  const opening = tract
    ? `Opening made ${showDay(tract.madeOn)}, ${dayWords(daysBetween(tract.madeOn, today))} old, ${state}`
    : 'When the opening was made is not charted'
  return `${opening}; tube in for ${dayWords(dwellDay(insertedOn(tube, context), today))}`
}

/**
 * Why a plan is refused, each at its field: no tube to change, a day that has passed, or a change that is too early or
 * contraindicated without a named senior and a reason (domain 3.11, R-301, R-302).
 */
export function planProblems(data: TubePlanData, context: CareContext): readonly FormProblem[] {
  if (data.step === 'call off') {
    return openPlan(context.record) ? [] : [{ field: 'step', message: 'There is no plan that could be called off' }]
  }
  if (!tubeInPlace(context.record)) {
    return [{ field: 'step', message: 'No tube is charted as in place: chart it before its change is planned' }]
  }
  const { plannedOn } = data
  if (plannedOn === undefined) return []
  if (plannedOn < localDay(context.now, context.ward.zone)) {
    return [{ field: 'plannedOn', message: 'Planned date must not be in the past' }]
  }
  return decided(data, [...earlyProblem(plannedOn, context), ...contraindicated(data)])
}

/** A senior's decision lifts what speaks against the change; half of a decision does not stand. */
function decided({ senior, seniorReason }: TubePlanData, against: readonly FormProblem[]): readonly FormProblem[] {
  if (senior && !seniorReason) return [{ field: 'seniorReason', message: `Enter why ${senior} decided to go ahead` }]
  if (seniorReason && !senior) return [{ field: 'senior', message: 'Enter the senior who decided to go ahead' }]
  return senior ? [] : against
}

/** The first change before its earliest day, by how the opening was made. */
function earlyProblem(plannedOn: LocalDay, context: CareContext): readonly FormProblem[] {
  const tube = tubeInPlace(context.record)
  if (!tube || !isFirstTube(tube)) return []
  const age = dwellDay(insertedOn(tube, context), plannedOn)
  const { earliest, isKnown } = firstChangeDays(context)
  if (age >= earliest) return []
  const why = isKnown ? '' : ', as it is not known how it was made'
  const message = `The opening is only ${dayWords(age)} old on that day; the first change is from day ${earliest} on${why}. Ask ENT or ICU before changing. To go ahead, name the senior who decides and the reason.`
  return [{ field: 'plannedOn', message }]
}

function contraindicated({ contraindications: found = [], consent }: TubePlanData): readonly FormProblem[] {
  const against = found.filter(one => one !== 'none').map(one => contraindications[one].toLowerCase())
  const words = [...against, ...(consent === 'refused' && !found.includes('refusal') ? ['patient refuses'] : [])]
  if (words.length === 0) return []
  const message = `Contraindicated: ${words.join('; ')}. To go ahead, name the senior who decides and the reason.`
  return [{ field: 'contraindications', message }]
}

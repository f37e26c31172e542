import { showDate, showDateTime } from '../../time/display.ts'
import { addDays, type Zone } from '../../time/zone.ts'
import { type Clock, dayClock, noClock, suspended } from '../clock.ts'
import type { CareContext, TaskRule } from '../kind.ts'
import { hasSutures, stomaChecks } from '../stoma-and-skin/schema.ts'
import { dwellDual, dwellNotice, dwellSingle, dwellSingleHeavy, heavyEpisodes } from './dwell-settings.ts'
import {
  firstChangePercutaneousEarliest,
  firstChangePercutaneousTarget,
  firstChangeSurgicalEarliest,
  firstChangeSurgicalTarget,
  routineFirstChange,
  suturesOutBy,
} from './settings.ts'
import { dwellLimit, insertedOn, isFirstTube, tubeInPlace } from './tube.ts'
import { type TubeAbsence, tubeAbsence } from './tube-absence.ts'

/** What a clock says when there is no tube: suspended once it came out or was removed, silent when none was ever charted. */
export function withoutTube({ record, ward }: CareContext): Clock {
  const absence = tubeAbsence(record)
  return absence ? suspended(absenceWords(absence, ward.zone)) : noClock
}

/** `tube came out 10-Mar-2026 09:00, not back`, `tube out for good since 10-Mar-2026`. */
export function absenceWords({ why, since }: TubeAbsence, zone: Zone): string {
  return why === 'came out'
    ? `tube came out ${showDateTime(since, zone)}, not back`
    : `tube out for good since ${showDate(since, zone)}`
}

/** The next change of the tube, by the date that its limit sets. */
export const byDate: TaskRule = {
  name: 'tube-change',
  airway: true,
  settings: [dwellDual, dwellSingle, dwellSingleHeavy, heavyEpisodes, dwellNotice],
  says(context) {
    const tube = tubeInPlace(context.record)
    return tube
      ? `The strictest limit counts: ${dwellLimit(tube, context).because}. The day of insertion is day 0.`
      : 'By date, by the strictest of policy and device label. The day of insertion is day 0.'
  },
  clock(context) {
    const tube = tubeInPlace(context.record)
    if (!tube) return withoutTube(context)
    const limit = dwellLimit(tube, context)
    return dayClock({
      dueOn: limit.changeBy,
      soonDays: context.values.of(dwellNotice),
      ward: context.ward,
      last: tube,
      because: limit.because,
    })
  },
}

const first: TaskRule = {
  name: 'first-tube-change',
  airway: true,
  settings: [
    firstChangeSurgicalEarliest,
    firstChangeSurgicalTarget,
    firstChangePercutaneousEarliest,
    firstChangePercutaneousTarget,
    routineFirstChange,
  ],
  opensWith: { reason: 'first change' },
  says(context) {
    const { earliest, target, isKnown } = firstChangeDays(context)
    const why = isKnown ? '' : ' How the opening was made is not known, so the later days count.'
    return `First change from day ${earliest}, by day ${target} after insertion.${why} An experienced operator, with airway help at hand.`
  },
  clock(context) {
    const tube = tubeInPlace(context.record)
    if (!tube || !isFirstTube(tube) || !context.values.of(routineFirstChange)) return noClock
    const { earliest, target } = firstChangeDays(context)
    return dayClock({
      dueOn: addDays(insertedOn(tube, context), target),
      soonDays: target - earliest,
      ward: context.ward,
      last: tube,
    })
  },
}

interface FirstChange {
  readonly earliest: number
  readonly target: number
  /** Whether it is known how the opening was made. */
  readonly isKnown: boolean
}

/**
 * Earliest and target day of the first change, by how the opening was made. Where that is not known the days of a percutaneous one
 * count: a change too early may lose the airway, a few days later it does no harm.
 */
export function firstChangeDays({ record, values }: CareContext): FirstChange {
  const technique = tubeInPlace(record)?.data.technique
  const surgical = technique === 'surgical'
  const earliest = values.of(surgical ? firstChangeSurgicalEarliest : firstChangePercutaneousEarliest)
  const target = values.of(surgical ? firstChangeSurgicalTarget : firstChangePercutaneousTarget)
  return { earliest: Math.min(earliest, target), target, isKnown: surgical || technique === 'percutaneous' }
}

export const tubeTasks: readonly TaskRule[] = [first, byDate]

/** Flange sutures out by their day. Charted with stoma and skin, which lists it among its tasks. */
export const sutureRemoval: TaskRule = {
  name: 'suture-removal',
  airway: false,
  settings: [suturesOutBy],
  opensWith: { sutures: 'removed now' },
  says: context => `Flange sutures come out by day ${context.values.of(suturesOutBy)} after insertion.`,
  clock(context) {
    const tube = tubeInPlace(context.record)
    if (!tube || !suturesIn(context)) return noClock
    return dayClock({
      dueOn: addDays(insertedOn(tube, context), context.values.of(suturesOutBy)),
      soonDays: 1,
      ward: context.ward,
      last: tube,
    })
  },
}

/** Whether the flange sutures of the tube in place are still in: as last seen, else as charted with the tube. */
export function suturesIn({ record }: Pick<CareContext, 'record'>): boolean {
  const tube = tubeInPlace(record)
  if (!tube) return false
  const [seen] = record.since(stomaChecks, tube.performedAt)
  return seen ? hasSutures(seen.data) : tube.data.sutures === 'in place'
}

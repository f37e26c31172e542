import { showDate } from '../../time/display.ts'
import { addDays } from '../../time/zone.ts'
import { type Clock, dayClock, noClock, suspended } from '../clock.ts'
import type { CareContext, TaskRule } from '../kind.ts'
import { stomaChecks, suturesRemoved } from '../stoma-and-skin/schema.ts'
import {
  dwellDual,
  dwellNotice,
  dwellSingle,
  firstChangePercutaneousEarliest,
  firstChangePercutaneousTarget,
  firstChangeSurgicalEarliest,
  firstChangeSurgicalTarget,
  routineFirstChange,
  suturesOutBy,
} from './settings.ts'
import { dwellLimit, insertedOn, isFirstTube, tubeInPlace, tubeOutSince } from './tube.ts'

/** What a clock says when there is no tube: suspended after removal for good, silent when none was ever charted. */
export function withoutTube(context: CareContext): Clock {
  const since = tubeOutSince(context.record)
  return since ? suspended(`tube out for good since ${showDate(since, context.ward.zone)}`) : noClock
}

/** The next change of the tube, by the date that its limit sets. */
export const byDate: TaskRule = {
  name: 'tube-change',
  airway: true,
  settings: [dwellDual, dwellSingle, dwellNotice],
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
    const { earliest, target } = firstChangeDays(context)
    return `First change from day ${earliest}, by day ${target} after insertion. An experienced operator, with airway help at hand.`
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

/** Earliest and target day of the first change, by how the opening was made; a technique not known counts as surgical. */
export function firstChangeDays(context: CareContext): { readonly earliest: number; readonly target: number } {
  const percutaneous = tubeInPlace(context.record)?.data.technique === 'percutaneous'
  const { values } = context
  const earliest = values.of(percutaneous ? firstChangePercutaneousEarliest : firstChangeSurgicalEarliest)
  const target = values.of(percutaneous ? firstChangePercutaneousTarget : firstChangeSurgicalTarget)
  return { earliest: Math.min(earliest, target), target }
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

/** Whether the flange sutures of the tube in place are still in. */
export function suturesIn(context: CareContext): boolean {
  const tube = tubeInPlace(context.record)
  if (tube?.data.sutures !== 'in place') return false
  return !context.record.latest(
    stomaChecks,
    (data, entry) => suturesRemoved(data) && entry.performedAt >= tube.performedAt,
  )
}

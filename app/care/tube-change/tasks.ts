import { showDate, showDateTime } from '../../time/display.ts'
import { addDays, type Zone } from '../../time/zone.ts'
import { type Clock, dayClock, noClock, suspended } from '../clock.ts'
import type { CareContext, TaskRule } from '../kind.ts'
import { hasSutures, stomaChecks } from '../stoma-and-skin/schema.ts'
import { openPlan } from '../tube-change-plan/open-plan.ts'
import { dwellDual, dwellNotice, dwellSingle, dwellSingleHeavy, heavyEpisodes } from './dwell-settings.ts'
import { firstChange } from './first-change.ts'
import { suturesOutBy } from './settings.ts'
import { dwellLimit, insertedOn, tubeInPlace } from './tube.ts'
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
      values: context.values,
      dueOn: limit.changeBy,
      soonDays: context.values.of(dwellNotice),
      ward: context.ward,
      last: tube,
      because: limit.because,
    })
  },
}

/** A change that was planned, on its day. */
const planned: TaskRule = {
  name: 'planned-tube-change',
  airway: true,
  settings: [],
  says: () => 'On the day that the plan names, once its gate of questions was gone through.',
  clock(context) {
    const plan = openPlan(context.record)
    if (!plan) return noClock
    return dayClock({
      values: context.values,
      dueOn: plan.plannedOn,
      soonDays: 1,
      ward: context.ward,
      last: plan.entry,
    })
  },
}

export const tubeTasks: readonly TaskRule[] = [firstChange, planned, byDate]

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
      values: context.values,
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

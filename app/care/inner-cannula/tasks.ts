import { hours, later } from '../../time/duration.ts'
import { type Clock, intervalClock, noClock, promptClock, sooner, suspended } from '../clock.ts'
import type { CareContext, TaskRule } from '../kind.ts'
import type { Setting } from '../policy.ts'
import { withoutTube } from '../tube-change/tasks.ts'
import { insertedAt, type TubeEntry, tubeInPlace } from '../tube-change/tube.ts'
import { actsOnTube, cannulaType, isCleaning, isInspection, isNarrowed, isRenewal, wasSeen } from './acts.ts'
import type { InnerCannulaData } from './schema.ts'
import {
  disposableInterval,
  earlyInterval,
  earlyPeriod,
  inspectionInterval,
  recheckWithin,
  reusableInterval,
} from './settings.ts'

const inspection: TaskRule = {
  name: 'inner-cannula-inspection',
  airway: true,
  settings: [inspectionInterval, earlyInterval, earlyPeriod, recheckWithin],
  says: ({ values }) =>
    `Every ${values.of(inspectionInterval)} h; every ${values.of(earlyInterval)} h in the first ${values.of(earlyPeriod)} h of a tube; within ${values.of(recheckWithin)} h of a heavy coating or a block. It counts when the cannula was taken out, looked at, and a clear one is back in.`,
  clock: context => dualClock(context, tube => inspectionClock(tube, context)),
}

const change: TaskRule = {
  name: 'inner-cannula-change',
  airway: true,
  settings: [disposableInterval],
  opensWith: { act: 'replaced' },
  says: ({ values }) =>
    `A disposable inner cannula is replaced with a new one every ${values.of(disposableInterval)} h.`,
  clock: context => careClock(context, 'disposable', isRenewal, disposableInterval),
}

const clean: TaskRule = {
  name: 'inner-cannula-clean',
  airway: true,
  settings: [reusableInterval],
  says: ({ values }) =>
    `A reusable inner cannula is cleaned, or swapped for the clean spare, at least every ${values.of(reusableInterval)} h. Clean it as its instructions say.`,
  clock: context => careClock(context, 'reusable', isCleaning, reusableInterval),
}

export const innerCannulaTasks: readonly TaskRule[] = [inspection, change, clean]

function dualClock(context: CareContext, clock: (tube: TubeEntry) => Clock): Clock {
  const tube = tubeInPlace(context.record)
  if (!tube) return withoutTube(context)
  return tube.data.construction === 'single' ? suspended('single-cannula tube') : clock(tube)
}

function careClock(
  context: CareContext,
  type: 'disposable' | 'reusable',
  counts: (data: InnerCannulaData) => boolean,
  interval: Setting<number>,
): Clock {
  return dualClock(context, tube =>
    cannulaType(tube, context.record) === type
      ? intervalClock({
          values: context.values,
          last: lastAct(context, counts),
          start: startOf(tube, context),
          interval: hours(context.values.of(interval)),
        })
      : noClock,
  )
}

function inspectionClock(tube: TubeEntry, context: CareContext): Clock {
  const { values } = context
  const last = lastAct(context, isInspection)
  const start = startOf(tube, context)
  const from = last && last.performedAt > start ? last.performedAt : start
  const usual = values.of(inspectionInterval)
  const early = Math.min(values.of(earlyInterval), usual)
  const isEarly = early < usual && from < later(insertedAt(tube, context), hours(values.of(earlyPeriod)))
  const regular = intervalClock({
    values,
    last,
    start,
    interval: hours(isEarly ? early : usual),
    ...(isEarly ? { because: `first ${values.of(earlyPeriod)} h of this tube` } : {}),
  })
  const seen = lastAct(context, wasSeen)
  if (!seen || !isNarrowed(seen.data)) return regular
  return sooner(
    regular,
    promptClock({
      values,
      event: seen.performedAt,
      within: hours(values.of(recheckWithin)),
      last,
      because: `it was ${seen.data.condition === 'blocked' ? 'blocked' : 'half blocked or more'} at the last check`,
    }),
  )
}

function lastAct({ record }: CareContext, counts: (data: InnerCannulaData) => boolean) {
  return actsOnTube(record).find(({ data }) => counts(data))
}

/** Care counts from the tube going in, but never from before the stay: a tube of last week is not overdue on arrival. */
function startOf(tube: TubeEntry, { record }: CareContext): Date {
  return new Date(Math.max(tube.performedAt.getTime(), record.admittedAt.getTime()))
}

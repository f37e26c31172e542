import { intervalClass, type Lateness } from '../clinical/tolerance.ts'
import { type Duration, hours, minutes } from '../time/duration.ts'
import type { Setting, Values } from './policy.ts'
import { latenessOf } from './tolerance-settings.ts'

/** The number of a setting as a length of time: a share of the interval, minutes or hours. */
const lengths = {
  short: (share: number, interval: Duration) => ((interval * share) / 100) as Duration,
  middle: minutes,
  long: hours,
} as const

/** What counts as late for a task that is due at an interval, by the policy. Throws RangeError unless the interval is longer than nothing. */
export function lateness(interval: Duration, values: Values): Lateness {
  const about = intervalClass(interval)
  const { tolerance, soon, serious } = latenessOf[about]
  const length = (setting: Setting<number>) => lengths[about](values.of(setting), interval)
  return {
    tolerance: length(tolerance),
    soonBefore: length(soon),
    seriousAfter: about === 'middle' ? seriousWithin(interval, values) : length(serious),
  }
}

/** From when care that is due every few hours, or once a shift, is seriously overdue: never later than the interval itself. */
export function seriousWithin(interval: Duration, values: Values): Duration {
  return Math.min(interval, minutes(values.of(latenessOf.middle.serious))) as Duration
}

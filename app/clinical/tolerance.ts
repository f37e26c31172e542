import { type Duration, hours } from '../time/duration.ts'

/** How early and how late a task may be done around its due time. */
export interface Lateness {
  /** Before or after the due time by no more than this is on time; later is overdue. */
  readonly tolerance: Duration
  /** It is due soon from this long before the due time. */
  readonly soonBefore: Duration
  /** It is seriously overdue when more than this has passed since the due time. */
  readonly seriousAfter: Duration
}

/** Intervals that are late by the same rule: under 4 hours, under a day, and a day or longer. */
export type IntervalClass = 'short' | 'middle' | 'long'

/** The class of an interval, as ISMP 2011 divides the times of scheduled medicines. Throws RangeError unless it is longer than nothing. */
export function intervalClass(interval: Duration): IntervalClass {
  if (!(interval > 0)) throw new RangeError(`An interval must be longer than nothing, not ${interval} ms`)
  if (interval < hours(4)) return 'short'
  return interval < hours(24) ? 'middle' : 'long'
}

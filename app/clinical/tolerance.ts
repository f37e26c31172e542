import { type Duration, hours, minutes } from '../time/duration.ts'

/** How early and how late a task may be done around its due time. */
export interface Lateness {
  /** Before or after the due time by no more than this is on time; later is overdue. */
  readonly tolerance: Duration
  /** It is due soon from this long before the due time. */
  readonly soonBefore: Duration
  /** It is seriously overdue when more than this has passed since the due time. */
  readonly seriousAfter: Duration
}

/**
 * What counts as late for a task that is due at an interval. No tracheostomy guideline gives a grace time: adopted from ISMP 2011
 * for medicines (a quarter of the interval below 4 h, 60 min below a day, 120 min from a day on). Serious lateness is our proposal.
 * Throws RangeError unless the interval is longer than nothing.
 */
export function lateness(interval: Duration): Lateness {
  if (!(interval > 0)) throw new RangeError(`An interval must be longer than nothing, not ${interval} ms`)
  if (interval < hours(4)) {
    const quarter = (interval * 0.25) as Duration
    return { tolerance: quarter, soonBefore: quarter, seriousAfter: interval }
  }
  if (interval < hours(24)) return { tolerance: minutes(60), soonBefore: minutes(60), seriousAfter: hours(4) }
  return { tolerance: minutes(120), soonBefore: hours(4), seriousAfter: hours(12) }
}

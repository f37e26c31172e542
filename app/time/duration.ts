declare const unit: unique symbol

/** A length of elapsed time in milliseconds. A plain number does not pass for one, so that hours never stand in for minutes. */
export type Duration = number & { readonly [unit]: 'ms' }

/** A whole or fractional number of minutes. */
export const minutes = (n: number): Duration => (n * 60_000) as Duration

/** A whole or fractional number of hours. */
export const hours = (n: number): Duration => minutes(n * 60)

/** Days of 24 elapsed hours. Calendar days, which a change of clocks makes shorter or longer, are counted in zone.ts. */
export const days = (n: number): Duration => hours(n * 24)

/** The instant which comes `by` after `at`, in elapsed time. */
export const later = (at: Date, by: Duration): Date => new Date(at.getTime() + by)

/** The instant which lies `by` before `at`, in elapsed time. */
export const earlier = (at: Date, by: Duration): Date => new Date(at.getTime() - by)

/** How long it is from one instant to another; negative when `to` comes first. */
export const since = (from: Date, to: Date): Duration => (to.getTime() - from.getTime()) as Duration

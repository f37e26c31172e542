/** How a due task stands; the words are shown as they are. */
export type TaskStatus = 'upcoming' | 'due soon' | 'due' | 'overdue' | 'seriously overdue' | 'deferred' | 'suspended'

/** The moments (UTC) at which a task changes its status, in this order; as dates, or all of them in ms. */
export interface StatusWindow<Moment extends Date | number = Date> {
  readonly soonAt: Moment
  readonly opensAt: Moment
  readonly closesAt: Moment
  readonly seriousAt: Moment
}

/**
 * Where `now` stands against a window, whose ends belong to it: due from `opensAt` to `closesAt`, overdue after (domain 3.0).
 * Deferred and suspended are facts of the record, not of the clock, and are never answered here.
 */
export function statusOf<Moment extends Date | number>(
  window: StatusWindow<Moment>,
  now: Moment,
): Exclude<TaskStatus, 'deferred' | 'suspended'> {
  if (now > window.seriousAt) return 'seriously overdue'
  if (now > window.closesAt) return 'overdue'
  if (now >= window.opensAt) return 'due'
  if (now >= window.soonAt) return 'due soon'
  return 'upcoming'
}

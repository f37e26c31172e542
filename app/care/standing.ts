import { showDateTime } from '../time/display.ts'
import { type Duration, earlier } from '../time/duration.ts'
import type { CareContext, Entry } from './kind.ts'
import type { Warning } from './warning.ts'

/**
 * Warnings of one rule about the latest act that settles it one way or the other, with when that was.
 * `acts` come latest first; when none settles it, nothing stands.
 */
export function standsSince<Data>(
  acts: readonly Entry<Data>[],
  rule: {
    readonly isSettledBy: (data: Data) => boolean
    readonly warns: (data: Data, context: CareContext) => readonly Warning[]
  },
  context: CareContext,
): readonly Warning[] {
  const last = acts.find(({ data }) => rule.isSettledBy(data))
  if (!last) return []
  const when = showDateTime(last.performedAt, context.ward.zone)
  // As of that act: the day after the opening was made must not move on with the clock.
  const then = { ...context, now: last.performedAt }
  return rule.warns(last.data, then).map(warning => ({ ...warning, cause: `${warning.cause} Charted ${when}.` }))
}

/**
 * What came again within `window` of the latest of these acts (latest first), itself included. It stands as long again after that
 * one, so that a second one at the end of the window is not gone before anybody has seen it.
 */
export function cameAgain<Data>(
  acts: readonly Entry<Data>[],
  window: Duration,
  { now }: Pick<CareContext, 'now'>,
): readonly Entry<Data>[] {
  const past = acts.filter(({ performedAt }) => performedAt <= now)
  const [last] = past
  if (!last || last.performedAt < earlier(now, window)) return []
  return past.filter(({ performedAt }) => performedAt >= earlier(last.performedAt, window))
}

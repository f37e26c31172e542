import type { Clock, DueWindow } from '../care/clock.ts'
import type { CareContext, TaskRule } from '../care/kind.ts'
import { windowWithDeferral } from './due-tasks.ts'

/** Something that a walk found: care that fell due, or came after its window. By the moment (ms) that it belongs to. */
export interface Found {
  readonly what: 'task' | 'late'
  readonly at: number
}

/** A stretch of time in ms, from its start to before its end. */
export interface Span {
  readonly from: number
  readonly to: number
}

interface Occurrence {
  readonly from: number
  window: DueWindow
  readonly byInterval: boolean
  isLate: boolean
  isCounted: boolean
}

/**
 * Follows one task of one patient through time. Late: the care that was charted came after its window, each time by the act before
 * it. Tasks by an interval are counted as they would fall due were each done on its due time, so that an interval that is longer than
 * what was done shows fewer; all others are counted by their windows.
 */
export function taskWalk(rule: TaskRule, span: Span, found: (one: Found) => void) {
  let open: Occurrence | undefined
  let anchor: number | undefined

  const isWithin = (at: number) => at >= span.from && at < span.to
  function report(what: Found['what'], moment: Date) {
    // What is due as a shift ends belongs to that shift.
    const at = moment.getTime() - 1
    if (isWithin(at)) found({ what, at })
  }

  function close(at: number) {
    if (!open) return
    const { window, byInterval, isCounted } = open
    const wasAskedFor = at >= window.opensAt.getTime()
    if (!byInterval && !isCounted && wasAskedFor) report('task', earlierOf(window.dueAt, at))
    open = undefined
  }

  function countByInterval(from: number, every: number, until: number) {
    anchor ??= from
    if (anchor + every < span.from) anchor += Math.floor((span.from - anchor) / every) * every
    for (; anchor + every <= until; anchor += every) report('task', new Date(anchor + every))
  }

  return {
    /** What the clock said at a moment, and goes on saying until the next one (ms). */
    step(clock: Clock, context: CareContext, until: number) {
      const now = context.now.getTime()
      if (clock.state !== 'running') {
        close(now)
        anchor = undefined
        return
      }
      const from = clock.from.getTime()
      if (open && open.from !== from) close(now)
      const { window } = windowWithDeferral(rule, clock, context)
      open ??= { from, window, byInterval: clock.every !== undefined, isLate: false, isCounted: false }
      open.window = window
      if (!open.isLate && window.closesAt.getTime() < until) {
        open.isLate = true
        if (window.closesAt.getTime() >= now) report('late', window.closesAt)
      }
      if (clock.every === undefined) anchor = undefined
      else countByInterval(from, clock.every, until)
    },
    /** The end of the walk: what fell due by then counts, what is still open does not. */
    end() {
      if (open && open.window.dueAt.getTime() <= span.to) close(span.to)
    },
  }
}

/** Care done before its due time belongs to the moment it was done. */
function earlierOf(dueAt: Date, at: number): Date {
  return new Date(Math.min(dueAt.getTime(), at + 1))
}

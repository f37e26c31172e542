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

/**
 * Follows one task of one patient through time. Late: the care that was charted came after its window, each time by the act before
 * it. Tasks by an interval are counted as they would fall due were each done on its due time, so that an interval that is longer than
 * what was done shows fewer; all others are counted by their windows.
 */
export function taskWalk(rule: TaskRule, span: Span, found: (one: Found) => void) {
  const report: Report = (what, moment) => {
    // What is due as a shift ends belongs to that shift.
    const at = moment.getTime() - 1
    if (at >= span.from && at < span.to) found({ what, at })
  }
  const windows = windowCount(report)
  const intervals = intervalCount(report, span.from)

  return {
    /** What the clock said at a moment, and goes on saying until the next one (ms). */
    step(clock: Clock, context: CareContext, until: number) {
      const now = context.now.getTime()
      if (clock.state !== 'running') {
        windows.close(now)
        intervals.stop()
        return
      }
      windows.step(clock, windowWithDeferral(rule, clock, context).window, { from: now, to: until })
      if (clock.every === undefined) intervals.stop()
      else intervals.step(clock.from.getTime(), clock.every, until)
    },
    /** The end of the walk: what fell due by then counts, what is still open does not. */
    end: () => windows.end(span.to),
  }
}

type Report = (what: Found['what'], moment: Date) => void

/** One act after another: late once when its window closed without it, and a task when it has no interval to be counted by. */
function windowCount(report: Report) {
  let open: { readonly from: number; window: DueWindow; readonly byInterval: boolean; isLate: boolean } | undefined

  function close(at: number) {
    if (!open) return
    const { window, byInterval } = open
    const wasAskedFor = at >= window.opensAt.getTime()
    if (!byInterval && wasAskedFor) report('task', earlierOf(window.dueAt, at))
    open = undefined
  }

  return {
    close,
    step(clock: Clock & { state: 'running' }, window: DueWindow, { from: now, to: until }: Span) {
      const from = clock.from.getTime()
      if (open && open.from !== from) close(now)
      open ??= { from, window, byInterval: clock.every !== undefined, isLate: false }
      open.window = window
      if (open.isLate || window.closesAt.getTime() >= until) return
      open.isLate = true
      if (window.closesAt.getTime() >= now) report('late', window.closesAt)
    },
    end(at: number) {
      if (open && open.window.dueAt.getTime() <= at) close(at)
    },
  }
}

/** Counts due times an interval apart, from the moment a clock began to run. */
function intervalCount(report: Report, start: number) {
  let anchor: number | undefined
  return {
    stop() {
      anchor = undefined
    },
    step(from: number, every: number, until: number) {
      anchor ??= from
      if (anchor + every < start) anchor += Math.floor((start - anchor) / every) * every
      for (; anchor + every <= until; anchor += every) report('task', new Date(anchor + every))
    },
  }
}

/** Care done before its due time belongs to the moment it was done. */
function earlierOf(dueAt: Date, at: number): Date {
  return new Date(Math.min(dueAt.getTime(), at + 1))
}

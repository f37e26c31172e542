import type { LengthEnd, LengthsTrend, TrendLength } from '../care/trend.ts'
import type { Duration } from '../time/duration.ts'
import { isTooYoung } from './due-tasks.ts'
import { durationTicks } from './plot-scale.ts'
import { contextAt, recordInTime, type TrendsAsked } from './trend-time.ts'

export interface LengthView {
  readonly entryId: string
  readonly startedAt: number
  readonly endedAt: number | null
  /** How long it lasted, or has lasted by now (ms). */
  readonly length: number
  /** How long it should last (ms); null where no rule is for this patient. */
  readonly target: number | null
  readonly end: LengthEnd
  readonly verdict: string
  readonly because: string
}

/** How long something lasted each time, as plain data; moments and lengths are milliseconds. */
export interface LengthsView {
  readonly shape: 'lengths'
  readonly name: string
  readonly title: string
  readonly says: string
  /** Sorts that there were, each latest first. */
  readonly groups: readonly { readonly name: string; readonly label: string; readonly lengths: readonly LengthView[] }[]
  /** Labels of the axis, from 0. */
  readonly ticks: readonly number[]
}

/** What lasted during some part of the span, by sort. */
export function lengthsView(trend: LengthsTrend, asked: TrendsAsked): LengthsView {
  const { from, to, now } = asked
  const during = trend
    .lengths(recordInTime(asked))
    .filter(({ startedAt, endedAt = now }) => startedAt <= to && endedAt >= from)
  const views = during.map(one => ({ group: one.group, view: lengthView(one, asked) }))
  const longest = Math.max(0, ...views.flatMap(({ view }) => [view.length, view.target ?? 0]))
  return {
    shape: 'lengths',
    name: trend.name,
    title: trend.title,
    says: trend.says,
    groups: Object.entries(trend.groups)
      .map(([name, label]) => ({
        name,
        label,
        lengths: views.filter(({ group }) => group === name).map(({ view }) => view),
      }))
      .filter(({ lengths }) => lengths.length > 0),
    ticks: durationTicks(longest as Duration),
  }
}

function lengthView(one: TrendLength, asked: TrendsAsked): LengthView {
  const { entryId, startedAt, endedAt, target, end, verdict, because = '' } = one
  const isUnjudged = isTooYoung(contextAt(asked, endedAt ?? asked.now))
  return {
    entryId,
    startedAt: startedAt.getTime(),
    endedAt: endedAt?.getTime() ?? null,
    length: (endedAt ?? asked.now).getTime() - startedAt.getTime(),
    target: isUnjudged ? null : (target ?? null),
    end: isUnjudged && end !== 'running' ? 'not judged' : end,
    verdict: isUnjudged && end !== 'running' ? 'Ended' : verdict,
    because,
  }
}

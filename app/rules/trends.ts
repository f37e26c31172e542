import type { AnyCareKind, Entry } from '../care/kind.ts'
import { careKinds } from '../care/kinds.ts'
import type { Measure, Trend } from '../care/trend.ts'
import { type FindingsView, findingsView } from './trend-findings.ts'
import { type LengthsView, lengthsView } from './trend-lengths.ts'
import { type MeasuredBy, type MeasureView, measureView } from './trend-measures.ts'
import type { TrendsAsked } from './trend-time.ts'

export type TrendView = MeasureView | FindingsView | LengthsView

// biome-ignore lint/suspicious/noExplicitAny: a kind's trend is asked with acts of that kind alone
type AnyTrend = Trend<any>

interface Declared {
  readonly trend: AnyTrend
  readonly entries: readonly Entry[]
}

/**
 * What every kind shows of a record over a span, numbers first. Superseded and retracted entries are not in a record. A measure of
 * several kinds is one plot.
 */
export function trendsOf(asked: TrendsAsked, kinds: readonly AnyCareKind[] = careKinds): readonly TrendView[] {
  const declared = kinds.flatMap(kind =>
    (kind.trends ?? []).map((trend): Declared => ({ trend, entries: entriesOf(kind, asked) })),
  )
  const measured = declared.flatMap(({ trend, entries }) => (trend.shape === 'measure' ? [{ trend, entries }] : []))
  return [
    ...[...new Set(measured.map(({ trend }) => trend.measure))].map(measure => ofMeasure(measure, measured, asked)),
    ...declared.flatMap(({ trend, entries }) =>
      trend.shape === 'findings' ? [findingsView(trend, entries, asked)] : [],
    ),
    ...declared.flatMap(({ trend }) => (trend.shape === 'lengths' ? [lengthsView(trend, asked)] : [])),
  ]
}

function ofMeasure(measure: Measure, by: readonly MeasuredBy[], asked: TrendsAsked): MeasureView {
  const own = by.filter(({ trend }) => trend.measure === measure)
  return measureView(measure, own, asked)
}

/** Acts of the span, oldest first. */
function entriesOf(kind: AnyCareKind, { record, from, to }: TrendsAsked): readonly Entry[] {
  return record
    .since(kind, from)
    .filter(({ performedAt }) => performedAt <= to)
    .toReversed()
}

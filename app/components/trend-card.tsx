import type { ReactNode } from 'react'
import type { FindingsView } from '#app/rules/trend-findings.ts'
import type { LengthsView } from '#app/rules/trend-lengths.ts'
import type { BandView, MeasureView } from '#app/rules/trend-measures.ts'
import { beyondWords } from '#app/rules/trend-words.ts'
import { momentWords } from '#app/rules/words.ts'
import type { Zone } from '#app/time/zone.ts'
import { Card } from './card.tsx'
import { FindingsPlot } from './findings-plot.tsx'
import type { Span } from './hour-ticks.ts'
import { LengthsPlot } from './lengths-plot.tsx'
import { MeasurePlot } from './measure-plot.tsx'
import { PlotLegend } from './plot-shapes.tsx'
import { findingsLegend, lengthsLegend, measureLegend } from './trend-legends.tsx'
import { FindingsTable, LengthsTable, MeasureTable } from './trend-tables.tsx'
import { WhyDetails } from './why.tsx'

export interface Shown {
  readonly span: Span
  /** The server's clock (ms). */
  readonly now: number
  readonly zone: Zone
}

interface TrendCardProps {
  readonly title: string
  readonly says: string
  readonly plot: ReactNode
  readonly table: ReactNode
}

/** A plot with the table of its values: beside it on a desk, beneath it on a phone. */
function TrendCard({ title, says, plot, table }: TrendCardProps) {
  return (
    <Card title={title}>
      <p className="-mt-2 mb-3 max-w-prose text-sm text-ink2">{says}</p>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-x-6 gap-y-4 lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        <div className="grid grid-cols-[minmax(0,1fr)] content-start gap-3">{plot}</div>
        {table}
      </div>
    </Card>
  )
}

/** Numbers over time against the target of each moment. */
export function MeasureCard({ view, span, now, zone }: Shown & { readonly view: MeasureView }) {
  const beyond = beyondWords(view, zone)
  return (
    <TrendCard
      title={`${view.title} (${view.unit})`}
      says={view.says}
      plot={
        <>
          <MeasurePlot view={view} span={span} zone={zone} />
          <PlotLegend items={measureLegend(view)} />
          {beyond.length > 0 && (
            <p className="text-sm font-semibold text-late">Beyond the plot, drawn at its edge: {beyond.join('; ')}.</p>
          )}
          <Targets view={view} now={now} zone={zone} />
        </>
      }
      table={<MeasureTable view={view} now={now} zone={zone} />}
    />
  )
}

/** Findings of each day. */
export function FindingsCard({ view, now, zone }: Shown & { readonly view: FindingsView }) {
  return (
    <TrendCard
      title={view.title}
      says={view.says}
      plot={
        <>
          {view.rows.length > 0 ? (
            <FindingsPlot view={view} />
          ) : (
            <p className="py-3 font-semibold">Nothing found on any day.</p>
          )}
          {view.rows.length > 0 && <PlotLegend items={findingsLegend} />}
          {view.notSeen.length > 0 && (
            <p className="text-sm text-ink2">Not seen in this span: {view.notSeen.join(', ').toLowerCase()}.</p>
          )}
        </>
      }
      table={<FindingsTable view={view} now={now} zone={zone} />}
    />
  )
}

/** How long something lasted each time. */
export function LengthsCard({ view, now, zone }: Shown & { readonly view: LengthsView }) {
  return (
    <TrendCard
      title={view.title}
      says={view.says}
      plot={
        <>
          <LengthsPlot view={view} zone={zone} />
          <PlotLegend items={lengthsLegend(view)} />
        </>
      }
      table={<LengthsTable view={view} now={now} zone={zone} />}
    />
  )
}

interface TargetsProps {
  readonly view: MeasureView
  readonly now: number
  readonly zone: Zone
}

/** The targets of the span in words, and where the one of now comes from. */
function Targets({ view: { bands, why, title }, now, zone }: TargetsProps) {
  if (bands.length === 0) return null
  return (
    <div className="text-sm text-ink2">
      <ul>
        {bands.map(band => (
          <li key={band.from}>{targetWords(band, now, zone)}</li>
        ))}
      </ul>
      {why && <WhyDetails why={{ rule: [], ...why }} about={title} />}
    </div>
  )
}

function targetWords({ words, from, origin }: BandView, now: number, zone: Zone) {
  return (
    <>
      <b className="font-semibold text-ink">Target {words}</b> from {momentWords(from, now, zone)}. {origin}.
    </>
  )
}

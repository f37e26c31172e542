import type { ReactNode } from 'react'
import type { Zone } from '#app/time/zone.ts'
import { gridTicks, labelled, percent, type Span, type Tick } from './hour-ticks.ts'
import { Drawing } from './plot-shapes.tsx'
import { Stretched } from './strip-shapes.tsx'

/** Px of a plot. */
export const PLOT = { top: 14, height: 170, axis: 24 } as const

/** Px from the top of a plot at which a place on its axis lies (thousandths from the low end). */
export const plotY = (at: number): number => Math.round((PLOT.top + PLOT.height * (1 - at / 1000)) * 10) / 10

export interface PlotFrameProps {
  /** Unlike that of others on the page. */
  readonly id: string
  readonly title: string
  /** What it shows, in sentences: the table beside it holds every value. */
  readonly desc: string
  /** Labels of the axis on the left, by their place (thousandths from the low end). */
  readonly axis: readonly { readonly at: number; readonly label: string }[]
  readonly span: Span
  readonly zone: Zone
  readonly children: ReactNode
}

/** A plot over time: values on the left, time below, and what is drawn on the grid. */
export function PlotFrame({ id, title, desc, axis, span, zone, children }: PlotFrameProps) {
  const bottom = PLOT.top + PLOT.height
  const height = bottom + PLOT.axis
  const ticks = gridTicks(span, zone, WIDE_PX)
  return (
    <div className="flex gap-1.5">
      <svg aria-hidden="true" className="w-8 flex-none" height={height}>
        {axis.map(({ at, label }) => (
          <text key={label} x="100%" y={plotY(at) + 4} textAnchor="end" className="fill-ink2 text-xs">
            {label}
          </text>
        ))}
      </svg>
      <div className="@container min-w-0 flex-1 pr-2">
        <Drawing id={id} title={title} desc={desc} height={height}>
          <Stretched height={height}>
            <path
              d={[
                ...axis.map(({ at }) => `M0 ${plotY(at)}H1000`),
                ...ticks.map(({ x }) => `M${x} ${PLOT.top}V${bottom}`),
              ].join('')}
              className="fill-none stroke-line"
              vectorEffect="non-scaling-stroke"
            />
          </Stretched>
          {children}
          <TimeLabels ticks={ticks} y={bottom + 18} />
        </Drawing>
      </div>
    </div>
  )
}

/** Labels are chosen for two widths; the plot's own container shows the set that fits. */
const NARROW_PX = 220
const WIDE_PX = 560
/** No flag stands in the way of a label. */
const NO_FLAG = -1000

interface TimeLabelsProps {
  readonly ticks: readonly Tick[]
  readonly y: number
}

/** Times or days below a plot, thinned so that none touch. */
export function TimeLabels({ ticks, y }: TimeLabelsProps) {
  const narrow = new Set(labelled(ticks, NARROW_PX, NO_FLAG))
  const wide = new Set(labelled(ticks, WIDE_PX, NO_FLAG))
  const shown = ticks.filter(tick => narrow.has(tick) || wide.has(tick))
  return shown.map(tick => (
    <text
      key={tick.x}
      x={percent(tick.x)}
      y={y}
      textAnchor="middle"
      className={`fill-ink2 text-xs ${wide.has(tick) ? '' : '@lg:hidden'} ${narrow.has(tick) ? '' : 'hidden @lg:inline'}`}
    >
      {tick.label}
    </text>
  ))
}

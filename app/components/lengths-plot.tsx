import type { LengthEnd } from '#app/care/trend.ts'
import type { LengthsView, LengthView } from '#app/rules/trend-lengths.ts'
import { lengthsWords } from '#app/rules/trend-words.ts'
import { showDate, showDuration } from '#app/time/display.ts'
import type { Zone } from '#app/time/zone.ts'
import { percent } from './hour-ticks.ts'
import { TimeLabels } from './plot-frame.tsx'
import { Drawing } from './plot-shapes.tsx'
import { HATCH } from './strip-patterns.tsx'
import { Stretched } from './strip-shapes.tsx'

const ROW_PX = 26
const AXIS_PX = 26

/** How each end is drawn: by fill and outline, not by colour alone. */
export const endLooks: Readonly<Record<LengthEnd, { readonly className: string; readonly fill?: string }>> = {
  reached: { className: 'fill-brand stroke-brand' },
  failed: { fill: HATCH, className: 'stroke-late stroke-[1.5]' },
  short: { className: 'fill-surface stroke-ink2 stroke-[1.5]' },
  running: { className: 'fill-brand-tint stroke-brand stroke-2 [stroke-dasharray:5_3]' },
  'not judged': { className: 'fill-sunk stroke-ink2 stroke-[1.5] [stroke-dasharray:2_2]' },
}

interface LengthsPlotProps {
  readonly view: LengthsView
  readonly zone: Zone
}

/** How long something lasted: a bar each time, by sort, against a mark where it should have got to. */
export function LengthsPlot({ view, zone }: LengthsPlotProps) {
  const rows = view.groups.flatMap(({ name, label, lengths }) => [
    { key: name, words: label, one: null },
    ...lengths.map(one => ({ key: one.entryId, words: showDate(new Date(one.startedAt), zone).slice(0, 6), one })),
  ])
  const height = rows.length * ROW_PX + AXIS_PX
  const end = view.ticks.at(-1) ?? 1
  const at = (ms: number) => (1000 * ms) / end
  const ticks = view.ticks.map(tick => ({ x: at(tick), label: tick === 0 ? '0' : showDuration(tick) }))
  const id = `trend-${view.name}`
  return (
    <div className="flex gap-3">
      <div aria-hidden="true" className="w-24 flex-none sm:w-32">
        {rows.map(({ key, words, one }) => (
          <div
            key={key}
            className={`flex h-6.5 items-center text-sm leading-none ${one ? 'justify-end text-ink2' : 'font-semibold'}`}
          >
            {words}
          </div>
        ))}
      </div>
      <div className="@container min-w-0 flex-1 pr-2">
        <Drawing id={id} title={view.title} desc={lengthsWords(view)} height={height}>
          <Stretched height={height}>
            <path
              d={ticks.map(({ x }) => `M${x} 0V${height - AXIS_PX}`).join('')}
              className="fill-none stroke-line"
              vectorEffect="non-scaling-stroke"
            />
          </Stretched>
          {rows.map(({ key, one }, index) => one && <Bar key={key} one={one} y={index * ROW_PX} at={at} />)}
          <TimeLabels ticks={ticks} y={height - 8} />
        </Drawing>
      </div>
    </div>
  )
}

interface BarProps {
  readonly one: LengthView
  /** Px. */
  readonly y: number
  readonly at: (ms: number) => number
}

function Bar({ one: { length, target, end }, y, at }: BarProps) {
  const x = target === null ? null : percent(at(target))
  return (
    <>
      <rect width={percent(Math.max(4, at(length)))} y={y + 5} height={ROW_PX - 10} {...endLooks[end]} />
      {x && <line x1={x} x2={x} y1={y + 1} y2={y + ROW_PX - 1} className="stroke-ink stroke-3" />}
    </>
  )
}

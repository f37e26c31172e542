import type { FindingsView } from '#app/rules/trend-findings.ts'
import { findingsWords } from '#app/rules/trend-words.ts'
import { showDay } from '#app/time/display.ts'
import { TimeLabels } from './plot-frame.tsx'
import { Drawing } from './plot-shapes.tsx'
import { Stretched } from './strip-shapes.tsx'

const ROW_PX = 28
const AXIS_PX = 26
/** Px of a bar by level, from the foot of its row. */
const BAR_PX = [0, 7, 14, 22] as const
const WIDEST = 90 // thousandths

/** Findings by day: a row for each, a column for each day, and a bar as tall as there was much of it. */
export function FindingsPlot({ view }: { readonly view: FindingsView }) {
  const { name, title, rows, days } = view
  const height = rows.length * ROW_PX + AXIS_PX
  const column = 1000 / days.length
  const middle = (index: number) => (index + 0.5) * column
  const ticks = days.map(({ day }, index) => ({ x: middle(index), label: showDay(day).slice(0, 6) }))
  const id = `trend-${name}`
  return (
    <div className="flex gap-3">
      <div aria-hidden="true" className="w-24 flex-none sm:w-32">
        {rows.map(({ name: row, label }) => (
          <div
            key={row}
            className="flex h-7 items-end justify-end pb-1 text-right text-xs leading-none font-semibold text-ink2 sm:text-sm sm:leading-none"
          >
            {label}
          </div>
        ))}
      </div>
      <div className="@container min-w-0 flex-1">
        <Drawing id={id} title={title} desc={findingsWords(view)} height={height}>
          <Stretched height={height}>
            {rows.map(({ name: row, levels }, index) => (
              <DayBars key={row} levels={levels} foot={(index + 1) * ROW_PX - 3} middle={middle} column={column} />
            ))}
          </Stretched>
          <TimeLabels ticks={ticks} y={height - 8} />
        </Drawing>
      </div>
    </div>
  )
}

interface DayBarsProps {
  readonly levels: readonly (number | null)[]
  /** Px. */
  readonly foot: number
  readonly middle: (index: number) => number
  readonly column: number
}

/** One row: a bar where it was seen, a line at the foot where it was looked for, nothing on days without a look. */
function DayBars({ levels, foot, middle, column }: DayBarsProps) {
  const width = Math.min(WIDEST, column * 0.7)
  const bars = levels.map((level, index) => {
    const x = middle(index) - width / 2
    const tall = BAR_PX[level ?? 0] ?? 0
    return level ? `M${x} ${foot}v${-tall}h${width}v${tall}z` : ''
  })
  const looks = levels.map((level, index) => (level === 0 ? `M${middle(index) - width / 2} ${foot}h${width}` : ''))
  return (
    <>
      <path
        d={bars.join('')}
        className="fill-late-tint stroke-late stroke-[1.5]"
        vectorEffect="non-scaling-stroke"
        strokeLinejoin="round"
      />
      <path d={looks.join('')} className="fill-none stroke-edge stroke-2" vectorEffect="non-scaling-stroke" />
    </>
  )
}

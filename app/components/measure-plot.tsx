import { placed } from '#app/rules/plot-scale.ts'
import type { MeasureView, ReadingView } from '#app/rules/trend-measures.ts'
import { measureWords, scaleOfTicks } from '#app/rules/trend-words.ts'
import type { Zone } from '#app/time/zone.ts'
import { percent, place, type Span } from './hour-ticks.ts'
import { PlotFrame, plotY } from './plot-frame.tsx'
import { ABOVE, BELOW, FULL, FULL_OUT, HOLLOW, HOLLOW_OUT, UNJUDGED } from './plot-shapes.tsx'
import { Stretched } from './strip-shapes.tsx'

interface MeasurePlotProps {
  readonly view: MeasureView
  readonly span: Span
  readonly zone: Zone
}

/** Numbers over time against their target. Found is hollow and left at is full; out of range is a triangle. */
export function MeasurePlot({ view, span, zone }: MeasurePlotProps) {
  const scale = scaleOfTicks(view.ticks)
  const y = (value: number) => plotY(placed(value, scale).at)
  const x = (at: number) => Math.min(1000, Math.max(0, place(new Date(at), span)))
  const places = { x, y }
  return (
    <PlotFrame
      id={`trend-${view.name}`}
      title={view.title}
      desc={measureWords(view, zone)}
      axis={view.ticks.map(tick => ({ at: placed(tick, scale).at, label: String(tick) }))}
      span={span}
      zone={zone}
    >
      <Bands view={view} {...places} />
      <Lines view={view} {...places} />
      {view.readings.map(reading => (
        <ReadingMarks key={reading.entryId} reading={reading} view={view} {...places} />
      ))}
    </PlotFrame>
  )
}

interface Places {
  /** Thousandths of the span, by moment. */
  readonly x: (at: number) => number
  /** Px, by value. */
  readonly y: (value: number) => number
}

const STRETCH_PX = plotY(0) + 1

/** The target in force, tinted between two broken lines, with a step where it became another. */
function Bands({ view: { bands, ticks }, x, y }: Places & { readonly view: MeasureView }) {
  const top = scaleOfTicks(ticks).to
  const edges = bands.flatMap(({ from, to, lower, upper }) =>
    [lower, ...(upper === undefined ? [] : [upper])].map(limit => `M${x(from)} ${y(limit)}H${x(to)}`),
  )
  if (bands.length === 0) return null
  return (
    <Stretched height={STRETCH_PX}>
      {bands.map(({ from, to, lower, upper = top }) => (
        <rect
          key={from}
          x={x(from)}
          width={Math.max(0, x(to) - x(from))}
          y={y(upper)}
          height={y(lower) - y(upper)}
          className="fill-brand-tint"
        />
      ))}
      <path
        d={edges.join('')}
        className="fill-none stroke-brand stroke-[1.5] [stroke-dasharray:6_4]"
        vectorEffect="non-scaling-stroke"
      />
    </Stretched>
  )
}

/** What joins readings, or what was found with what it was left at. */
function Lines({ view: { readings, isJoined }, x, y }: Places & { readonly view: MeasureView }) {
  const joined = readings.map(({ at, values: [first] }, index) =>
    first ? `${index === 0 ? 'M' : 'L'}${x(at)} ${y(first.value)}` : '',
  )
  const stems = readings.map(({ at, values: [first, second] }) =>
    first && second ? `M${x(at)} ${y(first.value)}V${y(second.value)}` : '',
  )
  return (
    <Stretched height={STRETCH_PX}>
      <path
        d={(isJoined ? joined : stems).join('')}
        className="fill-none stroke-ink2 stroke-[1.5]"
        vectorEffect="non-scaling-stroke"
        strokeLinejoin="round"
      />
    </Stretched>
  )
}

interface ReadingMarksProps extends Places {
  readonly reading: ReadingView
  readonly view: MeasureView
}

/** One reading; when it was left as it was found, the full mark covers the hollow one. */
function ReadingMarks({ reading: { at, values }, view, x, y }: ReadingMarksProps) {
  const scale = scaleOfTicks(view.ticks)
  return values.map((one, index) => {
    const isHollow = view.marks.length > 1 && index === 0
    const point = { x: percent(x(at)), y: y(one.value) }
    const { beyond } = placed(one.value, scale)
    return [
      <use key={one.mark} href={shapeOf(one.isOut, isHollow, view)} {...point} />,
      beyond && <use key={beyond} href={beyond === 'above' ? ABOVE : BELOW} {...point} />,
    ]
  })
}

function shapeOf(isOut: boolean | null, isHollow: boolean, { marks, bands }: MeasureView): string {
  if (isOut === null) return bands.length > 0 ? UNJUDGED : FULL
  if (!isOut) return isHollow ? HOLLOW : FULL
  return isHollow || marks.length === 1 ? HOLLOW_OUT : FULL_OUT
}

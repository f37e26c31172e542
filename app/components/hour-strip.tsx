import type { Zone } from '#app/time/zone.ts'
import { gridTicks, percent, place } from './hour-ticks.ts'
import { StripAxis } from './strip-axis.tsx'
import { laneShapes, type StripLane, stripWords } from './strip-lanes.ts'
import { StripGrid, StripShapes } from './strip-shapes.tsx'

export interface HourStripProps {
  readonly from: Date
  readonly to: Date
  readonly now: Date
  readonly zone: Zone
  /** Px it is drawn at on a desk, which decides how fine the hours are; it stretches to the room it is given. */
  readonly width: number
  readonly lanes: readonly StripLane[]
  readonly axis: boolean
  /** Names the lanes on the left, and makes them taller. */
  readonly labels?: boolean
  readonly title: string
  /** Px a lane; a wall board has tall ones. */
  readonly laneHeight?: number
  /** Name of the `SharedGrid` to draw instead of a grid of its own. */
  readonly grid?: string
}

const AXIS_PX = 26
export const BOARD_LANE_PX = 15
const NAMED_LANE_PX = 30

/** A time axis with lanes of care: what was done left of now, what will be due right of it, and lateness as a length. */
export function HourStrip({
  from,
  to,
  now,
  zone,
  width,
  lanes,
  axis,
  labels = false,
  title,
  grid,
  ...rest
}: HourStripProps) {
  const span = { from, to }
  const laneHeight = labels ? NAMED_LANE_PX : (rest.laneHeight ?? BOARD_LANE_PX)
  const top = axis ? AXIS_PX : 0
  const height = top + lanes.length * laneHeight
  const ticks = axis || grid === undefined ? gridTicks(span, zone, width) : []
  const nowX = place(now, span)
  const words = lanes.length === 0 ? title : stripWords(title, lanes)
  return (
    <div className={labels ? 'flex gap-3' : ''}>
      {labels && <LaneNames lanes={lanes} axis={axis} />}
      <div className="@container min-w-0 flex-1">
        <svg role="img" aria-label={words} className="block w-full" height={height}>
          {grid === undefined ? (
            <StripGrid ticks={ticks} rows={lanes.length} top={top} laneHeight={laneHeight} />
          ) : (
            <use href={`#${grid}`} width="100%" height={height} />
          )}
          <StripShapes shapes={laneShapes(lanes, { span, now, top, laneHeight })} height={height} />
          <line
            x1={percent(nowX)}
            x2={percent(nowX)}
            y1={axis ? 18 : 0}
            y2={height}
            className="stroke-brand stroke-2"
          />
          {axis && <StripAxis ticks={ticks} width={width} now={now} nowX={nowX} zone={zone} />}
        </svg>
      </div>
    </div>
  )
}

interface LaneNamesProps {
  readonly lanes: readonly StripLane[]
  readonly axis: boolean
}

/** Hidden from screen readers: the strip says its lanes by name. */
function LaneNames({ lanes, axis }: LaneNamesProps) {
  return (
    <div aria-hidden="true" className={`w-20 flex-none sm:w-32 ${axis ? 'pt-6.5' : ''}`}>
      {lanes.map(lane => (
        <div
          key={lane.name}
          className="flex h-7.5 items-center justify-end text-right text-xs leading-none font-semibold text-ink2 sm:text-sm sm:leading-none"
        >
          {lane.name}
        </div>
      ))}
    </div>
  )
}

import { localTime, type Zone } from '#app/time/zone.ts'
import { labelled, percent, type Tick } from './hour-ticks.ts'

export interface StripAxisProps {
  readonly ticks: readonly Tick[]
  readonly width: number
  readonly now: Date
  /** Thousandths of the span. */
  readonly nowX: number
  readonly zone: Zone
}

/** Labels are chosen for two widths, this one and the one asked for; the strip's own container shows the set that fits. */
const NARROW_PX = 200
const HALF_FLAG_PX = 23

const NARROW_ONLY = '@md:hidden'
const WIDE_ONLY = 'hidden @md:inline'

/** Hours above the strip, thinned so that none touch, and the time at the now line. */
export function StripAxis({ ticks, width, now, nowX, zone }: StripAxisProps) {
  const narrow = new Set(labelled(ticks, NARROW_PX, nowX))
  const wide = new Set(labelled(ticks, width, nowX))
  return (
    <>
      {ticks.map(
        tick =>
          (narrow.has(tick) || wide.has(tick)) && (
            <text
              key={tick.x}
              x={percent(tick.x)}
              y="14"
              textAnchor="middle"
              className={`fill-ink3 text-xs ${wide.has(tick) ? '' : NARROW_ONLY} ${narrow.has(tick) ? '' : WIDE_ONLY}`}
            >
              {tick.label}
            </text>
          ),
      )}
      {nowX >= 0 && nowX <= 1000 && (
        <svg aria-hidden="true" x={percent(nowX)} className="overflow-visible">
          <rect x={-HALF_FLAG_PX} width={2 * HALF_FLAG_PX} height="19" rx="4" className="fill-brand" />
          <text y="14" textAnchor="middle" className="fill-brand-ink text-xs font-bold">
            {localTime(now, zone)}
          </text>
        </svg>
      )}
    </>
  )
}

import type { TaskStatus } from '#app/rules/status.ts'
import { HATCH } from './strip-patterns.tsx'

export interface DwellBarProps {
  /** Calendar days since insertion, which is day 0. */
  readonly day: number
  /** The last day it may stay; null when nothing limits it. */
  readonly limit: number | null
  /** Of the tube change that the limit asks for. */
  readonly status?: TaskStatus
}

/** How long a tube has been in, as words: `Day 12 of 29`. */
export function dwellWords(day: number, limit: number | null): string {
  if (limit === null) return `Day ${day}`
  return day > limit ? `Day ${day}, limit was day ${limit}` : `Day ${day} of ${limit}`
}

/** Days of a tube against their limit, in words and as a length. */
export function DwellBar({ day, limit, status = 'upcoming' }: DwellBarProps) {
  const isLate = status === 'overdue' || status === 'seriously overdue'
  const isNear = status === 'due' || status === 'due soon'
  const words = isLate ? 'font-semibold text-late' : isNear ? 'font-semibold text-due' : 'text-ink2'
  return (
    <div>
      <p className={`text-sm ${words}`}>{dwellWords(day, limit)}</p>
      {limit !== null && (
        <svg aria-hidden="true" width="100%" height="8" className="mt-1 block">
          <rect y="1" width="100%" height="6" rx="3" className="fill-sunk stroke-hair" />
          <rect
            y="1"
            width={`${Math.round(Math.min(1, day / Math.max(1, limit)) * 1000) / 10}%`}
            height="6"
            rx="3"
            {...(isLate ? { fill: HATCH } : {})}
            className={isLate ? 'stroke-late' : isNear ? 'fill-due-fill stroke-due' : 'fill-soon'}
          />
        </svg>
      )}
    </div>
  )
}

import type { ReactNode } from 'react'
import { HATCH, NOTE, TRIANGLE } from './strip-patterns.tsx'

const WINDOW = { x: 1, y: 3, width: 20, height: 9 }

/** The shapes of the strip, in the order in which they press. */
const shapes: readonly { readonly says: string; readonly draws: ReactNode }[] = [
  { says: 'overdue: grows until it is charted', draws: <rect {...WINDOW} fill={HATCH} className="stroke-late" /> },
  {
    says: 'seriously overdue',
    draws: (
      <>
        <rect {...WINDOW} fill={HATCH} className="stroke-late" />
        <path d="M3 3v9" className="stroke-late stroke-5" />
      </>
    ),
  },
  { says: 'due now', draws: <rect {...WINDOW} className="fill-due-fill stroke-due" /> },
  { says: 'due soon', draws: <rect {...WINDOW} className="fill-surface stroke-soon stroke-3" /> },
  { says: 'upcoming', draws: <rect {...WINDOW} className="fill-surface stroke-soon" /> },
  {
    says: 'deferred',
    draws: (
      <>
        <rect {...WINDOW} className="fill-surface stroke-ink2" />
        <use href={NOTE} x="11" y="7.5" />
      </>
    ),
  },
  {
    says: 'suspended',
    draws: <rect {...WINDOW} className="fill-none stroke-ink3 [stroke-dasharray:4_3]" />,
  },
  { says: 'done', draws: <circle cx="11" cy="7.5" r="4" className="fill-done" /> },
  { says: 'out of range', draws: <use href={TRIANGLE} x="11" y="8" /> },
]

export interface StripLegendProps {
  /** Lanes from top to bottom, where the strips do not name them. */
  readonly lanes?: readonly string[]
}

/** What the shapes of the hour strips mean; for the foot of a board. */
export function StripLegend({ lanes = [] }: StripLegendProps) {
  return (
    <div className="flex flex-wrap items-center gap-x-5 gap-y-1 px-1 py-3 text-sm text-ink2">
      {lanes.length > 0 && <p>Lanes, top to bottom: {lanes.join(', ').toLowerCase()}</p>}
      <ul aria-label="Shapes" className="flex flex-wrap gap-x-5 gap-y-1">
        {shapes.map(({ says, draws }) => (
          <li key={says} className="inline-flex items-center gap-2">
            <svg aria-hidden="true" width="22" height="15" className="flex-none">
              {draws}
            </svg>
            {says}
          </li>
        ))}
      </ul>
    </div>
  )
}

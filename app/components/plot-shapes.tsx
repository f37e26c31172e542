import type { ReactNode } from 'react'

export const HOLLOW = '#plot-hollow'
export const FULL = '#plot-full'
export const HOLLOW_OUT = '#strip-triangle'
export const FULL_OUT = '#plot-full-out'
export const UNJUDGED = '#plot-unjudged'
export const ABOVE = '#plot-above'
export const BELOW = '#plot-below'

/** What the plots of a page share, drawn once beside `StripPatterns`. Shapes differ in form, so that grey is enough. */
export function PlotPatterns() {
  return (
    <svg width="0" height="0" aria-hidden="true" className="absolute">
      <defs>
        <circle id="plot-hollow" r="4.5" className="fill-surface stroke-ink stroke-2" />
        <circle id="plot-full" r="4.5" className="fill-ink" />
        <path
          id="plot-full-out"
          d="M0-5.5L5.5 4.5h-11z"
          className="fill-late stroke-late stroke-2"
          strokeLinejoin="round"
        />
        <path id="plot-unjudged" d="M-4-4L4 4M-4 4L4-4" className="fill-none stroke-ink2 stroke-2" />
        <path id="plot-above" d="M-5-7L0-12 5-7" className="fill-none stroke-late stroke-2" />
        <path id="plot-below" d="M-5 7L0 12 5 7" className="fill-none stroke-late stroke-2" />
      </defs>
    </svg>
  )
}

export interface LegendItem {
  readonly says: string
  /** Drawn within 24 by 16 px, with its middle at 12, 8. */
  readonly draws: ReactNode
}

/** What the shapes of one plot mean. */
export function PlotLegend({ items }: { readonly items: readonly LegendItem[] }) {
  return (
    <ul aria-label="Shapes" className="flex flex-wrap gap-x-5 gap-y-1 text-sm text-ink2">
      {items.map(({ says, draws }) => (
        <li key={says} className="inline-flex items-center gap-2">
          <svg aria-hidden="true" width="24" height="16" className="flex-none">
            {draws}
          </svg>
          {says}
        </li>
      ))}
    </ul>
  )
}

interface DrawingProps {
  /** Of this page alone: the title and the words for those who hear it are named after it. */
  readonly id: string
  readonly title: string
  readonly desc: string
  /** Px. */
  readonly height: number
  readonly children: ReactNode
}

/** The picture of a plot, as wide as its room, with its title and what it shows in words. */
export function Drawing({ id, title, desc, height, children }: DrawingProps) {
  return (
    <svg
      role="img"
      aria-labelledby={`${id}-title ${id}-desc`}
      className="block w-full overflow-visible"
      height={height}
    >
      <title id={`${id}-title`}>{title}</title>
      <desc id={`${id}-desc`}>{desc}</desc>
      {children}
    </svg>
  )
}

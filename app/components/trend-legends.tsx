import type { LengthsView } from '#app/rules/trend-lengths.ts'
import type { MeasureView } from '#app/rules/trend-measures.ts'
import { endLooks } from './lengths-plot.tsx'
import { FULL, FULL_OUT, HOLLOW, HOLLOW_OUT, type LegendItem, UNJUDGED } from './plot-shapes.tsx'

const symbol = (href: string) => <use href={href} x="12" y="8" />

/** The shapes of a plot of numbers: those that it may hold. */
export function measureLegend({ marks, bands, readings }: MeasureView): readonly LegendItem[] {
  const [first, second] = marks.map(({ label }) => label)
  const isUnjudged = bands.length > 0 && readings.some(({ values }) => values.some(({ isOut }) => isOut === null))
  return [
    ...(second === undefined
      ? [{ says: first ?? '', draws: symbol(FULL) }]
      : [
          { says: first ?? '', draws: symbol(HOLLOW) },
          { says: `${second}, or not changed`, draws: symbol(FULL) },
        ]),
    ...(bands.length > 0 ? outLegend(first, second) : []),
    ...(isUnjudged ? [{ says: 'no target applies', draws: symbol(UNJUDGED) }] : []),
    ...(bands.length > 0 ? [targetLegend] : []),
  ]
}

function outLegend(first: string | undefined, second: string | undefined): readonly LegendItem[] {
  if (second === undefined) return [{ says: 'out of range', draws: symbol(HOLLOW_OUT) }]
  return [
    { says: `${first ?? ''} out of range`, draws: symbol(HOLLOW_OUT) },
    { says: `${second} out of range`, draws: symbol(FULL_OUT) },
  ]
}

const targetLegend: LegendItem = {
  says: 'target',
  draws: (
    <>
      <rect x="1" y="2" width="22" height="12" className="fill-brand-tint" />
      <path d="M1 2h22M1 14h22" className="fill-none stroke-brand stroke-[1.5] [stroke-dasharray:6_4]" />
    </>
  ),
}

/** The shapes of the matrix. */
export const findingsLegend: readonly LegendItem[] = [
  {
    says: 'seen: the taller, the more',
    draws: <rect x="6" y="2" width="12" height="12" className="fill-late-tint stroke-late stroke-[1.5]" />,
  },
  { says: 'looked for, not seen', draws: <path d="M5 14h14" className="fill-none stroke-edge stroke-2" /> },
  { says: 'blank: nobody looked', draws: null },
]

const endWords = {
  reached: 'passed',
  failed: 'failed',
  short: 'stopped early',
  running: 'still running',
  'not judged': 'not judged',
} as const

/** The shapes of bars of length that there are, and their target. */
export function lengthsLegend({ groups }: LengthsView): readonly LegendItem[] {
  const lengths = groups.flatMap(group => group.lengths)
  const ends = (Object.keys(endWords) as (keyof typeof endWords)[]).filter(end => lengths.some(one => one.end === end))
  return [
    ...ends.map(end => ({
      says: endWords[end],
      draws: <rect x="2" y="2" width="20" height="12" {...endLooks[end]} />,
    })),
    ...(lengths.some(({ target }) => target !== null)
      ? [{ says: 'target', draws: <path d="M12 1v14" className="stroke-ink stroke-3" /> }]
      : []),
  ]
}

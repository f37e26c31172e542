export interface GaugeProps {
  readonly lower: number
  readonly upper: number
  /** The end of the scale, which starts at 0. */
  readonly max: number
  readonly unit: string
  /** In `unit`; nothing yet, or not a number, draws the band alone. */
  readonly value?: number | undefined
  readonly title: string
}

/** How a value lies against its band, in words: `above 30`. */
export function bandWords(value: number, lower: number, upper: number): string {
  if (value < lower) return `below ${lower}`
  return value > upper ? `above ${upper}` : `in range, ${lower} to ${upper}`
}

/** A value against its band. The words beside it say the same. */
export function Gauge({ lower, upper, max, unit, value, title }: GaugeProps) {
  const percent = (n: number) => `${Math.round((Math.min(Math.max(n, 0), max) / max) * 1000) / 10}%`
  const isOut = value !== undefined && (value < lower || value > upper)
  const band = `${title}: band ${lower} to ${upper} ${unit}`
  const words = value === undefined ? band : `${band}, ${value} ${unit} is ${bandWords(value, lower, upper)}`
  return (
    <svg role="img" aria-label={words} width="100%" height="48" className="block overflow-visible">
      <rect y="14" width="100%" height="14" rx="2" className="fill-sunk stroke-line" />
      <rect x={percent(lower)} y="14" width={percent(upper - lower)} height="14" className="fill-brand" />
      {value !== undefined && (
        <svg aria-hidden="true" x={percent(value)} className="overflow-visible">
          <path
            d="M0 12L-8-1H8zM0 12V32"
            className={`stroke-2 ${isOut ? 'fill-late stroke-late' : 'fill-ink stroke-ink'}`}
            strokeLinejoin="round"
          />
        </svg>
      )}
      {[0, lower, upper, max].map((n, index) => (
        <text
          key={n}
          x={percent(n)}
          y="46"
          textAnchor={index === 0 ? 'start' : index === 3 ? 'end' : 'middle'}
          className="fill-ink2 text-sm"
        >
          {n}
        </text>
      ))}
    </svg>
  )
}

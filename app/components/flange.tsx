import { firstLineOf, mm, PLATE, radiiOf, SLOTS, wingsOf } from './flange-shape.ts'

export interface FlangeProps {
  /** Inner diameter with the inner cannula in place. */
  readonly idMm: number
  readonly idWithoutInnerMm?: number | undefined
  readonly odMm: number
  readonly lengthMm?: number | undefined
  /** What is printed on the plate: `8.0 ISO 5366`. */
  readonly label: string
  /** In words: `air-filled cuff`. */
  readonly cuff: string
  /** Where an adjustable plate is locked. */
  readonly markCm?: number | undefined
  readonly className?: string
}

/** The neck plate as it looks at the bedside, drawn from the tube's own numbers and with what is printed on it. */
export function Flange(props: FlangeProps) {
  const { idMm, odMm, className = 'max-w-90' } = props
  const { left, right, bold } = wingsOf(props)
  return (
    <svg
      role="img"
      aria-label={flangeWords(props)}
      viewBox="0 0 340 150"
      className={`mx-auto block w-full ${className}`}
    >
      <path d={PLATE} className="fill-sunk stroke-ink2 stroke-2" strokeLinejoin="round" />
      {SLOTS.map(x => (
        <rect key={x} x={x} y="56" width="10" height="38" rx="5" className="fill-surface stroke-ink2 stroke-2" />
      ))}
      <Tube idMm={idMm} odMm={odMm} />
      <Lines lines={left} x={40} bold={2} anchor="start" />
      <Lines lines={right} x={300} bold={bold} anchor="end" />
    </svg>
  )
}

/** The same in words, for those who hear the drawing, with the numbers that the plate has no room for. */
export function flangeWords({ idMm, idWithoutInnerMm, odMm, lengthMm, label, cuff, markCm }: FlangeProps): string {
  return [
    `Neck plate printed ${label}`,
    `inner diameter ${mm(idMm)} mm`,
    ...(idWithoutInnerMm === undefined ? [] : [`${mm(idWithoutInnerMm)} mm without the inner cannula`]),
    `outer diameter ${mm(odMm)} mm`,
    ...(lengthMm === undefined ? [] : [`length ${lengthMm} mm`]),
    ...(markCm === undefined ? [] : [`locked at ${markCm} cm`]),
    cuff,
  ].join(', ')
}

function Tube({ idMm, odMm }: Pick<FlangeProps, 'idMm' | 'odMm'>) {
  const { ring, outer, inner } = radiiOf({ idMm, odMm })
  return (
    <>
      <circle cx="170" cy="75" r={ring} className="fill-surface stroke-ink2 stroke-2" />
      <circle cx="170" cy="75" r={outer} className="fill-hair stroke-ink2 stroke-2" />
      <circle cx="170" cy="75" r={inner} className="fill-surface stroke-ink2 stroke-2" />
    </>
  )
}

interface LinesProps {
  readonly lines: readonly string[]
  readonly x: number
  /** How many of them are bold, from the top. */
  readonly bold: number
  readonly anchor: 'start' | 'end'
}

function Lines({ lines, x, bold, anchor }: LinesProps) {
  const first = firstLineOf(lines)
  return lines.map((line, index) => (
    <text
      key={line}
      x={x}
      y={first + index * 18}
      textAnchor={anchor}
      className={index < bold ? 'fill-ink text-[14px] font-semibold' : 'fill-ink2 text-[13px]'}
    >
      {line}
    </text>
  ))
}

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

const PX_PER_MM = 4
/** The connector of every such tube is 15 mm wide (ISO 5356-1). */
const CONNECTOR_MM = 15
const LINE_CHARACTERS = 13

const mm = (value: number): string => value.toFixed(1)

/** The neck plate as it looks at the bedside, drawn from the tube's own numbers and with what is printed on it. */
export function Flange(props: FlangeProps) {
  const { idMm, odMm, lengthMm, label, cuff, className = 'max-w-90' } = props
  const left = [`ID ${mm(idMm)}`, `OD ${mm(odMm)}`, ...(lengthMm === undefined ? [] : [`${lengthMm} mm long`])]
  const right = [...linesOf(label), ...linesOf(cuff)]
  const bold = linesOf(label).length
  return (
    <svg
      role="img"
      aria-label={flangeWords(props)}
      viewBox="0 0 340 150"
      className={`mx-auto block w-full ${className}`}
    >
      <path
        d="M126 34C98 26 66 20 42 23 15 27 8 52 8 75s7 48 34 52c24 3 56-3 84-11 26 12 62 12 88 0 28 8 60 14 84 11 27-4 34-29 34-52s-7-48-34-52c-24-3-56 3-84 11-26-12-62-12-88 0z"
        className="fill-sunk stroke-ink2 stroke-2"
        strokeLinejoin="round"
      />
      <rect x="20" y="56" width="10" height="38" rx="5" className="fill-surface stroke-ink2 stroke-2" />
      <rect x="310" y="56" width="10" height="38" rx="5" className="fill-surface stroke-ink2 stroke-2" />
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
  const radius = (diameterMm: number) => Math.round(diameterMm * PX_PER_MM * 5) / 10
  return (
    <>
      <circle cx="170" cy="75" r={radius(CONNECTOR_MM) + 6} className="fill-surface stroke-ink2 stroke-2" />
      <circle
        cx="170"
        cy="75"
        r={Math.min(radius(odMm), radius(CONNECTOR_MM))}
        className="fill-hair stroke-ink2 stroke-2"
      />
      <circle cx="170" cy="75" r={radius(idMm)} className="fill-surface stroke-ink2 stroke-2" />
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
  const first = 75 - (lines.length - 1) * 9 + 5
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

/** Words broken into lines short enough for a wing of the plate. */
function linesOf(words: string): readonly string[] {
  const lines: string[] = []
  for (const word of words.split(' ')) {
    const last = lines.at(-1)
    if (last !== undefined && `${last} ${word}`.length <= LINE_CHARACTERS) lines[lines.length - 1] = `${last} ${word}`
    else lines.push(word)
  }
  return lines
}

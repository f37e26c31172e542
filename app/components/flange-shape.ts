const PX_PER_MM = 4
/** The connector of every such tube is 15 mm wide (ISO 5356-1). */
const CONNECTOR_MM = 15
const LINE_CHARACTERS = 13

/** The neck plate on a drawing of 340 by 150, and the slots for its ties. */
export const PLATE =
  'M126 34C98 26 66 20 42 23 15 27 8 52 8 75s7 48 34 52c24 3 56-3 84-11 26 12 62 12 88 0 28 8 60 14 84 11 27-4 34-29 34-52s-7-48-34-52c-24-3-56 3-84 11-26-12-62-12-88 0z'
export const SLOTS = [20, 310] as const

/** Radii of connector, outer and inner tube on that drawing. */
export function radiiOf({ idMm, odMm }: { readonly idMm: number; readonly odMm: number }) {
  const connector = radius(CONNECTOR_MM)
  return { ring: connector + 6, outer: Math.min(radius(odMm), connector), inner: radius(idMm) }
}

const radius = (diameterMm: number): number => Math.round(diameterMm * PX_PER_MM * 5) / 10

/** `8.0`: a diameter as it is printed. */
export const mm = (value: number): string => value.toFixed(1)

/** What is printed on the wings: numbers on the left, the label and the cuff on the right. */
export function wingsOf(plate: {
  readonly idMm: number
  readonly odMm: number
  readonly lengthMm?: number | undefined
  readonly label: string
  readonly cuff: string
}) {
  const { idMm, odMm, lengthMm, label, cuff } = plate
  return {
    left: [`ID ${mm(idMm)}`, `OD ${mm(odMm)}`, ...(lengthMm === undefined ? [] : [`${lengthMm} mm long`])],
    right: [...linesOf(label), ...linesOf(cuff)],
    /** How many lines of the right wing are the label. */
    bold: linesOf(label).length,
  }
}

/** Height of the first of so many lines on a wing, 18 apart. */
export function firstLineOf(lines: readonly string[]): number {
  return 75 - (lines.length - 1) * 9 + 5
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

import type { BedHeadSign } from '#app/rules/bed-head-sign.ts'
import { heightOf, landscape, type Piece, type Setting } from './paper.server.ts'

/** A paragraph with its place, and what it is to those who hear the sheet read. */
export interface Block {
  readonly tag: 'H1' | 'H2' | 'P'
  readonly pieces: readonly Piece[]
  readonly setting: Setting
}

/** Where everything stands on the sheet. */
export interface SignLayout {
  readonly blocks: readonly Block[]
  /** Lines across the sheet: the heavy one under the head, the light ones between the steps. */
  readonly rules: readonly { readonly x: number; readonly y: number; readonly width: number; readonly weight: number }[]
  readonly airwayBox: Frame
  readonly plate: Frame | null
  readonly qr: Frame
}

export interface Frame {
  readonly x: number
  readonly y: number
  readonly width: number
  readonly height: number
}

const { margin } = landscape
const GAP = 26
const LEFT_WIDTH = 330
const RIGHT_X = margin + LEFT_WIDTH + GAP
const RIGHT_WIDTH = landscape.width - margin - RIGHT_X
const FULL_WIDTH = landscape.width - 2 * margin
const FOOT = landscape.height - margin
const QR_SIDE = 84
const SCALES = [1, 0.94, 0.88, 0.82, 0.76, 0.7, 0.64, 0.58, 0.52] as const

const bold = (text: string): Piece => ({ text, weight: 700 })
const plain = (text: string): Piece => ({ text, weight: 400 })

/** The sign in the largest type in which all of it stands on one sheet. */
export function signLayout(document: PDFKit.PDFDocument, sign: BedHeadSign): SignLayout {
  const tried = SCALES.map(scale => () => laidOut(document, sign, scale))
  for (const lay of tried) {
    const { layout, bottom } = lay()
    if (bottom <= FOOT) return layout
  }
  throw new RangeError('The sign does not fit on one sheet')
}

/** Collects blocks from the top of a column downwards. */
class Column {
  readonly blocks: Block[] = []
  y: number
  constructor(
    private readonly document: PDFKit.PDFDocument,
    private readonly place: { readonly x: number; readonly width: number },
    y: number,
  ) {
    this.y = y
  }
  add(tag: Block['tag'], pieces: readonly Piece[], size: number, more: Partial<Setting> = {}): this {
    const setting = { ...this.place, y: this.y, size, ...more }
    this.blocks.push({ tag, pieces, setting })
    this.y += heightOf(this.document, pieces, setting)
    return this
  }
  skip(points: number): this {
    this.y += points
    return this
  }
}

function laidOut(document: PDFKit.PDFDocument, sign: BedHeadSign, scale: number) {
  const head = headOf(document, sign)
  const left = leftOf(document, sign, head.bottom + 14, scale)
  const right = rightOf(document, sign, head.bottom + 14, scale)
  const foot = footOf(document, sign, scale)
  const layout: SignLayout = {
    blocks: [...head.blocks, ...left.blocks, ...right.blocks, ...foot.blocks],
    rules: [{ x: margin, y: head.bottom, width: FULL_WIDTH, weight: 2.5 }, ...right.rules],
    airwayBox: left.airwayBox,
    plate: left.plate,
    qr: foot.qr,
  }
  // The left column runs beside the foot, which belongs to the right one.
  return { layout, bottom: Math.max(left.bottom, right.bottom + FOOT - foot.top) }
}

function headOf(document: PDFKit.PDFDocument, { bed, name, identity, title, where }: BedHeadSign) {
  const bedSize = bed.length <= 4 ? 44 : 20
  const bedWidth = bed.length <= 4 ? 112 : 150
  const nameX = margin + bedWidth
  const nameSize = name.length > 36 ? 15 : 22
  const bedColumn = new Column(document, { x: margin, width: bedWidth - 8 }, margin - 10)
  bedColumn.add('H2', [bold(bed)], bedSize)
  const who = new Column(document, { x: nameX, width: 420 - bedWidth + 90 }, margin - 6)
  who.add('H1', [bold(name)], nameSize).add('P', [plain(identity)], 12)
  const what = new Column(document, { x: margin + 500, width: FULL_WIDTH - 500 }, margin - 6)
  what.add('H2', [bold(title)], 22, { align: 'right' }).add('P', [plain(where)], 11, { align: 'right' })
  const bottom = Math.max(bedColumn.y, who.y, what.y) + 6
  return { blocks: [...bedColumn.blocks, ...who.blocks, ...what.blocks], bottom }
}

const BOX_PADDING = 11

function leftOf(document: PDFKit.PDFDocument, { airway, plate, facts }: BedHeadSign, top: number, scale: number) {
  const inside = { x: margin + BOX_PADDING, width: LEFT_WIDTH - 2 * BOX_PADDING }
  const box = new Column(document, inside, top + BOX_PADDING - 3)
  box.add('P', [plain(airway.label)], 11 * scale)
  box.add('H2', [bold(airway.says)], 26 * scale)
  box.add('P', [plain(airway.oxygen)], 13 * scale)
  const boxBottom = box.y + BOX_PADDING - 3
  const drawn = 96 * scale
  const plateFrame = plate ? { x: margin, y: boxBottom + 8, width: (drawn * 340) / 150, height: drawn } : null
  const columns = factColumns(document, facts, boxBottom + (plateFrame ? drawn + 14 : 14), scale)
  return {
    blocks: [...box.blocks, ...columns.blocks],
    airwayBox: { x: margin, y: top, width: LEFT_WIDTH, height: boxBottom - top },
    plate: plateFrame,
    bottom: columns.bottom,
  }
}

/** Two facts beside each other; a long one has the line for itself. */
function factColumns(document: PDFKit.PDFDocument, facts: BedHeadSign['facts'], top: number, scale: number) {
  const half = (LEFT_WIDTH - 14) / 2
  const blocks: Block[] = []
  let y = top
  let beside = Number.NaN // where the line beside the last fact ends, while there is room beside it
  for (const { label, value } of facts) {
    const isLong = value.length > 44
    const isRight: boolean = !Number.isNaN(beside) && !isLong
    if (!Number.isNaN(beside) && !isRight) y = beside
    const place = { x: isRight ? margin + half + 14 : margin, width: isLong ? LEFT_WIDTH : half }
    const column = new Column(document, place, y)
    column.add('P', [plain(label)], 9.5 * scale).add('P', [bold(value)], 12.5 * scale)
    blocks.push(...column.blocks)
    const below = column.y + 5 * scale
    if (isRight) {
      y = Math.max(beside, below)
      beside = Number.NaN
    } else if (isLong) {
      y = below
      beside = Number.NaN
    } else beside = below
  }
  return { blocks, bottom: Number.isNaN(beside) ? y : beside }
}

function rightOf(
  document: PDFKit.PDFDocument,
  { stepsTitle, steps, cautions }: BedHeadSign,
  top: number,
  scale: number,
) {
  const title = new Column(document, { x: RIGHT_X, width: RIGHT_WIDTH }, top - 4)
  title.add('H2', [bold(stepsTitle)], 18 * scale)
  const rules: { x: number; y: number; width: number; weight: number }[] = []
  const blocks = [...title.blocks]
  let y = title.y + 3
  steps.forEach(({ act, next }, index) => {
    rules.push({ x: RIGHT_X, y, width: RIGHT_WIDTH, weight: 0.6 })
    const number = new Column(document, { x: RIGHT_X, width: 20 }, y + 3 * scale)
    number.add('P', [bold(String(index + 1))], 13 * scale)
    const words = new Column(document, { x: RIGHT_X + 24, width: RIGHT_WIDTH - 24 }, y + 3 * scale)
    words.add('P', [bold(act), plain(next)], 12.5 * scale)
    blocks.push(...number.blocks, ...words.blocks)
    y = words.y + 3 * scale
  })
  rules.push({ x: RIGHT_X, y, width: RIGHT_WIDTH, weight: 0.6 })
  const last = new Column(document, { x: RIGHT_X, width: RIGHT_WIDTH }, y + 4)
  for (const caution of cautions) last.add('P', [bold(caution)], 11 * scale)
  return { blocks: [...blocks, ...last.blocks], rules, bottom: last.y + 8 }
}

/** At the foot of the right column, from the bottom upwards: whom to call, when the sign ends, and the way to the chart. */
function footOf(document: PDFKit.PDFDocument, { numbersTitle, numbers, ends, aid }: BedHeadSign, scale: number) {
  const width = RIGHT_WIDTH - QR_SIDE - 14
  const lay = (top: number) => {
    const column = new Column(document, { x: RIGHT_X, width }, top)
    const calls = numbers.map(({ who, number }) => `${who} ${number}`).join(' · ')
    column.add('P', [bold(`${numbersTitle}:`), bold(calls)], 13 * scale)
    column.skip(3).add('P', [bold(ends)], 11 * scale)
    column.skip(3).add('P', [plain(aid)], 8.5 * scale)
    return column
  }
  const height = Math.max(lay(0).y, QR_SIDE)
  const top = FOOT - height
  const qr = { x: RIGHT_X + RIGHT_WIDTH - QR_SIDE, y: FOOT - QR_SIDE, width: QR_SIDE, height: QR_SIDE }
  return { blocks: lay(top).blocks, qr, top }
}

import { firstLineOf, PLATE, radiiOf, SLOTS, wingsOf } from '#app/components/flange-shape.ts'
import type { BedHeadSign } from '#app/rules/bed-head-sign.ts'
import { runsOf } from './fonts.server.ts'
import { finished, set, sheet } from './paper.server.ts'
import { type QrSymbol, qrSymbol } from './qr.server.ts'
import { type Frame, type SignLayout, signLayout } from './sign-layout.server.ts'

/** A bed-head sign as a PDF: one sheet of A4 on its long side, black on white. `address`: where its QR symbol leads. */
export async function signPdf(sign: BedHeadSign, address: string): Promise<Buffer> {
  // Not the name: a title stays in lists of files that were opened.
  const document = sheet(`Bed-head sign, bed ${sign.bed}`)
  const layout = signLayout(document, sign)
  const root = document.struct('Document')
  document.addStructure(root)
  for (const { tag, pieces, setting } of layout.blocks) {
    root.add(document.struct(tag, {}, () => void set(document, pieces, setting)))
  }
  const { plate } = sign
  if (plate && layout.plate) {
    const frame = layout.plate
    const alt = `Neck plate printed ${plate.label}`
    root.add(document.struct('Figure', { alt }, () => drawPlate(document, plate, frame)))
  }
  root.add(
    document.struct('Figure', { alt: `QR symbol: ${address}` }, () => drawQr(document, qrSymbol(address), layout.qr)),
  )
  root.end()
  drawLines(document, layout)
  return finished(document)
}

function drawLines(document: PDFKit.PDFDocument, { rules, airwayBox }: SignLayout): void {
  document.markContent('Artifact', { type: 'Layout' })
  for (const { x, y, width, weight } of rules) {
    document
      .moveTo(x, y)
      .lineTo(x + width, y)
      .lineWidth(weight)
      .stroke('black')
  }
  const { x, y, width, height } = airwayBox
  document.roundedRect(x, y, width, height, 8).lineWidth(2.5).stroke('black')
  document.endMarkedContent()
}

function drawPlate(document: PDFKit.PDFDocument, plate: NonNullable<BedHeadSign['plate']>, frame: Frame): void {
  const scale = frame.height / 150
  document.save().translate(frame.x, frame.y).scale(scale).lineWidth(2)
  document.path(PLATE).stroke('black')
  for (const x of SLOTS) document.roundedRect(x, 56, 10, 38, 5).stroke('black')
  const { ring, outer, inner } = radiiOf(plate)
  for (const radius of [ring, outer, inner]) document.circle(170, 75, radius).fillAndStroke('white', 'black')
  document.fillColor('black')
  const { left, right, bold } = wingsOf(plate)
  wing(document, left, 40, 'left', 2)
  wing(document, right, 300, 'right', bold)
  document.restore()
}

const WING_SIZE = 13

function wing(
  document: PDFKit.PDFDocument,
  lines: readonly string[],
  x: number,
  align: 'left' | 'right',
  bold: number,
) {
  lines.forEach((line, index) => {
    const runs = runsOf(line, index < bold ? 700 : 400)
    const widths = runs.map(({ font, text }) => document.font(font).fontSize(WING_SIZE).widthOfString(text))
    let at = align === 'left' ? x : x - widths.reduce((sum, width) => sum + width, 0)
    runs.forEach(({ font, text }, nth) => {
      const y = firstLineOf(lines) + index * 18 - WING_SIZE
      document.font(font).fontSize(WING_SIZE).text(text, at, y, { lineBreak: false })
      at += widths[nth] ?? 0
    })
  })
}

function drawQr(document: PDFKit.PDFDocument, { size, dark }: QrSymbol, { x, y, width }: Frame): void {
  const module = width / size
  for (const at of dark) document.rect(x + at.x * module, y + at.y * module, module, module)
  document.fill('black')
}

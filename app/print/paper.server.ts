import PDFDocument from 'pdfkit'
import { fontFiles, type Run, runsOf, type Weight } from './fonts.server.ts'

/** Words with one weight, as part of a paragraph. */
export interface Piece {
  readonly text: string
  readonly weight: Weight
}

interface Word {
  readonly runs: readonly Run[]
  readonly width: number
}

type Line = readonly Word[]

/** Where and how large a paragraph is set; `leading` is the height of a line in sizes. */
export interface Setting {
  readonly x: number
  readonly y: number
  readonly width: number
  readonly size: number
  readonly align?: 'left' | 'right'
}

const LEADING = 1.25

/** A4 on its long side, with its margins, in points. */
export const landscape = { width: 841.89, height: 595.28, margin: 34 } as const

/** An empty sheet of A4 on its long side with every part of the typeface, and tags for those who hear it read. */
export function sheet(title: string): PDFKit.PDFDocument {
  const document = new PDFDocument({
    size: 'A4',
    layout: 'landscape',
    margin: 0,
    tagged: true,
    displayTitle: true,
    lang: 'en-GB',
    pdfVersion: '1.7',
    info: { Title: title, Producer: 'Cannulary', Creator: 'Cannulary' },
  })
  for (const { name, file } of fontFiles) document.registerFont(name, file)
  return document
}

/** The whole file, once it has been drawn. */
export async function finished(document: PDFKit.PDFDocument): Promise<Buffer> {
  const chunks: Buffer[] = []
  document.on('data', (chunk: Buffer) => chunks.push(chunk))
  const ended = new Promise<void>((resolve, reject) => document.on('end', resolve).on('error', reject))
  document.end()
  await ended
  return Buffer.concat(chunks)
}

/** Height of a paragraph when it is set so wide. */
export function heightOf(document: PDFKit.PDFDocument, pieces: readonly Piece[], { width, size }: Setting): number {
  return linesOf(document, pieces, width, size).length * size * LEADING
}

/** Sets a paragraph and returns where the next one may begin. */
export function set(document: PDFKit.PDFDocument, pieces: readonly Piece[], setting: Setting): number {
  const { x, y, width, size, align = 'left' } = setting
  const space = spaceAt(document, size)
  const lines = linesOf(document, pieces, width, size)
  lines.forEach((line, index) => {
    const length = line.reduce((sum, word) => sum + word.width, 0) + space * (line.length - 1)
    let at = align === 'right' ? x + width - length : x
    for (const { runs } of line) {
      runs.forEach(({ font, text }, nth) => {
        // With its space, so that the words are still apart where they are read aloud or copied.
        const shown = nth === runs.length - 1 ? `${text} ` : text
        document
          .font(font)
          .fontSize(size)
          .text(shown, at, y + index * size * LEADING, { lineBreak: false })
        at += widthOf(document, { font, text }, size)
      })
      at += space
    }
  })
  return y + lines.length * size * LEADING
}

function spaceAt(document: PDFKit.PDFDocument, size: number): number {
  return document.font('latin-400').fontSize(size).widthOfString(' ')
}

/** Words into lines. A word that is longer than a line is broken where it has to be, so that nothing leaves the sheet. */
function linesOf(document: PDFKit.PDFDocument, pieces: readonly Piece[], width: number, size: number): readonly Line[] {
  const space = spaceAt(document, size)
  const lines: Word[][] = [[]]
  let used = 0
  for (const word of pieces.flatMap(piece => wordsOf(document, piece, width, size))) {
    const line = lines.at(-1)
    const after = used === 0 ? word.width : used + space + word.width
    if (line && (used === 0 || after <= width)) {
      line.push(word)
      used = after
    } else {
      lines.push([word])
      used = word.width
    }
  }
  return lines
}

function wordsOf(document: PDFKit.PDFDocument, { text, weight }: Piece, width: number, size: number): readonly Word[] {
  return text
    .split(/\s+/)
    .filter(word => word !== '')
    .flatMap(word => partsThatFit(document, runsOf(word, weight), width, size))
}

function partsThatFit(
  document: PDFKit.PDFDocument,
  runs: readonly Run[],
  width: number,
  size: number,
): readonly Word[] {
  const whole = runs.reduce((sum, run) => sum + widthOf(document, run, size), 0)
  if (whole <= width) return [{ runs, width: whole }]
  const characters = runs.flatMap(({ font, text }) => [...text].map(character => ({ font, text: character })))
  const parts: { runs: Run[]; width: number }[] = []
  for (const run of characters) {
    const own = widthOf(document, run, size)
    const last = parts.at(-1)
    if (last && last.width + own <= width) {
      last.runs.push(run)
      last.width += own
    } else parts.push({ runs: [run], width: own })
  }
  return parts
}

function widthOf(document: PDFKit.PDFDocument, { font, text }: Run, size: number): number {
  return document.font(font).fontSize(size).widthOfString(text)
}

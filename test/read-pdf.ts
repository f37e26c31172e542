import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs'

/** A PDF as an outside reader sees it: the size of each page in points, its words without spaces, and the title. */
export async function readPdf(bytes: Uint8Array) {
  const task = getDocument({ data: new Uint8Array(bytes), verbosity: 0, isEvalSupported: false, useSystemFonts: false })
  const document = await task.promise
  const pages: { readonly width: number; readonly height: number; readonly words: string }[] = []
  for (let number = 1; number <= document.numPages; number += 1) {
    const page = await document.getPage(number)
    const { width, height } = page.getViewport({ scale: 1 })
    const { items } = await page.getTextContent()
    const words = items.map(item => ('str' in item ? item.str : '')).join('')
    pages.push({ width, height, words: withoutSpaces(words) })
  }
  const { info } = await document.getMetadata()
  const title = 'Title' in info ? String(info.Title) : ''
  const marks = await document.getMarkInfo()
  await task.destroy()
  return { pages, title, isTagged: marks?.Marked === true }
}

/** A text as `readPdf` gives it. */
export function withoutSpaces(words: string): string {
  return words.normalize('NFC').replace(/\s+/g, '')
}

import type { Page } from 'playwright-core'
import { expect } from 'vitest'
import { readPdf, withoutSpaces } from '#test/read-pdf.ts'

/** What the sheet on the page of the bed-head sign says, but for the minute at which it was made. */
export async function sheetTexts(page: Page): Promise<readonly string[]> {
  const sheet = page.getByRole('article', { name: 'Bed-head sign' })
  const texts = await sheet.locator('dt, dd, h2, h3, ol p, ul li').allInnerTexts()
  expect(texts.length).toBeGreaterThan(20)
  return texts
}

/** Holds a PDF to be one sheet of A4 on its long side with all these texts, and gives its title. */
export async function expectSheet(pdf: Uint8Array, texts: readonly string[]): Promise<string> {
  const { pages, title } = await readPdf(pdf)
  expect(pages.map(({ width, height }) => [Math.round(width), Math.round(height)])).toEqual([[842, 595]])
  expect(texts.filter(text => !pages[0]?.words.includes(withoutSpaces(text)))).toEqual([])
  return title
}

import { readFile } from 'node:fs/promises'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { readPdf, withoutSpaces } from '#test/read-pdf.ts'
import { signedIn } from './bedside.ts'
import { launchedBrowser, rowsOf, type StartedApp, startedApp } from './browser.ts'
import { answered } from './filling.ts'

let app: StartedApp
let browser: Browser

beforeAll(async () => {
  browser = await launchedBrowser()
  app = await startedApp()
})

afterAll(async () => {
  await browser.close()
  await app.stop()
})

async function patientIn(bed: string): Promise<string> {
  const [row] = await rowsOf<{ id: string }>(
    app,
    `SELECT s.patient_id AS id FROM stays s JOIN beds b ON b.id = s.bed_id WHERE b.label = :bed AND s.discharged_at IS NULL`,
    { bed },
  )
  return `/patients/${row?.id}`
}

/** What the sheet says, but for the minute at which it was made. */
async function sheetTexts(page: Page): Promise<readonly string[]> {
  const sheet = page.getByRole('article', { name: 'Bed-head sign' })
  const texts = await sheet.locator('dt, dd, h2, h3, ol p, ul li').allInnerTexts()
  expect(texts.length).toBeGreaterThan(20)
  return texts
}

test.each(['A1', 'A7', 'A8', 'A10'])(
  'the page of the sign at %s prints as one sheet of A4 on its long side',
  async bed => {
    const { page, problems } = await signedIn(browser, app, 'nurse.alder')
    await page.goto(`${await patientIn(bed)}/sign`)
    const texts = await sheetTexts(page)
    const { pages } = await readPdf(await page.pdf({ preferCSSPageSize: true, printBackground: true }))
    expect(pages.map(({ width, height }) => [Math.round(width), Math.round(height)])).toEqual([[842, 595]])
    expect(texts.filter(text => !pages[0]?.words.includes(withoutSpaces(text)))).toEqual([])
    expect(problems).toEqual([])
  },
)

test('the sign that was downloaded says what the page says, and ends with the next tube', async () => {
  const { page, problems } = await signedIn(browser, app, 'specialist')
  const patient = await patientIn('A1')
  await page.goto(`${patient}/sign`)
  const texts = await sheetTexts(page)
  const downloading = page.waitForEvent('download')
  await page.getByRole('button', { name: 'Download as PDF' }).click()
  const file = await (await downloading).path()
  const { pages, title } = await readPdf(await readFile(file))
  expect(title).toBe('Bed-head sign, bed A1')
  expect(pages).toHaveLength(1)
  expect(texts.filter(text => !pages[0]?.words.includes(withoutSpaces(text)))).toEqual([])
  await page.goto(`${patient}/sign`)
  await page.getByText('It is current.').waitFor()

  await page.goto(`${patient}/chart/tube-change`)
  await answered(page, newTube)
  await page.getByRole('button', { name: 'Chart tube change' }).click()
  await page.waitForURL(/\?charted=|\/act-now\//)
  await page.goto(patient)
  await page.getByText('Destroy the printed bed-head sign and print a new one.').first().waitFor()
  await page.getByRole('link', { name: 'Bed-head sign', exact: true }).first().click()
  await page.getByText('Changed since: the tube or what is charted of it.').waitFor()
  const old = await page.request.get(`${patient}/sign.pdf`, { maxRedirects: 0 })
  expect([old.status(), old.headers().location]).toEqual([302, `${patient}/sign`])

  await page.getByRole('button', { name: 'Print the sign' }).click()
  await page.getByText('Noted as printed.').waitFor()
  await page.getByText('It is current.').waitFor()
  expect((await sheetTexts(page)).join()).toContain('Halden, 7')
  expect(problems).toEqual([])
})

const newTube = {
  reason: 'routine',
  line: 'Halden',
  sizeSystem: 'ISO 5366',
  size: '7',
  construction: 'dual',
  innerCannula: 'reusable',
  idWithInner: '5.5',
  idWithoutInner: '7',
  od: '9.7',
  lengthMm: '84',
  cuff: 'none',
  fenestrated: 'no',
  connector: 'outer',
  flange: 'fixed',
  sutures: 'none',
  operator: 'Thandiwe Marlowe',
  difficulty: 'easy',
  position: 'capnography',
}

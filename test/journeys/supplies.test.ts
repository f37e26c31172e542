import { readFile } from 'node:fs/promises'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { readCsvText } from '#app/catalogue/csv-text.ts'
import { patientIn, signedIn } from './bedside.ts'
import { launchedBrowser, type StartedApp, startedApp } from './browser.ts'
import { pageProblems } from './page-problems.ts'

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

const cannula = 'Inner cannula Corvane Dual 8.0, disposable, box of 10'

/** What lies at a bed, on the page of its patient. */
const cardOf = (page: Page, bed: string) =>
  page.locator('section').filter({ has: page.getByRole('heading', { name: `Supplies at bed ${bed}` }) })

/** How many of the cannula lie at the bed, as the patient's page says it. */
async function atBed(page: Page, patient: string): Promise<number> {
  await page.goto(patient)
  const item = cardOf(page, 'A1').getByRole('listitem').filter({ hasText: cannula })
  return Number(await item.locator('span').first().textContent())
}

/** Receives a box, by a link of the ward's supplies. */
async function receive(page: Page, patient: string, pieces: string) {
  await page.goto(patient)
  await page.getByRole('link', { name: 'Supplies of the ward' }).click()
  await page.getByRole('link', { name: 'Receive' }).click()
  await page.getByLabel('Item').selectOption({ label: cannula })
  await page.getByLabel('Put into').selectOption({ label: 'Bed A1' })
  await page.getByLabel('Pieces received').fill(pieces)
  await page.getByRole('button', { name: 'Receive' }).click()
}

test.each([true, false])(
  'a box comes to a bed, a change takes one, a retraction gives it back, scripts %s',
  async on => {
    const { page, problems } = await signedIn(browser, app, 'nurse.alder', { javaScriptEnabled: on })
    const patient = await patientIn(app, 'A1')
    const before = await atBed(page, patient)
    await receive(page, patient, 'ten')
    await page.getByText('Enter the pieces received as a whole number').first().waitFor()
    expect(await page.getByLabel('Pieces received').inputValue()).toBe('ten')
    await page.getByLabel('Pieces received').fill('10')
    await page.getByRole('button', { name: 'Receive' }).click()
    await page.waitForURL(/\/supplies$/)
    expect(await atBed(page, patient)).toBe(before + 10)

    await page.goto(`${patient}/chart/inner-cannula`)
    for (const [name, value] of Object.entries({ act: 'replaced', condition: 'light', locked: 'yes', spare: 'yes' })) {
      await page.locator(`[name="care.${name}"][value="${value}"]`).check()
    }
    await page.locator('[name="care.tolerance"][value="well"]').check()
    await page.getByRole('button', { name: 'Chart cannula' }).click()
    await page.waitForURL(/\?charted=/)
    const entry = new URL(page.url()).searchParams.get('charted')
    expect(await atBed(page, patient)).toBe(before + 9)

    await page.goto(`/entries/${entry}/retract`)
    await page.getByLabel('Why it is in error').fill('Charted on the wrong patient')
    await page.getByRole('button', { name: 'Retract entry' }).click()
    await page.waitForURL(url => !url.pathname.endsWith('/retract'))
    expect(await atBed(page, patient)).toBe(before + 10)
    expect(problems.filter(problem => !problem.includes('400'))).toEqual([])
  },
)

test('what is short is moved to the bed from the patient’s page, and the order list is a file', async () => {
  const { page, problems } = await signedIn(browser, app, 'nurse.alder')
  const patient = await patientIn(app, 'A2')
  await page.goto(patient)
  await page.getByRole('link', { name: 'Supplies of the ward' }).click()
  const short = page.getByRole('row').filter({ hasText: 'Below nothing' }).first()
  const name = await short.getByRole('link').textContent()
  expect(await short.getByRole('cell').nth(1).textContent()).toMatch(/^-\d+$/)
  const downloading = page.waitForEvent('download')
  await page.getByRole('link', { name: 'Order list as CSV' }).click()
  const read = readCsvText(await readFile(await (await downloading).path(), 'utf8'))
  const rows = 'rows' in read ? read.rows.map(({ cells }) => cells) : []
  expect(rows[0]?.slice(0, 2)).toEqual(['Item', 'Pieces to order'])
  const ordered = rows.find(([item]) => item === name)
  expect(Number(ordered?.[1])).toBeGreaterThan(0)
  expect(Number(ordered?.[4])).toBeLessThan(0)
  expect(await pageProblems(page)).toEqual([])

  await page.goto(await patientIn(app, 'A10'))
  await cardOf(page, 'A10')
    .getByRole('link', { name: /^Move some here/ })
    .click()
  await page.getByLabel('Pieces moved').fill('4')
  await page.getByRole('button', { name: 'Move' }).click()
  await page.waitForURL(/\/supplies$/)
  await page.goto(await patientIn(app, 'A10'))
  await cardOf(page, 'A10').getByText('4', { exact: true }).waitFor()
  expect(problems).toEqual([])
})

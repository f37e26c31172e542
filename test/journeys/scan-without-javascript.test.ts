import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { demoCatalogue } from '#database/seeders/catalogue.ts'
import { signedIn } from './bedside.ts'
import { launchedBrowser, rowsOf, type StartedApp, startedApp } from './browser.ts'

const [right, wrong] = ['Corvane Dual', 'Halden'].map(
  name => demoCatalogue.innerCannulas.find(({ line, size }) => line === name && parseFloat(size) === 8)?.gtin,
)

let app: StartedApp
let browser: Browser
let patient: string

beforeAll(async () => {
  browser = await launchedBrowser()
  app = await startedApp()
  const [found] = await rowsOf<{ id: string }>(
    app,
    `SELECT s.patient_id AS id FROM stays s JOIN beds b ON b.id = s.bed_id
     WHERE b.label = 'A1' AND s.discharged_at IS NULL`,
  )
  patient = found?.id ?? ''
})

afterAll(async () => {
  await browser.close()
  await app.stop()
})

const lot = (page: Page) => page.locator('[name="care.lot"]').inputValue()

/** From a form to the page for scanning, which is told the code. */
async function typed(page: Page, code: string) {
  await page.getByRole('link', { name: 'Scan the inner cannula' }).click()
  await page.getByLabel('Code').fill(code)
  await page.getByRole('button', { name: 'Look it up' }).click()
}

test('without scripts a wrong cannula is stopped, the right one comes back into the form and stays beside the usual answers', async () => {
  const { page, problems } = await signedIn(browser, app, 'nurse.alder', { javaScriptEnabled: false })
  await page.goto(`/patients/${patient}/chart/inner-cannula`)
  await typed(page, `(01)${wrong}(10)W-1(17)491231`)
  await page.getByText('This cannula is not made for this tube').first().waitFor()
  expect(await page.getByRole('link', { name: 'Fill it into the form' }).count()).toBe(0)
  await page.getByRole('link', { name: 'It is in place already: fill it in' }).waitFor()

  await page.getByLabel('Code').fill(`(01)${right}(10)R-1(17)491231`)
  await page.getByRole('button', { name: 'Look it up' }).click()
  await page.getByRole('link', { name: 'Fill it into the form' }).click()
  expect(await lot(page)).toBe('R-1')
  await page.getByRole('link', { name: /^As usual: / }).click()
  expect(await page.getByRole('radio', { name: 'Locked in place' }).isChecked()).toBe(true)
  expect(await lot(page)).toBe('R-1')
  expect(await page.locator('[name="care.expiresOn"]').inputValue()).toBe('2049-12-31')
  expect(await page.getByRole('checkbox', { name: /^Scanned inner cannula/ }).isChecked()).toBe(true)
  await page.getByRole('radio', { name: 'Light coating' }).check()
  await page.getByRole('button', { name: 'Chart cannula' }).click()
  await page.waitForURL(/\?charted=/)
  expect(problems).toEqual([])
})

test('without scripts a charted cannula is scanned anew to correct it', async () => {
  const { page, problems } = await signedIn(browser, app, 'nurse.alder', { javaScriptEnabled: false })
  await page.goto(`/patients/${patient}/chart/inner-cannula?usual=1`)
  await typed(page, `(01)${right}(10)OTHER(17)491231`)
  await page.getByRole('link', { name: 'Fill it into the form' }).click()
  // The usual answers were in the form before the scan, and are again.
  expect(await page.getByRole('radio', { name: 'Locked in place' }).isChecked()).toBe(true)
  await page.getByRole('radio', { name: 'Light coating' }).check()
  await page.getByRole('button', { name: 'Chart cannula' }).click()
  await page.waitForURL(/\?charted=/)
  await page.goto(`/entries/${new URL(page.url()).searchParams.get('charted')}/correct`)
  expect(await lot(page)).toBe('OTHER')

  await typed(page, `(01)${right}(10)R-2(17)491231`)
  await page.getByRole('link', { name: 'Fill it into the form' }).click()
  expect(await lot(page)).toBe('R-2')
  await page.getByLabel('Why it is corrected').fill('Scanned the wrong pack')
  await page.getByRole('button', { name: 'Chart correction' }).click()
  await page.waitForURL(/\?charted=/)
  const [counting] = await rowsOf<{ lots: string }>(
    app,
    `SELECT GROUP_CONCAT(e.lot) AS lots FROM entries e WHERE e.lot IN ('OTHER', 'R-2')
     AND NOT EXISTS (SELECT 1 FROM entries n WHERE n.supersedes_id = e.id)`,
  )
  expect(counting?.lots).toBe('R-2')
  expect(problems).toEqual([])
})

import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { signedIn } from './bedside.ts'
import { launchedBrowser, rowsOf, type StartedApp, startedApp } from './browser.ts'

let app: StartedApp
let browser: Browser
/** The patient of bed C5, who has borne and failed trials. */
let patient: string

beforeAll(async () => {
  browser = await launchedBrowser()
  app = await startedApp()
  const [row] = await rowsOf<{ id: string }>(
    app,
    `SELECT s.patient_id AS id FROM stays s JOIN beds b ON b.id = s.bed_id WHERE b.label = 'C5' AND s.discharged_at IS NULL`,
  )
  patient = `/patients/${row?.id}`
})

afterAll(async () => {
  await browser.close()
  await app.stop()
})

/** Presses Tab until a link with this name has the focus. */
async function tabTo(page: Page, name: string): Promise<void> {
  for (let stop = 1; stop <= 120; stop += 1) {
    await page.keyboard.press('Tab')
    const at = await page.evaluate(() => document.activeElement?.textContent?.trim())
    if (at === name) return
  }
  throw new Error(`Nothing that says ${name} takes the focus`)
}

test('without scripts a patient’s trends are read in their tables, over a span of one’s choice', async () => {
  const { page, problems } = await signedIn(browser, app, 'specialist', { javaScriptEnabled: false })
  await page.goto(patient)
  await page.getByRole('link', { name: 'Trends', exact: true }).click()
  await page.getByRole('heading', { level: 1, name: 'Trends' }).waitFor()
  const lengths = page.getByRole('table', { name: 'Lengths of Weaning trials' })
  expect(await lengths.getByRole('row').count()).toBe(6)
  await page.getByRole('img', { name: /^Weaning trials One-way valve: 1 passed, 1 stopped early, 1 failed/ }).waitFor()
  const sums = page.getByRole('table', { name: 'Values of Secretion sum' })
  const all = await sums.getByRole('row').count()
  await page.getByRole('navigation', { name: 'Span of the trends' }).getByRole('link', { name: '24 h' }).click()
  await page.locator('a[aria-current=true]', { hasText: '24 h' }).waitFor()
  expect(await sums.getByRole('row').count()).toBeLessThan(all)
  await sums.getByRole('link').first().click()
  await page
    .getByText(/Secretions graded 3 of 15/)
    .first()
    .waitFor()
  expect(problems).toEqual([])
})

test('without scripts the weaning page says what is missing, why, and where it is charted', async () => {
  const { page } = await signedIn(browser, app, 'specialist', { javaScriptEnabled: false })
  await page.goto(patient)
  await page.getByRole('link', { name: 'Weaning', exact: true }).click()
  await page.getByText('It informs and does not decide', { exact: false }).waitFor()
  expect(await page.locator('li[aria-current=step]').textContent()).toContain('Ready for removal')
  await page
    .getByText(
      'Missing for this step: Airway open above the stoma (not assessed); Effective swallow (not assessed); Team agrees (not met).',
    )
    .waitFor()
  const cap = page.getByRole('listitem').filter({ hasText: /^Cap trial passed/ })
  await cap.getByText('Why?').click()
  await cap.getByText('A cap trial is passed after: 24 h.').waitFor()
  await page.getByRole('link', { name: 'Chart readiness: Effective swallow' }).click()
  await page.getByRole('heading', { level: 1, name: 'Readiness for tube removal' }).waitFor()
})

test('both pages are reached and read with the keyboard alone', async () => {
  const { page, problems } = await signedIn(browser, app, 'specialist')
  await page.goto(patient)
  await tabTo(page, 'Trends')
  await page.keyboard.press('Enter')
  await page.getByRole('heading', { level: 1, name: 'Trends' }).waitFor()
  await tabTo(page, '3 days')
  await page.keyboard.press('Enter')
  await page.locator('a[aria-current=true]', { hasText: '3 days' }).waitFor()
  await page.goto(patient)
  await tabTo(page, 'Weaning')
  await page.keyboard.press('Enter')
  await page.getByRole('heading', { level: 1, name: 'Weaning' }).waitFor()
  const why = page.locator('summary').first()
  await why.focus()
  await page.keyboard.press('Enter')
  expect(await page.locator('details[open]').count()).toBe(1)
  expect(problems).toEqual([])
})

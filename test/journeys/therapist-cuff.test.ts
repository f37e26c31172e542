import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { chartedWords, openBoard, rowsWith, sentenceToBeCharted, signedIn } from './bedside.ts'
import { launchedBrowser, type StartedApp, startedApp } from './browser.ts'

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

test('34 cmH2O is warned of before it is charted, and left at 26 it stands in the record as lowered', async () => {
  const { page, problems } = await signedIn(browser, app, 'therapist.alder')
  await openBoard(page)
  const cuff = /^Cuff pressure check /
  await rowsWith(page, cuff).first().getByRole('link', { name: cuff }).click()

  const warnings = page.getByRole('region', { name: 'Warnings' })
  const found = page.getByRole('textbox', { name: 'Pressure found' })
  await page.getByRole('img', { name: 'Pressure found: band 20 to 30 cmH2O', exact: true }).waitFor()
  await found.fill('34')
  await page.getByText('above 30', { exact: true }).waitFor()
  await page.getByRole('img', { name: 'Pressure found: band 20 to 30 cmH2O, 34 cmH2O is above 30' }).waitFor()
  await page.getByRole('radio', { name: 'Manometer' }).check()
  await warnings.getByText('Let air out slowly to 20 to 30 cmH2O and check again in 30 minutes.').waitFor()

  const upper = /Cuff pressure, upper limit: 30 cmH2O\. .*BMJ 1984.*version \d/s
  for (const about of ['The band of: Pressure found', 'Cuff high']) {
    const why = page.locator('details', { has: page.locator('summary', { hasText: about }) })
    await why.locator('summary').click()
    expect(await why.textContent()).toMatch(upper)
  }

  await page.getByRole('textbox', { name: 'Left at, if adjusted' }).fill('26')
  await page.getByText('in range, 20 to 30', { exact: true }).waitFor()
  await warnings.getByText('Found high, left within 20 to 30 cmH2O.').waitFor()
  const sentence = await sentenceToBeCharted(page)
  expect(sentence).toBe('Cuff pressure 34, lowered to 26 cmH2O, by manometer.')

  await page.getByRole('button', { name: 'Chart pressure' }).click()
  expect(await chartedWords(page)).toContain(sentence)
  const latest = page.locator('#charted').getByRole('listitem').first()
  expect(await latest.textContent()).toContain('Kofi Lindstrand, respiratory therapist')
  expect(await latest.getByRole('img', { name: 'Out of range' }).count()).toBe(1)
  expect(problems).toEqual([])
})

test('digits in the wrong unit are said in the ward’s unit before they are charted', async () => {
  const { page } = await signedIn(browser, app, 'therapist.alder')
  await openBoard(page)
  const cuff = /^Cuff pressure check /
  await rowsWith(page, cuff).last().getByRole('link', { name: cuff }).click()
  await page.getByRole('textbox', { name: 'Pressure found' }).fill('25')
  await page.getByText('in range, 20 to 30', { exact: true }).waitFor()
  await page.getByRole('radio', { name: 'mmHg' }).check()
  await page.getByText('34 cmH2O, above 30', { exact: true }).waitFor()
  await page.getByRole('radio', { name: 'Manometer' }).check()
  const warnings = page.getByRole('region', { name: 'Warnings' })
  await warnings.getByText('25 mmHg is 34 cmH2O; gauges of this ward read in cmH2O.').waitFor()
  expect(await sentenceToBeCharted(page)).toBe('Cuff pressure 25 mmHg by manometer, not adjusted.')
})

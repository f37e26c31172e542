import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import {
  barsOf,
  chartedWords,
  openBoard,
  patientOf,
  rowOf,
  rowsWith,
  sentenceToBeCharted,
  signedIn,
  tablet,
} from './bedside.ts'
import { launchedBrowser, type StartedApp, startedApp } from './browser.ts'
import { countedTaps } from './taps.ts'

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

test('a late inner cannula is charted as usual with four taps from the board, and its bar goes', async () => {
  const { page, problems } = await signedIn(browser, app, 'nurse.alder', tablet)
  await openBoard(page)
  const late = /^Inner cannula inspection .+ late$/
  const row = rowsWith(page, late).first()
  const patient = await patientOf(row)
  const bars = await barsOf(row)
  expect(bars).toBeGreaterThan(0)
  expect(await row.getByRole('img').first().getAttribute('aria-label')).toMatch(/Inner cannula inspection [^;.]* late/)

  const taps = await countedTaps(page)
  await row.getByRole('link', { name: late }).tap()
  await page.getByRole('button', { name: /^As usual: / }).tap()
  await page.getByRole('radio', { name: 'Light coating' }).tap()
  const sentence = await sentenceToBeCharted(page)
  await page.getByRole('button', { name: 'Chart cannula' }).tap()
  expect(await chartedWords(page)).toContain(sentence)
  expect(taps).toEqual({ all: 4, digits: 0 })

  await openBoard(page)
  const after = rowOf(page, patient)
  expect(await barsOf(after)).toBeLessThan(bars)
  expect(await after.getByRole('img').first().getAttribute('aria-label')).not.toMatch(
    /Inner cannula inspection [^;.]* late/,
  )
  expect(problems).toEqual([])
})

test('a normal cuff pressure is charted from the board with three taps and its digits', async () => {
  const { page } = await signedIn(browser, app, 'nurse.alder', tablet)
  await openBoard(page)
  const taps = await countedTaps(page)
  await page
    .getByRole('link', { name: /^Cuff pressure check / })
    .first()
    .tap()
  const keys = page.getByRole('group', { name: 'Keys for Pressure found' })
  await keys.getByRole('button', { name: '2' }).tap()
  await keys.getByRole('button', { name: '6' }).tap()
  await page.getByRole('radio', { name: 'Manometer' }).tap()
  const sentence = await sentenceToBeCharted(page)
  expect(sentence).toBe('Cuff pressure 26 cmH2O by manometer, not adjusted.')
  await page.getByRole('button', { name: 'Chart pressure' }).tap()
  expect(await chartedWords(page)).toContain(sentence)
  expect(taps).toEqual({ all: 3, digits: 2 })
  const latest = page.locator('#charted').getByRole('listitem').first()
  expect(await latest.textContent()).toMatch(/26 cmH2O by manometer, not adjusted\..*Imani Brathwaite, nurse/s)
})

test('the charge nurse starts on the board: warnings that wait for an answer, then the patient with the latest care', async () => {
  const { page, problems } = await signedIn(browser, app, 'charge.alder')
  await page.getByRole('list', { name: 'Patients' }).waitFor()
  expect(new URL(page.url()).pathname).toMatch(/^\/wards\/[^/]+\/board$/)
  const late = await page.locator('ul[aria-label=Patients] > li').evaluateAll(rows =>
    rows.map(row => ({
      warned: /\d warnings?/.test(row.textContent ?? ''),
      isUnseen: /not seen yet/.test(row.textContent ?? ''),
      isLate: row.querySelectorAll('[fill="url(#strip-late)"]').length > 0,
    })),
  )
  const lastUnseen = late.findLastIndex(({ isUnseen }) => isUnseen)
  expect(late.slice(0, lastUnseen + 1).every(({ warned }) => warned)).toBe(true)
  expect(late.slice(lastUnseen + 1).find(({ warned }) => !warned)?.isLate).toBe(true)
  expect(late.at(-1)?.isLate).toBe(false)
  const counts = await page.getByRole('list', { name: 'Summary' }).getByRole('listitem').allInnerTexts()
  expect(counts[0]).toMatch(/^[1-9]\d*\s*overdue$/)
  await page.getByRole('link', { name: 'Sort by bed' }).click()
  await page.waitForURL(/sort=bed/)
  await page.getByRole('link', { name: 'Sort by lateness' }).waitFor()
  const beds = await page.locator('ul[aria-label=Patients] > li > span').allInnerTexts()
  const numbers = beds.map(bed => Number(bed.replace(/\D/g, '')))
  expect(numbers).toEqual(numbers.toSorted((a, b) => a - b))
  expect(problems).toEqual([])
})

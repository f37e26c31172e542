import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { chartedWords, chartPressure, formReady, openBoard, patientOf, rowsWith, signedIn } from './bedside.ts'
import { launchedBrowser, type StartedApp, startedApp } from './browser.ts'

let app: StartedApp
let browser: Browser
let nurse: Page
let patient: string

beforeAll(async () => {
  browser = await launchedBrowser()
  app = await startedApp()
  nurse = (await signedIn(browser, app, 'nurse.alder')).page
  await openBoard(nurse)
  patient = await patientOf(rowsWith(nurse, /^Cuff pressure check /).first())
})

afterAll(async () => {
  await browser.close()
  await app.stop()
})

const inTimeline = (page: Page, words: string) =>
  page.locator('#charted').getByRole('listitem').filter({ hasText: words })

/** Opens the correction of an entry, and says why and what it should have been. */
async function correction(page: Page, entry: string, found: string, reason: string) {
  await page.goto(`${entry}/correct`)
  await formReady(page)
  await page.getByLabel('Why it is corrected').fill(reason)
  await page.getByRole('textbox', { name: 'Pressure found' }).fill(found)
}

test('a correction stands in the place of an entry, which stays readable with who, when and why', async () => {
  const entry = await chartPressure(nurse, patient, '21.3')
  await correction(nurse, entry, '23.4', 'Read the mark below')
  await nurse.getByRole('button', { name: 'Chart correction' }).click()
  expect(await chartedWords(nurse)).toContain('Cuff pressure 23.4 cmH2O by manometer')
  const before = inTimeline(nurse, 'Cuff pressure 21.3 cmH2O')
  expect(await before.textContent()).toMatch(/corrected.*Corrected on .* by Imani Brathwaite: Read the mark below/s)
  await before.getByRole('link', { name: /^Open / }).click()
  await nurse.getByText('Every version, oldest first').waitFor()
  const main = await nurse.getByRole('main').textContent()
  expect(main).toContain('Cuff pressure 21.3 cmH2O by manometer, not adjusted.')
  expect(main).toContain('Cuff pressure 23.4 cmH2O by manometer, not adjusted.')
  expect(await nurse.getByRole('link', { name: 'Correct', exact: true }).count()).toBe(0)
})

test('of two people who correct one entry the second is told by whom, and keeps what was typed', async () => {
  const entry = await chartPressure(nurse, patient, '24.6')
  const { page: charge } = await signedIn(browser, app, 'charge.alder')
  await correction(nurse, entry, '25.7', 'Read again')
  await correction(charge, entry, '22.8', 'Seen on the gauge')
  await charge.getByRole('button', { name: 'Chart correction' }).click()
  await chartedWords(charge)

  await nurse.getByRole('button', { name: 'Chart correction' }).click()
  const told = nurse.getByRole('alert').filter({ hasText: 'Not charted.' })
  expect(await told.textContent()).toMatch(/Odalys Verstraeten corrected or retracted this entry on \d\d-\w{3}-\d{4}/)
  expect(await nurse.getByRole('textbox', { name: 'Pressure found' }).inputValue()).toBe('25.7')
  expect(await nurse.getByLabel('Why it is corrected').inputValue()).toBe('Read again')
  await nurse.getByRole('link', { name: 'See the latest' }).click()
  await nurse.getByText('Cuff pressure 22.8 cmH2O by manometer, not adjusted.').first().waitFor()
  await nurse.goto(patient)
  expect(await inTimeline(nurse, 'Cuff pressure 25.7 cmH2O').count()).toBe(0)
})

test('an entry charted in error is struck through, keeps its words, and counts no more', async () => {
  const tag = rowOfPatient()
  const before = await tag
  const entry = await chartPressure(nurse, patient, '28.9')
  expect(await rowOfPatient()).not.toBe(before)
  await nurse.goto(entry)
  await nurse.getByRole('link', { name: 'Entered in error' }).click()
  await nurse.getByRole('button', { name: 'Retract entry' }).click()
  await nurse.getByRole('alert').waitFor()
  await nurse.getByLabel('Why it is in error').fill('Charted on the wrong patient')
  await nurse.getByRole('button', { name: 'Retract entry' }).click()
  await nurse.getByText('entered in error', { exact: true }).waitFor()
  expect(await nurse.getByRole('main').textContent()).toContain('Cuff pressure 28.9 cmH2O by manometer, not adjusted.')
  await nurse.goto(patient)
  const struck = inTimeline(nurse, 'Cuff pressure 28.9 cmH2O').first()
  expect(await struck.textContent()).toContain('Charted on the wrong patient')
  expect(await rowOfPatient()).toBe(before)
})

/** From when the patient's cuff pressure is counted, as the page of the patient says it. */
async function rowOfPatient() {
  await nurse.goto(patient)
  const task = nurse.getByRole('listitem').filter({ has: nurse.getByRole('heading', { name: 'Cuff pressure check' }) })
  return task.getByRole('paragraph').first().textContent()
}

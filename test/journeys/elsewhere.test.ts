import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { openBoard, patientOf, rowsWith, signedIn } from './bedside.ts'
import { launchedBrowser, rowsOf, type StartedApp, startedApp } from './browser.ts'

let app: StartedApp
let browser: Browser
let patient: string
let chart: string

beforeAll(async () => {
  browser = await launchedBrowser()
  app = await startedApp()
  const { page } = await signedIn(browser, app, 'nurse.alder')
  await openBoard(page)
  const cuff = /^Cuff pressure check /
  patient = await patientOf(rowsWith(page, cuff).first())
  chart = (await page.getByRole('link', { name: cuff }).first().getAttribute('href')) ?? ''
})

afterAll(async () => {
  await browser.close()
  await app.stop()
})

type Logged = { action: string; outcome: string; purpose: string; path: string }

const loggedOf = (who: string) =>
  rowsOf<Logged>(
    app,
    `SELECT l.action, l.outcome, l.purpose, l.path FROM access_log l JOIN users u ON u.id = l.actor_id
     WHERE u.email = :email AND l.patient_id IS NOT NULL ORDER BY l.at, l.seq`,
    { email: `${who}@example.org` },
  )

test('a nurse of another ward gives a reason first, charts, and their charge nurse reads who and why', async () => {
  const { page, problems } = await signedIn(browser, app, 'nurse.birch')
  await page.goto(patient)
  await page.getByRole('heading', { name: 'This patient is on Alder ward' }).waitFor()
  expect(await loggedOf('nurse.birch')).toEqual([])
  await page.getByLabel('Reason').fill('short')
  await page.getByRole('button', { name: 'Open the patient' }).click()
  await page.getByRole('alert').getByText('Say why in at least 10 characters').waitFor()

  await page.getByLabel('Reason').fill('Covering the ward tonight')
  await page.getByRole('button', { name: 'Open the patient' }).click()
  await page.getByText('Another ward’s patient, open to you for the reason you gave.').waitFor()
  expect(new URL(page.url()).pathname).toBe(patient)
  await page.goto(chart)
  await page.getByRole('button', { name: 'Chart pressure' }).waitFor()
  expect(await loggedOf('nurse.birch')).toContainEqual({
    action: 'opened patient',
    outcome: 'done',
    purpose: 'BTG',
    path: patient,
  })
  expect(problems.filter(problem => !problem.includes('400'))).toEqual([])

  const charge = await signedIn(browser, app, 'charge.alder')
  await charge.page.getByRole('link', { name: 'Who looked' }).click()
  const row = charge.page.getByRole('row', { name: /Lucien Abadier/ })
  await row.waitFor()
  expect(await row.textContent()).toContain('Covering the ward tonight')
})

test.each(['administrator', 'educator'])('for the %s there is no patient, and the try is logged', async who => {
  const { page } = await signedIn(browser, app, who)
  for (const path of [patient, chart]) {
    const answer = await page.goto(path)
    expect(answer?.status()).toBe(404)
    expect(await page.locator('main').textContent()).not.toContain('Bed')
  }
  const logged = await loggedOf(who)
  expect(logged.map(({ outcome }) => outcome)).toEqual(['refused', 'refused'])
})

test('an observer reads the ward, is offered no charting, and is refused it', async () => {
  const { page } = await signedIn(browser, app, 'observer.alder')
  await openBoard(page)
  expect(await page.getByRole('link', { name: /^Cuff pressure check/ }).count()).toBe(0)
  expect((await page.goto(patient))?.status()).toBe(200)
  expect(await page.locator('a[href*="/chart/"]').count()).toBe(0)
  expect((await page.goto(chart))?.status()).toBe(403)
  expect(await loggedOf('observer.alder')).toContainEqual(expect.objectContaining({ outcome: 'refused' }))
})

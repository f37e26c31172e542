import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest'
import { until } from '../../database/run/processes.mjs'
import { chartPressure, openBoard, patientOf, rowOf, rowsWith, signedIn } from './bedside.ts'
import { launchedBrowser, type StartedApp, startedApp } from './browser.ts'

const late = /^Cuff pressure check .+ late$/

let app: StartedApp
let browser: Browser
let watcher: Page
let other: Page
let board: string

beforeAll(async () => {
  browser = await launchedBrowser()
  app = await startedApp()
  other = (await signedIn(browser, app, 'therapist.alder')).page
  watcher = (await signedIn(browser, app, 'charge.alder')).page
  board = await openBoard(watcher)
})

beforeEach(async () => {
  await watcher.goto(board, { waitUntil: 'networkidle' })
})

afterAll(async () => {
  await browser.close()
  await app.stop()
})

/** Somebody comes back to the screen. */
const lookAgain = (page: Page) => page.evaluate(() => void window.dispatchEvent(new Event('focus')))

/** Does something every other second until the page has changed: before scripts run, it does not notice. */
async function changes(page: Page, hasChanged: () => Promise<boolean>, act: (page: Page) => Promise<void> = lookAgain) {
  const changed = await until(async () => {
    await act(page)
    return until(hasChanged, 2000)
  }, 60_000)
  expect(changed).toBe(true)
}

async function lateCuff(page: Page) {
  const patient = await patientOf(rowsWith(page, late).first())
  return { patient, care: rowOf(page, patient).getByRole('link', { name: late }) }
}

test('what another person charts is on the board when it is looked at again, without a reload', async () => {
  const { patient, care } = await lateCuff(watcher)
  await watcher.evaluate(() => document.body.setAttribute('data-not-reloaded', ''))
  await chartPressure(other, patient, '25')
  expect(await care.count()).toBe(1)
  await changes(watcher, async () => (await care.count()) === 0)
  expect(await watcher.locator('body[data-not-reloaded]').count()).toBe(1)
})

test('a board that nobody touches asks by itself within the minute', async () => {
  const { page } = await signedIn(browser, app, 'specialist')
  await page.clock.install()
  await page.goto(board)
  const { patient, care } = await lateCuff(page)
  await chartPressure(other, patient, '26')
  await changes(
    page,
    async () => (await care.count()) === 0,
    () => page.clock.fastForward('01:01'),
  )
})

test('a board whose server is gone says since when, and is right again when it comes back', async () => {
  const stale = watcher.getByText(/^Not up to date since \d\d:\d\d\. Trying again\.$/)
  await app.kill()
  await changes(watcher, () => stale.isVisible())
  expect(await watcher.getByRole('list', { name: 'Patients' }).isVisible()).toBe(true)
  await app.restart()
  await changes(watcher, async () => !(await stale.isVisible()))
})

test('a link that is followed while the server is gone says so instead of failing', async () => {
  await watcher.getByRole('link', { name: 'My round' }).click()
  await watcher.getByRole('heading', { name: 'My round' }).waitFor()
  await openBoard(watcher)
  await app.kill()
  await watcher.getByRole('link', { name: 'My round' }).click()
  await watcher.getByRole('heading', { name: 'The server cannot be reached. Nothing was charted.' }).waitFor()
  await app.restart()
  await watcher.getByRole('link', { name: 'Go to the start' }).click()
  await watcher.getByRole('list', { name: 'Patients' }).waitFor()
})

test('a patient’s page shows what another person charted when it is looked at again', async () => {
  const patient = await patientOf(rowsWith(watcher, /^Cuff pressure check /).last())
  await watcher.goto(patient, { waitUntil: 'networkidle' })
  await chartPressure(other, patient, '29.2')
  const entry = watcher.locator('#charted').getByText('Cuff pressure 29.2 cmH2O by manometer, not adjusted.')
  await changes(watcher, () => entry.isVisible())
})

test('a session that ends while a board is open leads to the sign-in page, and back to the board', async () => {
  const { page } = await signedIn(browser, app, 'nurse2.alder')
  await openBoard(page)
  const { page: elsewhere } = await signedIn(browser, app, 'nurse2.alder')
  await elsewhere.goto('/account')
  await elsewhere.getByRole('button', { name: /everywhere/i }).click()
  await elsewhere.waitForURL(/sign-in/)
  await changes(page, async () => page.url().includes('/sign-in'))
  expect(new URL(page.url()).searchParams.get('returnTo')).toBe(board)
})

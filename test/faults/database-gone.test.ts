import type { Browser } from 'playwright-core'
import { afterAll, afterEach, beforeAll, expect, test } from 'vitest'
import { type StartedApp, startedApp } from '#test/journeys/app.ts'
import { chartedWords, formReady, openBoard, rowsWith, signedIn } from '#test/journeys/bedside.ts'
import { launchedBrowser } from '#test/journeys/browser.ts'
import { until } from '../../database/run/processes.mjs'
import { bedsideClient, entryCount, patientIdsOn, timesCharted } from './bedside-client.ts'
import { type OwnMariadb, ownMariadb } from './own-mariadb.ts'

const cuff = /^Cuff pressure check /

let server: OwnMariadb
let app: StartedApp
let browser: Browser

beforeAll(async () => {
  browser = await launchedBrowser()
  server = await ownMariadb()
  app = await startedApp({ server })
})

afterEach(() => server.restart())

afterAll(async () => {
  await browser.close()
  await app.stop()
  await server.remove()
})

const isReady = async () => (await fetch(`${app.url}/health/ready`)).status === 200

test('without a database a page says so, and is there again when the database is, without a restart', async () => {
  const nurse = await bedsideClient(app, 'nurse.alder')
  expect((await nurse.read('/round')).status).toBe(200)
  await server.kill()
  const page = await nurse.read('/round')
  expect(page.status).toBe(503)
  expect(await page.text()).toContain('The database cannot be reached. Nothing was charted.')
  expect((await fetch(`${app.url}/health/ready`)).status).toBe(503)
  expect((await fetch(`${app.url}/health`)).status).toBe(200)
  await server.restart()
  expect(await until(isReady, 30_000)).toBe(true)
  expect((await nurse.read('/round')).status).toBe(200)
})

test('without a database no form is acknowledged, and sent again later it is charted once', async () => {
  const nurse = await bedsideClient(app, 'nurse.alder')
  const [patientId = ''] = await patientIdsOn(app, 'Alder ward')
  const before = await entryCount(app)
  await server.kill()
  const form = nurse.pressureForm(patientId, 25)
  for (const answer of await Promise.all([nurse.send(form), nurse.send(form), nurse.send(form)])) {
    expect(answer.status).toBe(503)
    expect(await answer.text()).toContain('Nothing was charted.')
  }
  await server.restart()
  expect(await until(isReady, 30_000)).toBe(true)
  expect(await entryCount(app)).toBe(before)
  expect((await nurse.send(form)).status).toBe(302)
  expect((await nurse.send(form)).status).toBe(302)
  expect(await timesCharted(app, [form.id])).toEqual(new Map([[form.id, 1]]))
})

test('a form that meets a lost database stays on the screen as typed, and goes through when it is back', async () => {
  const { page } = await signedIn(browser, app, 'nurse.alder')
  await openBoard(page)
  await rowsWith(page, cuff).first().getByRole('link', { name: cuff }).click()
  await formReady(page)
  await page.getByRole('textbox', { name: 'Pressure found' }).fill('27')
  await page.getByRole('radio', { name: 'Manometer' }).check()
  await page.getByRole('radio', { name: 'Lying flat' }).check()
  const before = await entryCount(app)
  await server.kill()
  await page.getByRole('button', { name: 'Chart pressure' }).click()
  const told = page.getByRole('alert').filter({ hasText: 'Not charted.' })
  expect(await told.textContent()).toContain('What you typed is still here. Send it again in a minute')
  expect(await page.getByRole('textbox', { name: 'Pressure found' }).inputValue()).toBe('27')
  expect(await page.getByRole('radio', { name: 'Lying flat' }).isChecked()).toBe(true)
  await server.restart()
  expect(await until(isReady, 30_000)).toBe(true)
  expect(await entryCount(app)).toBe(before)
  await page.getByRole('button', { name: 'Chart pressure' }).click()
  expect(await chartedWords(page)).toContain('Cuff pressure 27 cmH2O by manometer, not adjusted, lying flat.')
  expect(await entryCount(app)).toBe(before + 1)
})

test('a database that hangs makes the application not ready, not dead, and is waited for no longer than a moment', async () => {
  const nurse = await bedsideClient(app, 'nurse.alder')
  server.freeze()
  expect((await fetch(`${app.url}/health/ready`)).status).toBe(503)
  expect((await fetch(`${app.url}/health`)).status).toBe(200)
  const page = await nurse.read('/round')
  server.thaw()
  expect(page.status).toBe(503)
  expect(await until(isReady, 30_000)).toBe(true)
  expect((await nurse.read('/round')).status).toBe(200)
})

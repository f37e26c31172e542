import type { Browser, Page } from 'playwright-core'
import { v7 as uuidv7 } from 'uuid'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { formReady, openBoard, patientOf, rowsWith, signedIn } from './bedside.ts'
import { changeRows, launchedBrowser, type OpenedPage, rowsOf, type StartedApp, startedApp } from './browser.ts'
import { pageProblems } from './page-problems.ts'

let app: StartedApp
let browser: Browser
let charge: OpenedPage
let board: string
let patient: string

beforeAll(async () => {
  browser = await launchedBrowser()
  app = await startedApp()
  charge = await signedIn(browser, app, 'charge.alder')
  board = await openBoard(charge.page)
  patient = await patientOf(rowsWith(charge.page, /^Inner cannula inspection /).first())
})

afterAll(async () => {
  await browser.close()
  await app.stop()
})

const go = (page: Page, path: string) => page.goto(path, { waitUntil: 'networkidle' })

test.each([
  ['cuff-pressure', 'Chart pressure'],
  ['inner-cannula', 'Chart cannula'],
  ['tube-change', 'Chart tube change'],
])('a form of %s that was sent empty is whole', async (slug, words) => {
  const { page } = charge
  await go(page, `${patient}/chart/${slug}`)
  await formReady(page)
  await page.getByRole('button', { name: words }).click()
  await page.getByRole('alert').waitFor()
  expect(await pageProblems(page)).toEqual([])
})

test('a form with everything folded out is whole, and so is a menu that is open', async () => {
  const { page } = charge
  await go(page, `${patient}/chart/inner-cannula`)
  await formReady(page)
  await page.getByText('More details').click()
  await page.getByText('Second person', { exact: true }).click()
  await page.getByRole('radio', { name: 'Other time' }).check()
  await page.getByRole('radio', { name: 'Could not be done' }).check()
  expect(await pageProblems(page)).toEqual([])
  await page.getByText('Menu', { exact: true }).click()
  expect(await pageProblems(page)).toEqual([])
})

test('an admission and a retraction that lack something are whole', async () => {
  const { page } = charge
  await go(page, board.replace('/board', '/admit'))
  await page.getByRole('button', { name: 'Admit', exact: true }).click()
  await page.getByRole('alert').waitFor()
  expect(await pageProblems(page)).toEqual([])
  await go(page, patient)
  await page
    .locator('#charted')
    .getByRole('link', { name: /^Open / })
    .first()
    .click()
  await page.getByRole('link', { name: 'Entered in error' }).click()
  await page.getByRole('button', { name: 'Retract entry' }).click()
  await page.getByRole('alert').waitFor()
  expect(await pageProblems(page)).toEqual([])
})

test('every reason why care is due can be unfolded', async () => {
  const { page } = charge
  await go(page, patient)
  for (const why of await page.locator('summary', { hasText: 'Why?' }).all()) await why.click()
  expect(await pageProblems(page)).toEqual([])
})

test('a ward without patients says so', async () => {
  const id = uuidv7()
  await changeRows(
    app,
    `INSERT INTO wards (id, name, shift_times, pressure_unit) VALUES (:id, 'A new ward', '["07:00","19:00"]', 'kPa')`,
    { id },
  )
  await changeRows(app, 'INSERT INTO ward_revs (ward_id) VALUES (:id)', { id })
  await changeRows(
    app,
    `INSERT INTO ward_members (user_id, ward_id, added_at)
     SELECT id, :id, UTC_TIMESTAMP(3) FROM users WHERE email = 'charge.birch@example.org'`,
    { id },
  )
  const { page } = await signedIn(browser, app, 'charge.birch')
  for (const path of [`/wards/${id}/board`, `/round?ward=${id}`]) {
    expect((await go(page, path))?.status()).toBe(200)
    await page.getByText('No patients on this ward').waitFor()
    expect(await pageProblems(page)).toEqual([])
  }
})

test('the chart of somebody who has left can still be read', async () => {
  const [left] = await rowsOf<{ id: string }>(
    app,
    `SELECT s.patient_id AS id FROM stays s JOIN wards w ON w.id = s.ward_id
     WHERE w.name = 'Cedar ward' AND s.discharged_at IS NOT NULL LIMIT 1`,
  )
  const { page } = await signedIn(browser, app, 'charge.cedar')
  expect((await go(page, `/patients/${left?.id}`))?.status()).toBe(200)
  await page.getByText('Earlier care stays readable.').waitFor()
  expect(await pageProblems(page)).toEqual([])
})

test.each([
  ['an address that nothing answers', () => '/nowhere', 404],
  ['a patient who does not exist', () => `/patients/${uuidv7()}`, 404],
  ['an entry that does not exist', () => `/entries/${uuidv7()}/correct`, 404],
  ['a page for other people', () => '/admin/people', 403],
])('%s has a page that says so', async (_what, path, status) => {
  const { page } = charge
  expect((await go(page, path()))?.status()).toBe(status)
  expect(await pageProblems(page)).toEqual([])
})

test('the page that asks for a reason is whole, with and without a mistake', async () => {
  const { page } = await signedIn(browser, app, 'nurse.cedar')
  expect((await go(page, patient))?.status()).toBe(200)
  await page.getByRole('button', { name: 'Open the patient' }).click()
  await page.getByRole('alert').waitFor()
  expect(await pageProblems(page)).toEqual([])
})

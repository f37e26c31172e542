import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { openBoard, patientOf, rowOf, signedIn } from './bedside.ts'
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

/** Charts, as the form stands, a suction whose catheter would not pass. */
async function chartStuckCatheter(page: Page, patient: string) {
  await page.goto(`${patient}/chart/suction`)
  const given = { act: 'episode', indication: 'distress', route: 'tube open', catheter: '12 Fr', vacuumUnit: 'mmHg' }
  const found = { passed: 'no', amount: 'none', blood: 'none', tolerance: 'distress' }
  for (const [name, value] of Object.entries({ ...given, ...found })) {
    await page.locator(`[name="care.${name}"][value="${value}"]`).check()
  }
  await page.locator('[name="care.vacuum"]').fill('120')
  await page.locator('[name="care.passes"]').fill('1')
  await page.getByRole('button', { name: 'Chart suction' }).click()
}

test('a red finding takes over, is answered, and shows on the board until then', async () => {
  const { page, problems } = await signedIn(browser, app, 'nurse.alder')
  const board = await openBoard(page)
  const patient = await patientOf(page.locator('ul[aria-label=Patients] > li').last())
  await chartStuckCatheter(page, patient)
  await page.waitForURL(/\/act-now\//)
  await page.getByRole('heading', { name: 'Act now', exact: true }).waitFor()
  // The catheter and the distress ask for the same: it is said once, and each finding says why it is there.
  await page.getByText(/Call for help now\..*Follow your local emergency plan\.$/).waitFor()
  const whys = page.locator('#main details')
  expect(await whys.count()).toBeGreaterThan(1)
  await whys.first().locator('summary').click()
  await page
    .getByText(/^Source of this rule: .*RCEM/)
    .first()
    .waitFor()
  expect(await pageProblems(page)).toEqual([])

  const urgent = page.url()
  await page.goto(board)
  await rowOf(page, patient)
    .getByText(/warnings?/)
    .waitFor()
  await page.goto(urgent)
  await page
    .getByRole('button', { name: /^Seen: / })
    .first()
    .click()
  await page.waitForURL(/\?charted=/)
  const warnings = page.getByRole('region', { name: 'Warnings' })
  await warnings
    .getByText(/^Raised .* Seen by /)
    .first()
    .waitFor()

  await page
    .getByRole('link', { name: /^Chart what was done: / })
    .first()
    .click()
  await page.getByRole('radio', { name: 'Acted on' }).check()
  await page.getByRole('textbox', { name: 'What was done' }).fill('Inner cannula out, catheter passes')
  await page.getByRole('button', { name: 'Chart answer' }).click()
  await page.waitForURL(/\?charted=/)
  await warnings
    .getByText(/Acted on by .*: Inner cannula out, catheter passes/)
    .first()
    .waitFor()
  expect(problems).toEqual([])
})

import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { chartPressure, openBoard, passphrase, patientOf, rowsWith, signedIn } from './bedside.ts'
import { launchedBrowser, rowsOf, type StartedApp, startedApp } from './browser.ts'
import { pageProblems } from './page-problems.ts'

const student = 'student.alder'
const waits = 'To be countersigned'

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

/** The first patient of the board who has a cuff to be checked. */
async function cuffedPatient(page: Page): Promise<string> {
  await openBoard(page)
  return patientOf(rowsWith(page, /^Cuff pressure check /).first())
}

test('what a student charts is marked, and the charge nurse countersigns it from the list', async () => {
  const { page, problems } = await signedIn(browser, app, student)
  const patient = await cuffedPatient(page)
  const entry = await chartPressure(page, patient, '26')
  const charted = page.locator('#charted').getByRole('listitem').first()
  expect(await charted.textContent()).toMatch(/To be countersigned.*nurse under supervision/s)
  expect(await page.goto('/countersign').then(answer => answer?.status())).toBe(403)
  await page.goto(entry)
  await page.getByText(waits).waitFor()
  expect(await page.getByRole('link', { name: 'Countersign' }).count()).toBe(0)

  const charge = await signedIn(browser, app, 'charge.alder')
  await charge.page.getByRole('link', { name: /^\d+ to countersign$/ }).click()
  await charge.page.getByRole('heading', { name: 'To countersign', exact: true }).waitFor()
  await charge.page.locator(`input[name=entry][value="${entry.split('/').at(-1)}"]`).check()
  await charge.page.getByRole('button', { name: 'Countersign the chosen' }).click()
  await charge.page
    .getByRole('alert')
    .getByText(/supervised/)
    .first()
    .waitFor()
  expect(await charge.page.locator(`input[value="${entry.split('/').at(-1)}"]`).isChecked()).toBe(true)
  expect(await pageProblems(charge.page)).toEqual([])
  await charge.page.getByRole('checkbox', { name: /^I supervised this care/ }).check()
  await charge.page.getByRole('button', { name: 'Countersign the chosen' }).click()
  await charge.page.getByText('1 entry countersigned.').waitFor()
  // The words come with the answer, the list a moment later.
  await charge.page.locator(`input[value="${entry.split('/').at(-1)}"]`).waitFor({ state: 'detached' })

  await page.reload()
  await page.getByText(/^Countersigned by Odalys Verstraeten, charge nurse, on /).waitFor()
  expect(await page.getByText(waits).count()).toBe(0)
  expect(problems.filter(problem => !problem.includes('403'))).toEqual([])
})

/** Fills in a change of ties with a second person, up to their password. */
async function fillTies(page: Page, patient: string) {
  await page.goto(`${patient}/chart/ties`)
  const answers = { fingers: 'one', skin: 'intact', changed: 'yes', holder: 'padded' }
  for (const [name, value] of Object.entries(answers)) {
    await page.locator(`[name="care.${name}"][value="${value}"]`).check()
  }
  await page.locator('[name="care.secondPerson"]').fill('Kofi Lindstrand')
  await page.getByLabel('Who checked or helped').selectOption({ label: 'Kofi Lindstrand, respiratory therapist' })
}

async function secondSignatures(): Promise<string[]> {
  const rows = await rowsOf<{ proof: string }>(app, "SELECT proof FROM entry_signatures WHERE part = 'second person'")
  return rows.map(({ proof }) => proof)
}

test.each([
  ['with scripts', true],
  ['without scripts', false],
])('%s the second person of a change of ties signs on the same screen', async (_, javaScriptEnabled) => {
  const { page } = await signedIn(browser, app, 'nurse.alder', { javaScriptEnabled })
  const patient = await cuffedPatient(page)
  await fillTies(page, patient)
  const before = await secondSignatures()
  const password = page.getByLabel('Their own password')
  await password.fill('not the right one')
  await page.getByRole('button', { name: 'Chart ties' }).click()
  await page.getByRole('alert').getByRole('heading', { name: 'Not charted yet. Please check:' }).waitFor()
  expect(await password.inputValue()).toBe('')
  expect(await page.locator('[name="care.changed"][value="yes"]').isChecked()).toBe(true)
  expect(await secondSignatures()).toEqual(before)

  await password.fill(passphrase)
  await page.getByRole('button', { name: 'Chart ties' }).click()
  await page.waitForURL(/\?charted=/)
  expect(await secondSignatures()).toEqual([...before, 'password'])
  const charted = page.locator('#charted').getByRole('listitem').first()
  expect(await charted.textContent()).toContain('Kofi Lindstrand, respiratory therapist, signed on the same screen')
})

import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { openBoard, patientOf, rowsWith, sentenceToBeCharted, signedIn, visitor } from './bedside.ts'
import { launchedBrowser, rowsOf, type StartedApp, startedApp } from './browser.ts'

const scriptless = { javaScriptEnabled: false } as const
const cuff = /^Cuff pressure check /

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

async function entriesOf(patient: string): Promise<number> {
  const [row] = await rowsOf<{ entries: number }>(
    app,
    'SELECT COUNT(*) AS entries FROM entries e JOIN stays s ON s.id = e.stay_id WHERE s.patient_id = :id',
    { id: patient.split('/').at(-1) },
  )
  return row?.entries ?? 0
}

test('without scripts a pressure is checked first, charted, and corrected', async () => {
  const { page, problems } = await signedIn(browser, app, 'nurse.alder', scriptless)
  await openBoard(page)
  const row = rowsWith(page, cuff).first()
  const patient = await patientOf(row)
  await row.getByRole('link', { name: cuff }).click()
  await page.getByRole('textbox', { name: 'Pressure found' }).fill('34')
  await page.getByRole('radio', { name: 'Manometer' }).check()
  await page.getByRole('textbox', { name: 'Left at, if adjusted' }).fill('27')
  const before = await entriesOf(patient)
  await page.getByRole('button', { name: 'Check first' }).click()
  expect(await sentenceToBeCharted(page)).toBe('Cuff pressure 34, lowered to 27 cmH2O, by manometer.')
  await page.getByText('Found high, left within 20 to 30 cmH2O.').first().waitFor()
  const why = page.getByRole('region', { name: 'Warnings' }).locator('details').first()
  await why.locator('summary').click()
  await why.getByText('Cuff pressure, upper limit: 30 cmH2O.').waitFor()
  expect(await entriesOf(patient)).toBe(before)

  await page.getByRole('button', { name: 'Chart pressure' }).click()
  await page.getByText('Cuff pressure 34, lowered to 27 cmH2O, by manometer.').first().waitFor()
  const said = page.getByRole('region', { name: 'Charted just now' }).locator('details').first()
  await said.locator('summary').click()
  await said.getByText('Cuff pressure, upper limit: 30 cmH2O.').waitFor()
  expect(await entriesOf(patient)).toBe(before + 1)
  await page
    .locator('#charted')
    .getByRole('link', { name: /^Open Cuff pressure at / })
    .first()
    .click()
  await page.getByRole('region', { name: 'Warnings' }).locator('summary').first().click()
  await page.getByText('Cuff pressure, upper limit: 30 cmH2O.').first().waitFor()
  await page.getByRole('link', { name: 'Correct' }).click()
  await page.getByLabel('Why it is corrected').fill('Misread by one mark')
  await page.getByRole('textbox', { name: 'Left at, if adjusted' }).fill('26')
  await page.getByRole('button', { name: 'Chart correction' }).click()
  await page.getByText('Cuff pressure 34, lowered to 26 cmH2O, by manometer.').first().waitFor()
  const struck = page.locator('#charted').getByRole('listitem').filter({ hasText: 'lowered to 27 cmH2O' })
  expect(await struck.textContent()).toContain('Misread by one mark')
  expect(await entriesOf(patient)).toBe(before + 2)
  expect(problems).toEqual([])
})

test('without scripts a mistake is named, and what was typed stays', async () => {
  const { page } = await signedIn(browser, app, 'nurse.alder', scriptless)
  await openBoard(page)
  await page.getByRole('link', { name: cuff }).first().click()
  await page.getByRole('textbox', { name: 'Pressure found' }).fill('340')
  await page.getByRole('radio', { name: 'Lying flat' }).check()
  await page.getByRole('button', { name: 'Chart pressure' }).click()
  const summary = page.getByRole('alert')
  await summary.getByRole('heading', { name: 'Not charted yet. Please check:' }).waitFor()
  expect(await summary.getByRole('link').count()).toBe(2)
  expect(await page.getByRole('textbox', { name: 'Pressure found' }).inputValue()).toBe('340')
  expect(await page.getByRole('radio', { name: 'Lying flat' }).isChecked()).toBe(true)
})

test('without scripts the usual act fills the form, and the condition is still asked for', async () => {
  const { page } = await signedIn(browser, app, 'nurse.alder', scriptless)
  await openBoard(page)
  await page
    .getByRole('link', { name: /^Inner cannula inspection / })
    .first()
    .click()
  await page.getByRole('link', { name: /^As usual: / }).click()
  expect(await page.getByRole('radio', { name: 'Locked in place' }).isChecked()).toBe(true)
  expect(await page.getByRole('group', { name: 'Condition found' }).getByRole('radio', { checked: true }).count()).toBe(
    0,
  )
})

test('without scripts the colours are chosen and kept, the way out is there, and the page asked for comes back', async () => {
  const { page } = await signedIn(browser, app, 'nurse.alder', scriptless)
  const board = await openBoard(page)
  await page.getByText('Imani Brathwaite').first().click()
  await page.getByRole('button', { name: 'Night' }).click()
  expect(new URL(page.url()).pathname).toBe(board)
  expect(await page.locator('html').getAttribute('data-theme')).toBe('night')
  await page.getByText('Imani Brathwaite').first().click()
  await page.getByRole('button', { name: 'Sign out' }).click()
  await page.getByRole('heading', { name: 'Sign in' }).waitFor()
  expect(await page.locator('html').getAttribute('data-theme')).toBe('night')
  await page.goto(board)
  expect(new URL(page.url()).searchParams.get('returnTo')).toBe(board)
})

test('a wrong password is answered in the same words as an unknown person', async () => {
  const { page } = await visitor(browser, app, scriptless)
  const said: (string | null)[] = []
  for (const email of ['nurse.alder@example.org', 'nobody@example.org']) {
    await page.goto('/sign-in')
    await page.getByLabel('E-mail address').fill(email)
    await page.getByLabel('Password').fill('not the passphrase')
    await page.getByRole('button', { name: 'Sign in' }).click()
    said.push(await page.getByRole('alert').textContent())
  }
  expect(said[0]).toContain('Not signed in')
  expect(said[1]).toBe(said[0])
})

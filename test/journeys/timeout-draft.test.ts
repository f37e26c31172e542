import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { chartedWords, formReady, openBoard, patientOf, rowsWith, signedIn, signIn } from './bedside.ts'
import { changeRows, launchedBrowser, type StartedApp, startedApp } from './browser.ts'

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

/** Nobody has touched a page of theirs for so long: what the database knows of it. */
async function unseenFor(who: string, minutes: number) {
  await changeRows(
    app,
    `UPDATE sessions SET seen_at = UTC_TIMESTAMP(3) - INTERVAL :minutes MINUTE
     WHERE user_id = (SELECT id FROM users WHERE email = :email)`,
    { minutes, email: `${who}@example.org` },
  )
}

async function openForm(page: Page): Promise<string> {
  await openBoard(page)
  const row = rowsWith(page, cuff).first()
  const patient = await patientOf(row)
  await row.getByRole('link', { name: cuff }).click()
  await formReady(page)
  return patient
}

/** The address of a form, which a page with a clock of its own is to be loaded from. */
async function openedForm(page: Page): Promise<string> {
  await openForm(page)
  return page.url()
}

const found = (page: Page) => page.getByRole('textbox', { name: 'Pressure found' })
const restored = (page: Page) => page.getByText('What you had typed when you were signed out is filled in again.')

test('a session that ended while a form was filled in: sign in, and the form is as it was left', async () => {
  const { page, problems } = await signedIn(browser, app, 'nurse.alder')
  await openForm(page)
  const form = new URL(page.url())
  await found(page).fill('27')
  await page.getByRole('radio', { name: 'On the side' }).check()
  await unseenFor('nurse.alder', 61)
  await page.getByRole('radio', { name: 'Manometer' }).check()
  await page.getByRole('button', { name: 'Chart pressure' }).click()
  await page.getByText('What you had typed is kept for you').waitFor()

  await signIn(page, 'nurse.alder')
  await restored(page).waitFor()
  expect(new URL(page.url()).pathname).toBe(form.pathname)
  expect(new URL(page.url()).search).toBe(form.search)
  expect(await found(page).inputValue()).toBe('27')
  expect(await page.getByRole('radio', { name: 'On the side' }).isChecked()).toBe(true)
  expect(await page.getByRole('radio', { name: 'Manometer' }).isChecked()).toBe(true)
  await formReady(page)
  await page.getByRole('button', { name: 'Chart pressure' }).click()
  expect(await chartedWords(page)).toContain('Cuff pressure 27 cmH2O by manometer, not adjusted, on the side.')
  expect(problems).toEqual([])
})

test('what one person had typed is not shown to another who signs in on the same screen', async () => {
  const { page } = await signedIn(browser, app, 'nurse2.alder')
  await openForm(page)
  await found(page).fill('28')
  await unseenFor('nurse2.alder', 61)
  await page.getByRole('button', { name: 'Chart pressure' }).click()
  await page.getByText('What you had typed is kept for you').waitFor()
  await signIn(page, 'nurse3.alder')
  await formReady(page)
  expect(await found(page).inputValue()).toBe('')
  expect(await restored(page).count()).toBe(0)
})

test('a form that a second person sends in is charted under neither name until they say it is theirs', async () => {
  const { page, problems } = await signedIn(browser, app, 'nurse4.alder')
  const patient = await openForm(page)
  await found(page).fill('29')
  const previewed = page.waitForResponse(answer => answer.request().method() === 'POST')
  await page.getByRole('radio', { name: 'Manometer' }).check()
  await previewed
  await page.context().clearCookies()
  const other = await page.context().newPage()
  await other.goto('/sign-in')
  await signIn(other, 'nurse5.alder')
  await page.getByRole('button', { name: 'Chart pressure' }).click()
  const told = page.getByRole('alert').filter({ hasText: 'Not charted.' })
  expect(await told.textContent()).toContain(
    'You are signed in as Hye-jin Paek; this form was opened by Joaquín Salmerón.',
  )
  expect(await found(page).inputValue()).toBe('29')
  await page.getByRole('button', { name: 'Chart pressure' }).click()
  expect(await chartedWords(page)).toContain('Cuff pressure 29 cmH2O')
  expect(new URL(page.url()).pathname).toBe(patient)
  expect(await page.locator('#charted').getByRole('listitem').first().textContent()).toContain('Hye-jin Paek, nurse')
  expect(problems.filter(problem => !problem.includes('409'))).toEqual([])
})

test('a screen that nobody touches warns, hands in what was typed, and shows no patient any more', async () => {
  const { page } = await signedIn(browser, app, 'therapist.alder')
  await page.clock.install()
  await page.goto(await openedForm(page))
  await formReady(page)
  await found(page).fill('26')
  await page.clock.fastForward('58:30')
  await page
    .getByRole('alert')
    .getByText(/^You will be signed out at \d\d:\d\d\.$/)
    .waitFor()
  await unseenFor('therapist.alder', 60)
  await page.clock.fastForward('01:30')
  await page.waitForURL(url => url.pathname === '/sign-in' && url.searchParams.get('kept') === 'yes')
  await page.getByRole('heading', { name: 'Sign in' }).waitFor()
  expect(await page.getByRole('region', { name: 'Patient' }).count()).toBe(0)
  await signIn(page, 'therapist.alder')
  await restored(page).waitFor()
  expect(await found(page).inputValue()).toBe('26')
})

test('somebody who says that they are still there stays signed in', async () => {
  const { page } = await signedIn(browser, app, 'nurse6.alder')
  await page.clock.install()
  await page.goto(await openedForm(page))
  await formReady(page)
  await page.clock.fastForward('58:30')
  await page.getByRole('button', { name: 'Stay signed in' }).click()
  await page.getByRole('alert').waitFor({ state: 'detached' })
  await page.clock.fastForward('30:00')
  expect(await found(page).isVisible()).toBe(true)
})

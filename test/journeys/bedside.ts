import type { Browser, BrowserContextOptions, Locator, Page } from 'playwright-core'
import type { StartedApp } from './app.ts'
import { type OpenedPage, openedPage, rowsOf } from './browser.ts'

/** Opens every account of the demo hospital; the sign-in page shows it. */
export const passphrase = 'kettle lantern orchard rain'

/** A tablet at the bedside, which is tapped. */
export const tablet = { viewport: { width: 834, height: 1112 }, hasTouch: true } as const

/** A browser of its own at the application, with nobody signed in. */
export function visitor(browser: Browser, app: StartedApp, options: BrowserContextOptions = {}): Promise<OpenedPage> {
  return openedPage(browser, { baseURL: app.url, ...options })
}

/** The same with somebody signed in, on the page they start from. `who`: a demo account before its @, such as `nurse.alder`. */
export async function signedIn(
  browser: Browser,
  app: StartedApp,
  who: string,
  options: BrowserContextOptions = {},
): Promise<OpenedPage> {
  const opened = await visitor(browser, app, options)
  await opened.page.goto('/sign-in')
  await signIn(opened.page, who)
  return opened
}

/** Fills in the sign-in page and waits until it has led on. */
export async function signIn(page: Page, who: string): Promise<void> {
  await page.getByLabel('E-mail address').fill(`${who}@example.org`)
  await page.getByLabel('Password').fill(passphrase)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL(url => url.pathname !== '/sign-in')
}

/** Opens the board of the person's first ward by the section of that name, and gives the board's address. */
export async function openBoard(page: Page): Promise<string> {
  await page.getByRole('link', { name: 'Ward board', exact: true }).click()
  await page.getByRole('list', { name: 'Patients' }).waitFor()
  return new URL(page.url()).pathname
}

/** The rows of a board on which this care is offered, such as `/^Cuff pressure check .* late$/`. */
export function rowsWith(page: Page, care: RegExp): Locator {
  return page.locator('ul[aria-label=Patients] > li').filter({ has: page.getByRole('link', { name: care }) })
}

/** The row of a board that leads to this patient. */
export function rowOf(page: Page, patientPath: string): Locator {
  return page.locator('ul[aria-label=Patients] > li').filter({ has: page.locator(`a[href="${patientPath}"]`) })
}

/** Where the row of a patient leads: `/patients/…`. */
export async function patientOf(row: Locator): Promise<string> {
  const path = await row.locator('a[href^="/patients/"]').first().getAttribute('href')
  if (path === null) throw new Error('The row leads to no patient')
  return path
}

/** Where the patient in a bed is: `/patients/…`. */
export async function patientIn(app: StartedApp, bed: string): Promise<string> {
  const [row] = await rowsOf<{ id: string }>(
    app,
    'SELECT s.patient_id AS id FROM stays s JOIN beds b ON b.id = s.bed_id WHERE b.label = :bed AND s.discharged_at IS NULL',
    { bed },
  )
  if (!row) throw new Error(`Nobody is in bed ${bed}`)
  return `/patients/${row.id}`
}

/** How many bars of lateness the strip of a row has. */
export function barsOf(row: Locator): Promise<number> {
  return row.locator('rect[fill="url(#strip-late)"]').count()
}

/** The sentence at the foot of the form once it is whole, without time and signature: as the timeline will show it. */
export async function sentenceToBeCharted(page: Page): Promise<string> {
  const foot = page.locator('#will-be-charted', { hasText: 'Will be charted as:' })
  const words = await foot.textContent()
  const [, sentence] = words?.match(/charted as: .*?\d\d:\d\d (.+?\.) [^.]+, [^.,]+\.$/s) ?? []
  if (sentence === undefined) throw new Error(`Not a sentence to be charted: ${words}`)
  return sentence
}

/** Waits for the page that follows charting, and gives what it says was charted. */
export async function chartedWords(page: Page): Promise<string | null> {
  await page.waitForURL(/\?charted=/)
  return page.getByRole('region', { name: 'Charted just now' }).textContent()
}

/** Charts a cuff pressure read from a manometer, now, and gives the address of the entry. */
export async function chartPressure(page: Page, patient: string, found: string): Promise<string> {
  await page.goto(`${patient}/chart/cuff-pressure`)
  await page.getByRole('textbox', { name: 'Pressure found' }).fill(found)
  await page.getByRole('radio', { name: 'Manometer' }).check()
  await page.getByRole('button', { name: 'Chart pressure' }).click()
  await page.waitForURL(/\?charted=/)
  return `/entries/${new URL(page.url()).searchParams.get('charted')}`
}

/** Waits until scripts have taken over a chart form: from then on it says at its foot what is still needed. */
export async function formReady(page: Page): Promise<void> {
  await page.locator('#will-be-charted', { hasText: /Still needed|Will be charted/ }).waitFor()
}

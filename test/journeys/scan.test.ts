import { readFile } from 'node:fs/promises'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { formReady, patientIn, signedIn, tablet } from './bedside.ts'
import { launchedBrowser, rowsOf, type StartedApp, startedApp } from './browser.ts'
import { answered } from './filling.ts'
import { expectSheet, sheetTexts } from './sheet.ts'
import { countedTaps } from './taps.ts'

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

interface Items {
  readonly line: string
  readonly tube: string
  readonly right: string
  readonly wrong: string
}

/** A tube of the catalogue with a disposable inner cannula made for it, and one of another line. */
async function itemsOfDemo(): Promise<Items> {
  const [found] = await rowsOf<Items>(
    app,
    `SELECT l.name AS line, t.gtin AS tube, c.gtin AS \`right\`,
       (SELECT o.gtin FROM inner_cannulas o WHERE o.line_id <> t.line_id AND o.gtin IS NOT NULL AND o.retired_at IS NULL LIMIT 1) AS wrong
     FROM tubes t JOIN tube_lines l ON l.id = t.line_id
       JOIN inner_cannula_fits f ON f.tube_id = t.id
       JOIN inner_cannulas c ON c.id = f.inner_cannula_id AND c.used_as = 'disposable' AND c.fenestrated = t.fenestrated
     WHERE t.retired_at IS NULL AND t.construction = 'dual'
       AND t.inner_cannula = 'disposable' AND t.flange = 'fixed' AND t.cuff = 'air' LIMIT 1`,
  )
  if (!found) throw new Error('The demo catalogue has no such tube')
  return found
}

/** What a scanner does that types like a keyboard: keys in one burst, then Enter. Struck in the page, so that a slow machine keeps its pace. */
async function scan(page: Page, code: string) {
  await page.evaluate(
    keys => {
      for (const key of keys)
        document.body.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true }))
    },
    [...code, 'Enter'],
  )
}

const aboutTheAct = {
  reason: 'routine',
  sutures: 'none',
  operator: 'Thandiwe Marlowe',
  difficulty: 'easy',
  position: 'capnography',
}

/** The latest act of a kind that was charted on a scan, as it is stored. */
async function keptOf(kind: string): Promise<Readonly<Record<string, unknown>>> {
  const [row] = await rowsOf<{ data: string | object }>(
    app,
    `SELECT data FROM entries WHERE kind = '${kind}' AND JSON_VALUE(data, '$.scanned') IS NOT NULL ORDER BY recorded_at DESC LIMIT 1`,
  )
  return typeof row?.data === 'string' ? JSON.parse(row.data) : { ...row?.data }
}

test('from the scan of a tube to the search for a lot', async () => {
  const { line, tube, right, wrong } = await itemsOfDemo()
  const { page, problems } = await signedIn(browser, app, 'specialist', tablet)
  const patient = await patientIn(app, 'A1')

  // A tube is scanned as it goes in, and is on the card.
  await page.goto(`${patient}/chart/tube-change`)
  await formReady(page)
  await scan(page, `]d201${tube}1729123110T77`)
  await page.getByText('Filled in below.').waitFor()
  await answered(page, aboutTheAct)
  await page.getByRole('button', { name: 'Chart tube change' }).click()
  await page.waitForURL(/\?charted=|\/act-now\//)
  await page.goto(patient)
  await page.locator('aside').getByText(line).first().waitFor()

  // An inner cannula of another line is stopped before it goes in.
  await page.goto(`${patient}/chart/inner-cannula`)
  await formReady(page)
  await scan(page, `]d201${wrong}1729123110W12`)
  await page.getByText('This cannula is not made for this tube').first().waitFor()
  expect(await page.locator('[name="care.lot"]').inputValue()).toBe('')

  // The right one is charted with three taps.
  const taps = await countedTaps(page)
  await scan(page, `]d201${right}1729123110R34`)
  await page.getByText('Filled in below.').waitFor()
  await page.getByRole('button', { name: /^As usual: / }).tap()
  await page.getByRole('radio', { name: 'Light coating' }).tap()
  await page.getByRole('button', { name: 'Chart cannula' }).tap()
  await page.waitForURL(/\?charted=/)
  expect(taps).toEqual({ all: 3, digits: 0 })
  // What was scanned is kept with both acts, and the catalogue says that one is made for the other.
  expect(await keptOf('tube-change')).toMatchObject({ lot: 'T77', scanned: `barcode ]d201${tube}1729123110T77` })
  const kept = await keptOf('inner-cannula')
  expect(kept).toMatchObject({ lot: 'R34', scanned: `barcode ]d201${right}1729123110R34` })
  expect(kept.madeFor).toBe((await keptOf('tube-change')).item)

  // The sign for the new tube is printed, and its file says the same.
  await page.goto(`${patient}/sign`)
  const texts = await sheetTexts(page)
  expect(texts.join()).toContain(line)
  const downloading = page.waitForEvent('download')
  await page.getByRole('button', { name: 'Download as PDF' }).click()
  const file = await (await downloading).path()
  expect(await expectSheet(await readFile(file), texts)).toBe('Bed-head sign, bed A1')

  // A lot leads to the patient who has it.
  await page.goto('/lots?lot=R34')
  await page.locator(`a[href^="${patient}"], a[href^="/entries/"]`).first().waitFor()
  expect(problems).toEqual([])
})

test('a reusable pair that runs out of clean spares warns until one is laid ready', async () => {
  const { page, problems } = await signedIn(browser, app, 'nurse.alder', tablet)
  const patient = await patientIn(app, 'A5')
  const warning = page.getByText('No clean spare of the pair: the other one has been in cleaning since')
  const swapped = {
    act: 'swapped',
    condition: 'light',
    locked: 'yes',
    spare: 'no',
    other: 'cleaning',
    tolerance: 'well',
  }
  await page.goto(`${patient}/chart/inner-cannula`)
  await answered(page, swapped)
  await page.getByRole('button', { name: 'Chart cannula' }).tap()
  await page.waitForURL(/\?charted=/)
  await warning.first().waitFor()
  await page.locator('aside').getByText('the other being cleaned').waitFor()

  await page.goto(`${patient}/chart/inner-cannula`)
  await answered(page, { act: 'other only', spare: 'yes', other: 'ready' })
  await page.getByRole('button', { name: 'Chart cannula' }).tap()
  await page.waitForURL(/\?charted=/)
  await page.locator('aside').getByText('the other clean and ready').waitFor()
  expect(await warning.count()).toBe(0)
  expect(problems).toEqual([])
})

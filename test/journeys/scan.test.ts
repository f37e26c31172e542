import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { formReady, signedIn, tablet } from './bedside.ts'
import { launchedBrowser, rowsOf, type StartedApp, startedApp } from './browser.ts'
import { answered } from './filling.ts'

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
  readonly patient: string
  readonly line: string
  readonly tube: string
  readonly right: string
  readonly wrong: string
}

/** A patient with a tube, a catalogue tube with a disposable inner cannula made for it, and one of another line. */
async function itemsOfDemo(): Promise<Items> {
  const [found] = await rowsOf<Items>(
    app,
    `SELECT s.patient_id AS patient, l.name AS line, t.gtin AS tube, c.gtin AS \`right\`,
       (SELECT o.gtin FROM inner_cannulas o WHERE o.line_id <> t.line_id AND o.gtin IS NOT NULL AND o.retired_at IS NULL LIMIT 1) AS wrong
     FROM tubes t JOIN tube_lines l ON l.id = t.line_id
       JOIN inner_cannula_fits f ON f.tube_id = t.id
       JOIN inner_cannulas c ON c.id = f.inner_cannula_id AND c.used_as = 'disposable' AND c.fenestrated = t.fenestrated,
       stays s JOIN beds b ON b.id = s.bed_id
     WHERE b.label = 'A1' AND s.discharged_at IS NULL AND t.retired_at IS NULL AND t.construction = 'dual'
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

test('a tube is scanned as it goes in, a wrong inner cannula stops, the right one takes three taps, is scanned again to correct it, its lot is found', async () => {
  const { patient, line, tube, right, wrong } = await itemsOfDemo()
  const { page, problems } = await signedIn(browser, app, 'specialist', tablet)
  await page.goto(`/patients/${patient}/chart/tube-change`)
  await formReady(page)
  await scan(page, `]d201${tube}1729123110T77`)
  await page.getByText('Filled in below.').waitFor()
  await answered(page, aboutTheAct)
  await page.getByRole('button', { name: 'Chart tube change' }).click()
  await page.waitForURL(/\?charted=|\/act-now\//)
  await page.goto(`/patients/${patient}`)
  await page.locator('aside').getByText(line).first().waitFor()

  await page.goto(`/patients/${patient}/chart/inner-cannula`)
  await formReady(page)
  await scan(page, `]d201${wrong}1729123110W12`)
  await page.getByText('This cannula is not made for this tube').first().waitFor()
  expect(await page.locator('[name="care.lot"]').inputValue()).toBe('')
  await scan(page, `]d201${right}1729123110R34`)
  await page.getByText('Filled in below.').waitFor()
  await page.getByRole('button', { name: /^As usual: / }).tap()
  await page.getByRole('radio', { name: 'Light coating' }).tap()
  await page.getByRole('button', { name: 'Chart cannula' }).tap()
  await page.waitForURL(/\?charted=/)

  await page.goto(`/entries/${new URL(page.url()).searchParams.get('charted')}/correct`)
  await formReady(page)
  await scan(page, `]d201${right}1729123110R35`)
  await page.getByText('Filled in below.').waitFor()
  await page.getByLabel('Why it is corrected').fill('Another pack lay beside it')
  await page.getByRole('button', { name: 'Chart correction' }).tap()
  await page.waitForURL(/\?charted=/)

  await page.goto('/lots?lot=R35')
  await page.locator(`a[href^="/patients/${patient}"], a[href^="/entries/"]`).first().waitFor()
  expect(problems).toEqual([])
})

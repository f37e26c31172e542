import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { demoCatalogue } from '#database/seeders/catalogue.ts'
import { formReady, signedIn, tablet } from './bedside.ts'
import { launchedBrowser, type OpenedPage, rowsOf, type StartedApp, startedApp } from './browser.ts'
import { filmedLabel } from './fake-camera.ts'

const cannula = demoCatalogue.innerCannulas.find(
  ({ line, size, fenestrated }) => line === 'Corvane Dual' && size === '8.0' && fenestrated === 'no',
)
const folder = mkdtempSync(join(tmpdir(), 'cannulary-film-'))
const film = join(folder, 'label.y4m')

const A_WHILE = { timeout: 30_000 } // a busy machine is no defect

// The usual fake device shows no code.
const DEVICE = '--use-fake-device-for-media-stream'
const ALLOWED = '--use-fake-ui-for-media-stream'

let app: StartedApp
let seeing: Browser
const launched: Browser[] = []

beforeAll(async () => {
  await filmedLabel(film, `(01)${cannula?.gtin}(10)CAM-7(17)491231`)
  seeing = await launchedWith(DEVICE, ALLOWED, `--use-file-for-fake-video-capture=${film}`)
  app = await startedApp()
})

afterAll(async () => {
  for (const browser of launched) await browser.close()
  await app.stop()
  rmSync(folder, { recursive: true })
})

async function launchedWith(...flags: readonly string[]): Promise<Browser> {
  const browser = await launchedBrowser(flags)
  launched.push(browser)
  return browser
}

/** A page that notes which streams it was given and what its content security policy refused. */
async function watched(browser: Browser): Promise<OpenedPage> {
  const opened = await signedIn(browser, app, 'nurse.alder', tablet)
  await opened.page.addInitScript(() => {
    const seen = { streams: [] as MediaStream[], refused: [] as string[] }
    Object.assign(globalThis, { seen })
    const give = navigator.mediaDevices.getUserMedia.bind(navigator.mediaDevices)
    navigator.mediaDevices.getUserMedia = async asked => {
      const stream = await give(asked)
      seen.streams.push(stream)
      return stream
    }
    document.addEventListener('securitypolicyviolation', ({ blockedURI }) => seen.refused.push(blockedURI))
  })
  return opened
}

type Seen = { readonly seen: { readonly streams: readonly MediaStream[]; readonly refused: readonly string[] } }

/** Whether each track that a camera gave so far is `live` or `ended`. */
function tracks(page: Page): Promise<readonly string[]> {
  return page.evaluate(() =>
    (globalThis as unknown as Seen).seen.streams.flatMap(stream => stream.getTracks().map(track => track.readyState)),
  )
}

const refusals = (page: Page) => page.evaluate(() => (globalThis as unknown as Seen).seen.refused)
const camera = (page: Page) => page.getByRole('button', { name: 'Use the camera' })
const view = (page: Page) => page.getByLabel('What the camera sees')

/** A patient of Alder ward in whom the tube is that the filmed cannula is made for. */
async function patientWithTube(): Promise<string> {
  const [found] = await rowsOf<{ id: string }>(
    app,
    `SELECT s.patient_id AS id FROM entries e JOIN stays s ON s.id = e.stay_id JOIN wards w ON w.id = s.ward_id
     WHERE e.kind = 'tube-change' AND JSON_VALUE(e.data, '$.line') = 'Corvane Dual' AND JSON_VALUE(e.data, '$.size') = '8.0'
       AND w.name = 'Alder ward' AND s.discharged_at IS NULL
       AND NOT EXISTS (SELECT 1 FROM entries l WHERE l.stay_id = e.stay_id AND l.kind IN (e.kind, 'decannulation', 'adverse-event') AND l.number > e.number)
     LIMIT 1`,
  )
  if (!found) throw new Error('Nobody on Alder ward has such a tube')
  return found.id
}

test('the camera reads a label into the form, by what this server sends alone, and is let go', async () => {
  const { page, problems } = await watched(seeing)
  const elsewhere: string[] = []
  page.on('request', request => {
    if (!/^(data|blob):/.test(request.url()) && !request.url().startsWith(app.url)) elsewhere.push(request.url())
  })
  await page.goto(`/patients/${await patientWithTube()}/chart/inner-cannula`)
  await formReady(page)
  await camera(page).tap()
  await page.getByText('Filled in below.').waitFor()
  expect(await page.locator('[name="care.lot"]').inputValue()).toBe('CAM-7')
  expect(await page.locator('[name="care.expiresOn"]').inputValue()).toBe('2049-12-31')
  expect(await page.locator('[name="care.scanned"]').inputValue()).toMatch(/^barcode \]d2/)
  expect(await view(page).count()).toBe(0)
  expect(await tracks(page)).toEqual(['ended'])
  expect(elsewhere).toEqual([])
  expect([...(await refusals(page)), ...problems]).toEqual([])
})

test('the page for scanning shows what the camera read', async () => {
  const { page, problems } = await watched(seeing)
  await page.goto('/scan', { waitUntil: 'networkidle' })
  await camera(page).tap()
  await page.getByRole('heading', { name: /^Corvane Dual 8\.0/ }).waitFor()
  await page.getByText('CAM-7').first().waitFor()
  expect(await tracks(page)).toEqual(['ended'])
  expect([...(await refusals(page)), ...problems]).toEqual([])
})

test('a camera that is closed, or left for another page, is let go', async () => {
  const { page } = await watched(await launchedWith(DEVICE, ALLOWED))
  await page.goto('/scan', { waitUntil: 'networkidle' })
  await camera(page).tap()
  await view(page).waitFor()
  await expect.poll(() => tracks(page), A_WHILE).toEqual(['live'])
  await page.getByRole('button', { name: 'Close the camera' }).tap()
  await expect.poll(() => tracks(page), A_WHILE).toEqual(['ended'])
  await camera(page).tap()
  await expect.poll(() => tracks(page), A_WHILE).toEqual(['ended', 'live'])
  await page.getByRole('link', { name: 'Set up the scanner' }).tap()
  await page.getByRole('heading', { name: 'Set up the scanner of this workstation' }).waitFor()
  await expect.poll(() => tracks(page), A_WHILE).toEqual(['ended', 'ended'])
})

test('a camera whose pictures cannot be read is let go, and said in words', async () => {
  const { page } = await watched(seeing)
  await page.route('**/zxing_reader*.wasm', route => route.abort())
  await page.goto('/scan', { waitUntil: 'networkidle' })
  await camera(page).tap()
  expect(await page.getByRole('alert').textContent()).toContain('The camera could not be read.')
  expect(await tracks(page)).toEqual(['ended'])
})

test.each([
  ['refused', [DEVICE, '--deny-permission-prompts'], 'The camera was not allowed.'],
  ['missing', [`${DEVICE}=device-count=0`, ALLOWED], 'No camera was found.'],
])('a camera that is %s is said in words, and the code can be typed', async (_, flags, says) => {
  const { page, problems } = await watched(await launchedWith(...flags))
  await page.goto('/scan', { waitUntil: 'networkidle' })
  await camera(page).tap()
  const alert = page.getByRole('alert')
  await alert.waitFor()
  expect(await alert.textContent()).toContain(says)
  await page.getByLabel('Code').fill(`(01)${cannula?.gtin}(10)TYPED-1`)
  await page.getByRole('button', { name: 'Look it up' }).tap()
  await page.getByText('TYPED-1').first().waitFor()
  expect([...(await refusals(page)), ...problems]).toEqual([])
})

import type { Browser, Page } from 'playwright-core'
import sharp from 'sharp'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { patientIn, signedIn } from './bedside.ts'
import { launchedBrowser, type StartedApp, startedApp } from './browser.ts'
import { answered } from './filling.ts'

let app: StartedApp
let browser: Browser
let patient: string

beforeAll(async () => {
  browser = await launchedBrowser()
  app = await startedApp()
  patient = await patientIn(app, 'A13')
})

afterAll(async () => {
  await browser.close()
  await app.stop()
})

const look = {
  appearance: ['clean'],
  exudate: 'none',
  bleeding: 'none',
  sites: ['flange left', 'flange right', 'flange top', 'flange bottom', 'back of neck'],
  skin: 'intact',
  dressing: 'left in place',
  sutures: 'none',
  ties: 'two',
  holderChanged: 'no',
}

async function jpeg(name: string, background: string) {
  const picture = sharp({ create: { width: 1200, height: 900, channels: 3, background } })
  return { name, mimeType: 'image/jpeg', buffer: await picture.jpeg().toBuffer() }
}

async function formFilled(page: Page) {
  await page.goto(`${patient}/chart/stoma-and-skin`)
  await answered(page, look)
  return page.getByLabel('Photographs of the opening and the skin')
}

/** Widths of the pictures among these, as the browser has them: 0 for one that did not come. */
function widths(page: Page, alt: RegExp): Promise<readonly number[]> {
  const pictures = page.getByAltText(alt)
  return pictures.evaluateAll(async all => {
    const images = all.filter(one => one instanceof HTMLImageElement)
    // One that waits to be scrolled to would never come.
    for (const image of images) image.loading = 'eager'
    await Promise.all(images.map(image => image.decode().catch(() => undefined)))
    return images.map(({ naturalWidth }) => naturalWidth)
  })
}

test.each([true, false])('photographs are charted and seen on the timeline, scripts %s', async javaScriptEnabled => {
  const { page, problems } = await signedIn(browser, app, 'nurse.alder', { javaScriptEnabled })
  const chooser = await formFilled(page)
  await chooser.setInputFiles([await jpeg('one.jpg', '#b4544c'), await jpeg('two.jpg', '#4c7ab4')])
  await page.getByRole('button', { name: 'Chart stoma' }).click()
  await page.waitForURL(/\?charted=/)
  const latest = page.locator('#charted').getByRole('listitem').filter({ hasText: '2 photographs' }).first()
  await latest.getByRole('img', { name: /^Photograph 2 of Stoma and skin at / }).waitFor()
  expect(await latest.getByRole('img', { name: /^Photograph \d of Stoma and skin at / }).count()).toBe(2)
  if (javaScriptEnabled)
    expect((await widths(page, /^Photograph \d of Stoma and skin at /)).slice(0, 2)).toEqual([320, 320])
  expect(problems).toEqual([])
})

test('two days stand beside each other', async () => {
  const { page, problems } = await signedIn(browser, app, 'nurse.alder')
  await page.goto(patient)
  await page.getByRole('link', { name: 'Photographs', exact: true }).click()
  const left = page.getByLabel('On the left')
  const oldest = await left.locator('option').last().getAttribute('value')
  await left.selectOption(oldest)
  await page.getByRole('button', { name: 'Compare' }).click()
  await page.waitForURL(/earlier=/)
  const days = (await page.locator('main h2').allInnerTexts()).map(title => title.slice(0, 11))
  expect(days).toHaveLength(2)
  expect(days[0]).not.toBe(days[1])
  const shown = await widths(page, /photograph \d$/)
  expect(shown).toHaveLength(4)
  expect(shown.every(width => width > 0)).toBe(true)
  expect(problems).toEqual([])
})

test.each([true, false])('a file that is no photograph is refused, and what was typed stays, scripts %s', async on => {
  const { page } = await signedIn(browser, app, 'nurse.alder', { javaScriptEnabled: on })
  const chooser = await formFilled(page)
  const buffer = Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>')
  await chooser.setInputFiles([{ name: 'wound.jpg', mimeType: 'image/jpeg', buffer }])
  await page.getByRole('button', { name: 'Chart stoma' }).click()
  await page.getByText('"wound.jpg" is no JPEG, PNG or WebP photograph').first().waitFor()
  expect(await page.locator('input[name="care.skin"][value="intact"]').isChecked()).toBe(true)
  expect(await page.locator('input[name="care.sites"]:checked').count()).toBe(5)
})

test('more photographs than an entry takes are left out at once', async () => {
  const { page } = await signedIn(browser, app, 'nurse.alder')
  const chooser = await formFilled(page)
  const one = await jpeg('one.jpg', '#b4544c')
  await chooser.setInputFiles(['a', 'b', 'c', 'd', 'e.jpg'].map(name => ({ ...one, name })))
  await page.getByText('Not chosen, larger than 8 MB or more than 4: e.jpg.').waitFor()
  expect(await page.getByRole('list', { name: 'Chosen photographs' }).getByRole('listitem').count()).toBe(4)
})

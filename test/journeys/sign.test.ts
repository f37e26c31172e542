import { readFile } from 'node:fs/promises'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { patientIn, signedIn } from './bedside.ts'
import { launchedBrowser, type StartedApp, startedApp } from './browser.ts'
import { answered } from './filling.ts'
import { expectSheet, sheetTexts } from './sheet.ts'

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

test.each(['A1', 'A7', 'A8', 'A10'])(
  'the page of the sign at %s prints as one sheet of A4 on its long side',
  async bed => {
    const { page, problems } = await signedIn(browser, app, 'nurse.alder')
    await page.goto(`${await patientIn(app, bed)}/sign`)
    const texts = await sheetTexts(page)
    await expectSheet(await page.pdf({ preferCSSPageSize: true, printBackground: true }), texts)
    expect(problems).toEqual([])
  },
)

test('the sign that was downloaded says what the page says, and ends with the next tube', async () => {
  const { page, problems } = await signedIn(browser, app, 'specialist')
  const patient = await patientIn(app, 'A1')
  await page.goto(`${patient}/sign`)
  const texts = await sheetTexts(page)
  const downloading = page.waitForEvent('download')
  await page.getByRole('button', { name: 'Download as PDF' }).click()
  const file = await (await downloading).path()
  expect(await expectSheet(await readFile(file), texts)).toBe('Bed-head sign, bed A1')
  await page.goto(`${patient}/sign`)
  await page.getByText('It is current.').waitFor()

  await page.goto(`${patient}/chart/tube-change`)
  await answered(page, newTube)
  await page.getByRole('button', { name: 'Chart tube change' }).click()
  await page.waitForURL(/\?charted=|\/act-now\//)
  await page.goto(patient)
  await page.getByText('Destroy the printed bed-head sign and print a new one.').first().waitFor()
  await page.getByRole('link', { name: 'Bed-head sign', exact: true }).first().click()
  await page.getByText('Changed since: the tube or what is charted of it.').waitFor()
  const old = await page.request.get(`${patient}/sign.pdf`, { maxRedirects: 0 })
  expect([old.status(), old.headers().location]).toEqual([302, `${patient}/sign`])

  await page.getByRole('button', { name: 'Print the sign' }).click()
  await page.getByText('Noted as printed.').waitFor()
  await page.getByText('It is current.').waitFor()
  expect((await sheetTexts(page)).join()).toContain('Halden, 7')
  expect(problems).toEqual([])
})

const newTube = {
  reason: 'routine',
  line: 'Halden',
  sizeSystem: 'ISO 5366',
  size: '7',
  construction: 'dual',
  innerCannula: 'reusable',
  idWithInner: '5.5',
  idWithoutInner: '7',
  od: '9.7',
  lengthMm: '84',
  cuff: 'none',
  fenestrated: 'no',
  connector: 'outer',
  flange: 'fixed',
  sutures: 'none',
  operator: 'Thandiwe Marlowe',
  difficulty: 'easy',
  position: 'capnography',
}

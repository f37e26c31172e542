import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { localDay } from '#app/time/zone.ts'
import { passphrase, patientIn, signedIn } from './bedside.ts'
import { changeRows, launchedBrowser, type StartedApp, startedApp } from './browser.ts'
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

const gate = {
  indication: 'routine',
  newTube: 'Corvane Dual 7.0',
  operator: 'Thandiwe Marlowe',
  helper: 'Kofi Lindstrand',
  ...{ equipment: 'yes', spareSame: 'yes', spareSmaller: 'yes', fasted: 'yes', capnography: 'yes', consent: 'given' },
  ifItFails: 'Oxygen to face and stoma, airway team called',
}

async function plan(page: Page, patient: string, answers: Readonly<Record<string, string>>) {
  await page.goto(patient)
  await page.getByRole('link', { name: 'Tube change plan', exact: true }).click()
  await page.locator('[name="care.step"]').first().waitFor()
  await answered(page, { step: 'plan', plannedOn: localDay(new Date(), 'Europe/London'), ...gate, ...answers })
  await page.getByRole('button', { name: 'Chart plan' }).click()
}

const refusal = 'Contraindicated: high ventilator or oxygen need.'

test.each([true, false])(
  'a contraindicated plan is refused unless a senior is named with a reason, scripts %s',
  async on => {
    const { page } = await signedIn(browser, app, 'specialist', { javaScriptEnabled: on })
    const patient = await patientIn(app, on ? 'A2' : 'A10')
    await plan(page, patient, { contraindications: 'support' })
    await page.getByText(refusal).first().waitFor()
    expect(await page.locator('[name="care.ifItFails"]').inputValue()).toBe(gate.ifItFails)
    await page.locator('[name="care.senior"]').fill('Dr N. Abara')
    await page.getByRole('button', { name: 'Chart plan' }).click()
    await page.getByText('Enter why Dr N. Abara decided to go ahead').first().waitFor()
    await page.locator('[name="care.seniorReason"]').fill('The cuff is torn')
    await page.getByRole('button', { name: 'Chart plan' }).click()
    await page.waitForURL(/\?charted=/)
    await page.locator('#charted').getByText('Dr N. Abara decided to go ahead: The cuff is torn.').first().waitFor()
  },
)

const newTube = {
  line: 'Corvane Dual',
  sizeSystem: 'ISO 5366',
  size: '7.0',
  construction: 'dual',
  innerCannula: 'disposable',
  ...{ idWithInner: '7', idWithoutInner: '8', od: '10.5', lengthMm: '76' },
  ...{ cuff: 'air', fenestrated: 'no', connector: 'outer', flange: 'fixed', sutures: 'none' },
  ...{ difficulty: 'easy', position: 'capnography' },
}

/** The care due of this name, on the patient's page. */
const due = (page: Page, name: string) =>
  page.getByRole('listitem').filter({ has: page.getByRole('heading', { name, exact: true }) })

test('a planned change is charted and signed anew: new card, clocks from the start, kit check, old sign ended', async () => {
  const { page, problems } = await signedIn(browser, app, 'specialist')
  const patient = await patientIn(app, 'A1')
  await page.goto(`${patient}/sign`)
  await page.getByRole('button', { name: 'Print the sign' }).click()
  await page.getByText('It is current.').waitFor()
  await plan(page, patient, { contraindications: 'none' })
  await page.waitForURL(/\?charted=/)
  await page.locator('aside').getByText('Change planned').waitFor()

  await changeRows(app, 'UPDATE sessions SET started_at = started_at - INTERVAL 1 HOUR')
  await due(page, 'Tube change').getByRole('link', { name: 'Chart tube change' }).click()
  await page.locator('[name="care.reason"]').first().waitFor()
  expect(await page.locator('[name="care.reason"][value="routine"]').isChecked()).toBe(true)
  expect(await page.locator('[name="care.operator"]').inputValue()).toBe(gate.operator)
  expect(await page.locator('[name="care.helper"]').inputValue()).toBe(gate.helper)
  await answered(page, newTube)
  const password = page.getByLabel(/^Password of /)
  await password.fill('not the right one')
  await page.getByRole('button', { name: 'Chart tube change' }).click()
  await page.getByText('This is not your password').first().waitFor()
  expect(await page.locator('[name="care.size"]').inputValue()).toBe('7.0')
  await password.fill(passphrase)
  await page.getByRole('button', { name: 'Chart tube change' }).click()
  await page.waitForURL(/\?charted=|\/act-now\//)

  await page.goto(patient)
  const card = page.locator('aside')
  await card.getByText('7.0 ISO 5366', { exact: true }).first().waitFor()
  await card.getByText(/^Day 0 of \d+$/).waitFor()
  expect(await card.getByText('Change planned').count()).toBe(0)
  await due(page, 'Bedside kit check')
    .getByText(/Sooner because the tube was changed\./)
    .waitFor()
  await due(page, 'Cuff pressure check')
    .getByText(/Sooner because the tube was changed\./)
    .waitFor()
  await due(page, 'Inner cannula change')
    .getByText(/Not charted yet; counted from \d\d-\w{3}-\d{4}/)
    .waitFor()
  await page.getByText('Destroy the printed bed-head sign and print a new one.').first().waitFor()
  await page.goto(`${patient}/sign`)
  await page.getByText('Changed since: the tube or what is charted of it.').waitFor()
  expect(problems.filter(problem => !problem.includes('400'))).toEqual([])
})

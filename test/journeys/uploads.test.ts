import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { signedIn } from './bedside.ts'
import { launchedBrowser, rowsOf, type StartedApp, startedApp } from './browser.ts'

const scriptless = { javaScriptEnabled: false } as const
const folder = mkdtempSync(join(tmpdir(), 'cannulary-uploads-'))

let app: StartedApp
let browser: Browser

beforeAll(async () => {
  browser = await launchedBrowser()
  app = await startedApp()
})

afterAll(async () => {
  await browser.close()
  await app.stop()
  rmSync(folder, { recursive: true })
})

/** A file of so many megabytes. */
function aFile(name: string, megabytes: number): string {
  const path = join(folder, name)
  writeFileSync(path, Buffer.alloc(megabytes * 1_000_000, 'x'))
  return path
}

test('without scripts photographs that are too large are said at their field, and what was typed stays', async () => {
  const [patient] = await rowsOf<{ id: string }>(
    app,
    `SELECT s.patient_id AS id FROM stays s JOIN beds b ON b.id = s.bed_id WHERE b.label = 'A1' AND s.discharged_at IS NULL`,
  )
  const { page, problems } = await signedIn(browser, app, 'nurse.alder', scriptless)
  await page.goto(`/patients/${patient?.id}/chart/stoma-and-skin`)
  // More than 48 MB together, each of them more than 8 MB.
  await page.getByLabel(/^Photographs/).setInputFiles([1, 2, 3, 4].map(number => aFile(`stoma-${number}.jpg`, 13)))
  await page.getByText('More details').click()
  await page.locator('[name="care.note"]').fill('Typed before it was sent')
  await page.getByRole('button', { name: /^Chart / }).click()
  const alert = page.getByRole('alert')
  await alert.waitFor()
  for (const number of [1, 2, 3, 4])
    expect(await alert.textContent()).toContain(`"stoma-${number}.jpg" is larger than 8 MB`)
  expect(await page.locator('[name="care.note"]').inputValue()).toBe('Typed before it was sent')
  expect(problems.filter(problem => !problem.includes('400'))).toEqual([])
})

test('without scripts a file of the catalogue that is too large is said at its field', async () => {
  const { page } = await signedIn(browser, app, 'administrator', scriptless)
  await page.goto('/catalogue/import')
  await page.getByLabel('CSV file').setInputFiles(aFile('catalogue.csv', 12))
  await page.getByRole('button', { name: 'Show what it would do' }).click()
  await page.getByRole('alert').waitFor()
  expect(await page.locator('#file-error').textContent()).toContain('larger than 2 MB: import it in parts')
})

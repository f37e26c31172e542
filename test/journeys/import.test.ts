import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { type Column, columns, headings } from '#app/catalogue/columns.ts'
import { csvText, readCsvText } from '#app/catalogue/csv-text.ts'
import { demoTube } from '#database/seeders/catalogue.ts'
import { signedIn } from './bedside.ts'
import { launchedBrowser, rowsOf, type StartedApp, startedApp } from './browser.ts'
import { pageProblems } from './page-problems.ts'

let app: StartedApp
let browser: Browser
let page: Page
let problems: string[]

beforeAll(async () => {
  browser = await launchedBrowser()
  app = await startedApp()
  const opened = await signedIn(browser, app, 'specialist', { viewport: { width: 1440, height: 900 } })
  page = opened.page
  problems = opened.problems
})

afterAll(async () => {
  await browser.close()
  await app.stop()
})

type Cells = Partial<Record<Column, string>>
const HEAD = columns.map(column => headings[column])
const lineOf = (cells: Cells) => columns.map(column => cells[column] ?? '')

const common: Cells = { line: 'Wrenfield', maker: 'Sandhaven Devices', size: '7.5' }
const tube: Cells = {
  ...common,
  ...{ item: 'tube', sizeSystem: 'ISO 5366', construction: 'dual', innerCannula: 'disposable' },
  ...{ idWithInner: '7.5', idWithoutInner: '8.6', od: '10.9', lengthMm: '77', cuff: 'air', fenestrated: 'no' },
  ...{ connector: 'outer', flange: 'fixed', longestUseDays: '28', insertionAid: 'yes', reusableInnerCannulas: '0' },
  ...{ fits: '7.5 disposable x10', gtin: '09529999000019' },
}
const cannula: Cells = { ...common, item: 'inner cannula', use: 'disposable', fenestrated: 'no', packSize: '10' }

async function exported(): Promise<string> {
  return (await page.request.get('/catalogue/export')).text()
}

/** Chooses a file of these lines and asks what it would do. */
async function previewed(text: string) {
  await page.goto('/catalogue/import', { waitUntil: 'networkidle' })
  const file = { name: 'catalogue.csv', mimeType: 'text/csv', buffer: Buffer.from(text) }
  await page.getByLabel('CSV file').setInputFiles(file)
  await page.getByRole('button', { name: 'Show what it would do' }).click()
  await page.getByText(/^\d+ with errors, /).waitFor()
}

/** Each row of the preview: its line, its item, and what is said of it. */
const previewRows = async () => {
  const rows = await page.getByRole('region', { name: 'What each line would do' }).locator('tbody tr').all()
  return Promise.all(rows.map(row => row.locator('th, p, li').allTextContents()))
}

const itemsNow = async () => {
  const [row] = await rowsOf<{ items: number }>(
    app,
    'SELECT (SELECT COUNT(*) FROM tubes) + (SELECT COUNT(*) FROM inner_cannulas) AS items',
  )
  return row?.items
}

test('of a file with mistakes every one is shown with its line and column, and nothing is written', async () => {
  const before = await itemsNow()
  const wrong = [
    { ...tube, od: 'wide', cuff: 'balloon' },
    { ...cannula, packSize: '0' },
    { ...tube, size: '8.0', fits: '8.0 disposable x10', gtin: '09529999000017' },
    { ...cannula, size: '8.0' },
  ]
  await previewed(csvText([HEAD, ...wrong.map(lineOf)]))
  const alert = await page.getByRole('alert').textContent()
  for (const words of [
    /Line 2, .*OD mm: /,
    /Line 2, .*Cuff: Write one of: none, air, water, foam/,
    /Line 3, Pack size: /,
  ])
    expect(alert).toMatch(words)
  expect((await previewRows()).map(([line]) => line)).toEqual(['2', '3', '4', '5'])
  expect(await page.getByRole('cell', { name: 'Error', exact: true }).count()).toBe(3)
  expect(await page.getByRole('button', { name: /^Import/ }).count()).toBe(0)
  expect(await page.getByLabel('Or its lines').inputValue()).toContain('balloon')
  expect(await pageProblems(page)).toEqual([])
  expect(await itemsNow()).toBe(before)
  // The browser notes on its console that the page was answered with a 400.
  expect(problems.splice(0)).toEqual([expect.stringContaining('400')])
})

test('a file in order is imported once each line’s fate was seen, shown with its history, and exported as it is', async () => {
  const read = readCsvText(await exported())
  const [same, changed] = 'rows' in read ? read.rows.slice(1).filter(({ cells }) => cells[0] === 'tube') : []
  const cells = changed?.cells.map((cell, i) => (columns[i] === 'longestUseDays' ? '21' : cell)) ?? []
  await previewed(csvText([HEAD, same?.cells ?? [], cells, lineOf(cannula), lineOf(tube)]))
  expect(await previewRows()).toEqual([
    ['3', expect.stringMatching(/^Tube /), expect.stringMatching(/^Longest use days: .*, now 21$/)],
    ['4', 'Inner cannula Wrenfield 7.5, disposable, box of 10'],
    ['5', 'Tube Wrenfield 7.5 ISO 5366, dual (disposable), air cuff, 77 mm'],
    ['2', expect.stringMatching(/^Tube /)],
  ])
  for (const [fate, count] of [
    ['Changed', 1],
    ['New', 2],
    ['As before', 1],
  ] as const)
    expect(await page.getByRole('cell', { name: fate, exact: true }).count()).toBe(count)
  expect(await pageProblems(page)).toEqual([])
  await page.setViewportSize({ width: 1440, height: 900 })
  await page.getByRole('button', { name: 'Import 3 of 4' }).click()
  await page.getByText('Imported: 2 new, 1 changed, 1 as before.').waitFor()

  await page.goto('/catalogue?find=wrenfield')
  await page.getByRole('link', { name: /^Wrenfield 7\.5 ISO 5366/ }).click()
  await page.getByRole('link', { name: 'Wrenfield 7.5, disposable, box of 10' }).waitFor()
  expect(await page.getByRole('region', { name: 'History' }).textContent()).toMatch(/Tube added/)

  const out = await exported()
  expect(out).toContain('Wrenfield')
  await previewed(out)
  await page.getByText('The catalogue says the same already.').waitFor()
  expect(await page.getByText(/^0 with errors, 0 changed, 0 new, /).count()).toBe(1)
  expect(problems).toEqual([])
})

test('an item that is retired leaves the list and can still be found', async () => {
  await page.goto('/catalogue?find=wrenfield')
  await page.getByRole('link', { name: /^Wrenfield 7\.5 ISO 5366/ }).click()
  await page.getByRole('button', { name: 'Retire' }).click()
  await page.getByText('Retired. It stays in the catalogue.').waitFor()
  await page.goto('/catalogue?find=wrenfield')
  await page.getByText('Nothing was found').waitFor()
  await page.getByText('Filter and sort').click()
  await page.getByLabel('Retired').selectOption('Shown too')
  await page.getByRole('button', { name: 'Show' }).click()
  await page.getByRole('link', { name: /^Wrenfield 7\.5 ISO 5366/ }).waitFor()
})

test('a tube is laid beside others, the nearest outside diameter first, with both Jackson tables and the caution', async () => {
  const halden = demoTube({ line: 'Halden', size: '6', cuff: 'none', fenestrated: 'no' })
  await page.goto(`/catalogue/tubes/${halden.id}`)
  await page.getByRole('link', { name: 'Compare with other tubes' }).click()
  await page.getByRole('heading', { name: 'Tubes side by side' }).waitFor()
  const text = (await page.locator('main').textContent()) ?? ''
  expect(text).toContain('The decision is the tracheostomy specialist’s.')
  expect(text).not.toMatch(/equivalent|equals/i)
  const rows = await page.getByRole('region', { name: 'Others in the catalogue' }).locator('tbody tr').all()
  const cells = await Promise.all(rows.map(row => row.locator('th, td').allTextContents()))
  const away = cells.map(([, od = '']) => Number(/\([+−±]([\d.]+)\)/.exec(od)?.[1]))
  expect(away).toEqual(away.toSorted((a, b) => a - b))
  expect(new Set(cells.map(([name]) => name)).size).toBe(cells.length)
  expect(cells[0]?.[4]).toMatch(/^\d+\.\d\d times$/)
  for (const name of [/^Dual-cannula style/, /^Traditional metal tubes/])
    expect(await page.getByRole('region', { name }).count()).toBe(1)
  expect(problems).toEqual([])
})

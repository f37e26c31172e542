import { beforeAll, describe, expect, test } from 'vitest'
import { printedAnswers } from '#app/catalogue/item.ts'
import { isGtin } from '#app/clinical/gs1-gtin.ts'
import {
  catalogueInnerCannula,
  catalogueTube,
  innerCannulaByGtin,
  innerCannulasFitting,
  tubeByGtin,
  tubeLines,
  tubesFitting,
} from '#database/catalogue.server.ts'
import { searchInnerCannulas, searchTubes } from '#database/catalogue-search.server.ts'
import { demoCatalogue, demoTube } from '#database/seeders/catalogue.ts'
import { demoHospital } from '#database/seeders/hospital.ts'
import { demoTables } from '#database/seeders/tables.ts'
import { cleared, owner } from '#test/database.ts'

const hospital = demoHospital(new Date('2026-12-01T14:06:00Z'), 'Europe/London')
const page = { page: 1, pageSize: 20 }

beforeAll(async () => {
  await cleared()
  const wanted = ['wards', 'users', 'tube_lines', 'tubes', 'inner_cannulas', 'inner_cannula_fits']
  for (const { table, rows } of demoTables(hospital, 'x'.repeat(97))) {
    if (wanted.includes(table))
      await owner.getQueryInterface().bulkInsert(
        table,
        rows.map(row => ({ ...row })),
      )
  }
})

test('what was stored is read back, numbers as numbers', async () => {
  for (const tube of demoCatalogue.tubes) expect(await catalogueTube(tube.id)).toEqual(tube)
  for (const cannula of demoCatalogue.innerCannulas) expect(await catalogueInnerCannula(cannula.id)).toEqual(cannula)
  expect((await tubeLines()).map(({ line }) => line)).toEqual(['Corvane Dual', 'Halden', 'Linnet', 'Marrow Long'])
})

test('an item is found by its GTIN, and nothing by another', async () => {
  const [tube] = demoCatalogue.tubes
  const [cannula] = demoCatalogue.innerCannulas
  expect(await tubeByGtin(tube?.gtin ?? '')).toEqual(tube)
  expect(await innerCannulaByGtin(cannula?.gtin ?? '')).toEqual(cannula)
  expect(await tubeByGtin(cannula?.gtin ?? '')).toBeUndefined()
  expect(await innerCannulaByGtin('09521234543213')).toBeUndefined()
})

test('an inner cannula fits a tube exactly when the tube fits it', async () => {
  const pairs = new Set<string>()
  for (const { id } of demoCatalogue.tubes)
    for (const cannula of await innerCannulasFitting(id)) pairs.add(`${id} ${cannula.id}`)
  const mirrored = new Set<string>()
  for (const { id } of demoCatalogue.innerCannulas)
    for (const tube of await tubesFitting(id)) mirrored.add(`${tube.id} ${id}`)
  expect(mirrored).toEqual(pairs)
  expect(pairs.size).toBe(demoCatalogue.fits.length)
})

test('a fenestrated inner cannula is not made for a tube without windows, a plain one is made for both', async () => {
  const tube = demoTube({ line: 'Corvane Dual', size: '8.0', cuff: 'air', fenestrated: 'no' })
  const windowed = demoTube({ line: 'Corvane Dual', size: '8.0', cuff: 'air', fenestrated: 'yes' })
  expect((await innerCannulasFitting(tube.id)).map(({ fenestrated }) => fenestrated)).toEqual(['no'])
  expect((await innerCannulasFitting(windowed.id)).map(({ fenestrated }) => fenestrated)).toEqual(['no', 'yes'])
})

describe('searching', () => {
  test.each([
    [{ words: 'corvane 8' }, 4],
    [{ words: 'quillmere', cuff: 'air' as const }, 8],
    [{ sizeSystem: 'Jackson' as const }, 16],
    [{ words: '5.5' }, 0],
    [{ words: '5.5', retired: true }, 1],
    [{ words: '%' }, 0],
    [{ words: demoCatalogue.tubes[3]?.gtin?.slice(1) ?? '' }, 1],
    [{ construction: 'single' as const, cuff: 'foam' as const }, 2],
  ])('%j finds %i tubes', async (search, total) => {
    expect((await searchTubes({ ...search, ...page })).total).toBe(total)
  })

  test('pages follow one another and miss nothing', async () => {
    const { total } = await searchTubes({ ...page, retired: true })
    const pages = await Promise.all(
      Array.from({ length: Math.ceil(total / 20) }, (_, i) =>
        searchTubes({ page: i + 1, pageSize: 20, retired: true, order: 'od' }),
      ),
    )
    const tubes = pages.flatMap(found => found.tubes)
    expect(new Set(tubes.map(({ id }) => id)).size).toBe(demoCatalogue.tubes.length)
    expect(tubes.map(({ od }) => od)).toEqual(demoCatalogue.tubes.map(({ od }) => od).toSorted((a, b) => a - b))
  })

  test('inner cannulas are found by line and size', async () => {
    const { innerCannulas, total } = await searchInnerCannulas({ ...page, words: 'halden 6' })
    expect(total).toBe(2)
    expect(innerCannulas.map(({ size }) => size)).toEqual(['6', '6'])
  })
})

test('every item of the demo catalogue has a valid demonstration GTIN of its own', () => {
  const gtins = [...demoCatalogue.tubes, ...demoCatalogue.innerCannulas].map(({ gtin }) => gtin ?? '')
  expect(new Set(gtins).size).toBe(gtins.length)
  expect(gtins.filter(gtin => !isGtin(gtin) || !gtin.startsWith('0952'))).toEqual([])
})

test('the demo catalogue holds every kind of tube', () => {
  const values = (name: keyof (typeof demoCatalogue.tubes)[number]) =>
    [...new Set(demoCatalogue.tubes.map(tube => String(tube[name])))].sort()
  expect(values('sizeSystem')).toEqual(['ISO 5366', 'Jackson'])
  expect(values('cuff')).toEqual(['air', 'foam', 'none', 'water'])
  expect(values('construction')).toEqual(['dual', 'single'])
  expect(values('innerCannula')).toEqual(['disposable', 'null', 'reusable'])
  expect(values('fenestrated')).toEqual(['no', 'yes'])
  expect(values('flange')).toEqual(['adjustable', 'fixed'])
  expect(values('connector')).toEqual(['inner', 'none', 'outer'])
})

test('a tube-change form filled from the catalogue keeps what the label says', () => {
  expect(printedAnswers(demoTube({ line: 'Halden', size: '6', cuff: 'none', fenestrated: 'no' }))).toEqual({
    line: 'Halden',
    sizeSystem: 'Jackson',
    size: '6',
    construction: 'dual',
    innerCannula: 'reusable',
    idWithInner: 6.4,
    idWithoutInner: 8.1,
    od: 10.8,
    lengthMm: 76,
    cuff: 'none',
    fenestrated: 'no',
    connector: 'inner',
    flange: 'fixed',
  })
})

import fc from 'fast-check'
import { expect, test } from 'vitest'
import { demoCatalogue } from '#database/seeders/catalogue.ts'
import { innerCannulaName, type NamedTube, tubeName, tubesInWords } from './item.ts'

const tube: NamedTube = {
  line: 'Corvane Dual',
  size: '8.0',
  sizeSystem: 'ISO 5366',
  construction: 'dual',
  innerCannula: 'disposable',
  cuff: 'air',
  fenestrated: 'no',
  connector: 'outer',
  flange: 'fixed',
  lengthMm: 78,
}

test.each<[Partial<NamedTube>, string]>([
  [{}, 'Corvane Dual 8.0 ISO 5366, dual (disposable), air cuff, 78 mm'],
  [{ fenestrated: 'yes', cuff: 'none' }, 'Corvane Dual 8.0 ISO 5366, dual (disposable), no cuff, fenestrated, 78 mm'],
  [
    { construction: 'single', innerCannula: null, flange: 'adjustable', lengthMm: 110 },
    'Corvane Dual 8.0 ISO 5366, air cuff, adjustable flange, 110 mm',
  ],
  [{ innerCannula: null }, 'Corvane Dual 8.0 ISO 5366, dual, air cuff, 78 mm'],
  [
    { connector: 'inner' },
    'Corvane Dual 8.0 ISO 5366, dual (disposable), air cuff, connector on the inner cannula, 78 mm',
  ],
])('a tube with %o is called %s', (more, name) => {
  expect(tubeName({ ...tube, ...more })).toBe(name)
})

test('two tubes that differ in anything that the catalogue keeps apart are called differently', () => {
  const any: fc.Arbitrary<NamedTube> = fc.record({
    line: fc.constantFrom('Corvane', 'Corvane Dual'),
    size: fc.constantFrom('8', '8.0', '10'),
    sizeSystem: fc.constantFrom('ISO 5366', 'Jackson'),
    construction: fc.constant('dual' as const),
    innerCannula: fc.constantFrom('disposable', 'reusable'),
    cuff: fc.constantFrom('none', 'air', 'water', 'foam'),
    fenestrated: fc.constantFrom('yes', 'no'),
    connector: fc.constantFrom('outer', 'inner', 'none'),
    flange: fc.constantFrom('fixed', 'adjustable'),
    lengthMm: fc.constantFrom(78, 78.5, 80),
  })
  const single = any.map(one => ({ ...one, construction: 'single' as const, innerCannula: null }))
  const either = fc.oneof(any, single)
  fc.assert(
    fc.property(either, either, (one, other) => {
      expect(tubeName(one) === tubeName(other)).toBe(JSON.stringify(one) === JSON.stringify(other))
    }),
    { numRuns: 500 },
  )
})

test('several tubes are told by line and size, with the number of their kinds', () => {
  expect(tubesInWords([tube, { ...tube, size: '9.0' }, { ...tube, cuff: 'none' }])).toBe(
    'Corvane Dual 8.0 ISO 5366, 2 kinds; Corvane Dual 9.0 ISO 5366, dual (disposable), air cuff, 78 mm',
  )
  expect(tubesInWords([])).toBe('')
})

test('no two items of the demo catalogue are called the same', () => {
  for (const names of [demoCatalogue.tubes.map(tubeName), demoCatalogue.innerCannulas.map(innerCannulaName)])
    expect(new Set(names).size).toBe(names.length)
})

test('an inner cannula says how many are in its box', () => {
  const cannula = { line: 'Halden', size: '6', use: 'reusable', fenestrated: 'yes', packSize: 1 } as const
  expect(innerCannulaName(cannula)).toBe('Halden 6, reusable, fenestrated')
  expect(innerCannulaName({ ...cannula, fenestrated: 'no', packSize: 10 })).toBe('Halden 6, reusable, box of 10')
})

import { expect, test } from 'vitest'
import { type AboutContext, aContext, anEntry, aTube } from '../make.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { plainSuction } from './examples.ts'
import type { SuctionData } from './schema.ts'
import { techniqueWarnings } from './technique.ts'

interface About extends AboutContext {
  readonly tube?: Partial<TubeData>
}

function warningsOf(overrides: Partial<SuctionData>, { tube = {}, ...about }: About = {}) {
  const entries = [anEntry(tubeChanges, '2026-03-02 10:00', aTube(tube))]
  return techniqueWarnings({ ...plainSuction, ...overrides }, aContext(entries, '12:00', about))
}

test('the plain way of suctioning warns of nothing', () => {
  expect(warningsOf({})).toEqual([])
})

const jackson6: Partial<TubeData> = { size: '6', sizeSystem: 'Jackson', idWithInner: 6.4, idWithoutInner: 8.1 }

test.each([
  ['8 Fr', undefined],
  ['10 Fr', 'Largest size for this tube is 8 Fr.'],
  ['12 Fr', 'Largest size for this tube is 8 Fr.'],
] as const)('C-17: %s in a tube of 8.1 mm with an inner cannula of 6.4 mm: %s', (catheter, action) => {
  expect(warningsOf({ catheter }, { tube: jackson6 })[0]?.action).toBe(action)
})

test('C-17: with no inner cannula in the same tube takes 12 Fr', () => {
  expect(warningsOf({ catheter: '12 Fr' }, { tube: { ...jackson6, innerCannula: 'none' } })).toEqual([])
  expect(warningsOf({ catheter: '14 Fr' }, { tube: { ...jackson6, innerCannula: 'none' } })).toMatchObject([
    { name: 'suction-catheter-large', level: 'amber', action: 'Largest size for this tube is 12 Fr.' },
  ])
})

test('12 Fr is exactly half of 8 mm: allowed, unless the policy is strict', () => {
  expect(warningsOf({ catheter: '12 Fr' })).toEqual([])
  expect(warningsOf({ catheter: '12 Fr' }, { policy: { 'suction-catheter-strictly-below': true } })).toMatchObject([
    { action: 'Largest size for this tube is 10 Fr.' },
  ])
})

test('the largest size is one in stock, if there is one', () => {
  const stocked = (sizes: readonly number[]) => ({ policy: { 'suction-catheter-sizes': sizes } })
  expect(warningsOf({ catheter: '14 Fr' }, stocked([6, 10, 14]))[0]?.action).toBe(
    'Largest size for this tube is 10 Fr.',
  )
  expect(warningsOf({ catheter: '14 Fr' }, stocked([14, 16]))[0]?.action).toBe(
    'No size in stock is small enough for this tube. Ask the tracheostomy team.',
  )
})

test('without a tube in the record no size is called too large', () => {
  expect(techniqueWarnings({ ...plainSuction, catheter: '18 Fr' }, aContext([], '12:00'))).toEqual([])
})

test.each([
  [150, 'mmHg', undefined, undefined],
  [150.5, 'mmHg', 'suction-vacuum-high', 'Turn suction down to 80 to 150 mmHg.'],
  [200, 'mmHg', 'suction-vacuum-high', 'Turn suction down to 80 to 150 mmHg.'],
  [201, 'mmHg', 'suction-vacuum-very-high', 'Turn suction down to 80 to 150 mmHg now, and read the gauge again.'],
  [20, 'kPa', undefined, undefined],
  [20.5, 'kPa', 'suction-vacuum-high', 'Turn suction down to 80 to 150 mmHg (10.7 to 20 kPa).'],
  [
    27,
    'kPa',
    'suction-vacuum-very-high',
    'Turn suction down to 80 to 150 mmHg (10.7 to 20 kPa) now, and read the gauge again.',
  ],
] as const)('a vacuum of %d %s: %s', (vacuum, vacuumUnit, name, action) => {
  const [warning] = warningsOf({ vacuum, vacuumUnit })
  expect([warning?.name, warning?.action]).toEqual([name, action])
  if (warning) expect(warning.level).toBe('amber')
})

test.each([
  [20, 'mmHg', '20 mmHg is 2.7 kPa, which is not used for suction.'],
  [39.5, 'mmHg', '39.5 mmHg is 5.3 kPa, which is not used for suction.'],
  [40, 'mmHg', undefined],
  [40, 'kPa', undefined],
  [120, 'kPa', '120 kPa is 900 mmHg, which is not used for suction.'],
] as const)('the unit of %d %s is in doubt: %s', (vacuum, vacuumUnit, cause) => {
  const warning = warningsOf({ vacuum, vacuumUnit }).find(({ name }) => name === 'suction-vacuum-unit')
  expect(warning?.cause).toBe(cause)
  if (warning) expect(warning.action).toBe('Read the unit on the vacuum gauge again.')
})

test('a care plan may lower the vacuum that counts as high', () => {
  expect(warningsOf({ vacuum: 120 }, { personal: { 'suction-vacuum-warn': 100 } })).toMatchObject([
    { action: 'Turn suction down to 80 to 100 mmHg.' },
  ])
})

test.each([
  [10, undefined, undefined],
  [11, 'suction-pass-long', 'blue'],
  [15, 'suction-pass-long', 'blue'],
  [16, 'suction-pass-too-long', 'amber'],
])('a longest pass of %i s: %s', (longestPassS, name, level) => {
  const [warning] = warningsOf({ longestPassS })
  expect([warning?.name, warning?.level]).toEqual([name, level])
})

test.each([
  [3, undefined],
  [4, 'suction-many-passes'],
])('%i passes: %s', (passes, name) => {
  expect(warningsOf({ passes })[0]?.name).toBe(name)
})

test.each([
  ['yes', undefined, 'suction-fenestrated'],
  ['yes', 'fenestrated', 'suction-fenestrated'],
  ['yes', 'none', 'suction-fenestrated'],
  ['yes', 'plain', undefined],
  ['no', undefined, undefined],
] as const)('fenestrated tube %s, inner cannula charted as %s: %s', (fenestrated, innerCannula, name) => {
  expect(warningsOf({ innerCannula }, { tube: { fenestrated } })[0]?.name).toBe(name)
})

test('suction of the mouth has no technique of the tube', () => {
  const mouth = { act: 'episode', indication: ['asked'], route: 'oral', amount: 'none', blood: 'none' } as const
  const context = aContext([anEntry(tubeChanges, '10:00', aTube({ fenestrated: 'yes' }))], '12:00')
  expect(techniqueWarnings({ ...mouth, indication: ['asked'], tolerance: 'well' }, context)).toEqual([])
})

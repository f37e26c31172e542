import { expect, test } from 'vitest'
import { usualCheck } from './examples.ts'
import { type StomaData, sitesLeftOut, stomaSchema, suturesRemoved } from './schema.ts'

/** A key set to undefined is left out, as in a form that was not filled in. */
type Overrides = { readonly [Name in keyof StomaData]?: StomaData[Name] | undefined }

const issuesOf = (overrides: Overrides) =>
  stomaSchema
    .safeParse({ ...usualCheck, ...overrides })
    .error?.issues.map(({ path, message }) => `${path.join('.')}: ${message}`)

test('the usual check can be charted', () => {
  expect(issuesOf({})).toBeUndefined()
})

test.each<Overrides>([{ appearance: ['clean', 'redness'] }, { appearance: ['odour', 'clean'] }])(
  'clean and another finding contradict each other: %j',
  overrides => {
    expect(issuesOf(overrides)).toEqual(['appearance: Clean and healthy does not go with another finding'])
  },
)

test.each([
  ['none', undefined],
  ['spotting', undefined],
  ['fresh ooze', ['appearance: Clean and healthy does not go with bleeding']],
  ['active', ['appearance: Clean and healthy does not go with bleeding']],
] as const)('clean with bleeding %s', (bleeding, expected) => {
  expect(issuesOf({ bleeding })).toEqual(expected)
})

test('the stage is asked for a pressure injury', () => {
  expect(issuesOf({ skin: 'pressure injury', findingSite: 'flange left' })).toEqual([
    'stage: Choose the stage of the pressure injury',
  ])
})

test.each(['moisture damage', 'skin tear', 'fungal', 'blanching redness'] as const)('%s has no stage', skin => {
  expect(issuesOf({ skin, findingSite: 'flange left', stage: 'stage-2' })).toEqual([
    'stage: Leave out the stage of the pressure injury here',
  ])
})

test('a finding has its place, and intact skin has none', () => {
  expect(issuesOf({ skin: 'skin tear' })).toEqual(['findingSite: Choose the place of the finding'])
  expect(issuesOf({ skin: 'intact', findingSite: 'flange left', sizeMm: 4 })).toEqual([
    'findingSite: Leave out the place of the finding here',
    'sizeMm: Leave out the longest side here',
  ])
})

test('the place of a finding is one of those looked at', () => {
  expect(issuesOf({ skin: 'skin tear', findingSite: 'around opening' })).toEqual([
    'findingSite: Place of the finding is not among the skin looked at',
  ])
})

test('exudate has its kind, and no exudate has none', () => {
  expect(issuesOf({ exudate: 'scant' })).toEqual(['exudateType: Choose the kind of exudate'])
  expect(issuesOf({ exudateType: 'clear' })).toEqual(['exudateType: Leave out the kind of exudate here'])
})

test.each<Overrides>([
  { dressing: 'changed' },
  { holderChanged: 'yes' },
  { dressing: 'changed', holderChanged: 'yes' },
])('a change takes two people, or says that it was done alone: %j', overrides => {
  expect(issuesOf(overrides)).toEqual(['secondPerson: Enter the second person, or "alone"'])
  expect(issuesOf({ ...overrides, secondPerson: 'alone' })).toBeUndefined()
})

test.each([
  [-1, ['pain: Pain must be from 0 to 10 points']],
  [0, undefined],
  [10, undefined],
  [11, ['pain: Pain must be from 0 to 10 points']],
  [undefined, undefined],
])('pain of %s', (pain, expected) => {
  expect(issuesOf({ pain })).toEqual(expected)
})

test('bleeding, sutures and ties are asked each time: not asked is never taken for none', () => {
  expect(issuesOf({ bleeding: undefined, sutures: undefined, ties: undefined })).toEqual([
    'bleeding: Choose the bleeding',
    'sutures: Choose the flange sutures',
    'ties: Choose the fingers under the ties',
  ])
})

test.each([
  ['none', false],
  ['in place', false],
  ['loose', false],
  ['removed now', true],
] as const)('sutures %s: removed is %s', (sutures, expected) => {
  expect(suturesRemoved({ ...usualCheck, sutures })).toBe(expected)
})

test.each<[string, Overrides, readonly string[]]>([
  ['everywhere', {}, []],
  ['all but the left', { sites: ['flange right', 'flange top', 'flange bottom', 'back of neck'] }, ['flange left']],
  ['everywhere but under sutures', { sutures: 'in place' }, ['under sutures']],
  ['everywhere but under loose sutures', { sutures: 'loose' }, ['under sutures']],
  ['everywhere, the sutures just removed', { sutures: 'removed now' }, []],
  [
    'under the flange, with no ties',
    { ties: 'no ties', sites: ['flange left', 'flange right', 'flange top', 'flange bottom'] },
    [],
  ],
  [
    'around the opening only',
    { sites: ['around opening'] },
    ['flange left', 'flange right', 'flange top', 'flange bottom', 'back of neck'],
  ],
])('looked at %s', (_, overrides, leftOut) => {
  expect(sitesLeftOut({ ...usualCheck, ...overrides } as StomaData)).toEqual(leftOut)
})

import { expect, test } from 'vitest'
import { type ItemFacts, itemRows } from './ward-stock.ts'

const rule = { wastage: 20, leadDays: 3, safetyDays: 7, horizonDays: 28 }
const rate = (perDay: number) => ({ perDay, counted: 1, planned: 0, fewestDays: 14 })
const facts = (overrides: Partial<ItemFacts> = {}): ItemFacts => ({
  ...{ item: 'gel', words: 'Gel', packSize: null, store: 30, atBeds: 2, anyBelow: false, rate: rate(2) },
  ...overrides,
})
const rowOf = (overrides: Partial<ItemFacts>) => itemRows([facts(overrides)], rule)[0]

test('store and beds are one stock, held against what is used in a day', () => {
  expect(rowOf({})).toEqual({
    ...{ item: 'gel', words: 'Gel', store: 30, atBeds: 2, stock: 32, packSize: null, order: 0, boxes: null },
    ...{ perDay: '2', basis: '1 patient counted over at least 14 days', lasts: 'about 16 d' },
    ...{ reorderAt: 21, need: 68, standing: 'enough' },
  })
})

test.each<[string, Partial<ItemFacts>, string]>([
  ['at the reorder point', { store: 19 }, 'order now'],
  ['just above it', { store: 20 }, 'enough'],
  ['with a store below nothing, whatever lies at the beds', { store: -1, atBeds: 90 }, 'below nothing'],
  ['with one bed below nothing', { anyBelow: true }, 'below nothing'],
  ['that nobody uses', { rate: undefined }, 'not used'],
])('an item %s stands so', (_, overrides, standing) => {
  expect(rowOf(overrides)?.standing).toBe(standing)
})

test('an order is counted in whole boxes, where the catalogue knows them', () => {
  expect(rowOf({ store: 0, atBeds: 0, packSize: 10 })).toMatchObject({ order: 68, boxes: 7 })
  expect(rowOf({ packSize: 10 })).toMatchObject({ order: 0, boxes: 0 })
})

test('what is neither there nor used is left out; what was used up is not', () => {
  expect(rowOf({ store: 0, atBeds: 0, rate: undefined })).toBeUndefined()
  expect(rowOf({ store: 0, atBeds: 0 })).toMatchObject({ stock: 0, lasts: 'nothing left', standing: 'order now' })
  expect(rowOf({ store: -2, atBeds: 2, rate: undefined })).toMatchObject({ stock: 0, standing: 'below nothing' })
})

test('the most pressing stands first, then by name', () => {
  const rows = itemRows(
    [
      facts({ item: 'a', words: 'A', rate: undefined }),
      facts({ item: 'c', words: 'C' }),
      facts({ item: 'b', words: 'B' }),
      facts({ item: 'd', words: 'D', store: 0 }),
      facts({ item: 'e', words: 'E', store: -5 }),
    ],
    rule,
  )
  expect(rows.map(({ item }) => item)).toEqual(['e', 'd', 'b', 'c', 'a'])
})

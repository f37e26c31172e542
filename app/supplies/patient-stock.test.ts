import { expect, test } from 'vitest'
import { bedItems } from './bed-stock.ts'
import { patientItems } from './patient-stock.ts'

const rule = { wastage: 20, leadDays: 3, safetyDays: 7, horizonDays: 28 }
const about = { wordsOf: (item: string) => item, belongsAtBed: () => true }

function itemOf(stock: number, store: number, perDay: number) {
  const rates = new Map([['cannula', { perDay, daysOfData: 14 }]])
  const items = bedItems(new Map([['cannula', stock]]), rates, about)
  return patientItems(items, { store: new Map([['cannula', store]]), rates, rule })[0]
}

test.each<[string, number, number, number, string | null]>([
  ['below nothing', -1, 90, 2, 'Below nothing: more was charted than came. Count what lies here.'],
  ['below nothing and not used now', -1, 0, 0, 'Below nothing: more was charted than came. Count what lies here.'],
  ['short, with some in the store', 1, 30, 2, 'Less than a day: bring some from the store.'],
  ['short, with none in the store', 1, 0, 2, 'Less than a day, and none in the store: order now.'],
  ['short, with a store below nothing', 0, -4, 2, 'Less than a day, and none in the store: order now.'],
  ['needed once in weeks, and nowhere', 0, 0, 1 / 28, 'None here and none in the store: order.'],
  ['at the reorder point with the store', 6, 15, 2, 'With the store it lasts about 10 d: order.'],
  ['above the reorder point with the store', 6, 16, 2, null],
  ['with a store below nothing, enough at the bed', 40, -4, 2, null],
  ['not used now', 3, 0, 0, null],
])('an item %s (%i here, %i in the store, %i a day) says %s', (_, stock, store, perDay, notice) => {
  expect(itemOf(stock, store, perDay)).toMatchObject({ stock, store, notice })
})

test('an item that the store has none of says so', () => {
  const items = bedItems(new Map([['gel', 1]]), new Map(), about)
  expect(patientItems(items, { store: new Map(), rates: new Map(), rule })).toMatchObject([{ store: 0, notice: null }])
})

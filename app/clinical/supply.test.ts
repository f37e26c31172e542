import { expect, test } from 'vitest'
import { days, hours } from '../time/duration.ts'
import { lasting, needOver, rateOf, reorderPoint, toOrder } from './supply.ts'

const rule = { wastage: 20, leadDays: 3, safetyDays: 7, horizonDays: 28 }

test.each([
  [0, 28, 20, 0],
  [1 / 3, 28, 0, 10],
  [0.1, 30, 0, 3],
  [0.7, 10, 10, 8],
  [2.5, 7, 20, 21],
])('%f a day over %i days with a wastage of %i in a hundred need %i', (perDay, horizon, wastage, need) => {
  expect(needOver(perDay, horizon, wastage)).toBe(need)
})

test.each([
  [0, 0],
  [2, 21],
  [5, 53],
  [0.5, 5],
])('at %f a day an order goes out at a stock of %i', (perDay, point) => {
  expect(reorderPoint(perDay, rule)).toBe(point)
})

test.each([
  ['above the reorder point', 22, 2, 0],
  ['at the reorder point', 21, 2, 47],
  ['with nothing left', 0, 2, 68],
  ['below nothing', -3, 2, 71],
  ['below nothing and not used any more', -3, 0, 3],
  ['not used', 5, 0, 0],
  ['not used and not there', 0, 0, 0],
])('a stock %s: %i, at %i a day, orders %i', (_, stock, perDay, pieces) => {
  expect(toOrder(stock, perDay, rule)).toBe(pieces)
})

test.each([
  [3, 2, days(1.5)],
  [0, 2, hours(0)],
  [-4, 2, hours(0)],
  [3, 0, null],
])('a stock of %i at %i a day lasts %s', (stock, perDay, time) => {
  expect(lasting(stock, perDay)).toBe(time)
})

test('the interval stands in until there are enough days of data', () => {
  expect(rateOf({ used: 4, days: 2.9 }, 2, 3)).toEqual({ perDay: 2, daysOfData: 0 })
  expect(rateOf({ used: 9, days: 3 }, 2, 3)).toEqual({ perDay: 3, daysOfData: 3 })
  expect(rateOf({ used: -1, days: 5 }, 2, 3)).toEqual({ perDay: 0, daysOfData: 5 })
})

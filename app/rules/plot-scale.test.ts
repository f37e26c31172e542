import fc from 'fast-check'
import { expect, test } from 'vitest'
import { days, hours, minutes } from '../time/duration.ts'
import { durationTicks, niceTicks, placed } from './plot-scale.ts'

// The plots there are: gauges in three units, SpO2, the secretion sum; and ranges between round numbers.
test.each([
  [0, 50, [0, 10, 20, 30, 40, 50]],
  [0, 36.78, [0, 10, 20, 30, 40]],
  [0, 4.903, [0, 1, 2, 3, 4, 5]],
  [80, 100, [80, 85, 90, 95, 100]],
  [0, 15, [0, 5, 10, 15]],
  [0, 0.3, [0, 0.1, 0.2, 0.3]],
  [-3, 4, [-4, -2, 0, 2, 4]],
])('an axis from %d to %d is labelled %j', (from, to, ticks) => {
  expect(niceTicks({ from, to })).toEqual(ticks)
})

test.each([
  [5, 5],
  [7, 3],
  [Number.NaN, 3],
])('there is no axis from %d to %d', (from, to) => {
  expect(() => niceTicks({ from, to })).toThrow(RangeError)
})

test('labels rise by equal steps, and hold the range between them', () => {
  const ends = fc.tuple(fc.integer({ min: -500, max: 500 }), fc.integer({ min: 1, max: 900 }))
  fc.assert(
    fc.property(ends, ([from, width]) => {
      const ticks = niceTicks({ from, to: from + width })
      const steps = ticks.slice(1).map((tick, index) => tick - (ticks[index] ?? 0))
      expect(Math.max(...steps) - Math.min(...steps)).toBeLessThan(1e-6)
      expect(ticks[0]).toBeLessThanOrEqual(from)
      expect(ticks.at(-1)).toBeGreaterThanOrEqual(from + width)
      expect(ticks.length).toBeLessThanOrEqual(11)
    }),
  )
})

test.each([
  ['nothing', minutes(0), [0, minutes(5)]],
  ['half an hour', minutes(30), [0, 5, 10, 15, 20, 25, 30].map(minutes)],
  ['5 h 48 min', hours(5.8), [0, 1, 2, 3, 4, 5, 6].map(hours)],
  ['a day', hours(24), [0, 6, 12, 18, 24].map(hours)],
  ['a day and an hour', hours(25), [0, 6, 12, 18, 24, 30].map(hours)],
  ['three days', days(3), [0, 12, 24, 36, 48, 60, 72].map(hours)],
  ['half a year', days(180), [0, 35, 70, 105, 140, 175, 210].map(days)],
])('an axis of lengths up to %s is labelled as a clock counts', (_, to, ticks) => {
  expect(durationTicks(to)).toEqual(ticks)
})

test.each([
  [0, { at: 0 }],
  [12.5, { at: 250 }],
  [50, { at: 1000 }],
  [-0.1, { at: 0, beyond: 'below' }],
  [50.1, { at: 1000, beyond: 'above' }],
])('%d on an axis from 0 to 50 lies at %j', (value, expected) => {
  expect(placed(value, { from: 0, to: 50 })).toEqual(expected)
})

import { expect, test } from 'vitest'
import { hours, minutes } from '../time/duration.ts'
import { lateness } from './tolerance.ts'

test.each([
  ['1 h', hours(1), minutes(15), minutes(15), hours(1)],
  ['just under 4 h', minutes(239), minutes(59.75), minutes(59.75), minutes(239)],
  ['4 h', hours(4), minutes(60), minutes(60), hours(4)],
  ['12 h', hours(12), minutes(60), minutes(60), hours(4)],
  ['just under a day', minutes(1439), minutes(60), minutes(60), hours(4)],
  ['24 h', hours(24), minutes(120), hours(4), hours(12)],
  ['a week', hours(168), minutes(120), hours(4), hours(12)],
])('the lateness of a task due every %s', (_, interval, tolerance, soonBefore, seriousAfter) => {
  expect(lateness(interval)).toEqual({ tolerance, soonBefore, seriousAfter })
})

test.each([hours(0), hours(-1), hours(Number.NaN)])('an interval of %d ms is refused', interval => {
  expect(() => lateness(interval)).toThrow(RangeError)
})

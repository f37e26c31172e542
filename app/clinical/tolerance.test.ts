import { expect, test } from 'vitest'
import { type Duration, hours, minutes } from '../time/duration.ts'
import { intervalClass } from './tolerance.ts'

test.each([
  [minutes(1), 'short'],
  [minutes(239), 'short'],
  [hours(4), 'middle'],
  [minutes(24 * 60 - 1), 'middle'],
  [hours(24), 'long'],
  [hours(24 * 28), 'long'],
])('an interval of %i ms is %s', (interval, expected) => {
  expect(intervalClass(interval)).toBe(expected)
})

test.each([0, -1, Number.NaN])('an interval of %d is none', interval => {
  expect(() => intervalClass(interval as Duration)).toThrow(RangeError)
})

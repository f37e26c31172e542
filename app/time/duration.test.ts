import { expect, test } from 'vitest'
import { days, earlier, hours, later, minutes, since } from './duration.ts'

const at = new Date('2026-12-01T14:06:00Z')

test.each([
  ['30 minutes', minutes(30), 1_800_000],
  ['8 hours', hours(8), 28_800_000],
  ['a quarter of an hour', hours(0.25), 900_000],
  ['2 days', days(2), 172_800_000],
])('%s is counted in milliseconds', (_, duration, ms) => {
  expect(duration).toBe(ms)
})

test('eight hours later is eight elapsed hours', () => {
  expect(later(at, hours(8))).toEqual(new Date('2026-12-01T22:06:00Z'))
})

test('fifteen minutes earlier is fifteen elapsed minutes', () => {
  expect(earlier(at, minutes(15))).toEqual(new Date('2026-12-01T13:51:00Z'))
})

test('moving an instant leaves the instant itself alone', () => {
  const moved = new Date(at)
  later(moved, hours(1))
  earlier(moved, hours(1))
  expect(moved).toEqual(at)
})

test('the time since an instant is negative when the other comes first', () => {
  expect(since(at, new Date('2026-12-01T15:06:00Z'))).toBe(hours(1))
  expect(since(at, new Date('2026-12-01T13:06:00Z'))).toBe(hours(-1))
})

test('a plain number is not a duration', () => {
  // @ts-expect-error -- a number without a unit
  expect(later(at, 60_000)).toEqual(new Date('2026-12-01T14:07:00Z'))
})

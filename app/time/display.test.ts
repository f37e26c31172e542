import fc from 'fast-check'
import { expect, test } from 'vitest'
import {
  ageOn,
  showDate,
  showDateTime,
  showDay,
  showDuration,
  showOffset,
  showTime,
  showWeekdayDate,
} from './display.ts'
import { days, hours, minutes } from './duration.ts'

const at = (iso: string) => new Date(iso)

test.each([
  ['2026-01-31', '31-Jan-2026'],
  ['2026-05-05', '05-May-2026'],
  ['2026-09-09', '09-Sep-2026'],
  ['2026-12-01', '01-Dec-2026'],
])('%s is shown as %s', (day, shown) => {
  expect(showDay(day)).toBe(shown)
})

test('an instant is shown in the zone of the ward', () => {
  expect(showDate(at('2026-07-01T23:30:00Z'), 'Europe/London')).toBe('02-Jul-2026')
  expect(showTime(at('2026-07-01T23:30:00Z'), 'Europe/London')).toBe('00:30')
  expect(showDateTime(at('2026-12-01T14:06:59Z'), 'Europe/London')).toBe('01-Dec-2026 14:06')
  expect(showWeekdayDate(at('2026-12-01T14:06:00Z'), 'Europe/London')).toBe('Tue 01-Dec-2026')
  expect(showWeekdayDate(at('2026-12-01T14:06:00Z'), 'Australia/Sydney')).toBe('Wed 02-Dec-2026')
})

test('midnight is 00:00 of the new day', () => {
  expect(showDateTime(at('2026-12-02T00:00:00Z'), 'Europe/London')).toBe('02-Dec-2026 00:00')
})

test.each([
  [0, 'less than 1 min'],
  [minutes(1) - 1, 'less than 1 min'],
  [minutes(1), '1 min'],
  [minutes(36), '36 min'],
  [hours(1) - 1, '59 min'],
  [hours(1), '1 h'],
  [minutes(112), '1 h 52 min'],
  [hours(24) - 1, '23 h 59 min'],
  [days(1), '1 d'],
  [hours(51), '2 d 3 h'],
  [hours(51) + minutes(59), '2 d 3 h'],
  [minutes(-36), '36 min'],
])('%i ms is shown as %s', (ms, shown) => {
  expect(showDuration(ms)).toBe(shown)
})

test('a shown duration is never longer than the duration, and short of it by less than its last unit', () => {
  const units: Readonly<Record<string, number>> = { min: minutes(1), h: hours(1), d: days(1) }
  fc.assert(
    fc.property(fc.integer({ min: minutes(1), max: days(400) }), ms => {
      const parts = [...showDuration(ms).matchAll(/(\d+) (\w+)/g)]
      const shown = parts.reduce((sum, [, n, unit]) => sum + Number(n) * (units[unit ?? ''] ?? Number.NaN), 0)
      return shown <= ms && ms - shown < (ms < days(1) ? minutes(1) : hours(1))
    }),
  )
})

test.each([
  ['Europe/London', '2026-12-01T12:00:00Z', '+00:00'],
  ['Europe/London', '2026-07-01T12:00:00Z', '+01:00'],
  ['America/St_Johns', '2026-12-01T12:00:00Z', '-03:30'],
  ['Asia/Kathmandu', '2026-12-01T12:00:00Z', '+05:45'],
])('%s at %s has the offset %s', (zone, iso, shown) => {
  expect(showOffset(at(iso), zone)).toBe(shown)
})

test.each([
  ['1950-12-01', '2026-11-30', 75],
  ['1950-12-01', '2026-12-01', 76],
  ['2000-02-29', '2026-02-28', 25],
  ['2000-02-29', '2026-03-01', 26],
  ['2000-02-29', '2028-02-29', 28],
  ['2026-12-01', '2026-12-01', 0],
])('born on %s is on %s %i years old', (bornOn, on, age) => {
  expect(ageOn(bornOn, on)).toBe(age)
})

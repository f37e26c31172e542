import { expect, test } from 'vitest'
import { fullYear, labelDate, showLabelDate } from './gs1-dates.ts'

test.each([
  [2026, 0, 2000],
  [2026, 26, 2026],
  [2026, 76, 2076],
  [2026, 77, 1977],
  [2026, 99, 1999],
  [2050, 0, 2100],
  [2050, 1, 2001],
  [2050, 99, 2099],
  [2051, 0, 2100],
  [2051, 1, 2101],
  [2051, 2, 2002],
  [2099, 49, 2149],
  [2099, 50, 2050],
])('in %i the digits %i mean %i', (thisYear, twoDigits, year) => {
  expect(fullYear(twoDigits, thisYear)).toBe(year)
})

test.each([
  ['261201', '2026-12-01'],
  ['271231', '2027-12-31'],
  ['280229', '2028-02-29'],
  ['760229', '2076-02-29'],
  ['770228', '1977-02-28'],
])('%s on a label is %s', (digits, on) => {
  expect(labelDate(digits, '2026-12-01')).toEqual({ on, monthOnly: false })
})

test.each([
  ['271100', '2027-11-30'],
  ['270200', '2027-02-28'],
  ['280200', '2028-02-29'],
  ['261200', '2026-12-31'],
])('%s gives the month only and lasts to its end, %s', (digits, on) => {
  expect(labelDate(digits, '2026-12-01')).toEqual({ on, monthOnly: true })
})

test.each(['270230', '270229', '271301', '270001', '270000', '270132', '2712', '2712311', '27123A', '', '      '])(
  '"%s" is no date',
  digits => {
    expect(labelDate(digits, '2026-12-01')).toBeNull()
  },
)

test('whether 29 February exists is judged in the century that is meant', () => {
  expect(labelDate('000229', '2026-12-01')?.on).toBe('2000-02-29')
  expect(labelDate('000229', '2050-12-01')).toBeNull()
})

test('a date by the month says so', () => {
  expect(showLabelDate({ on: '2027-11-30', monthOnly: true })).toBe('30-Nov-2027 (label gives month only)')
  expect(showLabelDate({ on: '2027-12-31', monthOnly: false })).toBe('31-Dec-2027')
})

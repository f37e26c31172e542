import fc from 'fast-check'
import { expect, test } from 'vitest'
import {
  addDays,
  daysBetween,
  instantsOf,
  isLocalDay,
  isZone,
  localDay,
  localTime,
  offsetMinutes,
  startOfDay,
} from './zone.ts'

const at = (iso: string) => new Date(iso)

test.each([
  ['Europe/London', '2026-12-01T12:00:00Z', 0],
  ['Europe/London', '2026-07-01T12:00:00Z', 60],
  ['America/New_York', '2026-12-01T12:00:00Z', -300],
  ['Asia/Kathmandu', '2026-12-01T12:00:00Z', 345],
  ['Australia/Lord_Howe', '2026-12-01T12:00:00Z', 660],
  ['Australia/Lord_Howe', '2026-07-01T12:00:00Z', 630],
  ['UTC', '2026-07-01T12:00:00Z', 0],
])('%s at %s is %i minutes ahead of UTC', (zone, iso, minutes) => {
  expect(offsetMinutes(at(iso), zone)).toBe(minutes)
})

test('the offset changes at the very millisecond, also within an hour', () => {
  // Lord Howe goes forward at 02:00 local, half past the hour in UTC.
  expect(offsetMinutes(at('2026-10-03T15:29:59.999Z'), 'Australia/Lord_Howe')).toBe(630)
  expect(offsetMinutes(at('2026-10-03T15:30:00.000Z'), 'Australia/Lord_Howe')).toBe(660)
})

test('an unknown zone and an invalid date are refused', () => {
  expect(() => offsetMinutes(at('2026-12-01T12:00:00Z'), 'Europe/Nowhere')).toThrow(RangeError)
  expect(() => offsetMinutes(at('no date'), 'Europe/London')).toThrow(RangeError)
})

test.each([
  ['2026-07-01T23:30:00Z', 'Europe/London', '2026-07-02', '00:30'],
  ['2026-12-01T23:59:59Z', 'Europe/London', '2026-12-01', '23:59'],
  ['2026-12-02T04:59:00Z', 'America/New_York', '2026-12-01', '23:59'],
  ['2026-12-31T13:00:00Z', 'Australia/Sydney', '2027-01-01', '00:00'],
])('%s in %s is %s %s', (iso, zone, day, time) => {
  expect(localDay(at(iso), zone)).toBe(day)
  expect(localTime(at(iso), zone)).toBe(time)
})

test.each([
  ['2026-03-02', 28, '2026-03-30'],
  ['2028-02-10', 28, '2028-03-09'],
  ['2026-12-31', 1, '2027-01-01'],
  ['2026-03-01', -1, '2026-02-28'],
  ['2026-03-28', 1, '2026-03-29'],
])('%s and %i days is %s', (day, n, result) => {
  expect(addDays(day, n)).toBe(result)
})

test('days between two days are counted with their sign', () => {
  expect(daysBetween('2026-03-02', '2026-03-30')).toBe(28)
  expect(daysBetween('2026-03-30', '2026-03-02')).toBe(-28)
  expect(daysBetween('2026-10-24', '2026-10-26')).toBe(2)
})

test('adding days and counting them are each other backwards', () => {
  const day = fc.integer({ min: 0, max: 80_000 }).map(n => addDays('1900-01-01', n))
  fc.assert(
    fc.property(day, fc.integer({ min: -40_000, max: 40_000 }), (from, n) => daysBetween(from, addDays(from, n)) === n),
  )
})

test.each(['2026-12-01', '2028-02-29', '2000-02-29', '1926-01-31'])('%s is a calendar day', text => {
  expect(isLocalDay(text)).toBe(true)
})

test.each([
  '2026-02-29',
  '2100-02-29',
  '2026-04-31',
  '2026-13-01',
  '2026-00-10',
  '2026-01-00',
  '01-12-2026',
  '2026-1-2',
  '',
])('"%s" is not a calendar day', text => {
  expect(isLocalDay(text)).toBe(false)
})

test('an ordinary local time is one instant', () => {
  expect(instantsOf('2026-12-01', '14:06', 'America/New_York')).toEqual({ kind: 'one', at: at('2026-12-01T19:06:00Z') })
})

test('a time that the clock shows twice gives both instants in order', () => {
  expect(instantsOf('2026-10-25', '01:30', 'Europe/London')).toEqual({
    kind: 'two',
    first: at('2026-10-25T00:30:00Z'),
    second: at('2026-10-25T01:30:00Z'),
  })
})

test('a time that the clock jumps over gives the readings before and after the jump', () => {
  expect(instantsOf('2026-03-29', '01:30', 'Europe/London')).toEqual({
    kind: 'none',
    before: at('2026-03-29T00:30:00Z'),
    after: at('2026-03-29T01:30:00Z'),
  })
})

test.each([
  ['2026-03-29', '00:59', '2026-03-29T00:59:00Z'],
  ['2026-03-29', '02:00', '2026-03-29T01:00:00Z'],
  ['2026-10-25', '00:59', '2026-10-24T23:59:00Z'],
  ['2026-10-25', '02:00', '2026-10-25T02:00:00Z'],
])('%s %s, at the edge of a change of clocks, is one instant', (day, time, iso) => {
  expect(instantsOf(day, time, 'Europe/London')).toEqual({ kind: 'one', at: at(iso) })
})

test.each([
  ['2026-02-30', '12:00'],
  ['2026-02-28', '24:00'],
  ['2026-02-28', '7:00'],
])('%s %s is on no clock and is refused', (day, time) => {
  expect(() => instantsOf(day, time, 'Europe/London')).toThrow(RangeError)
})

test.each([
  ['2026-03-29', 'Europe/London', '2026-03-29T00:00:00Z'],
  ['2026-03-30', 'Europe/London', '2026-03-29T23:00:00Z'],
  // Cairo's clocks jump from midnight to one.
  ['2026-04-24', 'Africa/Cairo', '2026-04-23T22:00:00Z'],
  // Havana's clocks go back from one to midnight, so that midnight comes twice.
  ['2026-11-01', 'America/Havana', '2026-11-01T04:00:00Z'],
  // Apia left out 30 December 2011.
  ['2011-12-30', 'Pacific/Apia', '2011-12-30T10:00:00Z'],
])('%s in %s starts at %s', (day, zone, iso) => {
  expect(startOfDay(day, zone)).toEqual(at(iso))
})

test('a zone is known by its IANA name', () => {
  expect(isZone('Europe/London')).toBe(true)
  expect(isZone('Europe/Nowhere')).toBe(false)
  expect(isZone('')).toBe(false)
})

// Time against temporal-polyfill, an implementation of the TC39 Temporal proposal with the same tz database.
import fc from 'fast-check'
import { Temporal } from 'temporal-polyfill'
import { expect, test } from 'vitest'
import { ageOn, showOffset } from '#app/time/display.ts'
import { hours, later, since } from '#app/time/duration.ts'
import { shiftAt } from '#app/time/shift.ts'
import { addDays, instantsOf, localDay, localTime, offsetMinutes, startOfDay } from '#app/time/zone.ts'

const zones = ['Europe/London', 'Australia/Sydney', 'America/New_York', 'Australia/Lord_Howe', 'Africa/Cairo', 'UTC']
const zone = fc.constantFrom(...zones)
const instant = fc.date({
  min: new Date('1995-01-01T00:00:00Z'),
  max: new Date('2060-01-01T00:00:00Z'),
  noInvalidDate: true,
})
const minuteOfDay = fc.integer({ min: 0, max: 1439 })

function timeOf(minute: number): string {
  return [Math.floor(minute / 60), minute % 60].map(part => String(part).padStart(2, '0')).join(':')
}

function byTemporal(day: string, time: string, where: string, disambiguation: 'earlier' | 'later' | 'reject'): Date {
  const zoned = Temporal.PlainDateTime.from(`${day}T${time}`).toZonedDateTime(where, { disambiguation })
  return new Date(zoned.epochMilliseconds)
}

function localOf(at: Date, where: string): string {
  return `${localDay(at, where)}T${localTime(at, where)}${showOffset(at, where)}`
}

function onlyInstant(day: string, time: string, where: string): Date {
  const instants = instantsOf(day, time, where)
  if (instants.kind !== 'one') throw new Error(`${day} ${time} is not one instant in ${where}`)
  return instants.at
}

// Temporal, luxon and the other Temporal polyfill agree on these.
test.each([
  ['C-31', 'Europe/London', '2026-03-28', '22:00', 8, '2026-03-29T07:00+01:00'],
  ['C-32', 'Europe/London', '2026-10-24', '22:00', 8, '2026-10-25T05:00+00:00'],
  ['C-33', 'America/New_York', '2026-03-07', '23:00', 8, '2026-03-08T08:00-04:00'],
  ['Sydney, spring', 'Australia/Sydney', '2026-10-03', '22:00', 8, '2026-10-04T07:00+11:00'],
  ['Sydney, autumn', 'Australia/Sydney', '2026-04-04', '22:00', 8, '2026-04-05T05:00+10:00'],
  ['New York, autumn', 'America/New_York', '2026-10-31', '22:00', 12, '2026-11-01T09:00-05:00'],
  ['Lord Howe, spring', 'Australia/Lord_Howe', '2026-10-03', '22:00', 8, '2026-10-04T06:30+11:00'],
])('%s: in %s, done on %s at %s, %i elapsed hours later is %s', (_, where, day, time, n, expected) => {
  const dueAt = later(onlyInstant(day, time, where), hours(n))
  const reference = Temporal.PlainDateTime.from(`${day}T${time}`).toZonedDateTime(where).add({ hours: n })
  expect(localOf(dueAt, where)).toBe(expected)
  expect(reference.toString({ smallestUnit: 'minute', timeZoneName: 'never' })).toBe(expected)
})

test('the offset and the local day and time agree with Temporal at any instant', () => {
  fc.assert(
    fc.property(instant, zone, (at, where) => {
      const zoned = Temporal.Instant.fromEpochMilliseconds(at.getTime()).toZonedDateTimeISO(where)
      expect(offsetMinutes(at, where)).toBe(zoned.offsetNanoseconds / 60e9)
      expect(localDay(at, where)).toBe(zoned.toPlainDate().toString())
      expect(localTime(at, where)).toBe(zoned.toPlainTime().toString({ smallestUnit: 'minute', roundingMode: 'trunc' }))
    }),
    { numRuns: 500 },
  )
})

test('a local time has one, two or no instants just where Temporal finds it plain, ambiguous or missing', () => {
  // Days around the changes of clocks, where a uniform choice would seldom land.
  const day = fc
    .tuple(
      fc.constantFrom(
        '2026-03-08',
        '2026-03-29',
        '2026-04-05',
        '2026-04-24',
        '2026-10-04',
        '2026-10-25',
        '2026-10-29',
        '2026-11-01',
      ),
      fc.integer({ min: -1, max: 1 }),
    )
    .map(([near, n]) => addDays(near, n))
  fc.assert(
    fc.property(day, minuteOfDay.map(timeOf), zone, (on, time, where) => {
      const [early, late] = [byTemporal(on, time, where, 'earlier'), byTemporal(on, time, where, 'later')]
      const isMissing =
        Temporal.PlainDateTime.from(`${on}T${time}`).toZonedDateTime(where).toPlainTime().toString().slice(0, 5) !==
        time
      const expected = isMissing
        ? { kind: 'none', before: early, after: late }
        : early.getTime() === late.getTime()
          ? { kind: 'one', at: early }
          : { kind: 'two', first: early, second: late }
      expect(instantsOf(on, time, where)).toEqual(expected)
    }),
    { numRuns: 1000 },
  )
})

test.each([
  ['Europe/London', '2026-10-25', '01:30', 'two'],
  ['Europe/London', '2026-03-29', '01:30', 'none'],
  ['Australia/Sydney', '2026-04-05', '02:30', 'two'],
  ['Australia/Sydney', '2026-10-04', '02:30', 'none'],
  ['America/New_York', '2026-11-01', '01:30', 'two'],
  ['America/New_York', '2026-03-08', '02:30', 'none'],
  ['Australia/Lord_Howe', '2026-04-05', '01:45', 'two'],
  ['Australia/Lord_Howe', '2026-10-04', '02:15', 'none'],
])('in %s, %s %s is refused by Temporal and reported here as %s', (where, day, time, kind) => {
  expect(() => byTemporal(day, time, where, 'reject')).toThrow(RangeError)
  expect(instantsOf(day, time, where).kind).toBe(kind)
})

test.each([
  ['2026-10-24', 13],
  ['2026-03-28', 11],
  ['2026-12-01', 12],
])('the night of %s from 19:30 to 07:30 lasts %i h in London', (day, length) => {
  const night = shiftAt(onlyInstant(day, '23:00', 'Europe/London'), ['07:30', '19:30'], 'Europe/London')
  const [start, end] = [
    byTemporal(day, '19:30', 'Europe/London', 'reject'),
    byTemporal(addDays(day, 1), '07:30', 'Europe/London', 'reject'),
  ]
  expect(night).toEqual({ startsAt: start, endsAt: end, label: 'Shift from 19:30' })
  expect(since(night.startsAt, night.endsAt)).toBe(hours(length))
})

test('a day starts where Temporal says it starts', () => {
  const day = fc.integer({ min: 0, max: 20_000 }).map(n => addDays('1995-01-01', n))
  fc.assert(
    fc.property(day, zone, (on, where) => {
      const start = Temporal.PlainDate.from(on).toZonedDateTime(where).startOfDay()
      expect(startOfDay(on, where).getTime()).toBe(start.epochMilliseconds)
    }),
    { numRuns: 500 },
  )
})

test.each([
  ['2000-02-29', '2026-02-28', 25],
  ['2000-02-29', '2026-03-01', 26],
  ['2000-02-29', '2028-02-28', 27],
  ['1950-12-01', '2026-12-01', 76],
])('born on %s, on %s a person is %i years old', (bornOn, on, age) => {
  expect(ageOn(bornOn, on)).toBe(age)
})

test('ages agree with Temporal', () => {
  const day = (from: string, span: number) => fc.integer({ min: 0, max: span }).map(n => addDays(from, n))
  fc.assert(
    fc.property(day('1920-01-01', 38_000), day('2025-01-01', 12_000), (bornOn, on) => {
      const { years } = Temporal.PlainDate.from(bornOn).until(on, { largestUnit: 'years' })
      expect(ageOn(bornOn, on)).toBe(years)
    }),
    { numRuns: 500 },
  )
})

import fc from 'fast-check'
import { expect, test } from 'vitest'
import { hours, since } from './duration.ts'
import { nextShift, shiftAt, shiftTimesProblem } from './shift.ts'

const at = (iso: string) => new Date(iso)
const london = 'Europe/London'
const threeShifts = ['07:00', '15:00', '23:00']
const twoShifts = ['07:30', '19:30']

test.each([
  ['2026-12-01T07:00:00Z', '2026-12-01T07:00:00Z', '2026-12-01T15:00:00Z', 'Shift from 07:00'],
  ['2026-12-01T14:59:59Z', '2026-12-01T07:00:00Z', '2026-12-01T15:00:00Z', 'Shift from 07:00'],
  ['2026-12-01T15:00:00Z', '2026-12-01T15:00:00Z', '2026-12-01T23:00:00Z', 'Shift from 15:00'],
  ['2026-12-01T23:30:00Z', '2026-12-01T23:00:00Z', '2026-12-02T07:00:00Z', 'Shift from 23:00'],
  ['2026-12-02T03:00:00Z', '2026-12-01T23:00:00Z', '2026-12-02T07:00:00Z', 'Shift from 23:00'],
])('%s belongs to the shift from %s to %s', (iso, startsAt, endsAt, label) => {
  expect(shiftAt(at(iso), threeShifts, london)).toEqual({ startsAt: at(startsAt), endsAt: at(endsAt), label })
})

test('a night over the autumn change of clocks lasts thirteen hours', () => {
  const night = shiftAt(at('2026-10-25T01:00:00Z'), twoShifts, london)
  expect(night.startsAt).toEqual(at('2026-10-24T18:30:00Z'))
  expect(since(night.startsAt, night.endsAt)).toBe(hours(13))
})

test('a night over the spring change of clocks lasts eleven hours', () => {
  const night = shiftAt(at('2026-03-29T00:30:00Z'), twoShifts, london)
  expect(night.startsAt).toEqual(at('2026-03-28T19:30:00Z'))
  expect(since(night.startsAt, night.endsAt)).toBe(hours(11))
})

test('the next shift starts as this one ends', () => {
  const late = shiftAt(at('2026-12-01T16:00:00Z'), threeShifts, london)
  expect(nextShift(late, threeShifts, london)).toEqual({
    startsAt: at('2026-12-01T23:00:00Z'),
    endsAt: at('2026-12-02T07:00:00Z'),
    label: 'Shift from 23:00',
  })
})

test('a start that the clock shows twice counts the first time', () => {
  expect(shiftAt(at('2026-10-25T01:45:00Z'), ['01:30', '13:30'], london).startsAt).toEqual(at('2026-10-25T00:30:00Z'))
})

test('a start that the clock jumps over counts after the jump', () => {
  expect(shiftAt(at('2026-03-29T02:00:00Z'), ['01:30', '13:30'], london).startsAt).toEqual(at('2026-03-29T01:30:00Z'))
})

test('a ward with one start has one shift a day', () => {
  const shift = shiftAt(at('2026-12-01T06:00:00Z'), ['07:00'], london)
  expect([shift.startsAt, shift.endsAt]).toEqual([at('2026-11-30T07:00:00Z'), at('2026-12-01T07:00:00Z')])
})

test('a ward without starts has no shift', () => {
  expect(() => shiftAt(at('2026-12-01T06:00:00Z'), [], london)).toThrow(RangeError)
})

test('a shift can be changed by its reader without harm to the next reader', () => {
  shiftAt(at('2026-12-01T08:00:00Z'), threeShifts, london).startsAt.setTime(0)
  expect(shiftAt(at('2026-12-01T08:00:00Z'), threeShifts, london).startsAt).toEqual(at('2026-12-01T07:00:00Z'))
})

test('shifts tile time: an instant is in its shift, and shifts follow each other without gap or overlap', () => {
  // Besides ordinary zones: one that skipped a day, one that went back over midnight, one that jumps over midnight, half-hour changes.
  const zone = fc.constantFrom(
    london,
    'America/New_York',
    'Pacific/Apia',
    'America/St_Johns',
    'Africa/Cairo',
    'Australia/Lord_Howe',
  )
  const times = fc.constantFrom(
    threeShifts,
    twoShifts,
    ['00:00'],
    ['00:30', '12:30'],
    ['01:30', '09:30', '17:30'],
    ['02:00', '23:30'],
  )
  const instant = fc.date({ min: at('2008-01-01T00:00:00Z'), max: at('2040-01-01T00:00:00Z'), noInvalidDate: true })
  fc.assert(
    fc.property(instant, times, zone, (now, starts, where) => {
      const shift = shiftAt(now, starts, where)
      const last = new Date(shift.endsAt.getTime() - 1)
      expect(shift.startsAt <= now && now < shift.endsAt).toBe(true)
      expect(shiftAt(shift.startsAt, starts, where)).toEqual(shift)
      expect(shiftAt(last, starts, where)).toEqual(shift)
      expect(nextShift(shift, starts, where).startsAt).toEqual(shift.endsAt)
    }),
    { numRuns: 300 },
  )
})

test('shifts follow each other when Apia skipped 30 December', () => {
  expect(startsAfter('2011-12-29T00:00:00Z', 'Pacific/Apia')).toEqual([
    at('2011-12-29T10:00:00Z'),
    at('2011-12-29T22:00:00Z'),
    at('2011-12-30T10:00:00Z'),
    at('2011-12-30T22:00:00Z'),
  ])
})

test("shifts follow each other when St John's went back over midnight", () => {
  expect(startsAfter('2010-11-06T15:00:00Z', 'America/St_Johns')).toEqual([
    at('2010-11-07T02:30:00Z'),
    at('2010-11-07T15:30:00Z'),
    at('2010-11-08T03:30:00Z'),
    at('2010-11-08T15:30:00Z'),
  ])
})

function startsAfter(iso: string, zone: string): Date[] {
  const times = ['00:00', '12:00']
  let shift = shiftAt(at(iso), times, zone)
  return Array.from({ length: 4 }, () => {
    shift = nextShift(shift, times, zone)
    return shift.startsAt
  })
}

test.each([[threeShifts], [twoShifts], [['07:00']], [['00:00', '04:00', '08:00', '12:00', '16:00', '20:00']]])(
  'the starts %j are sound',
  times => {
    expect(shiftTimesProblem(times)).toBeUndefined()
  },
)

test.each([
  [[], 'Enter at least one shift start'],
  [['07:00', ''], 'Enter each start as a 24-hour time, such as 07:00'],
  [['7:00'], 'Enter 7:00 as a 24-hour time, such as 07:00'],
  [['07:00', '24:00'], 'Enter 24:00 as a 24-hour time, such as 07:00'],
  [['19:00', '07:00'], 'Enter the shift starts in order, each once'],
  [['07:00', '07:00'], 'Enter the shift starts in order, each once'],
  [['07:00', '10:59'], 'Shifts must be at least 4 hours long'],
  [['00:00', '12:00', '20:01'], 'Shifts must be at least 4 hours long'],
])('the starts %j are refused: %s', (times, problem) => {
  expect(shiftTimesProblem(times)).toBe(problem)
})

import { expect, test } from 'vitest'
import { hours, minutes } from '../time/duration.ts'
import { type Clock, dayClock, intervalClock, noClock, promptClock, shiftClock, sooner, suspended } from './clock.ts'
import type { Entry } from './kind.ts'
import { aContext, anEntry, aTube, at } from './make.ts'
import { readEntry } from './record.ts'
import { tubeChanges } from './tube-change/schema.ts'

const { ward, values } = aContext([], '12:00')

function done(when: string): Entry {
  const [entry] = readEntry(tubeChanges, anEntry(tubeChanges, when, aTube()))
  if (!entry) throw new Error('The tube of make.ts cannot be read')
  return entry
}

function windowOf(clock: Clock) {
  if (clock.state !== 'running') throw new Error(`The clock is ${clock.state}`)
  return clock.window
}

const start = at('2026-03-01 08:00')

test('an interval counts from the last act', () => {
  const clock = intervalClock({ values, last: done('06:00'), start, interval: hours(8) })
  // domain check C-23
  expect(windowOf(clock)).toEqual({
    dueAt: at('14:00'),
    soonAt: at('13:00'),
    opensAt: at('13:00'),
    closesAt: at('15:00'),
    seriousAt: at('18:00'),
  })
})

test('an interval counts from the start when nothing was done, or only before it', () => {
  const never = intervalClock({ values, last: undefined, start, interval: hours(8) })
  const before = intervalClock({ values, last: done('2026-03-01 06:00'), start, interval: hours(8) })
  expect(windowOf(never).dueAt).toEqual(at('2026-03-01 16:00'))
  expect(windowOf(before).dueAt).toEqual(at('2026-03-01 16:00'))
})

test('a clock says why it is due sooner, or nothing', () => {
  expect(intervalClock({ values, last: undefined, start, interval: hours(2), because: 'two blocks' })).toMatchObject({
    because: 'two blocks',
  })
  expect(intervalClock({ values, last: undefined, start, interval: hours(2) })).not.toHaveProperty('because')
})

test.each([
  ['C-31', '2026-03-28 22:00', '2026-03-29 07:00'],
  ['C-32', '2026-10-24 22:00', '2026-10-25 05:00'],
])('%s: eight hours after %s on the ward clock is %s, across the change of clocks', (_, last, due) => {
  const clock = intervalClock({ values, last: done(last), start, interval: hours(8) })
  expect(windowOf(clock).dueAt).toEqual(at(due))
})

test('after an event a check is due at once and serious an hour after its time', () => {
  const clock = promptClock({ values, event: at('15:00'), within: minutes(15), last: undefined, because: 'inflated' })
  expect(windowOf(clock)).toEqual({
    dueAt: at('15:15'),
    soonAt: at('15:00'),
    opensAt: at('15:00'),
    closesAt: at('15:15'),
    seriousAt: at('16:15'),
  })
})

test.each([
  ['never done: the shift of admission', undefined, '2026-03-01 08:00', '2026-03-01 15:00'],
  ['done in the morning: the afternoon', '2026-03-10 09:00', '2026-03-10 15:00', '2026-03-10 23:00'],
  ['done at the very start of a shift: the next', '2026-03-10 15:00', '2026-03-10 23:00', '2026-03-11 07:00'],
  ['done in the last minute of a shift: the next', '2026-03-10 22:59', '2026-03-10 23:00', '2026-03-11 07:00'],
  ['done before the start: the shift of the start', '2026-03-01 07:30', '2026-03-01 08:00', '2026-03-01 15:00'],
])('once a shift, %s', (_, last, opensAt, closesAt) => {
  const window = windowOf(shiftClock({ values, last: last === undefined ? undefined : done(last), start, ward }))
  expect([window.opensAt, window.dueAt, window.closesAt]).toEqual([at(opensAt), at(closesAt), at(closesAt)])
})

test('a missed shift is serious four hours after its end', () => {
  const window = windowOf(shiftClock({ values, last: done('09:00'), start, ward }))
  expect(window.seriousAt).toEqual(at('2026-03-11 03:00'))
})

test('a night shift over the change of clocks is an hour shorter and still ends by the wall clock', () => {
  const window = windowOf(shiftClock({ values, last: done('2026-03-28 20:00'), start, ward }))
  expect(window.closesAt).toEqual(at('2026-03-29 07:00'))
  expect(window.closesAt.getTime() - window.opensAt.getTime()).toBe(hours(7))
})

test('by calendar day: due all day, overdue from midnight, serious a day later', () => {
  const clock = dayClock({ values, dueOn: '2026-03-30', soonDays: 7, ward, last: done('2026-03-02 10:00') })
  expect(clock).toMatchObject({ byDay: '2026-03-30' })
  expect(windowOf(clock)).toEqual({
    dueAt: at('2026-03-30 00:00'),
    soonAt: at('2026-03-23 00:00'),
    opensAt: at('2026-03-30 00:00'),
    closesAt: at('2026-03-31 00:00'),
    seriousAt: at('2026-04-01 00:00'),
  })
})

test('the day of a change of clocks is due from one local midnight to the next', () => {
  const window = windowOf(dayClock({ values, dueOn: '2026-03-29', soonDays: 1, ward, last: done('2026-03-02 10:00') }))
  expect(window.closesAt.getTime() - window.opensAt.getTime()).toBe(hours(23))
})

test('a policy of its own moves every sort of window', () => {
  const numbers = { 'lateness-middle-tolerance': 30, 'lateness-middle-soon': 90, 'lateness-middle-serious': 120 }
  const own = aContext([], '12:00', {
    policy: { ...numbers, 'lateness-event-serious': 15, 'lateness-day-serious': 3 },
  }).values
  expect(windowOf(intervalClock({ values: own, last: done('06:00'), start, interval: hours(8) }))).toEqual({
    dueAt: at('14:00'),
    soonAt: at('12:30'),
    opensAt: at('13:30'),
    closesAt: at('14:30'),
    seriousAt: at('16:00'),
  })
  const event = { event: at('15:00'), within: minutes(15), last: undefined, because: 'inflated' }
  expect(windowOf(promptClock({ values: own, ...event })).seriousAt).toEqual(at('15:30'))
  expect(windowOf(shiftClock({ values: own, last: done('09:00'), start, ward })).seriousAt).toEqual(
    at('2026-03-11 01:00'),
  )
  const byDay = dayClock({ values: own, dueOn: '2026-03-12', soonDays: 7, ward, last: done('2026-03-02 10:00') })
  expect(windowOf(byDay).seriousAt).toEqual(at('2026-03-16 00:00'))
})

const six = intervalClock({ values, last: undefined, start, interval: hours(6) })
const eight = intervalClock({ values, last: undefined, start, interval: hours(8) })
const still = suspended('cuff is down')

test.each([
  ['the first to fall due', six, eight, six],
  ['the first to fall due, in either order', eight, six, six],
  ['the first given of two equal ones', six, { ...six, because: 'other' }, six],
  ['the one that runs', still, eight, eight],
  ['the one that runs, in either order', eight, still, eight],
  ['the one that runs rather than none', noClock, eight, eight],
  ['a suspended one rather than none', noClock, still, still],
  ['a suspended one rather than none, in either order', still, noClock, still],
])('of two clocks counts %s', (_, a: Clock, b: Clock, expected: Clock) => {
  expect(sooner(a, b)).toEqual(expected)
})

test('the first to fall due counts from the later of two moments, so that an event is not put off before it happened', () => {
  const turned = promptClock({ values, event: at('15:00'), within: minutes(15), last: undefined, because: 'turned' })
  expect(sooner(six, turned)).toMatchObject({ window: windowOf(six), from: at('15:00') })
})

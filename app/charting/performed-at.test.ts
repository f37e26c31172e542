import { expect, test } from 'vitest'
import type { ChartSpine } from './chart-form.ts'
import { type Calendar, performedAt, shortMoment } from './performed-at.ts'

const at = (text: string) => new Date(text)

const calendar: Calendar = {
  zone: 'Europe/London',
  now: at('2026-12-01T14:06:40Z'),
  beganAt: at('2026-10-01T08:00:30Z'),
  endedAt: null,
}

function spine(more: Partial<ChartSpine>): ChartSpine {
  return {
    id: '01939d4e-0000-7000-8000-000000000001',
    openedBy: '01939d4e-0000-7000-8000-000000000002',
    at: '2026-12-01T14:06:40.000Z',
    when: 'now',
    ...more,
  }
}

const other = (day: string, time: string, more: Partial<ChartSpine> = {}) =>
  spine({ when: 'other', day, time, ...more })

test.each([
  ['now', spine({}), '2026-12-01T14:06:00.000Z'],
  ['ten minutes before the moment shown', spine({ when: '10 min ago' }), '2026-12-01T13:56:00.000Z'],
  ['thirty minutes before it', spine({ when: '30 min ago' }), '2026-12-01T13:36:00.000Z'],
  ['another time of the same day', other('2026-12-01', '09:15'), '2026-12-01T09:15:00.000Z'],
  ['a summer time', other('2026-10-20', '09:15'), '2026-10-20T08:15:00.000Z'],
  ['one minute ahead of the server', other('2026-12-01', '14:07'), '2026-12-01T14:07:00.000Z'],
  ['the first of two readings', other('2026-10-25', '01:30', { occurrence: 'first' }), '2026-10-25T00:30:00.000Z'],
  ['the second of two readings', other('2026-10-25', '01:30', { occurrence: 'second' }), '2026-10-25T01:30:00.000Z'],
  ['the minute in which the stay began', other('2026-10-01', '09:00'), '2026-10-01T08:00:30.000Z'],
])('is %s', (_case, form, expected) => {
  expect(performedAt(form, calendar)).toEqual({ ok: true, at: at(expected) })
})

test.each([
  ['a time to come', other('2026-12-01', '14:09'), 'time', /has not come yet: it is 01-Dec-2026 14:06/],
  ['a shown moment to come', spine({ at: '2026-12-01T14:20:00.000Z' }), 'when', /has not come yet/],
  ['a time before the stay', other('2026-10-01', '08:59'), 'time', /began on 01-Oct-2026 09:00/],
  ['no day', spine({ when: 'other', time: '09:15' }), 'day', /Enter the day/],
  ['no time', spine({ when: 'other', day: '2026-12-01' }), 'time', /Enter the time/],
])('refuses %s at its field', (_case, form, field, message) => {
  expect(performedAt(form, calendar)).toMatchObject({ ok: false, field, message: expect.stringMatching(message) })
})

test('a time that the clocks show twice is asked about', () => {
  expect(performedAt(other('2026-10-25', '01:30'), calendar)).toEqual({
    ok: false,
    field: 'occurrence',
    message: 'Clocks went back on 25-Oct-2026 and showed 01:30 twice. Choose which.',
    asks: { first: 'First 01:30 (UTC +01:00)', second: 'Second 01:30 (UTC +00:00)' },
  })
})

test('a time that the clocks jump past is refused, and both readings of it are named', () => {
  const early = { ...calendar, beganAt: at('2026-03-01T08:00:00Z') }
  expect(performedAt(other('2026-03-29', '01:30'), early)).toMatchObject({
    ok: false,
    field: 'time',
    message: 'Clocks went forward on 29-Mar-2026 and never showed 01:30. It may have been 00:30 or 02:30.',
  })
})

test('nothing is charted after the end of a stay', () => {
  const ended = { ...calendar, endedAt: at('2026-11-30T10:00:00Z') }
  expect(performedAt(other('2026-11-30', '10:00'), ended)).toMatchObject({ ok: true })
  expect(performedAt(other('2026-11-30', '10:01'), ended)).toMatchObject({
    ok: false,
    field: 'time',
    message: 'The stay ended on 30-Nov-2026 10:00. Enter a time before that.',
  })
})

test('a moment of another day is shown with its day', () => {
  expect(shortMoment(at('2026-12-01T00:00:00Z'), calendar.now, calendar.zone)).toBe('00:00')
  expect(shortMoment(at('2026-11-30T23:59:00Z'), calendar.now, calendar.zone)).toBe('30-Nov-2026 23:59')
})

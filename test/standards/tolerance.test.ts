// No tracheostomy guideline gives a grace time. The tolerance follows ISMP 2011, acute care guidelines for timely administration of
// scheduled medication (read second-hand), as the policy adopts it by default; when a task is seriously overdue is a product proposal.
import { expect, test } from 'vitest'
import { lateness } from '#app/care/lateness.ts'
import { aContext } from '#app/care/make.ts'
import { earlier, hours, later, minutes } from '#app/time/duration.ts'

const { values } = aContext([], '12:00')

test('C-23 done at 06:00 and due every 8 h: on time 13:00 to 15:00, overdue after, seriously overdue after 18:00', () => {
  const dueAt = later(new Date('2026-12-01T06:00:00Z'), hours(8))
  const { tolerance, seriousAfter } = lateness(hours(8), values)
  expect(dueAt).toEqual(new Date('2026-12-01T14:00:00Z'))
  expect(earlier(dueAt, tolerance)).toEqual(new Date('2026-12-01T13:00:00Z'))
  expect(later(dueAt, tolerance)).toEqual(new Date('2026-12-01T15:00:00Z'))
  expect(later(dueAt, seriousAfter)).toEqual(new Date('2026-12-01T18:00:00Z'))
})

// ISMP: more often than every 4 hours, a quarter of the interval.
test('C-27 a task due every 2 h has a tolerance of 30 min', () => {
  expect(lateness(hours(2), values).tolerance).toBe(minutes(30))
})

// ISMP: daily, weekly and monthly, two hours.
test('C-28 a task due every 24 h has a tolerance of 120 min', () => {
  expect(lateness(hours(24), values).tolerance).toBe(minutes(120))
})

// ISMP: every 4 hours or longer but more often than daily, one hour.
test.each([4, 8, 12])('a task due every %i h has a tolerance of 60 min', n => {
  expect(lateness(hours(n), values).tolerance).toBe(minutes(60))
})

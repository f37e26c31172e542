import { expect, test } from 'vitest'
import { utcDate } from './calendar.ts'

test('a day without a zone is read and written in UTC', () => {
  expect(utcDate('2026-07-01').toISOString()).toBe('2026-07-01T00:00:00.000Z')
})

test('the weekday of an instant is the one of UTC', () => {
  expect(utcDate(Date.parse('2026-12-01T23:59:59Z')).day()).toBe(2)
})

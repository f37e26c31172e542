import { expect, test } from 'vitest'
import { statusOf } from './status.ts'

const at = (time: string) => new Date(`2026-12-01T${time}Z`)

// Inner cannula done 06:00, every 8 hours: due 14:00 with 60 minutes either side, serious 4 hours after it was due.
const window = { soonAt: at('13:00:00'), opensAt: at('13:00:00'), closesAt: at('15:00:00'), seriousAt: at('18:00:00') }

test.each([
  ['12:59:59', 'upcoming'],
  ['13:00:00', 'due'],
  ['15:00:00', 'due'],
  ['15:01:00', 'overdue'],
  ['18:00:00', 'overdue'],
  ['18:01:00', 'seriously overdue'],
])('at %s a task due from 13:00 to 15:00 is %s', (time, status) => {
  expect(statusOf(window, at(time))).toBe(status)
})

test('a task is due soon before its window opens when its rule gives notice', () => {
  expect(statusOf({ ...window, soonAt: at('09:00:00') }, at('09:00:00'))).toBe('due soon')
  expect(statusOf({ ...window, soonAt: at('09:00:00') }, at('08:59:59'))).toBe('upcoming')
})

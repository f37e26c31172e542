import { expect, test } from 'vitest'
import { changeByDay, daysLeft, dwellDay, dwellStage } from './dwell.ts'

const notice = { noticeDays: 7, strongDays: 2 }

test('the day of insertion is day 0', () => {
  expect(dwellDay('2026-03-02', '2026-03-02')).toBe(0)
  expect(dwellDay('2026-03-02', '2026-03-03')).toBe(1)
})

test('a change of clocks adds no day', () => {
  expect(dwellDay('2026-10-24', '2026-10-26')).toBe(2)
})

test('days are left until the change-by day', () => {
  expect(changeByDay('2026-03-02', 28)).toBe('2026-03-30')
  expect(daysLeft('2026-03-02', 28, '2026-03-30')).toBe(0)
  expect(daysLeft('2026-03-02', 28, '2026-03-31')).toBe(-1)
})

test.each([
  [8, 'quiet'],
  [7, 'notice'],
  [3, 'notice'],
  [2, 'strong'],
  [1, 'strong'],
  [0, 'limit day'],
  [-1, 'past limit'],
  [-30, 'past limit'],
] as const)('with %i days left the stage is %s', (left, stage) => {
  expect(dwellStage(left, notice)).toBe(stage)
})

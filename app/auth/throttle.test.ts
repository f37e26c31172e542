import { expect, test } from 'vitest'
import { FREE_MISSES, missesThatCount, secondsToWait } from './throttle.ts'

const lastMissedAt = new Date('2026-12-01T02:00:00.000Z')

test.each([
  [0, 0],
  [4, 0],
  [5, 1],
  [6, 2],
  [7, 4],
  [8, 8],
  [10, 32],
  [11, 60],
  [500, 60],
])('after %i misses the next attempt waits %i s', (misses, seconds) => {
  expect(secondsToWait({ misses, lastMissedAt }, FREE_MISSES.account, lastMissedAt)).toBe(seconds)
})

test.each([
  ['2026-12-01T02:00:07.000Z', 1],
  ['2026-12-01T02:00:07.001Z', 1],
  ['2026-12-01T02:00:08.000Z', 0],
  ['2026-12-01T02:00:09.000Z', 0],
])('at %s an account with eight misses waits %i s more', (now, seconds) => {
  expect(secondsToWait({ misses: 8, lastMissedAt }, FREE_MISSES.account, new Date(now))).toBe(seconds)
})

test('an address that a ward shares is given twenty misses', () => {
  expect(secondsToWait({ misses: 19, lastMissedAt }, FREE_MISSES.address, lastMissedAt)).toBe(0)
  expect(secondsToWait({ misses: 20, lastMissedAt }, FREE_MISSES.address, lastMissedAt)).toBe(1)
})

test('misses are forgotten a quarter of an hour after the last', () => {
  expect(missesThatCount({ misses: 9, lastMissedAt }, new Date('2026-12-01T02:14:59.999Z'))).toBe(9)
  expect(missesThatCount({ misses: 9, lastMissedAt }, new Date('2026-12-01T02:15:00.000Z'))).toBe(0)
})

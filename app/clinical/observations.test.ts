import { expect, test } from 'vitest'
import { hasFallen, isBelowTarget, isPlausibleSpo2 } from './observations.ts'

test.each([
  [39, false],
  [40, true],
  [100, true],
  [101, false],
])('SpO2 %i %% can be believed: %s', (percent, plausible) => {
  expect(isPlausibleSpo2(percent)).toBe(plausible)
})

test('the lower end of the target is within target', () => {
  expect(isBelowTarget(94, 94)).toBe(false)
  expect(isBelowTarget(93.9, 94)).toBe(true)
})

test.each([
  [97, 95, false],
  [97, 94, true],
  [94, 97, false],
])('from %i to %i %% counts as a fall: %s', (from, to, fallen) => {
  expect(hasFallen(from, to)).toBe(fallen)
})

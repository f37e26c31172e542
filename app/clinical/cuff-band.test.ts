import { expect, test } from 'vitest'
import { cuffClass } from './cuff-band.ts'

const usual = { lower: 20, upper: 30, veryLow: 15, veryHigh: 40 }

test.each([
  [0, 'very low'],
  [14.999, 'very low'],
  [15, 'low'],
  [19.999, 'low'],
  [20, 'in range'],
  [30, 'in range'],
  [30.001, 'high'],
  [40, 'high'],
  [40.001, 'very high'],
  [120, 'very high'],
] as const)('%d cmH2O is %s of 20 to 30', (cmH2O, stands) => {
  expect(cuffClass(cmH2O, usual)).toBe(stands)
})

test("a patient's own low target is in range though it reaches below the very low limit", () => {
  const own = { ...usual, lower: 10, upper: 14 }
  expect(cuffClass(12, own)).toBe('in range')
  expect(cuffClass(9, own)).toBe('very low')
  expect(cuffClass(16, own)).toBe('high')
})

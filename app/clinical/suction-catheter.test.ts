import fc from 'fast-check'
import { expect, test } from 'vitest'
import { catheterRatio, isTooLarge, largestCatheter, quickRuleFr } from './suction-catheter.ts'

const half = { stockedFr: [5, 6, 8, 10, 12, 14, 16, 18], ratio: 0.5, strict: false }

test('a 12 Fr catheter takes exactly half of an 8 mm tube', () => {
  expect(catheterRatio(12, 8)).toBe(0.5)
})

test('no stocked size fits a tube that is too narrow', () => {
  expect(largestCatheter(3, half)).toBeUndefined()
})

test('the order of the stock does not matter', () => {
  expect(largestCatheter(8, { ...half, stockedFr: [14, 12, 6] })).toBe(12)
})

test('an exact fit is not lost to binary fractions', () => {
  // 3 x 0.5 x 4.4 is a little more than 6.6 in floating point, and 6.6 / 3 / 4.4 a little more than a half.
  const stocked = { ...half, stockedFr: [6.6] }
  expect(largestCatheter(4.4, stocked)).toBe(6.6)
  expect(largestCatheter(4.4, { ...stocked, strict: true })).toBeUndefined()
})

test('a size fits up to exactly one and a half times the inside diameter, and under the strict rule only below it', () => {
  fc.assert(
    fc.property(fc.integer({ min: 20, max: 120 }), fc.integer({ min: 10, max: 240 }), (idTenths, frTenths) => {
      // In tenths: Fr is at most 1.5 ID, as whole numbers 2 Fr is at most 3 ID.
      const [fr, id] = [frTenths / 10, idTenths / 10]
      expect(isTooLarge(fr, id, half)).toBe(2 * frTenths > 3 * idTenths)
      expect(isTooLarge(fr, id, { ...half, strict: true })).toBe(2 * frTenths >= 3 * idTenths)
    }),
  )
})

test('the quick rule is twice the inside diameter less two', () => {
  expect(quickRuleFr(7.5)).toBe(11)
})

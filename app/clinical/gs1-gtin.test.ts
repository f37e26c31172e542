import fc from 'fast-check'
import { expect, test } from 'vitest'
import { checkDigit, gtin14, hasCheckDigit, isGtin } from './gs1-gtin.ts'

test('the last digit is computed from those before it', () => {
  expect(checkDigit('0952123454321')).toBe(3)
  expect(checkDigit('0000000000000')).toBe(0)
})

test.each([
  ['09521230', true],
  ['09521231', false],
  ['095212345438', true],
  ['095212345439', false],
  ['9521234543213', true],
  ['9521234543214', false],
  ['09521234543213', true],
  ['09521234543231', false],
])('%s as an item number: %s', (digits, is) => {
  expect(isGtin(digits)).toBe(is)
})

test.each(['', '0', '00', '0952123', '095212345432139', '0952123454321A', ' 9521234543213', '٠٩٥٢١٢٣٤'])(
  '"%s" is no item number',
  text => {
    expect(isGtin(text)).toBe(false)
    expect(gtin14(text)).toBeNull()
  },
)

test('an item number is kept in 14 digits, whatever its length', () => {
  expect(gtin14('09521230')).toBe('00000009521230')
  expect(gtin14('9521234543213')).toBe('09521234543213')
  expect(gtin14('09521234543213')).toBe('09521234543213')
})

const digits = fc.string({ unit: fc.constantFrom(...Array.from('0123456789')), minLength: 7, maxLength: 17 })

test('one digit misread is always noticed', () => {
  fc.assert(
    fc.property(digits, fc.nat(), fc.integer({ min: 1, max: 9 }), (before, place, change) => {
      const right = before + checkDigit(before)
      const i = place % right.length
      const misread = right.slice(0, i) + ((Number(right[i]) + change) % 10) + right.slice(i + 1)
      expect(hasCheckDigit(right)).toBe(true)
      expect(hasCheckDigit(misread)).toBe(false)
    }),
  )
})

test('zeros before a number leave its check digit as it is', () => {
  fc.assert(fc.property(digits, before => checkDigit(`000${before}`) === checkDigit(before)))
})

import fc from 'fast-check'
import { expect, test } from 'vitest'
import { convertPressure, frenchToMm, fromCmH2O, pressureUnits, showPressure, toCmH2O } from './units.ts'

test('a pressure in its own unit is not touched', () => {
  expect(toCmH2O(30.1, 'cmH2O')).toBe(30.1)
  expect(convertPressure(0.1, 'kPa', 'kPa')).toBe(0.1)
})

test('zero is zero in every unit', () => {
  for (const unit of pressureUnits) expect(toCmH2O(0, unit)).toBe(0)
})

test('a pressure comes back from any unit as it went', () => {
  const unit = fc.constantFrom(...pressureUnits)
  fc.assert(
    fc.property(fc.double({ min: 0, max: 120, noNaN: true }), unit, unit, (value, from, to) => {
      expect(convertPressure(convertPressure(value, from, to), to, from)).toBeCloseTo(value, 9)
      expect(fromCmH2O(toCmH2O(value, from), from)).toBeCloseTo(value, 9)
    }),
  )
})

test.each([
  [26, 'cmH2O', '26 cmH2O'],
  [25.4, 'cmH2O', '25 cmH2O'],
  [22.5, 'mmHg', '23 mmHg'],
  [2.46, 'kPa', '2.5 kPa'],
  [2, 'kPa', '2 kPa'],
  [0, 'cmH2O', '0 cmH2O'],
] as const)('%d %s is shown as %s', (value, unit, shown) => {
  expect(showPressure(value, unit)).toBe(shown)
})

test('three French are a millimetre', () => {
  expect(frenchToMm(3)).toBe(1)
})

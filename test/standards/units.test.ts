// Pressure and French sizes against UCUM (its reference library by the US National Library of Medicine), and against published pairs.
import { UcumLhcUtils } from '@lhncbc/ucum-lhc'
import fc from 'fast-check'
import { expect, test } from 'vitest'
import {
  convertPressure,
  frenchToMm,
  fromCmH2O,
  type PressureUnit,
  pressureUnits,
  toCmH2O,
} from '#app/clinical/units.ts'
import { vacuumMmHg } from '#app/clinical/vacuum.ts'

const ucum = UcumLhcUtils.getInstance()
const ucumCode: Readonly<Record<PressureUnit, string>> = { cmH2O: 'cm[H2O]', mmHg: 'mm[Hg]', kPa: 'kPa' }

function inUcum(value: number, from: string, to: string): number {
  const { status, toVal } = ucum.convertUnitTo(from, value, to)
  if (status !== 'succeeded' || toVal === null) throw new Error(`UCUM does not convert ${from} to ${to}`)
  return toVal
}

const relativeError = (value: number, reference: number): number => Math.abs(value / reference - 1)

test('every pair of units agrees with UCUM to 1 in 100,000', () => {
  // UCUM rounds 1 mmHg to 133.322 Pa, which is 3 in a million below the definition.
  for (const from of pressureUnits) {
    for (const to of pressureUnits) {
      for (const value of [1, 15, 20, 22, 25, 30, 120]) {
        const reference = inUcum(value, ucumCode[from], ucumCode[to])
        expect(relativeError(convertPressure(value, from, to), reference)).toBeLessThan(1e-5)
      }
    }
  }
})

test('GNU units agrees: 1 cmH2O is 0.7355591353 mmHg', () => {
  // GNU units 2.22, "cm water" to "mmHg" with conventional mmHg of 133.3223874 Pa.
  expect(relativeError(fromCmH2O(1, 'mmHg'), 0.7355591353)).toBeLessThan(1e-9)
})

// NIST SP 811, table of conversion factors; printed factors from memory, recomputed from the definitions.
test.each([
  ['cmH2O', 'kPa', 0.0980665],
  ['mmHg', 'kPa', 0.1333224],
] as const)('NIST SP 811 agrees on 1 %s in %s', (from, to, factor) => {
  expect(convertPressure(1, from, to)).toBeCloseTo(factor, 7)
})

test.each([
  [20, 14.71],
  [25, 18.39],
  [30, 22.07],
])('C-01 %i cmH2O is %d mmHg', (cmH2O, mmHg) => {
  expect(fromCmH2O(cmH2O, 'mmHg')).toBeCloseTo(mmHg, 2)
})

test.each([
  [20, 27.19],
  [22, 29.91],
  [25, 33.99],
])('C-02 %i mmHg is %d cmH2O', (mmHg, cmH2O) => {
  expect(toCmH2O(mmHg, 'mmHg')).toBeCloseTo(cmH2O, 2)
})

test.each([
  [20, 1.961],
  [30, 2.942],
])('C-03 %i cmH2O is %d kPa', (cmH2O, kPa) => {
  expect(fromCmH2O(cmH2O, 'kPa')).toBeCloseTo(kPa, 3)
})

// NSW Agency for Clinical Innovation, suction of the adult patient (2014), equates 150 mmHg with 20 kPa.
test.each([
  [150, 20.0],
  [120, 16.0],
  [80, 10.67],
])('C-04 %i mmHg of suction is %d kPa', (mmHg, kPa) => {
  expect(convertPressure(mmHg, 'mmHg', 'kPa')).toBeCloseTo(kPa, 2)
})

// National Tracheostomy Safety Project, paediatric suction: 60-80 mmHg beside 8-10 kPa.
test.each([
  [20, 150.0],
  [8, 60.0],
])('C-05 %i kPa of suction is %d mmHg', (kPa, mmHg) => {
  expect(vacuumMmHg(kPa, 'kPa')).toBeCloseTo(mmHg, 1)
})

test('C-06 27 cmH2O to mmHg and back is 27 to nine decimals', () => {
  expect(toCmH2O(fromCmH2O(27, 'mmHg'), 'mmHg')).toBeCloseTo(27, 9)
})

// Seegobin & van Hasselt, BMJ 1984;288:965 print "30 cm H2O (22 mm Hg)".
test('C-51 30 cmH2O is 22 whole mmHg', () => {
  expect(Math.round(fromCmH2O(30, 'mmHg'))).toBe(22)
})

test.each([
  [6, 2.0],
  [10, 3.33],
  [12, 4.0],
  [14, 4.67],
  [18, 6.0],
])('C-10 %i Fr is %d mm, as the French gauge and UCUM say', (fr, mm) => {
  expect(frenchToMm(fr)).toBeCloseTo(mm, 2)
  expect(frenchToMm(fr)).toBeCloseTo(inUcum(fr, '[Ch]', 'mm'), 9)
})

test('conversion is proportional: twice the pressure is twice the figure', () => {
  const unit = fc.constantFrom(...pressureUnits)
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 120 }), unit, unit, (value, from, to) => {
      expect(convertPressure(2 * value, from, to)).toBeCloseTo(2 * convertPressure(value, from, to), 9)
    }),
  )
})

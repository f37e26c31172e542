import { expect, test } from 'vitest'
import { jacksonDual, jacksonMetal, laminarResistanceRatio } from './sizes.ts'

test('a wider inner diameter means less resistance', () => {
  expect(laminarResistanceRatio(6, 8)).toBeLessThan(1)
  expect(laminarResistanceRatio(8, 8)).toBe(1)
})

test('walls have a thickness: outside is wider than inside, and inside wider without the inner cannula', () => {
  for (const { idWithInnerMm, idWithoutInnerMm, odMm } of jacksonDual) {
    expect(odMm).toBeGreaterThan(idWithoutInnerMm)
    expect(idWithoutInnerMm).toBeGreaterThan(idWithInnerMm)
  }
})

test('French sizes of metal tubes are three times the outside diameter, within half a French', () => {
  for (const { odMm, fr } of jacksonMetal) expect(Math.abs(fr - 3 * odMm)).toBeLessThanOrEqual(0.5)
})

test('the two Jackson tables disagree, so neither may be used to convert', () => {
  const metal = jacksonMetal.find(row => row.jackson === '6')
  const dual = jacksonDual.find(row => row.jackson === 6)
  expect(metal?.odMm).not.toBe(dual?.odMm)
})

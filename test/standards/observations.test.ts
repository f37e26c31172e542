// British Thoracic Society guideline for oxygen use 2017: target 94-98 %, or 88-92 % with a risk of carbon dioxide retention; look at
// the patient when SpO2 falls by 3 % or more, or below target. Resistance: Poiseuille's law.
import { expect, test } from 'vitest'
import { hasFallen, isBelowTarget } from '#app/clinical/observations.ts'
import { laminarResistanceRatio } from '#app/clinical/sizes.ts'

test('C-46 from 8 mm to 6 mm inside diameter, laminar resistance grows 3.16 times', () => {
  expect(laminarResistanceRatio(8, 6)).toBeCloseTo(3.16, 2)
})

test('C-47 SpO2 of 93 % is below a target of 94-98 %', () => {
  expect(isBelowTarget(93, 94)).toBe(true)
})

test('C-47 a fall from 97 % to 94 % calls for a look, though within target', () => {
  expect(hasFallen(97, 94)).toBe(true)
  expect(isBelowTarget(94, 94)).toBe(false)
})

test('SpO2 of 90 % is within a target of 88-92 %', () => {
  expect(isBelowTarget(90, 88)).toBe(false)
})

// Cuff pressure classes against the publications that the default band rests on.
import { expect, test } from 'vitest'
import { type CuffBand, cuffClass } from '#app/clinical/cuff-band.ts'
import { toCmH2O } from '#app/clinical/units.ts'

// 20-30: Lizy 2014 (Am J Crit Care 23:e1) and BMC Anesthesiology 2015 (12871-015-0132-7). 15 is the lowest lower limit in print (NHS
// Greater Glasgow & Clyde, 15-30). That below 15 and above 40 are "very" far out is a product proposal.
const usual: CuffBand = { lower: 20, upper: 30, veryLow: 15, veryHigh: 40 }

test.each([
  [14.9, 'very low'],
  [15, 'low'],
  [19.9, 'low'],
  [20, 'in range'],
  [30, 'in range'],
  [30.1, 'high'],
  [40, 'high'],
  [40.1, 'very high'],
] as const)('C-07 %d cmH2O is %s', (cmH2O, stands) => {
  expect(cuffClass(cmH2O, usual)).toBe(stands)
})

// UK practice (teaching hospital training page; Critical Care Nurse review): 20-25.
test('C-08 26 cmH2O is high where the upper limit is 25', () => {
  expect(cuffClass(26, { ...usual, upper: 25 })).toBe('high')
})

// Nursing Standard 2015 prints 20-25 mmHg: the same figures as a common cmH2O range, a third more pressure.
test('C-09 25 read off a gauge in mmHg is 33.99 cmH2O and high', () => {
  expect(toCmH2O(25, 'mmHg')).toBeCloseTo(33.99, 2)
  expect(cuffClass(toCmH2O(25, 'mmHg'), usual)).toBe('high')
})

// Seegobin & van Hasselt, BMJ 1984;288:965: "30 cm H2O (22 mm Hg)" should not be exceeded.
test.each([
  [22, 'in range'],
  [23, 'high'],
] as const)('%i mmHg is %s: the limit of BMJ 1984 in its other unit', (mmHg, stands) => {
  expect(cuffClass(toCmH2O(mmHg, 'mmHg'), usual)).toBe(stands)
})

// Lizy 2014: of readings after a change of position, those above 30 cmH2O counted as too high.
test('readings above 30 are never in range, as Lizy 2014 counts them', () => {
  for (const cmH2O of [30.01, 31, 35, 50, 100]) expect(cuffClass(cmH2O, usual)).not.toBe('in range')
})

test('15 mmHg is in range once converted, though 15 cmH2O is low', () => {
  expect(cuffClass(toCmH2O(15, 'mmHg'), usual)).toBe('in range')
  expect(cuffClass(15, usual)).toBe('low')
})

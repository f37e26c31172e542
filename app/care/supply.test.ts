import { expect, test } from 'vitest'
import { supplyWords, timesADay, unidentified } from './supply.ts'

test.each([
  ['exchanger', 'Heat and moisture exchanger'],
  [unidentified.tube, 'Tube, not identified'],
  ['tube', undefined],
  ['toString', undefined],
  ['__proto__', undefined],
])('what is kept by the name %s is called %s', (name, words) => {
  expect(supplyWords(name)).toBe(words)
})

test('every eight hours is three times a day', () => {
  expect(timesADay(8)).toBe(3)
})

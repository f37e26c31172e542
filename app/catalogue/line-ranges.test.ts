import { expect, test } from 'vitest'
import { lineRanges } from './line-ranges.ts'

test.each([
  [[], ''],
  [[7], '7'],
  [[2, 3, 4, 7], '2 to 4, 7'],
  [[9, 2, 8, 3, 5], '2 to 3, 5, 8 to 9'],
])('lines %j are %s', (lines, words) => {
  expect(lineRanges(lines)).toBe(words)
})

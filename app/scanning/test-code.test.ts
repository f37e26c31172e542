import { expect, test } from 'vitest'
import { isWholeTestCode } from './test-code.ts'

test.each([
  [']d2010952123454321310SETUP\u001d21SEPARATOR', true, /came whole/],
  ['010952123454321310SETUP\u001d21SEPARATOR', true, /came whole/],
  [']d2010952123454321310SETUP21SEPARATOR', false, /separator did not come/],
  ['(01)09521234543213(10)SETUP(21)SEPARATOR', false, /separator did not come/],
  [']d20109521234543213', false, /not the test code/],
  ['x', false, /not the test code/],
  ['', false, /not the test code/],
])('%j proves a scanner: %s', (raw, isWhole, says) => {
  const test = isWholeTestCode(raw)
  expect(test.isWhole).toBe(isWhole)
  expect(test.says).toMatch(says)
})

import { expect, test } from 'vitest'
import { csvOf } from './lot-csv.ts'

test('cells keep their commas and quotes, and none is a formula', () => {
  expect(csvOf([['A,"b"', '=1+1', '-3', 'ok']])).toBe(`\uFEFF"A,""b""",'=1+1,'-3,ok\r\n`)
})

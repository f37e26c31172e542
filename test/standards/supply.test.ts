import { expect, test } from 'vitest'
import { needOver } from '#app/clinical/supply.ts'

// Clinical reference 7.2, check C-42: a disposable inner cannula twice a day, by the length of a month.
test.each([
  [28, 0, 56],
  [30, 0, 60],
  [31, 0, 62],
  [30, 20, 72],
])('C-42 two changes a day over %i days with a wastage of %i in a hundred need %i', (horizon, wastage, need) => {
  expect(needOver(2, horizon, wastage)).toBe(need)
})

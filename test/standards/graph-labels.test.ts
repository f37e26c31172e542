// Labels of axes against the worked examples of P. S. Heckbert, "Nice numbers for graph labels", Graphics Gems (1990), p. 61.
import { expect, test } from 'vitest'
import { niceTicks } from '#app/rules/plot-scale.ts'

test.each([
  ['data from 105 to 543: every 100 from 100 to 600', 105, 543, [100, 200, 300, 400, 500, 600]],
  ['data from 2.04 to 2.16: every 0.05 from 2.00 to 2.20', 2.04, 2.16, [2, 2.05, 2.1, 2.15, 2.2]],
])('%s', (_, from, to, ticks) => {
  expect(niceTicks({ from, to })).toEqual(ticks)
})

// As a port of the published program to C prints it for ten labels (github.com/qianfan-Zhao/nice_number, README).
test('data from -0.085 to 0.173 with ten labels: every 0.05 from -0.1 to 0.2', () => {
  expect(niceTicks({ from: -0.085, to: 0.173 }, 10)).toEqual([-0.1, -0.05, 0, 0.05, 0.1, 0.15, 0.2])
})

import { expect, test } from 'vitest'
import { plainFilling } from './examples.ts'
import { waterCuffUse } from './supplies.ts'

test.each([
  [5, ['syringe-10-ml', 'sterile-water']],
  [0, ['syringe-10-ml']],
])('a cuff emptied and filled with %i mL takes %j', (instilledMl, names) => {
  const used = names.map(supply => ({ item: { supply }, quantity: 1 }))
  expect(waterCuffUse({ ...plainFilling, instilledMl })).toEqual(used)
})

import { expect, test } from 'vitest'
import { supplyItems } from '../supply.ts'
import { plainSuction } from './examples.ts'
import { type SuctionData, suctionSchema } from './schema.ts'
import { suctionUse } from './supplies.ts'

test('an episode through the open tube takes one catheter, however many passes', () => {
  expect(suctionUse({ ...plainSuction, passes: 5 })).toEqual([{ item: { supply: 'catheter-12-fr' }, quantity: 1 }])
})

test.each<[string, SuctionData]>([
  ['a look at the need', { act: 'need only' }],
  ['a closed system', { ...plainSuction, route: 'tube closed' }],
  ['the mouth', { ...plainSuction, route: 'oral' }],
  ['the port above the cuff', { ...plainSuction, route: 'above cuff' }],
])('%s takes none', (_, data) => {
  expect(suctionUse(data)).toEqual([])
})

test('every size on the form is kept in the store', () => {
  const sizes = Object.keys(suctionSchema.shape.catheter.unwrap().enum)
  expect(sizes.length).toBeGreaterThan(5)
  const names = sizes.map(size => suctionUse({ ...plainSuction, catheter: size as SuctionData['catheter'] }))
  expect(names.map(([used]) => used && 'supply' in used.item && used.item.supply in supplyItems)).toEqual(
    sizes.map(() => true),
  )
})

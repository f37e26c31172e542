import { expect, test } from 'vitest'
import { tubeChangePlan } from '../care/tube-change-plan/kind.ts'
import { itemProblems } from './item-problems.ts'

const item = {
  id: '01a0fe4f-c072-7f38-a172-8d364b8703b8',
  line: 'Alder',
  formerLines: ['Rowan'],
  size: '8.0',
  fits: [],
}
const message = 'The scanned item is Alder 8.0. Scan the other one, or take the scan out.'

test.each([
  ['as it is called', 'Alder 8.0 ISO 5366, dual', []],
  ['as its line was called', 'Rowan 8.0', []],
  ['as somebody types it', 'size 8.0, alder', []],
  ['in another size', 'Alder 7.0', [{ field: 'care.newTube', message }]],
  ['of another line', 'Corvane 8.0', [{ field: 'care.newTube', message }]],
  ['not at all', undefined, [{ field: 'care.newTube', message }]],
])('a planned tube that was scanned may be named %s: %j', (_, newTube, problems) => {
  expect(itemProblems(tubeChangePlan, { newItem: item.id, newTube }, item)).toEqual(problems)
})

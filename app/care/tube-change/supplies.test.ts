import { expect, test } from 'vitest'
import { aContext, anEntry, aRemoval, aTube } from '../make.ts'
import { tubeChanges } from './schema.ts'
import { plannedTubes, tubeUse, usedTube } from './supplies.ts'

const tubeOf = (data: Parameters<typeof usedTube>[0]) => ({ item: usedTube(data), quantity: 1 })

test('a tube is known by its id, line, size, cuff and fenestration', () => {
  const item = '01890f3c-7d3b-7a44-8f10-2f1d0c9a6b11'
  expect(usedTube(aTube({ item, fenestrated: 'yes' }))).toEqual({
    ...{ device: 'tube', id: item, line: 'Alder', size: '8.0', cuff: 'air', fenestrated: 'yes' },
  })
})

test('a tube takes itself and its disposable inner cannula', () => {
  const data = aTube()
  const cannula = { device: 'inner cannula', line: 'Alder', size: '8.0', ofTube: usedTube(data) }
  expect(tubeUse(data)).toEqual([tubeOf(data), { item: cannula, quantity: 1 }])
})

test.each(['reusable', 'none', undefined] as const)('with inner cannula %s it takes the tube alone', innerCannula => {
  const data = aTube({ innerCannula })
  expect(tubeUse(data)).toEqual([tubeOf(data)])
})

test('one that did not go in is used up all the same; one that came with the patient was never ours', () => {
  expect(tubeUse(aTube({ difficulty: 'failed' }))).toHaveLength(2)
  expect(tubeUse(aTube({ reason: 'on arrival' }))).toEqual([])
})

test('the same tube is needed again by the end of its dwell', () => {
  const plannedOf = (...entries: Parameters<typeof aContext>[0]) => plannedTubes(aContext(entries, '12:00'))
  const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube({ longestUseDays: 20 }))
  expect(plannedOf(tube)).toEqual([{ item: usedTube(aTube()), perDay: 1 / 20 }])
  expect(plannedOf()).toEqual([])
  expect(plannedOf(tube, aRemoval('2026-03-09 10:00'))).toEqual([])
})

import { expect, test } from 'vitest'
import { aContext, anEntry, aRemoval, aTube } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { usualCheck } from './examples.ts'
import { type StomaData, stomaChecks } from './schema.ts'
import { plannedDressings, stomaUse } from './supplies.ts'

test.each<[Partial<StomaData>, readonly string[]]>([
  [{}, []],
  [{ dressing: 'changed' }, ['stoma-dressing']],
  [{ dressing: 'none' }, []],
  [{ holderChanged: 'yes' }, ['tube-holder']],
  [{ dressing: 'changed', holderChanged: 'yes' }, ['stoma-dressing', 'tube-holder']],
])('a check with %j takes %j', (overrides, names) => {
  expect(stomaUse({ ...usualCheck, ...overrides })).toEqual(names.map(supply => ({ item: { supply }, quantity: 1 })))
})

test('a dressing is needed each interval, unless the opening is left without one or the tube is out', () => {
  const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())
  const plannedOf = (...entries: Parameters<typeof aContext>[0]) =>
    plannedDressings(aContext(entries, '12:00', { policy: { 'dressing-change-interval': 12 } }))
  expect(plannedOf(tube)).toEqual([{ item: { supply: 'stoma-dressing' }, perDay: 2 }])
  expect(plannedOf(tube, anEntry(stomaChecks, '08:00', { ...usualCheck, dressing: 'none' }))).toEqual([])
  expect(plannedOf(tube, aRemoval('2026-03-09 10:00'))).toEqual([])
})

import { expect, test } from 'vitest'
import { aContext, anEntry, aRemoval, aTube } from '../make.ts'
import { usualCheck } from '../stoma-and-skin/examples.ts'
import { stomaChecks } from '../stoma-and-skin/schema.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { usualLook } from './examples.ts'
import { plannedTies, tieUse } from './supplies.ts'

test('a holder that was changed takes one', () => {
  expect(tieUse(usualLook)).toEqual([])
  expect(tieUse({ ...usualLook, changed: 'yes' })).toEqual([{ item: { supply: 'tube-holder' }, quantity: 1 }])
})

test('a holder is needed each interval, while a tube is in that is tied', () => {
  const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())
  const plannedOf = (...entries: Parameters<typeof aContext>[0]) =>
    plannedTies(aContext(entries, '12:00', { policy: { 'ties-change-interval': 48 } }))
  expect(plannedOf(tube)).toEqual([{ item: { supply: 'tube-holder' }, perDay: 0.5 }])
  expect(plannedOf(tube, anEntry(stomaChecks, '08:00', { ...usualCheck, ties: 'no ties' }))).toEqual([])
  expect(plannedOf(tube, aRemoval('2026-03-09 10:00'))).toEqual([])
  expect(plannedOf()).toEqual([])
})

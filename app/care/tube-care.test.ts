import { expect, test } from 'vitest'
import type { StoredEntry } from './kind.ts'
import { aContext, anEntry, aRemoval, aTube, at } from './make.ts'
import { careOfTubeFrom, tubeCareFrom } from './tube-care.ts'
import { tubeChanges } from './tube-change/schema.ts'
import { tubeInPlace } from './tube-change/tube.ts'

const tube = (when: string, overrides: Parameters<typeof aTube>[0] = {}) => anEntry(tubeChanges, when, aTube(overrides))
const arrival = {
  reason: 'on arrival',
  insertedOn: '2026-02-20',
  stomaMadeOn: '2026-02-10',
  technique: 'surgical',
} as const

test.each<[string, readonly StoredEntry[], string]>([
  ['no tube: admission', [], '2026-03-01 08:00'],
  ['a tube of before the stay: admission', [tube('2026-02-20 08:00')], '2026-03-01 08:00'],
  ['a tube in place on arrival: admission', [tube('2026-03-01 09:30', arrival)], '2026-03-01 08:00'],
  ['the first tube of the stay', [tube('2026-03-03 10:00')], '2026-03-03 10:00'],
  ['the first tube, not the change after it', [tube('2026-03-03 10:00'), tube('09:00')], '2026-03-03 10:00'],
  ['not a tube that did not go in', [tube('2026-03-03 10:00', { difficulty: 'failed' }), tube('09:00')], '09:00'],
  ['a tube after removal for good', [tube('2026-03-03 10:00'), aRemoval('06:00'), tube('09:00')], '09:00'],
])('care of a tube began with %s', (_, entries, began) => {
  expect(tubeCareFrom(aContext(entries, '12:00'))).toEqual(at(began))
})

test.each([
  ['2026-02-20 08:00', '2026-03-01 08:00'],
  ['2026-03-03 10:00', '2026-03-03 10:00'],
])('care of a tube that went in on %s began %s', (when, began) => {
  const context = aContext([tube(when)], '12:00')
  const inPlace = tubeInPlace(context.record)
  expect(inPlace && careOfTubeFrom(inPlace, context)).toEqual(at(began))
})

import { expect, test } from 'vitest'
import { personalValues } from '../care/care-plan/personal-values.ts'
import { type CarePlanData, carePlans } from '../care/care-plan/schema.ts'
import { cuffChecks } from '../care/cuff-pressure/schema.ts'
import type { StoredEntry } from '../care/kind.ts'
import { aContext, anEntry, aTube, at } from '../care/make.ts'
import { valuesFor } from '../care/policy.ts'
import { type TubeData, tubeChanges } from '../care/tube-change/schema.ts'
import { marksSince } from './views.ts'

const tube = (when: string, cuff: TubeData['cuff']) => anEntry(tubeChanges, when, aTube({ cuff }))
const cuff = (when: string, found: number) => anEntry(cuffChecks, when, { found, unit: 'cmH2O', method: 'manometer' })
const upper25: CarePlanData = {
  setting: 'cuff-pressure-upper-limit',
  step: 'set own value',
  value: 25,
  reviewOn: '2026-03-20',
  reason: 'Tracheal injury',
}

function shapes(entries: readonly StoredEntry[]) {
  const context = aContext(entries, '14:00')
  const values = valuesFor(context.values.policy, personalValues(context.record))
  const marks = marksSince({ ...context, values }, at('00:00'))
  return marks.filter(({ lane }) => lane === 'Cuff').map(({ shape }) => shape)
}

test.each<[string, readonly StoredEntry[], readonly string[]]>([
  ['a high reading', [tube('02:00', 'air'), cuff('09:00', 36)], ['out of range']],
  [
    'a high reading before a change to no cuff',
    [tube('02:00', 'air'), cuff('09:00', 36), tube('10:00', 'none')],
    ['out of range'],
  ],
  [
    'a reading of a water cuff before a change to air',
    [tube('02:00', 'water'), cuff('09:00', 36), tube('10:00', 'air')],
    ['done'],
  ],
  [
    '27 before and after the own limit became 25',
    [tube('02:00', 'air'), cuff('09:00', 27), anEntry(carePlans, '10:00', upper25), cuff('11:00', 27)],
    ['done', 'out of range'],
  ],
])('marks keep the shape that they had at their time: %s', (_, entries, expected) => {
  expect(shapes(entries)).toEqual(expected)
})

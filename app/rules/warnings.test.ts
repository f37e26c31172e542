import { expect, test } from 'vitest'
import { cuffPressure } from '../care/cuff-pressure/kind.ts'
import { type CuffData, cuffChecks } from '../care/cuff-pressure/schema.ts'
import { aContext, anEntry, aTube } from '../care/make.ts'
import { plainSuction } from '../care/suction/examples.ts'
import { suction } from '../care/suction/kind.ts'
import { suctions } from '../care/suction/schema.ts'
import { tubeChanges } from '../care/tube-change/schema.ts'
import { entryWarnings, standingWarnings } from './warnings.ts'

const tube = anEntry(tubeChanges, '2026-03-09 10:00', aTube())
const high: CuffData = { found: 36, unit: 'cmH2O', method: 'manometer' }
const child = { patient: { bornOn: '2015-05-01' } }
const stuck = { ...plainSuction, passed: 'no' } as const

test('warnings stand most urgent first, each rule once', () => {
  const context = aContext([tube, anEntry(cuffChecks, '09:00', high), anEntry(suctions, '09:30', stuck)], '12:00')
  expect(standingWarnings(context).map(({ level }) => level)).toEqual(['red', 'amber'])
})

test('of a child only emergencies are said, and that the limits are not for children', () => {
  const context = aContext(
    [tube, anEntry(cuffChecks, '09:00', high), anEntry(suctions, '09:30', stuck)],
    '12:00',
    child,
  )
  expect(standingWarnings(context).map(({ name }) => name)).toEqual(['suction-will-not-pass', 'no-rules-for-children'])
  expect(entryWarnings(cuffPressure, high, context)).toEqual([])
  expect(entryWarnings(suction, stuck, context)).toMatchObject([{ level: 'red' }])
})

test('the warnings of an act of an adult are all said', () => {
  expect(entryWarnings(cuffPressure, high, aContext([tube], '12:00'))).toMatchObject([{ name: 'cuff-high' }])
})

import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, anEntry, aRemoval, aTube } from '../make.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { cuffState, foundClass, leftClass } from './cuff.ts'
import { cuffPressure } from './kind.ts'
import { type CuffData, cuffChecks, cuffSchema } from './schema.ts'

const tube = (cuff: TubeData['cuff'], when = '2026-03-09 02:00') => anEntry(tubeChanges, when, aTube({ cuff }))
const reading: CuffData = { found: 26, unit: 'cmH2O', method: 'manometer' }
const check = (when: string, more: Partial<CuffData>) => anEntry(cuffChecks, when, { ...reading, ...more })
const down = check('08:00', { found: 0, cuffNow: 'deflated' })

test.each<[string, readonly StoredEntry[], string]>([
  ['without a tube', [], 'no tube'],
  ['after removal for good', [tube('air'), aRemoval('09:00')], 'no tube'],
  ['without a cuff', [tube('none')], 'no cuff'],
  ['of foam', [tube('foam')], 'foam'],
  ['of water', [tube('water')], 'water'],
  ['of air, until said otherwise', [tube('air')], 'inflated'],
  ['let down', [tube('air'), down], 'deflated'],
  ['let down with an earlier tube', [tube('air'), down, tube('air', '09:00')], 'inflated'],
  ['inflated again', [tube('air'), down, check('09:00', { cuffNow: 'inflated' })], 'inflated'],
  ['with pressure in it again', [tube('air'), down, check('09:00', { found: 0, leftAt: 24 })], 'inflated'],
  ['still down at 0', [tube('air'), down, check('09:00', { found: 0 })], 'deflated'],
])('a cuff %s', (_, entries, expected) => {
  expect(cuffState(aContext(entries, '12:00').record)).toBe(expected)
})

test.each<[string, readonly StoredEntry[], Partial<CuffData>, string | undefined, string | undefined]>([
  ['found and left in range', [tube('air')], {}, 'in range', 'in range'],
  ['found high, left in range', [tube('air')], { found: 34, leftAt: 26 }, 'high', 'in range'],
  ['found 0 in a cuff that should be up', [tube('air')], { found: 0 }, 'very low', 'very low'],
  ['let down: not classed', [tube('air')], { found: 0, cuffNow: 'deflated' }, undefined, undefined],
  ['0 in a cuff that is down', [tube('air'), down], { found: 0 }, undefined, undefined],
  ['inflated again from 0: only what it was left at', [tube('air'), down], { found: 0, leftAt: 34 }, undefined, 'high'],
  ['foam', [tube('foam')], {}, undefined, undefined],
  ['water', [tube('water')], {}, undefined, undefined],
  ['no tube', [], {}, undefined, undefined],
  ['not measured', [tube('air')], { found: undefined, method: 'not measured' }, undefined, undefined],
])('classes: %s', (_, entries, more, found, left) => {
  const context = aContext(entries, '12:00')
  const data = { ...reading, ...more }
  expect([foundClass(data, context), leftClass(data, context)]).toEqual([found, left])
})

test('a reading is drawn out of range by what was found', () => {
  const context = aContext([tube('air')], '12:00')
  expect(cuffPressure.outOfRange?.({ ...reading, found: 34, leftAt: 26 }, context)).toBe(true)
  expect(cuffPressure.outOfRange?.(reading, context)).toBe(false)
})

test('the form starts in the unit of the ward and shows the band only for an air cuff that is up', () => {
  const gauges = (entries: readonly StoredEntry[]) => cuffPressure.gauges?.(aContext(entries, '12:00'))
  expect(gauges([tube('air')])?.[0]).toMatchObject({ field: 'found', lower: 20, upper: 30, unit: 'cmH2O' })
  expect(gauges([tube('air'), down])).toEqual([])
  expect(gauges([tube('water')])).toEqual([])
  expect(cuffPressure.startsWith?.(aContext([], '12:00', { ward: { pressureUnit: 'mmHg' } }))).toEqual({ unit: 'mmHg' })
  expect(cuffPressure).not.toHaveProperty('usual')
})

test.each<[Partial<CuffData>, readonly string[] | undefined]>([
  [{ found: 120 }, undefined],
  [{ found: 88, unit: 'mmHg' }, undefined],
  [{ found: 89, unit: 'mmHg' }, ['Check the unit: 89 mmHg is more than 120 cmH2O']],
  [{ found: 26, unit: 'kPa' }, ['Check the unit: 26 kPa is more than 120 cmH2O']],
  [{ found: undefined }, ['Enter the pressure found']],
  [{ method: 'not measured', found: undefined }, ['Enter the reason it was not measured']],
])('what is charted as %j', (more, problems) => {
  const issues = cuffSchema.safeParse({ ...reading, ...more }).error?.issues.map(({ message }) => message)
  expect(issues).toEqual(problems)
})

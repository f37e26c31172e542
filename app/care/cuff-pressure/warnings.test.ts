import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { type AboutContext, aContext, anEntry, aRemoval, aTube } from '../make.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { type CuffData, cuffChecks } from './schema.ts'
import { cuffWarnings, standingCuffWarnings } from './warnings.ts'

const tube = (cuff: TubeData['cuff'] = 'air', when = '2026-03-09 02:00') => anEntry(tubeChanges, when, aTube({ cuff }))
const reading: CuffData = { found: 26, unit: 'cmH2O', method: 'manometer' }
const check = (when: string, more: Partial<CuffData> = {}) => anEntry(cuffChecks, when, { ...reading, ...more })

interface About extends AboutContext {
  readonly before?: readonly StoredEntry[]
}

const warningsOf = (more: Partial<CuffData>, { before = [tube()], ...about }: About = {}) =>
  cuffWarnings({ ...reading, ...more }, aContext(before, '12:00', about))
const namesOf = (more: Partial<CuffData>, about: About = {}) =>
  warningsOf(more, about).map(({ name, level }) => `${name} ${level}`)

test.each([
  [14.9, ['cuff-low amber']],
  [19.9, ['cuff-low amber']],
  [20, []],
  [30, []],
  [30.1, ['cuff-high amber']],
  [40.1, ['cuff-high amber']],
])('left at %d cmH2O', (found, expected) => {
  expect(namesOf({ found })).toEqual(expected)
})

test('too high and too low say what to do first', () => {
  expect(warningsOf({ found: 34 })[0]).toMatchObject({
    action: 'Let air out slowly to 20 to 30 cmH2O and check again in 30 minutes.',
    cause: 'Above 30 cmH2O the cuff can harm the wall of the windpipe.',
  })
  expect(warningsOf({ found: 44 })[0]?.action).toMatch(/minutes\. Do it now\.$/)
  expect(warningsOf({ found: 18 })[0]).toMatchObject({
    action: 'Add air to 20 to 30 cmH2O. If it keeps falling, check tube and pilot line.',
    cause: 'Below 20 cmH2O secretions can pass the cuff.',
  })
})

test('very low is to be acted on now where the patient is ventilated', () => {
  const action = (found: number, ventilated: boolean) => warningsOf({ found }, { patient: { ventilated } })[0]?.action
  expect(action(14, true)).toContain('Do it now: the patient is ventilated.')
  expect(action(14, false)).not.toContain('now')
  expect(action(16, true)).not.toContain('now')
})

test('band and minutes are those of the policy and of the patient', () => {
  const policy = { 'cuff-pressure-recheck': 45 }
  expect(warningsOf({ found: 27 }, { policy, personal: { 'cuff-pressure-upper-limit': 25 } })[0]?.action).toBe(
    'Let air out slowly to 20 to 25 cmH2O and check again in 45 minutes.',
  )
})

test.each([
  [{ found: 34, leftAt: 26 }, 'Found high, left within 20 to 30 cmH2O.'],
  [{ found: 12, leftAt: 24 }, 'Found very low, left within 20 to 30 cmH2O.'],
])('put right, %j is a note', (more, cause) => {
  expect(warningsOf(more)).toMatchObject([{ name: 'cuff-corrected', level: 'blue', cause }])
})

test.each<[TubeData['cuff'], string, string]>([
  ['none', 'Check which tube is in and correct the record.', 'a tube without a cuff'],
  ['foam', 'Check which tube is in and correct the record.', 'a foam cuff'],
  ['water', 'Measure this cuff in mL of sterile water.', 'a water cuff'],
])('a pressure of a cuff of %s is taken, and doubted', (cuff, action, words) => {
  expect(warningsOf({ found: 50 }, { before: [tube(cuff)] })).toMatchObject([
    { name: 'cuff-not-air', level: 'amber', action, cause: expect.stringContaining(words) },
  ])
})

test('nothing is said of 0 in a cuff let down', () => {
  expect(namesOf({ found: 0, cuffNow: 'deflated' })).toEqual([])
  expect(namesOf({ found: 0 }, { before: [tube(), check('09:00', { found: 0, cuffNow: 'deflated' })] })).toEqual([])
})

test.each([
  [{ found: 25, unit: 'mmHg' }, ['cuff-high amber', 'cuff-unit amber']],
  [{ found: 20, unit: 'mmHg' }, ['cuff-unit blue']],
  [{ found: 15, unit: 'mmHg' }, ['cuff-unit amber']],
  [{ found: 25, unit: 'cmH2O' }, []],
] as const)('%j on a ward whose gauges read cmH2O', (more, expected) => {
  expect(namesOf(more)).toEqual(expected)
})

test('the unit in doubt is said in both units', () => {
  expect(warningsOf({ found: 25, unit: 'mmHg' })[1]?.cause).toBe(
    '25 mmHg is 34 cmH2O; gauges of this ward read in cmH2O.',
  )
  expect(namesOf({ found: 20, unit: 'mmHg' }, { ward: { pressureUnit: 'mmHg' } })).toEqual([])
})

const standing = (entries: readonly StoredEntry[]) =>
  standingCuffWarnings(aContext(entries, '14:00')).map(({ name }) => name)

test.each<[string, readonly StoredEntry[], readonly string[]]>([
  ['nothing before the first reading', [tube()], []],
  ['a reading left high', [tube(), check('10:00', { found: 34 })], ['cuff-high']],
  ['nothing once put right', [tube(), check('10:00', { found: 34 }), check('10:30')], []],
  ['nothing of one put right at once', [tube(), check('10:00', { found: 34, leftAt: 26 })], []],
  [
    'a reading left low, though an earlier one is written down later',
    [tube(), check('10:00', { found: 18 }), check('09:00')],
    ['cuff-low'],
  ],
  [
    'nothing after the cuff was let down',
    [tube(), check('10:00', { found: 34 }), check('11:00', { cuffNow: 'deflated' })],
    [],
  ],
  ['nothing with another tube', [tube(), check('10:00', { found: 34 }), tube('air', '11:00')], []],
  ['nothing after removal', [tube(), check('10:00', { found: 34 }), aRemoval('11:00')], []],
  ['a leak until a look without one', [tube(), check('10:00', { leak: 'yes' })], ['cuff-leak']],
  ['no leak once none is heard', [tube(), check('10:00', { leak: 'yes' }), check('10:20', { leak: 'no' })], []],
])('what stands: %s', (_, entries, expected) => {
  expect(standing(entries)).toEqual(expected)
})

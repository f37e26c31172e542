import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, anEntry, aRemoval, aTube } from '../make.ts'
import { usualCheck } from '../stoma-and-skin/examples.ts'
import { type StomaData, stomaChecks } from '../stoma-and-skin/schema.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { tieExamples, usualLook } from './examples.ts'
import { ties } from './kind.ts'
import { type TieData, tieChecks, tieSchema } from './schema.ts'
import { tieSentence } from './sentence.ts'
import { standingTieWarnings, tieWarnings } from './warnings.ts'

const tube = (when = '2026-03-02 10:00') => anEntry(tubeChanges, when, aTube())
const look = (when: string, overrides: Partial<TieData> = {}) =>
  anEntry(tieChecks, when, { ...usualLook, ...overrides })
const stoma = (when: string, overrides: Partial<StomaData> = {}) =>
  anEntry(stomaChecks, when, { ...usualCheck, ...overrides })

type About = Parameters<typeof aContext>[2]

const namesOf = (overrides: Partial<TieData>, about: About = {}) =>
  tieWarnings({ ...usualLook, ...overrides }, aContext([tube()], '12:00', about)).map(one => `${one.name} ${one.level}`)

const standingOf = (...entries: readonly StoredEntry[]) =>
  standingTieWarnings(aContext([tube(), ...entries], '12:00')).map(({ name }) => name)

test('looks read as short sentences', () => {
  expect(tieExamples.map(tieSentence)).toEqual([
    'Ties looked at: two fingers fit. Holder padded, hook and loop. Skin under them intact.',
    'Ties changed: one finger fits. Holder padded, hook and loop. Skin under them redness that blanches. With T. Okafor.',
    'Ties changed: two fingers fit. Holder cotton tape. Skin under them wet or macerated. Done alone. Soaked through; new tape fastened before the old one came off.',
    'Ties looked at: more than two fingers fit. Holder elastic. Skin under them broken.',
  ])
})

test('a change takes two people, or says that it was done alone', () => {
  const issuesOf = (data: object) => tieSchema.safeParse({ ...usualLook, ...data }).error?.issues.map(i => i.message)
  expect(issuesOf({ changed: 'yes' })).toEqual(['Enter the second person'])
  expect(issuesOf({ changed: 'yes', secondPerson: 'alone' })).toBeUndefined()
  expect(issuesOf({ changed: 'no', secondPerson: 'T. Okafor' })).toEqual(['Leave out the second person here'])
})

test.each<[TieData['fingers'], number, readonly string[]]>([
  ['none', 2, ['ties-tight amber']],
  ['one', 2, []],
  ['two', 2, []],
  ['more than two', 2, ['ties-loose amber']],
  ['none', 1, ['ties-tight amber']],
  ['one', 1, []],
  ['two', 1, ['ties-loose amber']],
  ['more than two', 1, ['ties-loose amber']],
])('%s under the ties where the policy allows %i', (fingers, most, expected) => {
  expect(namesOf({ fingers }, { policy: { 'ties-most-fingers': most } })).toEqual(expected)
})

test('the warning says how they should fit', () => {
  const [warning] = tieWarnings({ ...usualLook, fingers: 'none' }, aContext([tube()], '12:00'))
  expect(warning?.action).toBe('Re-fit ties so one to two fingers fit.')
  const strict = aContext([tube()], '12:00', { policy: { 'ties-most-fingers': 1 } })
  expect(tieWarnings({ ...usualLook, fingers: 'two' }, strict)[0]?.action).toBe('Re-fit ties so one finger fits.')
})

test.each<[TieData['skin'], readonly string[]]>([
  ['intact', []],
  ['blanching redness', []],
  ['staying redness', ['ties-skin-damage amber']],
  ['broken', ['ties-skin-damage amber']],
  ['wet', ['ties-skin-wet amber']],
])('skin under the ties: %s', (skin, expected) => {
  expect(namesOf({ skin })).toEqual(expected)
})

test('without a tube nothing is said', () => {
  expect(tieWarnings({ ...usualLook, fingers: 'none' }, aContext([], '12:00'))).toEqual([])
})

test('a bad fit stands until a later look on either form, or the next tube', () => {
  const loose = look('09:00', { fingers: 'more than two' })
  expect(standingOf(loose)).toEqual(['ties-loose'])
  expect(standingOf(loose, look('09:10'))).toEqual([])
  expect(standingOf(loose, stoma('09:10'))).toEqual([])
  expect(standingOf(loose, tube('09:10'))).toEqual([])
  expect(standingOf(loose, aRemoval('09:10'))).toEqual([])
  expect(standingOf(stoma('09:00', { ties: 'none' }))).toEqual(['ties-tight'])
  expect(standingOf(stoma('09:00', { ties: 'none' }), look('09:10'))).toEqual([])
})

test('damaged skin stands until it was seen again, here or with stoma and skin', () => {
  const broken = look('09:00', { skin: 'broken' })
  expect(standingOf(broken)).toEqual(['ties-skin-damage'])
  expect(standingOf(broken, look('10:00'))).toEqual([])
  expect(standingOf(broken, stoma('10:00'))).toEqual([])
  expect(standingOf(broken, stoma('10:00', { sites: ['flange left'] }))).toEqual(['ties-skin-damage'])
})

test('a form starts with the holder of the last look, and the fit is felt each time', () => {
  const context = aContext([tube(), look('09:00', { holder: 'tape' })], '12:00')
  expect(ties.startsWith?.(context)).toEqual({ holder: 'tape' })
  expect(ties.usual?.(context)).toEqual({ words: 'Ties left as they are', answers: { changed: 'no' } })
  expect(ties.usual?.(aContext([], '12:00'))).toBeUndefined()
})

test.each<[Partial<TieData>, boolean]>([
  [{}, false],
  [{ fingers: 'none' }, true],
  [{ skin: 'broken' }, true],
])('a look with %j is out of range: %s', (overrides, expected) => {
  expect(ties.outOfRange?.({ ...usualLook, ...overrides }, aContext([tube()], '12:00'))).toBe(expected)
})

import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, anEntry, aTube } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { usualCheck } from './examples.ts'
import { fixingWarnings } from './fixing.ts'
import { stomaAndSkin } from './kind.ts'
import { type StomaData, stomaChecks } from './schema.ts'
import { isOutOfRange, standingStomaWarnings } from './warnings.ts'

type About = Parameters<typeof aContext>[2]
const firstTube = anEntry(
  tubeChanges,
  '2026-03-01 10:00',
  aTube({ reason: 'first insertion', technique: 'surgical', sutures: 'in place' }),
)
const laterTube = (when: string) => anEntry(tubeChanges, when, aTube({ reason: 'routine' }))
const checkOf = (overrides: Partial<StomaData>): StomaData => ({ ...usualCheck, ...overrides })
const check = (when: string, overrides: Partial<StomaData> = {}) => anEntry(stomaChecks, when, checkOf(overrides))
const context = (entries: readonly StoredEntry[] = [], about: About = {}, now = '12:00') =>
  aContext([firstTube, ...entries], now, about)
const line = ({ name, level }: { name: string; level: string }) => `${name} ${level}`

test.each([
  ['none', ['ties-tight amber']],
  ['one', []],
  ['two', []],
  ['more than two', ['ties-loose amber']],
  ['no ties', []],
] as const)('ties left with %s under them', (ties, expected) => {
  expect(fixingWarnings(checkOf({ ties }), context()).map(line)).toEqual(expected)
})

test('where policy allows one finger, two are too loose', () => {
  const oneFinger = context([], { policy: { 'ties-most-fingers': 1 } })
  expect(fixingWarnings(checkOf({ ties: 'one' }), oneFinger)).toEqual([])
  expect(fixingWarnings(checkOf({ ties: 'two' }), oneFinger)[0]).toMatchObject({
    name: 'ties-loose',
    action: 'Re-fit ties so one finger fits.',
  })
})

test('ties are re-fitted so that one to two fingers fit', () => {
  expect(fixingWarnings(checkOf({ ties: 'none' }), context())[0]?.action).toBe('Re-fit ties so one to two fingers fit.')
})

test.each([
  ['none', []],
  ['in place', []],
  ['loose', ['sutures-loose amber']],
  ['removed now', []],
] as const)('flange sutures %s', (sutures, expected) => {
  expect(fixingWarnings(checkOf({ sutures }), context()).map(line)).toEqual(expected)
})

test('without a tube nothing needs fixing', () => {
  expect(fixingWarnings(checkOf({ ties: 'none', sutures: 'loose' }), aContext([], '12:00'))).toEqual([])
})

const standingOf = (...entries: readonly StoredEntry[]) => standingStomaWarnings(context(entries)).map(line)
const found: Partial<StomaData> = { appearance: ['redness', 'pus'], ties: 'more than two', sutures: 'loose' }

test.each<[string, readonly StoredEntry[], readonly string[]]>([
  ['nothing, before the first check', [], []],
  ['nothing, after a clean check', [check('09:00')], []],
  ['what the last check found', [check('09:00', found)], ['stoma-infection amber', 'sutures-loose amber']],
  ['nothing, once a later check is clean', [check('09:00', found), check('10:00')], []],
  ['only what is still found', [check('09:00', found), check('10:00', { sutures: 'loose' })], ['sutures-loose amber']],
  [
    'the opening but not the sutures, after a tube change',
    [check('09:00', found), laterTube('10:00')],
    ['stoma-infection amber'],
  ],
  [
    'a bleed until it has stopped',
    [check('09:00', { appearance: ['redness'], bleeding: 'active' })],
    ['stoma-bleeding red'],
  ],
  [
    'nothing of a bleed that has stopped',
    [check('09:00', { appearance: ['redness'], bleeding: 'active' }), check('10:00')],
    [],
  ],
])('what stands: %s', (_, entries, expected) => {
  expect(standingOf(...entries)).toEqual(expected)
})

test('how the ties fit is left to their own kind, which also knows that they were re-fitted', () => {
  expect(standingOf(check('09:00', { ties: 'more than two' }))).toEqual([])
})

test('a standing bleed keeps the day on which it was seen', () => {
  const bled = check('2026-03-04 12:00', { appearance: ['redness'], bleeding: 'active' })
  expect(standingStomaWarnings(context([bled]))[0]?.cause).toContain('on day 3')
})

test.each<[Partial<StomaData>, boolean]>([
  [{}, false],
  [{ appearance: ['crusting'] }, false],
  [{ skin: 'blanching redness', findingSite: 'flange top' }, false],
  [{ sites: ['flange left'] }, false],
  [{ skin: 'skin tear', findingSite: 'flange top' }, true],
  [{ skin: 'pressure injury', stage: 'stage-1', findingSite: 'flange top' }, true],
  [{ appearance: ['redness'], bleeding: 'spotting' }, true],
  [{ ties: 'none' }, true],
])('a check with %j is out of range: %s', (overrides, expected) => {
  expect(isOutOfRange(checkOf(overrides), context())).toBe(expected)
})

test('a known injury is still out of range', () => {
  const injury = { skin: 'pressure injury', stage: 'stage-2', findingSite: 'flange left' } as const
  expect(isOutOfRange(checkOf(injury), context([check('09:00', injury)]))).toBe(true)
})

test('the form starts with no sutures once the record knows that there are none', () => {
  expect(stomaAndSkin.startsWith?.(context())).toEqual({})
  expect(stomaAndSkin.startsWith?.(context([check('09:00', { sutures: 'removed now' })]))).toEqual({ sutures: 'none' })
  expect(stomaAndSkin.startsWith?.(context([laterTube('09:00')]))).toEqual({ sutures: 'none' })
})

test('that there are no sutures is filled in only where the record says so', () => {
  const starts = (entries: readonly StoredEntry[]) => stomaAndSkin.startsWith?.(aContext(entries, '12:00'))
  expect(starts([])).toEqual({})
  expect(starts([firstTube])).toEqual({})
  expect(starts([laterTube('09:00')])).toEqual({ sutures: 'none' })
})

test('the usual act fills in what was done and leaves every finding open', () => {
  expect(stomaAndSkin.usual?.(context())?.answers).toEqual({ dressing: 'left in place', holderChanged: 'no' })
  expect(stomaAndSkin.usual?.(aContext([], '12:00'))).toBeUndefined()
})

import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, anEntry, aRemoval, aTube, at, windowOf } from '../make.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { replacedWithNew } from './examples.ts'
import { innerCannula } from './kind.ts'
import { pairState, pairWords, standingPair } from './pair.ts'
import { type InnerCannulaData, innerCannulaActs, innerCannulaSchema } from './schema.ts'
import { notOfferedOfCannula, usualInnerCannula } from './start.ts'
import { innerCannulaWarnings, standingInnerCannulaWarnings } from './warnings.ts'

const tube = (when = '2026-03-09 10:00', overrides: Partial<TubeData> = {}) =>
  anEntry(tubeChanges, when, aTube({ innerCannula: 'reusable', ...overrides }))
const act = (when: string, overrides: Partial<InnerCannulaData>) =>
  anEntry(innerCannulaActs, when, { ...replacedWithNew, line: 'Alder', size: '8.0', ...overrides })
const swap = (when: string, overrides: Partial<InnerCannulaData> = {}) => act(when, { act: 'swapped', ...overrides })
const other = (when: string, where: NonNullable<InnerCannulaData['other']>, spare: 'yes' | 'no' = 'yes') =>
  anEntry(innerCannulaActs, when, { act: 'other only', other: where, spare })

const stateOf = (...entries: readonly StoredEntry[]) => pairState(aContext(entries, '14:00').record)

test.each<[string, readonly StoredEntry[], string | undefined]>([
  ['a tube goes in with its clean spare', [tube()], 'ready'],
  ['a swap takes it out to be cleaned', [tube(), swap('09:00', { other: 'cleaning' })], 'cleaning'],
  ['a swap that does not say, with no spare left', [tube(), swap('09:00', { spare: 'no' })], 'cleaning'],
  ['a swap that does not say, with a spare there', [tube(), swap('09:00')], 'ready'],
  ['it was cleaned', [tube(), swap('09:00', { other: 'cleaning' }), other('09:30', 'ready')], 'ready'],
  ['a look does not move it', [tube(), other('09:00', 'lost'), act('10:00', { act: 'inspected' })], 'lost'],
  ['it was found again', [tube(), other('09:00', 'lost'), other('10:00', 'ready')], 'ready'],
  ['the next tube has its own pair', [tube(), other('09:00', 'lost'), tube('10:00')], 'ready'],
  ['a disposable has no pair', [tube('09:00', { innerCannula: 'disposable' }), swap('10:00')], undefined],
  ['no tube, no pair', [tube(), aRemoval('09:00')], undefined],
  ['none was charted', [], undefined],
])('the other one of the pair: %s', (_, entries, expected) => {
  expect(stateOf(...entries)?.other).toBe(expected)
})

test('an act on the other one alone moves no clock and settles nothing of the one in place', () => {
  const due = (...entries: readonly StoredEntry[]) =>
    windowOf(innerCannula, 'inner-cannula-inspection', aContext([tube(), ...entries], '14:00')).dueAt
  expect(due(act('09:00', {}), other('13:00', 'ready'))).toEqual(due(act('09:00', {})))
  const unlocked = [tube(), act('09:00', { locked: 'no' }), other('13:00', 'ready')]
  expect(standingInnerCannulaWarnings(aContext(unlocked, '14:00')).map(({ name }) => name)).toEqual([
    'inner-cannula-not-locked',
  ])
})

const standing = (now: string, ...entries: readonly StoredEntry[]) =>
  standingPair(aContext([tube(), ...entries], now)).map(({ name, level }) => `${name} ${level}`)

test.each<[string, StoredEntry, readonly string[]]>([
  ['13:00', swap('12:00', { other: 'cleaning' }), ['inner-cannula-no-clean-spare blue']],
  ['13:01', swap('12:00', { other: 'cleaning' }), ['inner-cannula-no-clean-spare amber']],
  ['12:01', swap('12:00', { other: 'cleaning', spare: 'no' }), ['inner-cannula-no-clean-spare amber']],
  ['12:01', other('12:00', 'lost'), ['inner-cannula-pair-lost amber']],
  ['12:01', other('12:00', 'ready'), []],
])('at %s there is no clean spare: %#', (now, entry, expected) => {
  expect(standing(now, entry)).toEqual(expected)
})

test('no clean spare is said once, and a lost one asks for a set or another tube', () => {
  const entries = [tube(), swap('12:00', { other: 'lost', spare: 'no' })]
  const found = standingInnerCannulaWarnings(aContext(entries, '13:00'))
  expect(found).toMatchObject([
    {
      name: 'inner-cannula-pair-lost',
      action: 'Ask the tracheostomy team for a new set or another tube today. Keep a whole tube of this size at hand.',
      cause: 'One of the pair is lost or broken, and has no replacement of its own. Charted 10-Mar-2026 12:00.',
    },
  ])
})

test('the card says where the other one is', () => {
  expect(pairWords(aContext([tube(), swap('12:00', { other: 'cleaning' })], '13:00'))).toBe(
    'One in place, the other being cleaned since 10-Mar-2026 12:00',
  )
})

test('a swap is the usual act only while the spare is clean', () => {
  const usual = (...entries: readonly StoredEntry[]) => usualInnerCannula(aContext([tube(), ...entries], '14:00'))
  expect(usual()?.answers).toMatchObject({ act: 'swapped', other: 'cleaning' })
  expect(usual(other('13:00', 'cleaning'))?.answers).toMatchObject({ act: 'cleaned' })
  expect(usual(other('13:00', 'cleaning'))?.answers).not.toHaveProperty('spare')
})

test('a single-use cannula is never offered to be cleaned, and is charted all the same if it was', () => {
  const single = aContext([tube('09:00', { innerCannula: 'disposable' })], '14:00')
  expect(notOfferedOfCannula(single).act).toEqual(['cleaned', 'swapped', 'other only'])
  const cleaned: InnerCannulaData = { ...replacedWithNew, line: 'Alder', act: 'cleaned' }
  expect(innerCannulaSchema.safeParse(cleaned).success).toBe(true)
  const names = (data: InnerCannulaData) => innerCannulaWarnings(data, single).map(({ name }) => name)
  expect(names(cleaned)).toEqual(['inner-cannula-reused'])
  expect(names({ ...cleaned, act: 'inspected', foundReused: 'yes' })).toEqual(['inner-cannula-reused'])
  expect(names({ ...cleaned, act: 'replaced', foundReused: 'yes' })).toEqual([])
  expect(notOfferedOfCannula(aContext([tube()], '14:00'))).toEqual({ foundReused: ['yes', 'no'] })
})

test('an act on the other one alone has to say where it is, and asks nothing of the one in place', () => {
  const issues = (data: object) => innerCannulaSchema.safeParse(data).error?.issues.map(({ path }) => path.join('.'))
  expect(issues({ act: 'other only', spare: 'yes' })).toEqual(['other'])
  expect(issues({ act: 'other only', spare: 'yes', other: 'ready', tolerance: 'well' })).toEqual(['tolerance'])
})

test('the state is known since the act that told of it', () => {
  expect(stateOf(tube(), other('11:20', 'cleaning'))?.at).toEqual(at('11:20'))
})

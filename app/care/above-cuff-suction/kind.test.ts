import { expect, test } from 'vitest'
import { hours, minutes } from '../../time/duration.ts'
import type { StoredEntry } from '../kind.ts'
import { aContext, anEntry, aRemoval, aTube } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { aboveCuffExamples, plainVolume } from './examples.ts'
import { aboveCuffSuction } from './kind.ts'
import { aboveCuffRate, mlPerHour } from './rate.ts'
import { type AboveCuffData, aboveCuffSuctions } from './schema.ts'
import { aboveCuffSentence } from './sentence.ts'
import { aboveCuffWarnings, standingAboveCuffWarnings } from './warnings.ts'

const tube = (when = '2026-03-02 10:00', overrides: Parameters<typeof aTube>[0] = {}) =>
  anEntry(tubeChanges, when, aTube(overrides))
const drawn = (when: string, overrides: Partial<AboveCuffData> = {}) =>
  anEntry(aboveCuffSuctions, when, { ...plainVolume, ...overrides })

const namesOf = (overrides: Partial<AboveCuffData>, entries: readonly StoredEntry[] = [tube()]) =>
  aboveCuffWarnings({ ...plainVolume, ...overrides }, aContext(entries, '12:00')).map(one => `${one.name} ${one.level}`)

test('volumes read as short sentences', () => {
  expect(aboveCuffExamples.map(aboveCuffSentence)).toEqual([
    'Suction above the cuff: 4 mL. Secretions clear.',
    'Suction above the cuff: 0 mL. Port blocked. Air would not go through either.',
    'Suction above the cuff: 12.5 mL. Port was blocked, cleared. Secretions like feed or food. Streaks of blood.',
  ])
})

test.each([
  [6, hours(6), 1],
  [9, hours(6), 1.5],
  [0, hours(4), 0],
  [2, minutes(30), 4],
  [2, hours(0), undefined],
])('%i mL over %i ms is %s mL an hour', (volumeMl, over, rate) => {
  expect(mlPerHour(volumeMl, over)).toBe(rate)
})

test.each<[string, readonly StoredEntry[], object | undefined]>([
  ['6 mL in 6 h', [drawn('03:00'), drawn('09:00', { volumeMl: 6 })], { mlPerHour: 1, isLow: true }],
  ['9 mL in 6 h', [drawn('03:00'), drawn('09:00', { volumeMl: 9 })], { mlPerHour: 1.5, isLow: false }],
  [
    '6 mL in 6 h, with a blocked port in between',
    [drawn('03:00'), drawn('06:00', { volumeMl: 0, port: 'blocked' }), drawn('09:00', { volumeMl: 6 })],
    { mlPerHour: 1, isLow: true },
  ],
  ['one volume', [drawn('09:00')], undefined],
  ['two at one moment', [drawn('09:00'), drawn('09:00')], undefined],
  ['a volume of the tube before', [drawn('03:00'), tube('04:00'), drawn('09:00')], undefined],
])('the rate after %s', (_, entries, expected) => {
  expect(aboveCuffRate(aContext([tube(), ...entries], '12:00'))).toEqual(expected)
})

test('which rate is low is set by policy', () => {
  const entries = [tube(), drawn('03:00'), drawn('09:00', { volumeMl: 9 })]
  const policy = { 'above-cuff-rate-limit': 2 }
  expect(aboveCuffRate(aContext(entries, '12:00', { policy }))?.isLow).toBe(true)
})

test.each<[Partial<AboveCuffData>, readonly string[]]>([
  [{}, []],
  [{ volumeMl: 60, colour: 'green' }, []],
  [{ port: 'cleared' }, []],
  [{ port: 'blocked' }, ['above-cuff-blocked amber']],
  [{ colour: 'feed' }, ['above-cuff-feed amber']],
  [{ blood: 'streaks' }, ['above-cuff-blood amber']],
  [{ blood: 'fresh' }, ['above-cuff-blood red']],
  [{ blood: 'heavy', port: 'blocked' }, ['above-cuff-blood red', 'above-cuff-blocked amber']],
])('%j warns of %j', (overrides, expected) => {
  expect(namesOf(overrides)).toEqual(expected)
  expect(aboveCuffSuction.outOfRange?.({ ...plainVolume, ...overrides }, aContext([tube()], '12:00'))).toBe(
    expected.length > 0,
  )
})

test('a tube without a cuff has nothing above it: the record is asked about', () => {
  expect(namesOf({}, [tube('2026-03-02 10:00', { cuff: 'none' })])).toEqual(['above-cuff-no-cuff amber'])
})

test('blood is red with no tube charted either', () => {
  expect(namesOf({ blood: 'fresh', port: 'blocked' }, [])).toEqual(['above-cuff-blood red'])
})

test('blood and a blocked port stand until the next emptying, or the next tube', () => {
  const standingOf = (...entries: readonly StoredEntry[]) =>
    standingAboveCuffWarnings(aContext([tube(), ...entries], '12:00')).map(({ name }) => name)
  const bad = drawn('09:00', { blood: 'fresh', port: 'blocked' })
  expect(standingOf(bad)).toEqual(['above-cuff-blood', 'above-cuff-blocked'])
  expect(standingOf(bad, drawn('10:00'))).toEqual([])
  expect(standingOf(bad, tube('10:00'))).toEqual([])
  expect(standingOf(bad, aRemoval('10:00'))).toEqual([])
})

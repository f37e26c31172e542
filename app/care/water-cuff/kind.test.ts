import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, aRemoval, aTube, at, clockOf } from '../make.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { plainFilling, waterCuffExamples } from './examples.ts'
import { waterCuff } from './kind.ts'
import { type WaterCuffData, waterCuffs } from './schema.ts'
import { waterCuffSentence } from './sentence.ts'
import { standingWaterCuffWarnings, waterCuffWarnings } from './warnings.ts'

const tube = (when = '2026-03-02 10:00', cuff: TubeData['cuff'] = 'water') =>
  anEntry(tubeChanges, when, aTube({ cuff }))
const filling = (when: string, overrides: Partial<WaterCuffData> = {}) =>
  anEntry(waterCuffs, when, { ...plainFilling, ...overrides })

function dueOf(entries: readonly StoredEntry[], now = '12:00') {
  const clock = clockOf(waterCuff, 'water-cuff-check', aContext(entries, now))
  return clock.state === 'running' ? clock.window.dueAt : clock
}

const namesOf = (overrides: Partial<WaterCuffData>, entries: readonly StoredEntry[] = [tube()], policy = {}) =>
  waterCuffWarnings({ ...plainFilling, ...overrides }, aContext(entries, '12:00', { policy })).map(
    ({ name, level }) => `${name} ${level}`,
  )

test('fillings read as short sentences', () => {
  expect(waterCuffExamples.map(waterCuffSentence)).toEqual([
    'Water cuff: 5 mL removed, 5 mL put in; prescribed 5 mL.',
    'Water cuff: 3.5 mL removed, 5 mL put in; prescribed 5 mL. Leak or voice with the cuff up. Voice heard before.',
    'Water cuff: 5 mL removed, left empty; prescribed 5 mL.',
  ])
})

test.each<[string, readonly StoredEntry[], string]>([
  ['never filled', [tube()], '2026-03-02 15:00'],
  ['filled in this shift', [tube(), filling('09:00')], '23:00'],
  ['filled one minute before this shift', [tube(), filling('06:59')], '15:00'],
  ['filled as this shift began', [tube(), filling('07:00')], '23:00'],
  ['filled in the tube before', [tube(), filling('09:00'), tube('10:00')], '15:00'],
  ['left empty on purpose', [tube(), filling('09:00', { instilledMl: 0 })], '23:00'],
  ['the filling of this shift retracted', [tube(), filling('2026-03-09 23:30'), ...retracted('09:00')], '15:00'],
])('a water cuff is due: %s', (_, entries, due) => {
  expect(dueOf(entries)).toEqual(at(due))
})

function retracted(when: string): readonly StoredEntry[] {
  const mistaken = filling(when)
  return [mistaken, aCorrection(mistaken, waterCuffs, when, plainFilling, { status: 'retracted' })]
}

test.each<TubeData['cuff']>(['air', 'foam', 'none'])('a tube with cuff %s owes no water', cuff => {
  expect(dueOf([tube('2026-03-02 10:00', cuff)])).toEqual({ state: 'none' })
})

test('it does not concern somebody without a tube, and stands still after removal for good', () => {
  expect(dueOf([])).toEqual({ state: 'none' })
  const because = 'tube out for good since 10-Mar-2026'
  expect(dueOf([tube(), filling('09:00'), aRemoval('10:00')])).toEqual({ state: 'suspended', because })
})

test.each<[Partial<WaterCuffData>, readonly string[]]>([
  [{}, []],
  [{ removedMl: 4 }, []],
  [{ removedMl: 3.9 }, ['water-cuff-difference amber']],
  [{ removedMl: 6 }, []],
  [{ removedMl: 6.1 }, ['water-cuff-difference amber']],
  [{ prescribedMl: 4.1, removedMl: 5.1, instilledMl: 4.1 }, []],
  [{ instilledMl: 0 }, []],
  [{ instilledMl: 4.5 }, ['water-cuff-not-as-prescribed amber']],
  [{ instilledMl: 6.5 }, ['water-cuff-difference amber', 'water-cuff-not-as-prescribed amber']],
  [{ leak: 'yes' }, ['water-cuff-leak amber']],
])('%j warns of %j', (overrides, expected) => {
  expect(namesOf(overrides)).toEqual(expected)
})

test('water that is lost asks for a leak, water that is too much for a volume', () => {
  const actionOf = (removedMl: number) =>
    waterCuffWarnings({ ...plainFilling, removedMl }, aContext([tube()], '12:00'))[0]?.action
  expect(actionOf(2)).toMatch(/^Check cuff and pilot line for a leak/)
  expect(actionOf(8)).toMatch(/^Ask the tracheostomy team how much water/)
})

test('the difference that warns is set by policy', () => {
  expect(namesOf({ removedMl: 3.5 }, [tube()], { 'water-cuff-difference': 2 })).toEqual([])
  expect(namesOf({ removedMl: 4.5 }, [tube()], { 'water-cuff-difference': 0.2 })).toEqual([
    'water-cuff-difference amber',
  ])
})

test.each<TubeData['cuff']>(['air', 'foam', 'none'])('water charted for a tube with cuff %s is asked about', cuff => {
  expect(namesOf({}, [tube('2026-03-02 10:00', cuff)])).toEqual(['water-cuff-other-cuff amber'])
})

test('without a tube nothing is said', () => {
  expect(namesOf({ leak: 'yes' }, [])).toEqual([])
})

test('a difference and a leak stand until the next filling, or the next tube', () => {
  const standingOf = (...entries: readonly StoredEntry[]) =>
    standingWaterCuffWarnings(aContext([tube(), ...entries], '12:00')).map(({ name }) => name)
  const bad = filling('09:00', { removedMl: 2, leak: 'yes' })
  expect(standingOf(bad)).toEqual(['water-cuff-leak', 'water-cuff-difference'])
  expect(standingOf(bad, filling('10:00'))).toEqual([])
  expect(standingOf(bad, tube('10:00'))).toEqual([])
  expect(standingOf(bad, aRemoval('10:00'))).toEqual([])
})

test('a form starts with the volume that was prescribed last, for this tube', () => {
  const startOf = (...entries: readonly StoredEntry[]) => waterCuff.startsWith?.(aContext(entries, '12:00'))
  expect(startOf(tube(), filling('09:00', { prescribedMl: 4.5 }))).toEqual({ prescribedMl: 4.5 })
  expect(startOf(tube(), filling('09:00'), tube('10:00'))).toEqual({})
})

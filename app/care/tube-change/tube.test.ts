import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, anEntry, aRemoval, aTube, at } from '../make.ts'
import { type TubeData, tubeChanges } from './schema.ts'
import {
  insertedAt,
  isFirstTube,
  sizeWords,
  stomaAgeDays,
  stomaMadeOn,
  tubeInPlace,
  tubeTract,
  tubeWords,
  workingIdMm,
} from './tube.ts'

const tube = (when: string, overrides: Partial<TubeData> = {}) => anEntry(tubeChanges, when, aTube(overrides))
const first = tube('2026-03-02 10:00', { reason: 'first insertion', technique: 'surgical' })
const arrived = (insertedOn: string, stomaMadeOn: string) =>
  tube('12:00', { reason: 'on arrival', insertedOn, stomaMadeOn, technique: 'surgical' })
const contextOf = (...entries: readonly StoredEntry[]) => aContext(entries, '14:00')

test.each<[string, readonly StoredEntry[], Date | undefined]>([
  ['none was charted', [], undefined],
  ['the only one', [first], at('2026-03-02 10:00')],
  ['the one put in last, not the one charted last', [tube('09:00'), first], at('09:00')],
  ['not one that did not go in', [first, tube('09:00', { difficulty: 'failed' })], at('2026-03-02 10:00')],
  ['none after removal for good', [first, aRemoval('09:00')], undefined],
  ['none when removed in the minute of its change', [tube('09:00'), aRemoval('09:00')], undefined],
  ['the one put back', [first, aRemoval('09:00'), tube('10:00')], at('10:00')],
])('the tube in place: %s', (_, entries, expected) => {
  expect(tubeInPlace(contextOf(...entries).record)?.performedAt).toEqual(expected)
})

test.each([
  ['2026-03-10', '12:00'],
  ['2026-03-08', '2026-03-09 00:00'],
])('of a tube in place on arrival since %s only the day is known: its end, at most %s', (insertedOn, expected) => {
  const context = contextOf(arrived(insertedOn, '2026-03-01'))
  const entry = tubeInPlace(context.record)
  expect(entry && insertedAt(entry, context)).toEqual(at(expected))
})

test.each<[string, StoredEntry, boolean]>([
  ['a first insertion', first, true],
  ['in place on arrival since the opening was made', arrived('2026-03-05', '2026-03-05'), true],
  ['in place on arrival in an older opening', arrived('2026-03-05', '2026-02-01'), false],
  ['a change', tube('09:00'), false],
])('whether it is the first tube: %s', (_, entry, expected) => {
  const [found] = contextOf(entry).record.of(tubeChanges)
  expect(found && isFirstTube(found)).toBe(expected)
})

test('the opening was made at the first insertion or as charted on arrival, and ages by the calendar', () => {
  expect(stomaMadeOn(contextOf(first, tube('09:00')))).toBe('2026-03-02')
  expect(stomaAgeDays(contextOf(first, tube('09:00')))).toBe(8)
  expect(stomaMadeOn(contextOf(arrived('2026-03-05', '2026-02-01')))).toBe('2026-02-01')
  expect(stomaAgeDays(contextOf(tube('09:00')))).toBeUndefined()
})

test('the tract counts changes that went well, and a tube that came with the patient as one', () => {
  const went = (...entries: readonly StoredEntry[]) =>
    tubeTract(contextOf(...entries))?.changes.map(({ uncomplicated }) => uncomplicated)
  expect(went(first)).toEqual([])
  expect(went(first, tube('08:00'), tube('09:00', { difficulty: 'difficult' }))).toEqual([false, true])
  expect(went(arrived('2026-03-05', '2026-02-01'))).toEqual([true])
  expect(went()).toBeUndefined()
})

test.each<[string, Parameters<typeof aTube>[0], number]>([
  ['with the inner cannula in', {}, 8],
  ['without one, of the outer tube', { innerCannula: 'none' }, 9.1],
  ['of a single cannula', { construction: 'single', innerCannula: undefined, idWithInner: undefined }, 9.1],
])('the inside diameter that a catheter meets: %s', (_, overrides, expected) => {
  expect(workingIdMm(aTube(overrides))).toBe(expected)
})

test('a tube is named by its label, its cuff and its construction', () => {
  expect(sizeWords(aTube({ size: '6', sizeSystem: 'Jackson' }))).toBe('6 Jackson')
  expect(tubeWords(aTube({ cuff: 'foam' }))).toBe('8.0 ISO 5366, foam cuff, dual')
})

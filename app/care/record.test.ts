import { expect, test } from 'vitest'
import { careFields, quantity } from './field.ts'
import { charted } from './kind.ts'
import { aContext, aCorrection, anEntry, at } from './make.ts'
import { effectiveEntries, knownAt, latestFirst, recordBefore } from './record.ts'

const level = (slug: string) =>
  charted({ slug, schema: careFields({ ml: quantity({ label: 'Level', unit: 'mL', min: 0, max: 500 }) }) })
const water = level('water-level')
const tank = level('tank-level')

const recordOf = (...entries: Parameters<typeof aContext>[0]) => aContext(entries, '12:00').record

const early = anEntry(water, '08:00', { ml: 100 })
const late = anEntry(water, '10:00', { ml: 300 })

test('a record gives entries of one kind, latest performed first, whatever the order of input', () => {
  const other = anEntry(tank, '09:00', { ml: 5 })
  expect(recordOf(early, other, late).of(water)).toEqual(recordOf(late, early, other).of(water))
  expect(
    recordOf(early, other, late)
      .of(water)
      .map(entry => entry.data.ml),
  ).toEqual([300, 100])
})

test('the latest entry is the one performed last, not the one recorded last', () => {
  const writtenLater = anEntry(water, '09:00', { ml: 200 }, { recordedAt: at('11:30') })
  expect(recordOf(late, writtenLater).latest(water)?.data.ml).toBe(300)
})

test('of two entries at the same minute the one with the higher id is the latest', () => {
  const a = anEntry(water, '08:00', { ml: 1 }, { id: 'a' })
  const b = anEntry(water, '08:00', { ml: 2 }, { id: 'b' })
  expect(recordOf(b, a).latest(water)?.id).toBe('b')
  expect([a, b].toSorted(latestFirst)).toEqual([b, a])
})

test('the latest entry that satisfies a condition can be asked for', () => {
  expect(recordOf(early, late).latest(water, data => data.ml < 200)?.performedAt).toEqual(at('08:00'))
  expect(recordOf(early, late).latest(water, data => data.ml > 400)).toBeUndefined()
})

test('a kind that was never charted has no entries', () => {
  expect(recordOf(early).of(tank)).toEqual([])
  expect(recordOf(early).latest(tank)).toBeUndefined()
})

test.each([
  ['07:59', 2],
  ['08:00', 2],
  ['08:01', 1],
  ['10:00', 1],
  ['10:01', 0],
])('since %s, %i of two entries were performed', (from, count) => {
  expect(recordOf(early, late).since(water, at(from))).toHaveLength(count)
})

test('a correction takes the place of what it corrects', () => {
  const corrected = aCorrection(late, water, '10:00', { ml: 250 })
  expect(
    recordOf(early, late, corrected)
      .of(water)
      .map(entry => entry.data.ml),
  ).toEqual([250, 100])
})

test('a chain of corrections counts once, as its last link', () => {
  const second = aCorrection(early, water, '08:00', { ml: 110 })
  const third = aCorrection(second, water, '08:05', { ml: 120 })
  expect(
    recordOf(third, early, second)
      .of(water)
      .map(entry => entry.data.ml),
  ).toEqual([120])
})

test('a retraction leaves nothing of what it retracts', () => {
  const retraction = aCorrection(late, water, '10:00', { ml: 300 }, { status: 'retracted' })
  expect(recordOf(early, late, retraction).latest(water)?.data.ml).toBe(100)
})

test('the same entry given twice counts once', () => {
  expect(effectiveEntries([early, early])).toEqual([early])
})

test('what was known at a moment leaves out what was written later', () => {
  const writtenLater = anEntry(water, '08:30', { ml: 200 }, { recordedAt: at('11:00') })
  expect(knownAt([early, writtenLater], at('10:59'))).toEqual([early])
  expect(knownAt([early, writtenLater], at('11:00'))).toEqual([early, writtenLater])
})

test('before a correction was written, the entry it corrects counted', () => {
  const corrected = aCorrection(early, water, '08:00', { ml: 110 }, { recordedAt: at('11:00') })
  expect(effectiveEntries(knownAt([early, corrected], at('10:00')))).toEqual([early])
})

test('an entry that cannot be read takes no part in rules', () => {
  const broken = anEntry(water, '11:00', { ml: 9 }, { raw: { ml: 9000 } })
  expect(
    recordOf(early, broken)
      .of(water)
      .map(entry => entry.data.ml),
  ).toEqual([100])
})

test('an unreadable correction does not bring back what it corrects', () => {
  const broken = aCorrection(early, water, '08:00', { ml: 9 }, { raw: { ml: 9000 } })
  expect(recordOf(early, broken).of(water)).toEqual([])
})

test('an entry of the record carries who and when, and neither version nor raw text', () => {
  expect(recordOf(early).latest(water)).toMatchObject({ recordedByName: 'Ama Mensah', performedAt: at('08:00') })
  expect(recordOf(early).latest(water)).not.toHaveProperty('raw')
})

test('the record before an act holds what had been done by then, and not the act', () => {
  const sameMinute = anEntry(tank, '10:00', { ml: 5 })
  const after = anEntry(water, '10:01', { ml: 400 })
  const before = recordBefore(recordOf(early, late, sameMinute, after), late)
  expect(before.of(water).map(entry => entry.data.ml)).toEqual([100])
  expect(before.latest(water, ({ ml }) => ml > 100)).toBeUndefined()
  expect(before.since(tank, at('10:00')).map(entry => entry.data.ml)).toEqual([5])
})

test('the record before an act holds the moves up to then', () => {
  const moves = ['09:00', '10:00', '10:01'].map(when => ({ at: at(when), bed: 'A4', ward: null }))
  const { record } = aContext([early, late], '12:00', { moves })
  expect(record.moves).toEqual(moves)
  expect(recordBefore(record, late).moves).toEqual(moves.slice(0, 2))
})

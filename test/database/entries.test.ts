import type { Transaction } from 'sequelize'
import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { addEntry, correctEntry, retractEntry } from '#database/entries.server.ts'
import { stayRecord } from '#database/records.server.ts'
import { sequelize } from '#database/sequelize.server.ts'
import { discharge } from '#database/stay-changes.server.ts'
import { wardRev } from '#database/ward-revs.server.ts'
import { cleared } from '#test/database.ts'
import { aPerson } from '#test/people.ts'
import { aCuffPressure, aStay, on, pressureOf26 } from '#test/stays.ts'

let bedside: Awaited<ReturnType<typeof aStay>>

beforeEach(async () => {
  await cleared()
  bedside = await aStay()
})

const anAct = (more: Parameters<typeof aCuffPressure>[2] = {}) => aCuffPressure(bedside.stayId, bedside.nurse, more)

const charted = async () => (await stayRecord(bedside.stayId))?.entries ?? []

test('an act is charted with its author, its role and the time of the database', async () => {
  const act = anAct({ data: { ...pressureOf26, note: 'Zoë: 😀 "quoted"\nsecond line' } })
  expect(await addEntry(act)).toEqual({
    outcome: 'charted',
    entry: { id: act.id, stayId: bedside.stayId, number: 1 },
  })
  const [entry] = await charted()
  expect(entry).toMatchObject({
    ...{ id: act.id, number: 1, kind: 'cuff-pressure', version: 1, status: 'final', reason: null, supersedesId: null },
    ...{ performedAt: on('02', '10:00'), recordedByName: 'Nurse of Ward 7', recordedRole: 'nurse', witnessName: null },
    raw: act.data,
  })
})

test('the same form again is answered as the first time and charted once', async () => {
  const act = anAct()
  await addEntry(act)
  const rev = await wardRev(bedside.ward.id)
  expect(await addEntry({ ...act, id: act.id.toUpperCase() })).toMatchObject({
    outcome: 'already charted',
    entry: { number: 1 },
  })
  expect(await charted()).toHaveLength(1)
  expect(await wardRev(bedside.ward.id)).toBe(rev)
})

test('fifty sendings of one form at once chart it once', async () => {
  const act = anAct()
  const outcomes = await Promise.all(Array.from({ length: 50 }, () => addEntry(act)))
  expect(outcomes.filter(({ outcome }) => outcome === 'charted')).toHaveLength(1)
  expect(outcomes.filter(({ outcome }) => outcome === 'already charted')).toHaveLength(49)
  expect(await charted()).toHaveLength(1)
})

test.each([
  ['another value', { data: { ...pressureOf26, found: 62 } }],
  ['another time', { performedAt: on('02', '10:01') }],
  ['a reason', { reason: 'Charted late' }],
])('a used id with %s changes nothing', async (_, other) => {
  const act = anAct()
  await addEntry(act)
  expect(await addEntry({ ...act, ...other })).toEqual({ outcome: 'other body under this id' })
  expect(await charted()).toMatchObject([{ raw: act.data, performedAt: act.performedAt }])
})

test('a used id of somebody else changes nothing', async () => {
  const act = anAct()
  await addEntry(act)
  const other = await aPerson({ name: 'Bea Lindqvist' })
  expect(await addEntry({ ...act, recordedBy: other })).toEqual({ outcome: 'other body under this id' })
})

test('two people who chart the same care are both kept', async () => {
  const other = await aPerson({ name: 'Bea Lindqvist' })
  const outcomes = await Promise.all([addEntry(anAct()), addEntry(anAct({ recordedBy: other }))])
  expect(outcomes.map(({ outcome }) => outcome)).toEqual(['charted', 'charted'])
})

test('a correction names the entry that it takes the place of', async () => {
  const act = anAct()
  await addEntry(act)
  const correction = { ...anAct({ data: { ...pressureOf26, found: 24 } }), supersedes: act.id, reason: 'Misread' }
  expect(await correctEntry(correction)).toMatchObject({ outcome: 'charted', entry: { number: 2 } })
  expect(await correctEntry(correction)).toMatchObject({ outcome: 'already charted' })
  expect(await charted()).toMatchObject([{ supersedesId: null }, { supersedesId: act.id, reason: 'Misread' }])
})

test('of twenty who correct one entry at once one is heard, and the others are told by whom', async () => {
  const act = anAct()
  await addEntry(act)
  const corrections = Array.from({ length: 20 }, () => ({ ...anAct(), supersedes: act.id, reason: 'Misread' }))
  const outcomes = await Promise.all(corrections.map(correction => correctEntry(correction)))
  const winners = outcomes.flatMap(outcome => (outcome.outcome === 'charted' ? [outcome.entry] : []))
  expect(winners).toHaveLength(1)
  const losers = outcomes.filter(({ outcome }) => outcome !== 'charted')
  expect(losers).toHaveLength(19)
  for (const loser of losers) {
    expect(loser).toMatchObject({
      ...{ outcome: 'already corrected', by: 'Nurse of Ward 7', at: expect.any(Date), entryId: winners[0]?.id },
    })
  }
})

test('a retraction keeps the payload of what no longer counts', async () => {
  const act = anAct()
  await addEntry(act)
  const [entry] = await charted()
  if (!entry) throw new Error('Nothing was charted')
  const retraction = { id: uuidv7(), recordedBy: bedside.nurse, reason: 'Another patient' }
  expect(await retractEntry(retraction, entry)).toMatchObject({ outcome: 'charted' })
  expect(await retractEntry(retraction, entry)).toMatchObject({ outcome: 'already charted' })
  expect(await charted()).toMatchObject([{ id: act.id }, { status: 'retracted', supersedesId: act.id, raw: act.data }])
})

test('a correction of an entry that was retracted is told so', async () => {
  const act = anAct()
  await addEntry(act)
  const [entry] = await charted()
  if (!entry) throw new Error('Nothing was charted')
  const id = uuidv7()
  await retractEntry({ id, recordedBy: bedside.nurse, reason: 'Another patient' }, entry)
  expect(await correctEntry({ ...anAct(), supersedes: act.id, reason: 'Misread' })).toMatchObject({
    outcome: 'already corrected',
    entryId: id,
  })
})

test('care of before the discharge is charted after it, and care of later is not', async () => {
  const { stayId, nurse } = bedside
  const early = anAct()
  await addEntry(early)
  await discharge({ stayId, dischargedAt: on('03', '12:00'), reason: 'home', note: null, careAfter: false }, nurse.id)
  expect(await addEntry(anAct({ performedAt: on('03', '12:00') }))).toMatchObject({ outcome: 'charted' })
  expect(await addEntry(anAct({ performedAt: on('03', '12:01') }))).toEqual({
    outcome: 'stay not open',
    dischargedAt: on('03', '12:00'),
  })
  expect(await addEntry(early)).toMatchObject({ outcome: 'already charted' })
})

test('care for a stay that is not there is refused', async () => {
  const outcome = await addEntry(aCuffPressure(uuidv7(), bedside.nurse))
  expect(outcome).toEqual({ outcome: 'stay not open', dischargedAt: null })
})

test('what the schema does not take is never stored', async () => {
  const act = anAct({ data: { ...pressureOf26, found: 4000 } })
  await expect(addEntry(act)).rejects.toThrow(/must be from 0 to 120/)
  expect(await charted()).toEqual([])
})

test('an entry raises the counter of its ward', async () => {
  const rev = await wardRev(bedside.ward.id)
  await addEntry(anAct())
  expect(await wardRev(bedside.ward.id)).toBe(rev + 1)
})

test('a witness is kept by name', async () => {
  const witness = await aPerson({ name: 'Bea Lindqvist' })
  await addEntry(anAct({ witnessId: witness.id }))
  expect(await charted()).toMatchObject([{ witnessName: 'Bea Lindqvist' }])
})

test('a used id with another witness changes nothing', async () => {
  const act = anAct({ witnessId: (await aPerson({ name: 'Second Nurse' })).id })
  await addEntry(act)
  expect(await addEntry(act)).toMatchObject({ outcome: 'already charted' })
  expect(await addEntry({ ...act, witnessId: (await aPerson({ name: 'Third Nurse' })).id })).toEqual({
    outcome: 'other body under this id',
  })
})

test('what is written alongside is written with the act, once, or not at all', async () => {
  const lines: string[] = []
  const alongside = async (transaction: Transaction) => {
    await sequelize.query('UPDATE wards SET name = :name WHERE id = :id', {
      replacements: { name: 'Renamed by the act', id: bedside.ward.id },
      transaction,
    })
    lines.push('written')
  }
  const act = anAct()
  expect(await addEntry(act, alongside)).toMatchObject({ outcome: 'charted' })
  expect(await addEntry(act, alongside)).toMatchObject({ outcome: 'already charted' })
  expect(lines).toEqual(['written'])
  const failing = async () => {
    throw new RangeError('No such item')
  }
  const other = anAct()
  await expect(addEntry(other, failing)).rejects.toThrow('No such item')
  expect((await charted()).map(({ id }) => id)).toEqual([act.id])
})

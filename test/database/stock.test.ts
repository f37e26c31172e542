import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import type { StoredEntry } from '#app/care/kind.ts'
import { addEntry, correctEntry, retractEntry } from '#database/entries.server.ts'
import { stayRecord } from '#database/records.server.ts'
import { sequelize } from '#database/sequelize.server.ts'
import { move } from '#database/stay-changes.server.ts'
import { stockKeptSince, usedByStays } from '#database/stock.server.ts'
import { recordStockAct, type StockAct } from '#database/stock-acts.server.ts'
import { moveCursorText, readMoveCursor, stockHistory } from '#database/stock-history.server.ts'
import { cleared, owner } from '#test/database.ts'
import { aStay, on } from '#test/stays.ts'
import { aSuction, catheter12, noSuction, received, stockWords, suctionWith } from '#test/stock.ts'

let given: Awaited<ReturnType<typeof aStay>>
let bedId: string

beforeEach(async () => {
  await cleared()
  given = await aStay()
  bedId = given.ward.bedIds[0] ?? ''
})

const store = () => ({ wardId: given.ward.id, bedId: null })
const bed = () => ({ wardId: given.ward.id, bedId })
const words = () => stockWords(given.ward.id)
const anAct = () => aSuction(given.stayId, given.nurse)
const entryOf = async (id: string): Promise<StoredEntry> => {
  const entry = (await stayRecord(given.stayId))?.entries.find(one => one.id === id)
  if (!entry) throw new Error('It was not charted')
  return entry
}

test('an act takes what lies at the bed first, then from the store, which may go below nothing', async () => {
  await received(bed(), 1, given.nurse.id)
  await received(store(), 1, given.nurse.id)
  await addEntry(anAct())
  expect(await words()).toEqual(['store catheter-12-fr 1'])
  await addEntry(anAct())
  await addEntry(anAct())
  expect(await words()).toEqual(['store catheter-12-fr -1'])
})

test('the same form twice takes nothing twice', async () => {
  const act = anAct()
  await Promise.all([addEntry(act), addEntry(act), addEntry(act)])
  expect(await words()).toEqual(['store catheter-12-fr -1'])
})

test('a correction gives back what the old entry took and takes the new, a retraction gives it back', async () => {
  await received(bed(), 1, given.nurse.id)
  const act = anAct()
  await addEntry(act)
  const other = { ...anAct(), data: suctionWith('14 Fr'), supersedes: act.id, reason: 'Misread' }
  await correctEntry(other)
  await correctEntry(other)
  expect(await words()).toEqual(['1 catheter-12-fr 1', 'store catheter-14-fr -1'])
  const retraction = { id: uuidv7(), recordedBy: given.nurse, reason: 'Another patient' }
  await retractEntry(retraction, await entryOf(other.id))
  await retractEntry(retraction, await entryOf(other.id))
  expect(await words()).toEqual(['1 catheter-12-fr 1'])
})

test('an act that takes nothing moves nothing', async () => {
  await addEntry({ ...anAct(), data: noSuction })
  expect(await stockKeptSince(given.ward.id)).toBeUndefined()
})

test('what is charted late was taken where the patient was then', async () => {
  await received(bed(), 2, given.nurse.id)
  const [, other = ''] = given.ward.bedIds
  const to = { id: uuidv7(), stayId: given.stayId, wardId: given.ward.id, bedId: other, movedAt: on('03', '10:00') }
  await move(to, given.nurse.id)
  await addEntry(anAct())
  await addEntry({ ...anAct(), performedAt: on('04', '10:00') })
  expect(await words()).toEqual(['1 catheter-12-fr 1', 'store catheter-12-fr -1'])
})

test('what a stay used adds up by day, without what was given back', async () => {
  const [first, second] = [anAct(), { ...anAct(), performedAt: on('04', '11:00') }]
  await addEntry(first)
  await addEntry(second)
  const all = [{ stayId: given.stayId, item: 'catheter-12-fr', used: 1 }]
  expect(await usedByStays([given.stayId], on('05', '10:00'), 14)).toMatchObject([
    { ...all[0], day: 0 },
    { ...all[0], day: 3 },
  ])
  await retractEntry({ id: uuidv7(), recordedBy: given.nurse, reason: 'Not done' }, await entryOf(first.id))
  expect(await usedByStays([given.stayId], on('05', '10:00'), 14)).toMatchObject([{ ...all[0], day: 0 }])
  expect(await usedByStays([], on('05', '10:00'), 14)).toEqual([])
})

const aCount = (counted: number): StockAct => {
  const spine = { id: uuidv7(), item: catheter12, at: on('05', '10:00'), by: given.nurse.id, reason: null }
  return { ...spine, act: 'counted', in: store(), counted }
}

test('a count is written as the difference, with what was counted', async () => {
  await received(store(), 10, given.nurse.id)
  expect(await recordStockAct(aCount(7))).toEqual({ outcome: 'recorded', was: 10 })
  expect(await words()).toEqual(['store catheter-12-fr 7'])
  const { moves } = await stockHistory(given.ward.id, { limit: 1 })
  expect(moves).toMatchObject([{ act: 'counted', quantity: -3, counted: 7, recordedByName: 'Nurse of Ward 7' }])
})

test('of counts at the same moment each is right for itself', async () => {
  await received(store(), 10, given.nurse.id)
  await Promise.all(Array.from({ length: 8 }, () => recordStockAct(aCount(7))))
  expect(await words()).toEqual(['store catheter-12-fr 7'])
})

test('the same act again is the same act, and under its id with other answers nothing is changed', async () => {
  const spine = { id: uuidv7(), item: catheter12, at: on('05', '10:00'), by: given.nurse.id, reason: null }
  const box: StockAct = { ...spine, act: 'moved', from: store(), to: bed(), quantity: 5 }
  const outcomes = await Promise.all([recordStockAct(box), recordStockAct(box), recordStockAct(box)])
  expect(outcomes.map(({ outcome }) => outcome).toSorted()).toEqual([
    'already recorded',
    'already recorded',
    'recorded',
  ])
  expect(await recordStockAct({ ...box, quantity: 6 })).toEqual({ outcome: 'other body under this id' })
  expect(await words()).toEqual(['1 catheter-12-fr 5', 'store catheter-12-fr -5'])
  const count = aCount(7)
  await recordStockAct(count)
  expect(await recordStockAct(count)).toEqual({ outcome: 'already recorded' })
  expect(await words()).toEqual(['1 catheter-12-fr 5', 'store catheter-12-fr 7'])
})

test('a bed of another ward is no place of this one', async () => {
  expect(await received({ wardId: given.ward.id, bedId: uuidv7() }, 1, given.nurse.id)).toEqual({
    outcome: 'no such place',
  })
  expect(await words()).toEqual([])
})

test('moves are neither changed nor deleted, and the application may not even try', async () => {
  await received(store(), 1, given.nurse.id)
  await expect(owner.query('UPDATE stock_moves SET quantity = 2')).rejects.toThrow(/append-only/)
  await expect(owner.query('DELETE FROM stock_moves')).rejects.toThrow(/append-only/)
  await expect(sequelize.query('UPDATE stock_moves SET quantity = 2')).rejects.toThrow(/denied/)
})

test('the history pages from the newest move to the oldest', async () => {
  for (const quantity of [1, 2, 3]) await received(store(), quantity, given.nurse.id)
  const first = await stockHistory(given.ward.id, { limit: 2 })
  expect(first.moves.map(({ quantity }) => quantity)).toEqual([3, 2])
  const before = readMoveCursor(first.next && moveCursorText(first.next))
  const second = await stockHistory(given.ward.id, { limit: 2, before })
  expect(second).toMatchObject({ moves: [{ quantity: 1 }], next: null })
  expect(readMoveCursor('2026-13-45T00:00:00.000Z_x')).toBeUndefined()
})

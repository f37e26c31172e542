import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { authorOf } from '#app/auth/permissions.ts'
import { addEntry, correctEntry } from '#database/entries.server.ts'
import { writtenSince } from '#database/shift-writing.server.ts'
import { move } from '#database/stay-changes.server.ts'
import { cleared } from '#test/database.ts'
import { aPerson } from '#test/people.ts'
import { aCuffPressure, admitted, aWardOf } from '#test/stays.ts'

const minutesAgo = (count: number) => new Date(Date.now() - count * 60_000)

let ward: Awaited<ReturnType<typeof aWardOf>>
let other: Awaited<ReturnType<typeof aWardOf>>
let stayId: string

beforeEach(async () => {
  await cleared()
  ward = await aWardOf(1, 'Ward 7')
  other = await aWardOf(1, 'Ward 8')
  stayId = (await admitted(ward.id, ward.bedIds[0] ?? '', ward.nurse.id, { admittedAt: minutesAgo(600) })).stayId
})

const chart = (by: { readonly id: string; readonly role: string }, performedAt = minutesAgo(5)) =>
  addEntry(aCuffPressure(stayId, by, { performedAt }))

const readSince = async (wardIds: readonly string[], minutes = 60) =>
  (await writtenSince(wardIds, minutesAgo(minutes))).map(({ wardId, userId, kind, isAct }) => [
    wardId === ward.id ? 'Ward 7' : 'Ward 8',
    userId === ward.nurse.id ? 'nurse' : 'somebody else',
    kind,
    isAct,
  ])

test('what was written since is read with its ward; a correction is no act of its own', async () => {
  const charted = await chart(ward.nurse)
  if (charted.outcome !== 'charted') throw new Error(charted.outcome)
  const again = aCuffPressure(stayId, other.nurse, { performedAt: minutesAgo(5) })
  await correctEntry({ ...again, supersedes: charted.entry.id, reason: 'Misread' })
  expect(await readSince([ward.id])).toEqual([
    ['Ward 7', 'nurse', 'cuff-pressure', true],
    ['Ward 7', 'somebody else', 'cuff-pressure', false],
  ])
  expect(await readSince([other.id])).toEqual([])
  expect(await readSince([])).toEqual([])
})

test('what a student wrote, and what was done before, is left out', async () => {
  const student = await aPerson({ name: 'Ines Student', wardIds: [ward.id], isSupervised: true })
  await chart(authorOf(student))
  await chart(ward.nurse, minutesAgo(90))
  expect(await readSince([ward.id])).toEqual([])
  expect(await readSince([ward.id], 120)).toHaveLength(1)
})

test('after a move, what was written before it stays with the ward of that time', async () => {
  await chart(ward.nurse)
  const to = { id: uuidv7(), stayId, wardId: other.id, bedId: other.bedIds[0] ?? '', movedAt: new Date() }
  await move(to, ward.nurse.id)
  await chart(other.nurse, new Date())
  expect(await readSince([ward.id, other.id])).toEqual([
    ['Ward 7', 'nurse', 'cuff-pressure', true],
    ['Ward 8', 'somebody else', 'cuff-pressure', true],
  ])
})

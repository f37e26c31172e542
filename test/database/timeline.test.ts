import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { suction } from '#app/care/suction/kind.ts'
import { addEntry, correctEntry, retractEntry } from '#database/entries.server.ts'
import { cursorText, entryWithHistory, readCursor, timeline } from '#database/timeline.server.ts'
import { cleared, owner } from '#test/database.ts'
import { aCuffPressure, aStay, on, pressureOf26 } from '#test/stays.ts'

let bedside: Awaited<ReturnType<typeof aStay>>

beforeEach(async () => {
  await cleared()
  bedside = await aStay()
})

const chart = async (time: string, more: Parameters<typeof aCuffPressure>[2] = {}) => {
  const act = aCuffPressure(bedside.stayId, bedside.nurse, { performedAt: on('02', time), ...more })
  await addEntry(act)
  return act
}

test('the timeline is paged from the latest, each entry once, at equal times too', async () => {
  for (const time of ['10:00', '12:00', '12:00', '12:00', '09:00', '14:00', '11:00']) await chart(time)
  const pages: string[][] = []
  const seen = new Set<string>()
  let before = undefined as Awaited<ReturnType<typeof timeline>>['next'] | undefined
  do {
    const page = await timeline(bedside.stayId, { limit: 3, before: before ?? undefined })
    pages.push(page.entries.map(({ entry }) => entry.performedAt.toISOString().slice(11, 16)))
    for (const { entry } of page.entries) seen.add(entry.id)
    before = page.next && readCursor(cursorText(page.next))
  } while (before)
  expect(pages).toEqual([['14:00', '12:00', '12:00'], ['12:00', '11:00', '10:00'], ['09:00']])
  expect(seen.size).toBe(7)
})

test('a page that ends with the last entry says that there is no more', async () => {
  for (const time of ['10:00', '12:00']) await chart(time)
  expect((await timeline(bedside.stayId, { limit: 2 })).next).toBeNull()
})

test('one kind of care can be shown alone', async () => {
  await chart('10:00')
  const [example] = suction.examples
  if (!example) throw new Error('Suction has no example')
  const act = { id: uuidv7(), kind: suction, stayId: bedside.stayId, performedAt: on('02', '11:00'), data: example }
  await addEntry({ ...act, recordedBy: bedside.nurse })
  const { entries } = await timeline(bedside.stayId, { limit: 10, kind: 'suction' })
  expect(entries.map(({ entry }) => entry.kind)).toEqual(['suction'])
})

test('what was corrected or retracted stays in view with what took its place', async () => {
  const wrong = await chart('10:00')
  const right = { ...aCuffPressure(bedside.stayId, bedside.nurse), supersedes: wrong.id, reason: 'Misread' }
  await correctEntry({ ...right, performedAt: on('02', '10:05') })
  const found = await entryWithHistory(right.id)
  if (!found) throw new Error('Nothing was charted')
  await retractEntry({ id: uuidv7(), recordedBy: bedside.nurse, reason: 'Another patient' }, found.entry)
  const { entries } = await timeline(bedside.stayId, { limit: 10 })
  const by = new Map(entries.map(({ entry, supersededBy }) => [entry.number, supersededBy]))
  expect(by.get(1)).toMatchObject({
    id: right.id,
    recordedByName: 'Nurse of Ward 7',
    reason: 'Misread',
    status: 'final',
  })
  expect(by.get(2)).toMatchObject({ reason: 'Another patient', status: 'retracted' })
  expect(by.get(3)).toBeNull()
})

test('an entry shows the whole chain that it belongs to, and whose it is', async () => {
  const one = await chart('10:00')
  await chart('11:00')
  const two = { ...aCuffPressure(bedside.stayId, bedside.nurse), supersedes: one.id, reason: 'Misread' }
  const three = { ...aCuffPressure(bedside.stayId, bedside.nurse), supersedes: two.id, reason: 'Again' }
  await correctEntry(two)
  await correctEntry(three)
  for (const id of [one.id, two.id, three.id]) {
    const found = await entryWithHistory(id)
    expect(found?.entry.id).toBe(id)
    expect(found?.chain.map(link => link.id)).toEqual([one.id, two.id, three.id])
    expect(found).toMatchObject({ patientId: bedside.patientId, wardId: bedside.ward.id })
  }
})

test.each(['', 'x', '018f0000-0000-7000-8000-000000000000', "' OR 1=1 --"])('%j is no entry', async id => {
  expect(await entryWithHistory(id)).toBeUndefined()
})

test('a payload that cannot be read does not break the page', async () => {
  await chart('10:00', { data: { ...pressureOf26, note: 'kept' } })
  await owner.query(
    `INSERT INTO entries (id, stay_id, kind, version, performed_at, recorded_by, recorded_role, data)
     VALUES (UUID(), :stayId, 'no-such-kind', 7, '2026-11-02 12:00:00', :by, 'nurse', '{"old":["shape"]}')`,
    { replacements: { stayId: bedside.stayId, by: bedside.nurse.id } },
  )
  const { entries } = await timeline(bedside.stayId, { limit: 10 })
  expect(entries.map(({ entry }) => entry.raw)).toEqual([{ old: ['shape'] }, { ...pressureOf26, note: 'kept' }])
})

test.each([null, '', 'x', '2026-11-02T10:00:00.000Z', '2026-13-02T10:00:00.000Z_018f0000-0000-7000-8000-000000000000'])(
  '%j is no cursor',
  text => {
    expect(readCursor(text)).toBeUndefined()
  },
)

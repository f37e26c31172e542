import { v7 as uuidv7 } from 'uuid'
import { afterEach, beforeEach, expect, test } from 'vitest'
import { addEntry, correctEntry } from '#database/entries.server.ts'
import { entries as entriesMigration } from '#database/migrations/0013-entries.ts'
import { verifyEntries } from '#database/verify-entries.server.ts'
import { cleared, owner } from '#test/database.ts'
import { aCuffPressure, aStay, on, pressureOf26 } from '#test/stays.ts'

let bedside: Awaited<ReturnType<typeof aStay>>

beforeEach(async () => {
  await cleared()
  bedside = await aStay()
  for (const [time, note] of [
    ['10:00', 'plain'],
    ['11:00', 'Zoë 😀'],
    ['12:00', 'two\nlines'],
  ] as const) {
    const data = { ...pressureOf26, note }
    await addEntry(aCuffPressure(bedside.stayId, bedside.nurse, { performedAt: on('02', time), data }))
  }
})

// The migration makes again what a test took away: its statements say IF NOT EXISTS.
afterEach(() => entriesMigration.up({ name: '0013-entries', context: owner.getQueryInterface() }))

/** What somebody with all rights could do: take the guard away, and write. */
async function tamper(guard: string, sql: string) {
  await owner.query(`DROP TRIGGER ${guard}`)
  await owner.query(sql)
}

test('what was charted and corrected is found as it was written', async () => {
  const act = aCuffPressure(bedside.stayId, bedside.nurse)
  await addEntry(act)
  const correction = { ...aCuffPressure(bedside.stayId, bedside.nurse), supersedes: act.id, reason: 'A "quote"\n€' }
  await correctEntry(correction)
  expect(await verifyEntries()).toMatchObject({ stays: 1, entries: 5, faults: [] })
})

test('the digest moves with every entry', async () => {
  const before = await verifyEntries()
  await addEntry(aCuffPressure(bedside.stayId, bedside.nurse))
  expect((await verifyEntries()).digest).not.toBe(before.digest)
})

test.each([
  [`UPDATE entries SET data = JSON_SET(data, '$.found', 62) WHERE number = 2`, 2],
  [`UPDATE entries SET performed_at = performed_at + INTERVAL 1 MINUTE WHERE number = 1`, 1],
  [`UPDATE entries SET recorded_role = 'charge nurse' WHERE number = 3`, 3],
  [`UPDATE entries SET reason = 'because' WHERE number = 2`, 2],
])('%s is found', async (sql, number) => {
  await tamper('entries_refuse_update', sql)
  expect((await verifyEntries()).faults).toEqual([
    { stayId: bedside.stayId, number, says: 'is not as it was written, or what came before it is not' },
  ])
})

test('an entry taken out of the middle is found', async () => {
  await tamper('entries_refuse_delete', 'DELETE FROM entries WHERE number = 2')
  const { faults } = await verifyEntries()
  expect(faults).toContainEqual({
    stayId: bedside.stayId,
    number: 3,
    says: 'follows 1: what was between them is gone',
  })
})

test('an entry taken off the end is found', async () => {
  await tamper('entries_refuse_delete', 'DELETE FROM entries WHERE number = 3')
  expect((await verifyEntries()).faults).toEqual([
    { stayId: bedside.stayId, number: 2, says: 'is not the last one: 3 were charted' },
  ])
})

test.each([
  ['no-such-kind', '{}', 'is of a kind that is not known: no-such-kind'],
  ['cuff-pressure', '{"found":"much"}', expect.stringMatching(/^cannot be read: /)],
])('a payload of %s that today cannot be read is named', async (kind, data, says) => {
  await owner.query(
    `INSERT INTO entries (id, stay_id, kind, version, performed_at, recorded_by, recorded_role, data)
     VALUES (:id, :stayId, :kind, 1, '2026-11-02 10:00:00', :by, 'nurse', :data)`,
    { replacements: { id: uuidv7(), stayId: bedside.stayId, kind, by: bedside.nurse.id, data } },
  )
  expect((await verifyEntries()).faults).toEqual([{ stayId: bedside.stayId, number: 4, says }])
})

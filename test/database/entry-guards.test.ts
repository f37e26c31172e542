import { QueryTypes } from 'sequelize'
import { v7 as uuidv7 } from 'uuid'
import { beforeAll, expect, test } from 'vitest'
import { addEntry } from '#database/entries.server.ts'
import { sequelize } from '#database/sequelize.server.ts'
import { cleared, owner } from '#test/database.ts'
import { aCuffPressure, admitted, aStay } from '#test/stays.ts'

// What the database refuses by itself, whoever writes: the owner stands for a program with a mistake in it.
let bedside: Awaited<ReturnType<typeof aStay>>
let entryId: string

// One stay for all: what is refused leaves nothing behind.
beforeAll(async () => {
  await cleared()
  bedside = await aStay()
  const act = aCuffPressure(bedside.stayId, bedside.nurse)
  await addEntry(act)
  entryId = act.id
})

const row = () => ({
  id: uuidv7(),
  stay_id: bedside.stayId,
  kind: 'cuff-pressure',
  version: 1,
  performed_at: '2026-11-02 11:00:00.000',
  recorded_by: bedside.nurse.id,
  recorded_role: 'nurse',
  data: '{"found":26}',
})

function insert(columns: Record<string, unknown>) {
  const names = Object.keys(columns)
  return owner.query(`INSERT INTO entries (${names.join(', ')}) VALUES (${names.map(name => `:${name}`).join(', ')})`, {
    replacements: columns,
  })
}

test('a plain row is taken', async () => {
  await expect(insert(row())).resolves.toBeDefined()
})

test.each<[string, () => Record<string, unknown>, RegExp]>([
  ['a payload that is no object', () => ({ data: '[1]' }), /entries_data_is_object/],
  ['a payload that is no JSON', () => ({ data: '{broken' }), /entries.data/],
  ['a payload of megabytes', () => ({ data: JSON.stringify({ note: 'x'.repeat(70_000) }) }), /entries_data_is_small/],
  ['a time to come', () => ({ performed_at: '2126-01-01 00:00:00.000' }), /entries_have_happened/],
  ['a kind that is no slug', () => ({ kind: 'Cuff Pressure' }), /entries_kind_is_a_slug/],
  ['version 0', () => ({ version: 0 }), /entries_are_counted/],
  ['an unknown status', () => ({ status: 'deleted' }), /entries_status_is_known/],
  ['a retraction of nothing', () => ({ status: 'retracted' }), /entries_retract_another/],
  ['a correction without a reason', () => ({ supersedes_id: entryId }), /entries_correct_with_a_reason/],
  ['a correction for a blank reason', () => ({ supersedes_id: entryId, reason: '  ' }), /correct_with_a_reason/],
  ['an own witness', () => ({ witness_id: bedside.nurse.id }), /entries_are_witnessed_by_another/],
  ['an unknown author', () => ({ recorded_by: uuidv7() }), /entries_recorded_by/],
  ['an unknown stay', () => ({ stay_id: uuidv7() }), /belong to a stay/],
  [
    'a correction of another kind',
    () => ({ supersedes_id: entryId, reason: 'x', kind: 'suction' }),
    /same stay and kind/,
  ],
])('%s is refused', async (_, wrong, words) => {
  await expect(insert({ ...row(), ...wrong() })).rejects.toThrow(words)
})

test('a correction of an entry of another stay is refused', async () => {
  const { ward, nurse } = bedside
  const other = await admitted(ward.id, ward.bedIds[1] ?? '', nurse.id)
  const wrong = { ...row(), stay_id: other.stayId, supersedes_id: entryId, reason: 'x' }
  await expect(insert(wrong)).rejects.toThrow(/same stay and kind/)
})

test('a number and a hash that are given are not taken', async () => {
  const given = { ...row(), number: 900, hash: 'f'.repeat(64) }
  await insert(given)
  const [stored] = await owner.query<{ number: number; hash: string }>(
    'SELECT number, hash FROM entries WHERE id = :id',
    {
      replacements: given,
      type: QueryTypes.SELECT,
    },
  )
  expect(stored?.number).toBeLessThan(900)
  expect(stored?.hash).not.toBe(given.hash)
})

test.each(['UPDATE entries SET reason = NULL', 'DELETE FROM entries'])('%s is refused to the owner', async sql => {
  await expect(owner.query(sql)).rejects.toThrow(/append-only/)
})

test.each(['UPDATE entries SET reason = NULL', 'DELETE FROM entries', 'TRUNCATE TABLE entries', 'DROP TABLE entries'])(
  '%s is refused to the application',
  async sql => {
    await expect(sequelize.query(sql)).rejects.toThrow(/command denied/)
  },
)

test.each(['policies', 'record_changes'])('%s is only added to', async table => {
  await expect(sequelize.query(`UPDATE ${table} SET id = id`)).rejects.toThrow(/command denied|append-only/)
  await expect(sequelize.query(`DELETE FROM ${table}`)).rejects.toThrow(/command denied|append-only/)
})

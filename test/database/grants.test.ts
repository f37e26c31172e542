import { QueryTypes } from 'sequelize'
import { beforeAll, expect, test } from 'vitest'
import { select, sequelize } from '#database/sequelize.server.ts'
import { migrated, owner } from '#test/database.ts'

beforeAll(migrated)

test.each([
  `UPDATE entries SET reason = 'x'`,
  'DELETE FROM entries',
  'TRUNCATE TABLE entries',
  'DROP TABLE entries',
  'DELETE FROM access_log',
  `UPDATE access_log SET id = 1`,
  'DROP TRIGGER entries_refuse_delete',
  'UPDATE policies SET id = id',
  'DELETE FROM record_changes',
  'DELETE FROM schema_migrations',
  'SET GLOBAL sql_mode = ""',
])('the application may not %s', async statement => {
  await expect(sequelize.query(statement)).rejects.toThrow(/denied/)
})

test('the application may read and add to what it may not change', async () => {
  expect(await select('SELECT 1 FROM entries, access_log LIMIT 1')).toEqual([])
})

test('even the owner is refused a change of an entry by its triggers', async () => {
  const events = await owner.query<{ event: string }>(
    `SELECT event_manipulation AS event FROM information_schema.triggers
     WHERE trigger_schema = DATABASE() AND event_object_table = 'entries' AND event_manipulation <> 'INSERT'
     ORDER BY event`,
    { type: QueryTypes.SELECT },
  )
  expect(events.map(({ event }) => event)).toEqual(['DELETE', 'UPDATE'])
})

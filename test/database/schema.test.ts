import { expect, test } from 'vitest'
import { migrateDown, migrateUp, migrationStatus } from '#database/migrate.server.ts'
import { schemaOf } from '#database/schema.server.ts'
import { migrated, withScratchDatabase } from '#test/database.ts'

// After a new migration: npm run schema
test('schema.sql shows the migrated schema', async () => {
  await migrated()
  // A database of its own: other tests take triggers away and put them back.
  await withScratchDatabase(async scratch => {
    await migrateUp(scratch)
    await expect(await schemaOf(scratch)).toMatchFileSnapshot('../../database/schema.sql')
  })
})

test('migrations lead up, back down to nothing, and up to the same schema', async () => {
  await migrated()
  await withScratchDatabase(async scratch => {
    await migrateUp(scratch)
    const first = await schemaOf(scratch)
    await migrateDown(scratch, '0')
    expect(await schemaOf(scratch)).toMatch(/^CREATE TABLE `schema_migrations` [^;]*;\n$/)
    await migrateUp(scratch)
    expect(await schemaOf(scratch)).toBe(first)
  })
})

test('of two processes that migrate at once, one does and the other finds nothing to do', async () => {
  await migrated()
  await withScratchDatabase(async scratch => {
    const [one, other] = await Promise.all([migrateUp(scratch), migrateUp(scratch)])
    expect([...one, ...other]).toEqual((await migrationStatus(scratch)).all)
  })
})

test('a migration is taken back to a named one', async () => {
  await migrated()
  await withScratchDatabase(async scratch => {
    await migrateUp(scratch)
    const { all } = await migrationStatus(scratch)
    const [before = '', last = ''] = all.slice(-2)
    expect(await migrateDown(scratch, before)).toEqual([last])
    expect((await migrationStatus(scratch)).pending).toEqual([last])
  })
})

import { QueryTypes, type Sequelize } from 'sequelize'
import { env } from '#app/env.server.ts'
import { connection } from '#database/connection.server.ts'
import { grantAppRights } from '#database/grants.server.ts'
import { migrateUp } from '#database/migrate.server.ts'

/** The worker's database as the user who owns it: for what the application may not do, such as altering an entry. */
export const owner = connection(env.databaseOwnerUrl, { maxConnections: 3, queryTimeoutMs: 60_000 })

/** The name of this worker's database. */
export const databaseName = owner.getDatabaseName()

let ready: Promise<ClearedTable[]> | undefined

interface ClearedTable {
  name: string
  statement: string
}

/** Makes this worker's database with today's schema, and the rights of the application's user on it. Repeatable. */
export async function migrated(): Promise<void> {
  await tablesToClear()
}

/** An empty database with today's schema: `beforeEach(cleared)`. */
export async function cleared(): Promise<void> {
  const tables = await tablesToClear()
  if (tables.length === 0) return
  const questions = tables.map(({ name }) => `SELECT '${name}' AS name WHERE EXISTS (SELECT 1 FROM \`${name}\`)`)
  const filled = await owner.query<{ name: string }>(questions.join(' UNION ALL '), { type: QueryTypes.SELECT })
  const names = new Set(filled.map(({ name }) => name))
  await owner.transaction(async transaction => {
    await owner.query('SET foreign_key_checks = 0', { transaction })
    for (const { name, statement } of tables) if (names.has(name)) await owner.query(statement, { transaction })
    await owner.query('SET foreign_key_checks = 1', { transaction })
  })
}

/** Makes an empty database beside the worker's own, does the work in it, and drops it: for migrations and restores. */
export async function withScratchDatabase<T>(work: (scratch: Sequelize, url: string) => Promise<T>): Promise<T> {
  const url = `${env.databaseOwnerUrl}_scratch`
  const scratch = connection(url, { maxConnections: 3, queryTimeoutMs: 60_000 })
  await owner.query(`CREATE OR REPLACE DATABASE \`${scratch.getDatabaseName()}\``)
  try {
    return await work(scratch, url)
  } finally {
    await scratch.close()
    await owner.query(`DROP DATABASE \`${scratch.getDatabaseName()}\``)
  }
}

function tablesToClear() {
  ready ??= prepared()
  return ready
}

async function prepared(): Promise<ClearedTable[]> {
  await createDatabase()
  const applied = await migrateUp(owner)
  if (applied.length > 0) await grantAppRights(owner, env.databaseUrl)
  const tables = await owner.query<{ name: string; guarded: number }>(
    `SELECT table_name AS name, EXISTS (SELECT 1 FROM information_schema.triggers g WHERE g.event_object_schema = DATABASE()
       AND g.event_object_table = t.table_name AND g.event_manipulation = 'DELETE') AS guarded
     FROM information_schema.tables t
     WHERE table_schema = DATABASE() AND table_type = 'BASE TABLE' AND table_name <> 'schema_migrations'`,
    { type: QueryTypes.SELECT },
  )
  // DELETE is faster on few rows, but a trigger keeps entries from being deleted.
  return tables.map(({ name, guarded }) => ({
    name,
    statement: guarded ? `TRUNCATE TABLE \`${name}\`` : `DELETE FROM \`${name}\``,
  }))
}

async function createDatabase() {
  const server = new URL(env.databaseOwnerUrl)
  server.pathname = '/'
  const anyDatabase = connection(server.href, { maxConnections: 1 })
  try {
    await anyDatabase.query(`CREATE DATABASE IF NOT EXISTS \`${databaseName}\``)
  } finally {
    await anyDatabase.close()
  }
}

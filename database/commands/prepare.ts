// What npm start does before it serves, in one process: the schema, and with --demo the demo hospital of an empty database.
import '../environment.ts'
import { env } from '#app/env.server.ts'
import { connection } from '../connection.server.ts'
import { schemaUp } from '../schema-up.server.ts'
import { seed } from '../seeders/seed.server.ts'
import { sequelize } from '../sequelize.server.ts'

const owner = connection(env.databaseOwnerUrl, { maxConnections: 3, queryTimeoutMs: 600_000 })
try {
  const schema = await schemaUp(owner, env.databaseUrl)
  const demo = process.argv.includes('--demo') ? await seed(owner, 'if empty', new Date(), env.hospitalTimeZone) : ''
  console.log(`Schema ${schema}. ${demo}`.trim())
} catch (error) {
  console.error(error instanceof Error ? error.message : error)
  process.exitCode = 1
} finally {
  await Promise.all([owner.close(), sequelize.close()])
}

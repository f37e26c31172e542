import '../environment.ts'
import { parseArgs } from 'node:util'
import { env } from '#app/env.server.ts'
import { connection } from '../connection.server.ts'
import { seed } from '../seeders/seed.server.ts'
import { sequelize } from '../sequelize.server.ts'

const owner = connection(env.databaseOwnerUrl, { maxConnections: 2, queryTimeoutMs: 60_000 })
try {
  const { values } = parseArgs({
    options: { 'if-empty': { type: 'boolean' }, reset: { type: 'boolean' }, now: { type: 'string' } },
  })
  const how = values.reset ? 'reset' : values['if-empty'] ? 'if empty' : 'only'
  console.log(await seed(owner, how, moment(values.now), env.hospitalTimeZone))
} catch (error) {
  console.error(error instanceof Error ? error.message : error)
  process.exitCode = 1
} finally {
  await Promise.all([owner.close(), sequelize.close()])
}

function moment(text: string | undefined): Date {
  const at = text === undefined ? new Date() : new Date(text)
  if (Number.isNaN(at.getTime())) throw new Error(`--now is ${text}: write it as 2026-12-01T14:06:00Z`)
  return at
}

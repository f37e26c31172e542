import '../environment.ts'
import { env } from '#app/env.server.ts'
import { connection } from '../connection.server.ts'
import { migrateDown, migrationStatus } from '../migrate.server.ts'
import { counted, schemaUp } from '../schema-up.server.ts'

const USAGE = 'Say what to do: npm run migrate -- up | down --to <name, or 0 for all> | status'

const owner = connection(env.databaseOwnerUrl, { maxConnections: 3, queryTimeoutMs: 600_000 })
try {
  console.log(await answer(process.argv.slice(2)))
} catch (error) {
  console.error(error instanceof Error ? error.message : error)
  process.exitCode = 1
} finally {
  await owner.close()
}

async function answer([command, ...options]: string[]): Promise<string> {
  switch (command) {
    case 'up':
      return schemaUp(owner, env.databaseUrl)
    case 'down': {
      const [option, to] = options
      if (option !== '--to' || !to) throw new Error(USAGE)
      const reverted = await migrateDown(owner, to)
      return reverted.length > 0 ? `took back ${counted(reverted)}` : 'nothing to take back'
    }
    case 'status': {
      const { all, pending } = await migrationStatus(owner)
      return all.map(name => `${pending.includes(name) ? 'pending' : 'applied'}  ${name}`).join('\n')
    }
    default:
      throw new Error(USAGE)
  }
}

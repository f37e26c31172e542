import '../environment.ts'
import { env } from '#app/env.server.ts'
import { connection } from '../connection.server.ts'
import { grantAppRights } from '../grants.server.ts'
import { migrateDown, migrateUp, migrationStatus } from '../migrate.server.ts'

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
    case 'up': {
      const applied = await migrateUp(owner)
      await grantAppRights(owner, env.databaseUrl)
      return applied.length > 0 ? `applied ${count(applied)}` : 'up to date'
    }
    case 'down': {
      const [option, to] = options
      if (option !== '--to' || !to) throw new Error(USAGE)
      const reverted = await migrateDown(owner, to)
      return reverted.length > 0 ? `took back ${count(reverted)}` : 'nothing to take back'
    }
    case 'status': {
      const { all, pending } = await migrationStatus(owner)
      return all.map(name => `${pending.includes(name) ? 'pending' : 'applied'}  ${name}`).join('\n')
    }
    default:
      throw new Error(USAGE)
  }
}

function count(names: string[]) {
  return `${names.length === 1 ? 'one migration' : `${names.length} migrations, the last is`} ${names.at(-1)}`
}

import { QueryTypes, type Sequelize } from 'sequelize'
import { connection } from './connection.server.ts'

/**
 * Grants the application's database user its rights on every table, as the owner who migrated them. Does nothing when
 * both are the same user, as on a server that was given as one DATABASE_URL.
 */
export async function grantAppRights(owner: Sequelize, appUrl: string): Promise<void> {
  const app = await accountOf(appUrl)
  if (app === (await currentAccount(owner))) return
  const tables = await owner.query<GrantedTable>(TABLES, { type: QueryTypes.SELECT })
  for (const table of tables) await owner.query(`GRANT ${rights(table)} ON \`${table.name}\` TO ${app}`)
}

interface GrantedTable {
  name: string
  type: string
  /** Triggers that refuse every UPDATE or every DELETE. */
  refusals: number
}

const TABLES = `
  SELECT table_name AS name, table_type AS type, (
    SELECT COUNT(*) FROM information_schema.triggers
    WHERE event_object_schema = table_schema AND event_object_table = table_name
      AND event_manipulation IN ('UPDATE', 'DELETE') AND TRIM(action_statement) LIKE 'SIGNAL %'
  ) AS refusals
  FROM information_schema.tables WHERE table_schema = DATABASE()`

/** What is only ever added to, such as what was charted, is guarded twice: by its triggers and by the missing right. */
function rights({ name, type, refusals }: GrantedTable) {
  if (name === 'schema_migrations' || type === 'VIEW') return 'SELECT'
  return refusals === 2 ? 'SELECT, INSERT' : 'SELECT, INSERT, UPDATE, DELETE'
}

/** Asked without naming a database, on which the user may have no right yet. */
async function accountOf(url: string) {
  const server = new URL(url)
  server.pathname = '/'
  const app = connection(server.href, { maxConnections: 1 })
  try {
    return await currentAccount(app)
  } finally {
    await app.close()
  }
}

/** The account as statements name it: 'user'@'host'. */
async function currentAccount(database: Sequelize) {
  const [row] = await database.query<{ account: string }>('SELECT CURRENT_USER() AS account', {
    type: QueryTypes.SELECT,
  })
  const account = row?.account ?? ''
  const at = account.lastIndexOf('@')
  return `${database.escape(account.slice(0, at))}@${database.escape(account.slice(at + 1))}`
}

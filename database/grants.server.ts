import { QueryTypes, type Sequelize } from 'sequelize'
import { connection } from './connection.server.ts'

/** Tables to which the application may only add: what was charted, and who looked at it. */
const APPEND_ONLY = ['entries', 'access_log']

const READ_ONLY = ['schema_migrations']

/**
 * Grants the application's database user its rights on every table, as the owner who migrated them. Does nothing when
 * both are the same user, as on a server that was given as one DATABASE_URL.
 */
export async function grantAppRights(owner: Sequelize, appUrl: string): Promise<void> {
  const app = await accountOf(appUrl)
  if (app === (await currentAccount(owner))) return
  const tables = await owner.query<{ name: string; type: string }>(
    'SELECT table_name AS name, table_type AS type FROM information_schema.tables WHERE table_schema = DATABASE()',
    { type: QueryTypes.SELECT },
  )
  for (const { name, type } of tables) {
    await owner.query(`GRANT ${rights(name, type)} ON \`${name}\` TO ${app}`)
  }
}

function rights(table: string, type: string) {
  if (READ_ONLY.includes(table) || type === 'VIEW') return 'SELECT'
  return APPEND_ONLY.includes(table) ? 'SELECT, INSERT' : 'SELECT, INSERT, UPDATE, DELETE'
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

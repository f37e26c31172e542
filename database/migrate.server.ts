import { QueryTypes, type Sequelize } from 'sequelize'
import { migrations } from './migrations/list.ts'

const LEDGER = 'schema_migrations'

/** The names of all migrations, and of those the database has not seen yet. */
export async function migrationStatus(owner: Sequelize): Promise<{ all: string[]; pending: string[] }> {
  const pending = await (await umzug(owner)).pending()
  return { all: Object.keys(migrations), pending: pending.map(({ name }) => name) }
}

/** Applies what is pending and returns the names. Of several processes at once, one migrates and the others wait. */
export async function migrateUp(owner: Sequelize): Promise<string[]> {
  if (await isUpToDate(owner)) return []
  return oneAtATime(owner, async () => (await (await umzug(owner)).up()).map(({ name }) => name))
}

/**
 * Takes migrations back, newest first, until the named one is the last that is applied; `0` takes all back.
 * Returns the names of those taken back.
 */
export function migrateDown(owner: Sequelize, to: string): Promise<string[]> {
  return oneAtATime(owner, async () => {
    const ledger = await umzug(owner)
    if (to === '0') return (await ledger.down({ to: 0 })).map(({ name }) => name)
    const applied = (await ledger.executed()).map(({ name }) => name)
    if (!applied.includes(to)) throw new Error(`${to} is not among the applied migrations: ${applied.join(', ')}`)
    const next = applied[applied.indexOf(to) + 1]
    return next ? (await ledger.down({ to: next })).map(({ name }) => name) : []
  })
}

/** Asked before anything else, so that the usual start neither waits for a lock nor loads what migrates. */
async function isUpToDate(owner: Sequelize): Promise<boolean> {
  const ledgers = await owner.query('SHOW TABLES LIKE :ledger', {
    replacements: { ledger: LEDGER },
    type: QueryTypes.SELECT,
  })
  if (ledgers.length === 0) return false
  const applied = await owner.query<{ name: string }>(`SELECT name FROM ${LEDGER}`, { type: QueryTypes.SELECT })
  const names = new Set(applied.map(({ name }) => name))
  return Object.keys(migrations).every(name => names.has(name))
}

async function umzug(owner: Sequelize) {
  const { SequelizeStorage, Umzug } = await import('umzug')
  return new Umzug({
    migrations: Object.entries(migrations).map(([name, migration]) => ({ name, ...migration })),
    context: owner.getQueryInterface(),
    storage: new SequelizeStorage({ sequelize: owner, tableName: LEDGER }),
    logger: undefined,
  })
}

/** The lock belongs to one connection of the server: a transaction holds that connection while the work runs on others. */
function oneAtATime<T>(owner: Sequelize, work: () => Promise<T>): Promise<T> {
  return owner.transaction(async transaction => {
    const replacements = { lock: `${owner.getDatabaseName()}.${LEDGER}` }
    const locked = { type: QueryTypes.SELECT, replacements, transaction } as const
    const [answer] = await owner.query<{ taken: number | null }>('SELECT GET_LOCK(:lock, 60) AS taken', locked)
    if (answer?.taken !== 1)
      throw new Error('Another process has been migrating this database for a minute. Try again.')
    try {
      return await work()
    } finally {
      await owner.query('SELECT RELEASE_LOCK(:lock)', locked)
    }
  })
}

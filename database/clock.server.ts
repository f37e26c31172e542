import type { Transaction } from 'sequelize'
import { select } from './sequelize.server.ts'

/** The database's clock: the one that every process of an installation shares. */
export async function databaseNow(transaction: Transaction | null = null): Promise<Date> {
  const [row] = await select<{ now: Date }>('SELECT UTC_TIMESTAMP(3) AS now', {}, transaction)
  if (row === undefined) throw new Error('The database did not say what time it is')
  return row.now
}

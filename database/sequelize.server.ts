import { setTimeout as pause } from 'node:timers/promises'
import { QueryTypes, type Sequelize, type Transaction } from 'sequelize'
import { env } from '#app/env.server.ts'
import { connection } from './connection.server.ts'
import { DatabaseUnavailable, isWorthARetry, translated } from './errors.server.ts'

const kept = globalThis as typeof globalThis & { cannularyPool?: Sequelize }

kept.cannularyPool ??= connection(env.databaseUrl)

/** The pool of this process. It connects when it is first used. In development it outlives the reload of this module. */
export const sequelize: Sequelize = kept.cannularyPool

/** A value that may stand for a `:name` in a statement. */
export type Replacement = string | number | boolean | Date | null | Buffer | readonly Replacement[]

/** The values of a statement by name. */
export type Replacements = Readonly<Record<string, Replacement>>

const MOST_TRIES = 5

/**
 * Does the work in one transaction, READ COMMITTED, and returns what it returns. When another transaction is in the
 * way the whole work is done again, so it must change nothing but the database. Throws `DatabaseUnavailable`.
 */
export async function transact<T>(work: (transaction: Transaction) => Promise<T>): Promise<T> {
  for (let tries = 1; ; tries += 1) {
    const progress = { worked: false }
    try {
      return await once(work, progress)
    } catch (error) {
      if (tries < MOST_TRIES && isWorthARetry(error)) {
        await pause(2 ** tries * (5 + Math.random() * 10))
        continue
      }
      const known = translated(error)
      throw known instanceof DatabaseUnavailable && progress.worked ? new DatabaseUnavailable(error, true) : known
    }
  }
}

function once<T>(work: (transaction: Transaction) => Promise<T>, progress: { worked: boolean }) {
  return sequelize.transaction(async transaction => {
    const result = await work(transaction)
    progress.worked = true
    return result
  })
}

/** The rows of a SELECT. Instants go in and come out as `Date`, whatever zone the process runs in. */
export async function select<Row extends object>(
  sql: string,
  replacements: Replacements = {},
  transaction: Transaction | null = null,
): Promise<Row[]> {
  return sequelize.query<Row>(sql, { type: QueryTypes.SELECT, replacements: inUtc(replacements), transaction })
}

/** Runs an INSERT, UPDATE or DELETE and returns the number of rows it affected. */
export async function change(sql: string, replacements: Replacements, transaction: Transaction): Promise<number> {
  return sequelize.query(sql, { type: QueryTypes.BULKUPDATE, replacements: inUtc(replacements), transaction })
}

/** The instant as MariaDB writes it in a DATETIME(3) column: `2026-12-01 14:06:00.000`, UTC. */
export function utcText(instant: Date): string {
  return instant.toISOString().slice(0, 23).replace('T', ' ')
}

function inUtc(replacements: Replacements) {
  return Object.fromEntries(Object.entries(replacements).map(([name, value]) => [name, plain(value)]))
}

function plain(value: Replacement): unknown {
  if (value instanceof Date) return utcText(value)
  return Array.isArray(value) ? value.map(plain) : value
}

import { createHash } from 'node:crypto'
import { QueryTypes, type Sequelize, type Transaction } from 'sequelize'
import type { DemoEntry } from '#database/seeders/rows.ts'
import { demoTables, type TableRows } from '#database/seeders/tables.ts'
import { utcText } from '#database/sequelize.server.ts'
import type { BenchHospital } from './hospital.ts'

const ROWS_A_STATEMENT = 1000
const NUMBERS_A_STATEMENT = 50

/**
 * Fills an empty database over the one connection of its owner, and returns the number of its entries. The triggers of `entries` number and hash row
 * by row, which takes too long for millions: they are taken away for the load, which does the numbering itself, and put back.
 * The hashes only look like hashes: a chain is for `npm run verify`, and nothing that is measured reads it.
 */
export async function load(owner: Sequelize, { hospital, copies }: BenchHospital): Promise<number> {
  const tables = demoTables(hospital, 'none').filter(({ table }) => table !== 'entries')
  await owner.transaction(async transaction => {
    for (const rows of tables) await insertAll(owner, rows, transaction)
  })
  // What the generator promises need not be checked row by row.
  await owner.query('SET SESSION unique_checks = 0, foreign_key_checks = 0, check_constraint_checks = 0')
  await withoutTriggers(owner, 'entries', async () => {
    await loadEntries(owner, hospital.entries)
    await copyEntries(owner, copies)
  })
  await owner.query(`UPDATE stays s SET last_entry_hash = SHA2(s.id, 256),
    entry_count = (SELECT COUNT(*) FROM entries e WHERE e.stay_id = s.id)`)
  await owner.query('ANALYZE TABLE entries, stays, patients', { type: QueryTypes.SELECT })
  const [row] = await owner.query<{ count: number }>('SELECT SUM(entry_count) AS count FROM stays', {
    type: QueryTypes.SELECT,
  })
  return Number(row?.count)
}

async function insertAll(owner: Sequelize, { table, rows }: TableRows, transaction: Transaction): Promise<void> {
  for (let from = 0; from < rows.length; from += ROWS_A_STATEMENT) {
    const part = rows.slice(from, from + ROWS_A_STATEMENT).map(row => {
      return Object.fromEntries(
        Object.entries(row).map(([name, value]) => [name, value instanceof Date ? utcText(value) : value]),
      )
    })
    await owner.getQueryInterface().bulkInsert(table, part, { transaction })
  }
}

/** Takes the triggers of a table away while the work runs. */
async function withoutTriggers(owner: Sequelize, table: string, work: () => Promise<void>): Promise<void> {
  const triggers = await owner.query<{ Trigger: string }>(`SHOW TRIGGERS LIKE '${table}'`, { type: QueryTypes.SELECT })
  const statements: string[] = []
  for (const { Trigger: name } of triggers) {
    const [made] = await owner.query<Record<string, string>>(`SHOW CREATE TRIGGER ${name}`, { type: QueryTypes.SELECT })
    statements.push(made?.['SQL Original Statement'] ?? '')
    await owner.query(`DROP TRIGGER ${name}`)
  }
  await work()
  for (const statement of statements) await owner.query(statement)
}

const COLUMNS = 'kind, version, performed_at, recorded_at, recorded_by, recorded_role, status, data, hash'

async function loadEntries(owner: Sequelize, entries: readonly DemoEntry[]): Promise<void> {
  for (let from = 0; from < entries.length; from += ROWS_A_STATEMENT) {
    const rows = entries.slice(from, from + ROWS_A_STATEMENT).map(entryRow)
    await owner.query(`INSERT INTO entries (id, stay_id, number, ${COLUMNS}) VALUES :rows`, { replacements: { rows } })
  }
}

/** The last digits of the id are left to the copies. */
function entryRow(entry: DemoEntry) {
  const { id, stayId, number, kind, version, status } = entry
  const written = [utcText(entry.performedAt), utcText(entry.recordedAt), entry.recordedById, entry.recordedRole]
  const hash = createHash('sha256').update(id).digest('hex')
  return [
    id.replace(/.{4}$/, '0000'),
    stayId,
    number,
    kind,
    version,
    ...written,
    status,
    JSON.stringify(entry.raw),
    hash,
  ]
}

/**
 * Repeats the entries of some stays for others, about in the order of time, as they would have come: else every page of the
 * table would be read and written again for each stay. A copy has the id of its original with its own number at the end.
 */
async function copyEntries(owner: Sequelize, copies: BenchHospital['copies']): Promise<void> {
  if (copies.length === 0) return
  await owner.query(
    'CREATE TABLE copies (number INT UNSIGNED PRIMARY KEY, original UUID NOT NULL, stay_id UUID NOT NULL)',
  )
  const rows = copies.map(({ original, stayId }, index) => [index + 1, original, stayId])
  await owner.query('INSERT INTO copies VALUES :rows', { replacements: { rows } })
  const [last] = await owner.query<{ number: number }>('SELECT MAX(number) AS number FROM entries', {
    type: QueryTypes.SELECT,
  })
  const from = COLUMNS.split(', ').map(column => `e.${column}`)
  for (let start = 1; start <= (last?.number ?? 0); start += NUMBERS_A_STATEMENT) {
    await owner.query(
      `INSERT INTO entries (id, stay_id, number, ${COLUMNS})
       SELECT INSERT(CAST(e.id AS CHAR), 33, 4, LPAD(HEX(c.number), 4, '0')), c.stay_id, e.number, ${from.join(', ')}
       FROM copies c JOIN entries e ON e.stay_id = c.original AND e.number BETWEEN :start AND :end ORDER BY e.number`,
      { replacements: { start, end: start + NUMBERS_A_STATEMENT - 1 } },
    )
  }
  await owner.query('DROP TABLE copies')
}

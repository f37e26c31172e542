import type { Sequelize, Transaction } from 'sequelize'
import { closePasswords, passwordHash } from '#app/auth/password.server.ts'
import { type DemoNote, demoPassphrase } from '../demo.server.ts'
import { writeFiles } from '../photographs.server.ts'
import { utcText } from '../sequelize.server.ts'
import { demoPictures, pictureRow } from './demo-pictures.server.ts'
import type { DemoHospital } from './rows.ts'
import { demoTables, type TableRows } from './tables.ts'

const ROWS_A_STATEMENT = 500

/**
 * Writes a demo hospital into an empty database, as the owner of it, all of it or nothing, and its pictures into the store. All its accounts have
 * `demoPassphrase`. Entries are numbered and hashed by the database, in the order in which they stand.
 */
export async function loadDemo(owner: Sequelize, hospital: DemoHospital): Promise<void> {
  const hash = await passwordHash(demoPassphrase)
  await closePasswords() // no other is hashed here, and waiting threads would keep a command from ending
  const note: DemoNote = {
    seededAt: hospital.seededAt.toISOString(),
    userIds: hospital.people.map(({ id }) => id),
  }
  const noted: TableRows = { table: 'installation', rows: [{ name: 'demo', value: JSON.stringify(note) }] }
  const pictures = await demoPictures(hospital.entries)
  await writeFiles(pictures)
  const photographs: TableRows = { table: 'photographs', rows: pictures.map(pictureRow) }
  await owner.transaction(async transaction => {
    for (const rows of [...demoTables(hospital, hash), photographs, noted]) await insertAll(owner, rows, transaction)
  })
}

async function insertAll(owner: Sequelize, { table, rows }: TableRows, transaction: Transaction): Promise<void> {
  for (let from = 0; from < rows.length; from += ROWS_A_STATEMENT) {
    const part = rows.slice(from, from + ROWS_A_STATEMENT).map(inUtc)
    await owner.getQueryInterface().bulkInsert(table, part, { transaction })
  }
}

function inUtc(row: TableRows['rows'][number]) {
  return Object.fromEntries(
    Object.entries(row).map(([name, value]) => [name, value instanceof Date ? utcText(value) : value]),
  )
}

import { QueryTypes, type Sequelize } from 'sequelize'
import { demoNote, population } from '../demo.server.ts'
import { removeFiles } from '../photographs.server.ts'

/** The database holds somebody who was not invented, or no demo hospital at all. The message says which. */
export class NotDemoAlone extends Error {
  override readonly name = 'NotDemoAlone'
}

// The access log outlives what it is about.
const KEPT = ['schema_migrations', 'access_log', 'access_log_heads']

/** Empties a database that holds the demo hospital alone. Throws `NotDemoAlone`, and has then changed nothing. Its pictures go too. */
export async function emptyDemo(owner: Sequelize): Promise<void> {
  await refuseOthers()
  const tables = await owner.query<{ name: string }>(
    `SELECT table_name AS name FROM information_schema.tables
     WHERE table_schema = DATABASE() AND table_type = 'BASE TABLE' AND table_name NOT IN (:kept)`,
    { type: QueryTypes.SELECT, replacements: { kept: KEPT } },
  )
  const pictures = await owner.query<{ file: string }>('SELECT file FROM photographs', { type: QueryTypes.SELECT })
  // TRUNCATE, since triggers keep entries from being deleted. The transaction only holds the one connection whose checks are off.
  await owner.transaction(async transaction => {
    await owner.query('SET foreign_key_checks = 0', { transaction })
    for (const { name } of tables) await owner.query(`TRUNCATE TABLE \`${name}\``, { transaction })
    await owner.query('SET foreign_key_checks = 1', { transaction })
  })
  await removeFiles(pictures)
}

async function refuseOthers(): Promise<void> {
  if (!(await demoNote())) throw new NotDemoAlone('No demo hospital is loaded, so there is none to replace.')
  const { otherPatients, otherAccounts } = await population()
  const others = [counted(otherPatients, 'patient'), counted(otherAccounts, 'account')].filter(words => words !== '')
  if (others.length === 0) return
  throw new NotDemoAlone(
    `Nothing was changed: the database also holds ${others.join(' and ')} not of the demo hospital.`,
  )
}

function counted(count: number, noun: string): string {
  return count === 0 ? '' : `${count} ${noun}${count === 1 ? '' : 's'}`
}

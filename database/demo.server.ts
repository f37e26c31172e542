import type { Role } from '#app/auth/permissions.ts'
import { select } from './sequelize.server.ts'

/** Opens every demo account. It is printed on the sign-in page for as long as the demo hospital is loaded. */
export const demoPassphrase = 'kettle lantern orchard rain'

/** What is noted of the demo hospital under the name `demo`, so that its people can be told from others. */
export type DemoNote = {
  /** ISO 8601, UTC. */
  readonly seededAt: string
  readonly userIds: readonly string[]
}

/** An account that anybody may sign in with. */
export type DemoAccount = {
  readonly name: string
  readonly email: string
  readonly role: Role
  readonly wardNames: readonly string[]
}

/** The note of the demo hospital; null when none is loaded. */
export async function demoNote(): Promise<DemoNote | null> {
  const [row] = await select<{ value: DemoNote }>(`SELECT value FROM installation WHERE name = 'demo'`)
  return row?.value ?? null
}

/** The moment at which the charting of the demo hospital ends; null when none is loaded. */
export async function demoSeededAt(): Promise<Date | null> {
  const note = await demoNote()
  return note && new Date(note.seededAt)
}

/**
 * The accounts of the demo hospital that `demoPassphrase` opens, in the order in which they were added: nurses first. None when no
 * demo hospital is loaded; left out are those who were disabled or given another password.
 */
export async function demoAccounts(): Promise<readonly DemoAccount[]> {
  const note = await demoNote()
  if (!note || note.userIds.length === 0) return []
  const rows = await select<Omit<DemoAccount, 'wardNames'> & { wardName: string | null }>(
    `SELECT u.name, u.email, u.role, w.name AS wardName
     FROM users u LEFT JOIN ward_members m ON m.user_id = u.id LEFT JOIN wards w ON w.id = m.ward_id
     WHERE u.id IN (:userIds) AND u.disabled_at IS NULL AND u.password_set_at = :seededAt
     ORDER BY FIELD(u.id, :userIds), w.name`,
    { userIds: note.userIds, seededAt: new Date(note.seededAt) },
  )
  const byEmail = new Map<string, DemoAccount>()
  for (const { wardName, ...account } of rows) {
    const known = byEmail.get(account.email)?.wardNames ?? []
    byEmail.set(account.email, { ...account, wardNames: wardName === null ? known : [...known, wardName] })
  }
  return [...byEmail.values()]
}

/** How many patients and accounts there are, and how many of them were not invented. */
export type Population = {
  readonly patients: number
  readonly accounts: number
  readonly otherPatients: number
  readonly otherAccounts: number
}

/** Counts everybody in the database against the note of the demo hospital. */
export async function population(): Promise<Population> {
  const note = await demoNote()
  const [row] = await select<Population>(
    `SELECT (SELECT COUNT(*) FROM patients) AS patients, (SELECT COUNT(*) FROM users) AS accounts,
       (SELECT COUNT(*) FROM patients WHERE NOT demo) AS otherPatients,
       (SELECT COUNT(*) FROM users WHERE NOT JSON_CONTAINS(:userIds, JSON_QUOTE(CAST(id AS CHAR)))) AS otherAccounts`,
    { userIds: JSON.stringify(note?.userIds ?? []) },
  )
  if (!row) throw new Error('The database did not say who is in it')
  return row
}

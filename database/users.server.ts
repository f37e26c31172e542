import type { Role } from '#app/auth/permissions.ts'
import { type AccessEntry, logAccess, type Trace } from './access-log.server.ts'
import { databaseNow } from './clock.server.ts'
import { UserRow } from './models/user.server.ts'
import { select, transact } from './sequelize.server.ts'
import { endSessionsOf } from './sessions.server.ts'

/** Somebody who may sign in, as an administrator sees them. `oneTimeUntil` is null once they chose their own password. */
export type Person = {
  id: string
  name: string
  email: string
  role: Role
  supervised: boolean
  addedAt: Date
  disabledAt: Date | null
  oneTimeUntil: Date | null
  lastSeenAt: Date | null
  wards: readonly { id: string; name: string }[]
}

type PersonRow = Omit<Person, 'wards' | 'supervised'> & {
  supervised: number
  wardId: string | null
  wardName: string | null
}

const selectPeople = (where: string) => `
  SELECT u.id, u.name, u.email, u.role, u.supervised, u.added_at AS addedAt, u.disabled_at AS disabledAt,
    u.one_time_until AS oneTimeUntil, (SELECT MAX(s.seen_at) FROM sessions s WHERE s.user_id = u.id) AS lastSeenAt,
    w.id AS wardId, w.name AS wardName
  FROM users u LEFT JOIN ward_members m ON m.user_id = u.id LEFT JOIN wards w ON w.id = m.ward_id
  ${where} ORDER BY u.disabled_at IS NOT NULL, u.name, u.id, w.name`

/** Everybody, those who may sign in first, by name. */
export async function people(): Promise<readonly Person[]> {
  return gathered(await select<PersonRow>(selectPeople('')))
}

/** Somebody of a ward who may sign in. */
export type Member = { id: string; name: string; role: Role }

/** Who belongs to a ward and may sign in, by name. */
export function membersOf(wardId: string): Promise<Member[]> {
  return select<Member>(
    `SELECT u.id, u.name, u.role FROM ward_members m JOIN users u ON u.id = m.user_id
     WHERE m.ward_id = :wardId AND u.disabled_at IS NULL ORDER BY u.name, u.id`,
    { wardId },
  )
}

/** One person, or null. */
export async function person(id: string): Promise<Person | null> {
  return gathered(await select<PersonRow>(selectPeople('WHERE u.id = :id'), { id }))[0] ?? null
}

function gathered(rows: readonly PersonRow[]): readonly Person[] {
  const byId = new Map<string, Person>()
  for (const { wardId, wardName, supervised, ...one } of rows) {
    const known = byId.get(one.id) ?? { ...one, supervised: supervised === 1, wards: [] }
    const wards = wardId === null ? known.wards : [...known.wards, { id: wardId, name: wardName ?? '' }]
    byId.set(one.id, { ...known, wards })
  }
  return [...byId.values()]
}

/** What is compared at sign-in. `mayEnter` is false for a disabled account and for a one-time password past its time. */
export type Credentials = { id: string; role: Role; passwordHash: string; mayEnter: number }

/**
 * The credentials behind an e-mail address in small letters; null when there is no such account. Compared to the character:
 * to the index, a soft hyphen or a full-width letter is the same address, and tries would be counted for each spelling.
 */
export async function credentialsOf(email: string): Promise<Credentials | null> {
  const rows = await select<Credentials>(
    `SELECT id, role, password_hash AS passwordHash,
       disabled_at IS NULL AND (one_time_until IS NULL OR one_time_until > UTC_TIMESTAMP(3)) AS mayEnter
     FROM users WHERE email = :email AND LOWER(email) COLLATE utf8mb4_bin = :email`,
    { email },
  )
  return rows[0] ?? null
}

/** The stored hash of somebody who is signed in, to confirm that it is them. */
export async function passwordHashOf(userId: string): Promise<string | null> {
  const [row] = await select<{ passwordHash: string }>(
    'SELECT password_hash AS passwordHash FROM users WHERE id = :userId',
    { userId },
  )
  return row?.passwordHash ?? null
}

/** What confirms that somebody is who they say; `mayEnter` is false for a disabled account and one with a one-time password. */
export type OwnCredentials = Pick<Credentials, 'passwordHash' | 'mayEnter'> & { email: string }

/** The credentials of one account by its id; null when there is none. */
export async function credentialsById(userId: string): Promise<OwnCredentials | null> {
  const rows = await select<OwnCredentials>(
    `SELECT email, password_hash AS passwordHash, disabled_at IS NULL AND one_time_until IS NULL AS mayEnter
     FROM users WHERE id = :userId`,
    { userId },
  )
  return rows[0] ?? null
}

/** Stores the same password under today's parameters. */
export async function storeRehashed(userId: string, passwordHash: string): Promise<void> {
  await transact(transaction => UserRow.update({ passwordHash }, { where: { id: userId }, transaction }))
}

/** A person's own new password; their other sessions end unless `keepsOthers`. */
export async function setOwnPassword(
  userId: string,
  passwordHash: string,
  by: Trace,
  keepsOthers: boolean,
): Promise<void> {
  await transact(async transaction => {
    const passwordSetAt = await databaseNow(transaction)
    await UserRow.update({ passwordHash, passwordSetAt, oneTimeUntil: null }, { where: { id: userId }, transaction })
    if (!keepsOthers) await endSessionsOf(userId, 'new password', transaction, by.actor?.sessionHash ?? null)
    await logAccess(aboutPerson('set password', userId, by), transaction)
  })
}

/** The log entry for something done to a person's account. */
export function aboutPerson(action: string, userId: string, by: Trace): AccessEntry {
  return { action, purpose: 'ADMIN', resource: { type: 'user', id: userId }, by }
}

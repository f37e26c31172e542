import type { Transaction } from 'sequelize'
import { v7 as uuidv7 } from 'uuid'
import type { Role } from '#app/auth/permissions.ts'
import { logAccess, type Trace } from './access-log.server.ts'
import { databaseNow } from './clock.server.ts'
import { isUniqueViolation } from './errors.server.ts'
import { UserRow } from './models/user.server.ts'
import { WardMemberRow } from './models/ward-member.server.ts'
import { select, transact } from './sequelize.server.ts'
import { endSessionsOf } from './sessions.server.ts'
import { aboutPerson } from './users.server.ts'

/** What an administrator says about somebody. */
export type PersonDetails = {
  readonly name: string
  readonly email: string
  readonly role: Role
  readonly wardIds: readonly string[]
  /** What they chart waits for a countersignature. */
  readonly supervised: boolean
}

/** A password that somebody else made: it works for this many hours and opens only the page that replaces it. */
export type OneTime = { readonly passwordHash: string; readonly hours: number }

/** Another account has this e-mail address. */
export class EmailTaken extends Error {
  override readonly name = 'EmailTaken'
}

/** Nobody would be left who can look after the accounts. */
export class LastAdministrator extends Error {
  override readonly name = 'LastAdministrator'
}

/** Adds somebody with a one-time password and returns their id. Throws `EmailTaken`. */
export async function addPerson(details: PersonDetails, { passwordHash, hours }: OneTime, by: Trace): Promise<string> {
  const { wardIds, ...columns } = details
  const id = uuidv7()
  const addedBy = by.actor?.id ?? null
  await withOwnEmail(() =>
    transact(async transaction => {
      const addedAt = await databaseNow(transaction)
      const fresh = { passwordHash, passwordSetAt: addedAt, oneTimeUntil: hoursAfter(addedAt, hours) }
      await UserRow.create({ id, ...columns, ...fresh, addedAt, addedBy }, { transaction })
      await addToWards(id, wardIds, addedBy, addedAt, transaction)
      await logAccess(aboutPerson('added person', id, by), transaction)
    }),
  )
  return id
}

/**
 * Replaces what is said about somebody. It counts from their next request; a new role also ends their sessions, so that
 * they come in again with it. Throws `EmailTaken` and `LastAdministrator`.
 */
export async function changePerson(id: string, details: PersonDetails, by: Trace): Promise<void> {
  const { wardIds, ...columns } = details
  await withOwnEmail(() =>
    transact(async transaction => {
      const user = await lockedUser(id, transaction)
      const hasNewRole = user.role !== columns.role
      if (columns.role !== 'administrator') await keepAnAdministrator(id, transaction)
      await user.update(columns, { transaction })
      await WardMemberRow.destroy({ where: { userId: id }, transaction })
      await addToWards(id, wardIds, by.actor?.id ?? null, await databaseNow(transaction), transaction)
      if (hasNewRole) await endSessionsOf(id, 'account changed', transaction)
      await logAccess(aboutPerson('changed person', id, by), transaction)
    }),
  )
}

/** Gives somebody a one-time password and ends their sessions. */
export async function resetPassword(id: string, { passwordHash, hours }: OneTime, by: Trace): Promise<void> {
  await transact(async transaction => {
    const passwordSetAt = await databaseNow(transaction)
    const user = await lockedUser(id, transaction)
    await user.update({ passwordHash, passwordSetAt, oneTimeUntil: hoursAfter(passwordSetAt, hours) }, { transaction })
    await endSessionsOf(id, 'new password', transaction)
    await logAccess(aboutPerson('reset password', id, by), transaction)
  })
}

/** Keeps somebody out from their next request on. Throws `LastAdministrator`. */
export async function disablePerson(id: string, by: Trace): Promise<void> {
  await transact(async transaction => {
    const user = await lockedUser(id, transaction)
    await keepAnAdministrator(id, transaction)
    await user.update({ disabledAt: await databaseNow(transaction) }, { transaction })
    await endSessionsOf(id, 'account disabled', transaction)
    await logAccess(aboutPerson('disabled person', id, by), transaction)
  })
}

/** Lets somebody in again, with the password they had. */
export async function enablePerson(id: string, by: Trace): Promise<void> {
  await transact(async transaction => {
    const user = await lockedUser(id, transaction)
    await user.update({ disabledAt: null }, { transaction })
    await logAccess(aboutPerson('enabled person', id, by), transaction)
  })
}

async function lockedUser(id: string, transaction: Transaction): Promise<UserRow> {
  return UserRow.findByPk(id, { transaction, lock: true, rejectOnEmpty: true })
}

/** Locks the administrators, so that two of them cannot put each other out in one moment. */
async function keepAnAdministrator(leavingId: string, transaction: Transaction): Promise<void> {
  const left = await select<{ id: string }>(
    `SELECT id FROM users WHERE role = 'administrator' AND disabled_at IS NULL ORDER BY id FOR UPDATE`,
    {},
    transaction,
  )
  if (left.length === 1 && left[0]?.id === leavingId) throw new LastAdministrator(leavingId)
}

async function addToWards(
  userId: string,
  wardIds: readonly string[],
  addedBy: string | null,
  addedAt: Date,
  transaction: Transaction,
): Promise<void> {
  const members = [...new Set(wardIds)].map(wardId => ({ userId, wardId, addedAt, addedBy }))
  await WardMemberRow.bulkCreate(members, { transaction })
}

async function withOwnEmail(work: () => Promise<void>): Promise<void> {
  try {
    await work()
  } catch (error) {
    if (isUniqueViolation(error, 'users_email')) throw new EmailTaken('this address is taken', { cause: error })
    throw error
  }
}

const hoursAfter = (instant: Date, hours: number): Date => new Date(instant.getTime() + hours * 3_600_000)

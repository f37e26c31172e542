import type { Role } from '#app/auth/permissions.ts'
import type { Level, Skill } from '#app/care/skills.ts'
import type { LocalDay } from '#app/time/zone.ts'
import { logAccess, type Trace } from './access-log.server.ts'
import type { Author } from './entries.server.ts'
import { isUniqueViolation } from './errors.server.ts'
import { change, select, transact } from './sequelize.server.ts'
import { aboutPerson } from './users.server.ts'

/** A sign-off as it is stored; names as they are today. */
export interface StoredSignOff {
  readonly id: string
  readonly userId: string
  readonly skill: string
  readonly level: Level
  readonly assessedOn: LocalDay
  readonly expiresOn: LocalDay
  readonly assessedById: string
  readonly assessedByName: string
  readonly signedAt: Date
  readonly withdrawn: { readonly by: string; readonly at: Date; readonly reason: string } | null
}

type Row = Omit<StoredSignOff, 'withdrawn'> & { withdrawnBy: string | null; withdrawnAt: Date; reason: string }

/** All sign-offs of these people, withdrawn ones too, latest first; one query. */
export async function signOffsOf(userIds: readonly string[]): Promise<readonly StoredSignOff[]> {
  if (userIds.length === 0) return []
  const rows = await select<Row>(
    `SELECT c.id, c.user_id AS userId, c.skill, c.level, CAST(c.assessed_on AS CHAR) AS assessedOn,
       CAST(c.expires_on AS CHAR) AS expiresOn, c.assessed_by AS assessedById, a.name AS assessedByName,
       c.signed_at AS signedAt, b.name AS withdrawnBy, w.withdrawn_at AS withdrawnAt, w.reason
     FROM competences c JOIN users a ON a.id = c.assessed_by
       LEFT JOIN competence_withdrawals w ON w.competence_id = c.id LEFT JOIN users b ON b.id = w.withdrawn_by
     WHERE c.user_id IN (:userIds) ORDER BY c.signed_at DESC, c.id`,
    { userIds },
  )
  return rows.map(({ withdrawnBy, withdrawnAt, reason, ...row }) => ({
    ...row,
    withdrawn: withdrawnBy === null ? null : { by: withdrawnBy, at: withdrawnAt, reason },
  }))
}

/** A skill of somebody, assessed and signed by another. `id` is minted when the form opens. */
export interface NewSignOff {
  readonly id: string
  readonly userId: string
  readonly skill: Skill
  readonly level: Level
  readonly assessedOn: LocalDay
  readonly expiresOn: LocalDay
}

/** Signs a skill off; the same id again does nothing. */
export async function signOff(given: NewSignOff, assessor: Author, by: Trace): Promise<void> {
  await once('PRIMARY', async transaction => {
    await change(
      `INSERT INTO competences (id, user_id, skill, level, assessed_on, expires_on, assessed_by, assessed_role)
       VALUES (:id, :userId, :skill, :level, :assessedOn, :expiresOn, :assessedBy, :role)`,
      { ...given, assessedBy: assessor.id, role: assessor.role },
      transaction,
    )
    await logAccess(aboutPerson('signed off a skill', given.userId, by), transaction)
  })
}

/** Withdraws a sign-off, which stays readable; a second withdrawal does nothing. */
export async function withdrawSignOff(signedOff: StoredSignOff, reason: string, by: Trace): Promise<void> {
  await once('PRIMARY', async transaction => {
    await change(
      `INSERT INTO competence_withdrawals (competence_id, withdrawn_by, reason) VALUES (:id, :withdrawnBy, :reason)`,
      { id: signedOff.id, withdrawnBy: by.actor?.id ?? null, reason },
      transaction,
    )
    await logAccess(aboutPerson('withdrew a sign-off', signedOff.userId, by), transaction)
  })
}

async function once(key: string, work: Parameters<typeof transact<void>>[0]): Promise<void> {
  try {
    await transact(work)
  } catch (error) {
    if (!isUniqueViolation(error, key)) throw error
  }
}

/** Somebody of a ward who charts there. */
export interface Staff {
  readonly id: string
  readonly name: string
  readonly role: Role
  readonly wardId: string
}

/** Who belongs to these wards and may sign in, by name; registered colleagues only. One query. */
export function staffOf(wardIds: readonly string[]): Promise<readonly Staff[]> {
  if (wardIds.length === 0) return Promise.resolve([])
  return select<{ id: string; name: string; role: Role; wardId: string }>(
    `SELECT u.id, u.name, u.role, m.ward_id AS wardId FROM ward_members m JOIN users u ON u.id = m.user_id
     WHERE m.ward_id IN (:wardIds) AND u.disabled_at IS NULL AND NOT u.supervised ORDER BY u.name, u.id`,
    { wardIds },
  )
}

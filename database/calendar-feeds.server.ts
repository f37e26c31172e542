import type { Role } from '#app/auth/permissions.ts'
import { logAccess, type Trace } from './access-log.server.ts'
import { change, select, transact } from './sequelize.server.ts'

/** Whose calendar an address opens, with the wards they belong to now. */
export type FeedOwner = {
  readonly id: string
  readonly role: Role
  readonly wardIds: readonly string[]
}

/** When the address of a person's calendar was made; null while they have none. */
export async function feedOf(userId: string): Promise<{ readonly madeAt: Date } | null> {
  const [feed] = await select<{ madeAt: Date }>(
    'SELECT made_at AS madeAt FROM calendar_feeds WHERE user_id = :userId AND revoked_at IS NULL ORDER BY made_at DESC LIMIT 1',
    { userId },
  )
  return feed ?? null
}

/** Gives a person an address in place of any they had. */
export async function makeFeed(userId: string, secretHash: string, by: Trace): Promise<void> {
  await transact(async transaction => {
    await change(REVOKE, { userId }, transaction)
    await change(
      'INSERT INTO calendar_feeds (secret_hash, user_id, made_at) VALUES (:secretHash, :userId, UTC_TIMESTAMP(3))',
      { secretHash, userId },
      transaction,
    )
    await logAccess({ action: 'made calendar address', purpose: 'ADMIN', by }, transaction)
  })
}

/** Ends every address of a person's calendar: it answers no more from the next request on. */
export async function revokeFeeds(userId: string, by: Trace): Promise<void> {
  await transact(async transaction => {
    await change(REVOKE, { userId }, transaction)
    await logAccess({ action: 'ended calendar address', purpose: 'ADMIN', by }, transaction)
  })
}

const REVOKE = 'UPDATE calendar_feeds SET revoked_at = UTC_TIMESTAMP(3) WHERE user_id = :userId AND revoked_at IS NULL'

/** Whose calendar this is; null when the address was ended or never made, and when its owner may not sign in any more. */
export async function feedOwner(secretHash: string): Promise<FeedOwner | null> {
  const rows = await select<{ id: string; role: Role; wardId: string | null }>(
    `SELECT u.id, u.role, m.ward_id AS wardId FROM calendar_feeds f JOIN users u ON u.id = f.user_id
     LEFT JOIN ward_members m ON m.user_id = u.id
     WHERE f.secret_hash = :secretHash AND f.revoked_at IS NULL AND u.disabled_at IS NULL ORDER BY m.ward_id`,
    { secretHash },
  )
  const [first] = rows
  if (first === undefined) return null
  return { id: first.id, role: first.role, wardIds: rows.flatMap(({ wardId }) => wardId ?? []) }
}

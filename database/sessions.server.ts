import type { Transaction } from 'sequelize'
import type { Role } from '#app/auth/permissions.ts'
import { change, select, transact } from './sequelize.server.ts'

/** A ward of the person who is signed in. `rev` changes with every write that the ward's pages show. */
export type OwnWard = { readonly id: string; readonly name: string; readonly rev: number }

/** A session that nobody ended, with its person. Past a limit it is `over`, and good for one thing: keeping a draft. */
export type KnownSession = {
  readonly user: {
    readonly id: string
    readonly name: string
    readonly email: string
    readonly role: Role
    readonly isSupervised: boolean
  }
  readonly wards: readonly OwnWard[]
  readonly startedAt: Date
  readonly endsAt: Date
  readonly isOver: boolean
  /** Seen within the last minute, so that there is nothing to write. */
  readonly isFresh: boolean
  /** Signed in with a one-time password, and so owes one of their own. */
  readonly owesPassword: boolean
}

/** Why a session ended, as its owner reads it. */
export type SessionEnd =
  | 'signed out'
  | 'signed out everywhere'
  | 'nobody was there'
  | 'signed in again'
  | 'new password'
  | 'account disabled'
  | 'account changed'

type SessionRow = {
  userId: string
  name: string
  email: string
  role: Role
  supervised: number
  startedAt: Date
  endsAt: Date
  isOver: number
  isFresh: number
  owesPassword: number
  wardId: string | null
  wardName: string | null
  rev: number | null
}

/**
 * The session behind a hashed cookie, or null when it is unknown, was ended, or its person is disabled. One query brings
 * the person, their wards and each ward's counter: a page that only asks whether anything changed costs no second one.
 */
export async function knownSession(idHash: string, idleMinutes: number): Promise<KnownSession | null> {
  const rows = await select<SessionRow>(
    `SELECT u.id AS userId, u.name, u.email, u.role, u.supervised, s.started_at AS startedAt, s.ends_at AS endsAt,
       (s.ends_at <= UTC_TIMESTAMP(3) OR s.seen_at <= UTC_TIMESTAMP(3) - INTERVAL :idleMinutes MINUTE) AS isOver,
       s.seen_at > UTC_TIMESTAMP(3) - INTERVAL 1 MINUTE AS isFresh, u.one_time_until IS NOT NULL AS owesPassword,
       w.id AS wardId, w.name AS wardName, r.rev
     FROM sessions s JOIN users u ON u.id = s.user_id
     LEFT JOIN ward_members m ON m.user_id = u.id
     LEFT JOIN wards w ON w.id = m.ward_id
     LEFT JOIN ward_revs r ON r.ward_id = m.ward_id
     WHERE s.id_hash = :idHash AND s.ended_at IS NULL AND u.disabled_at IS NULL
     ORDER BY w.name, w.id`,
    { idHash, idleMinutes },
  )
  const [first] = rows
  if (first === undefined) return null
  return {
    user: {
      id: first.userId,
      name: first.name,
      email: first.email,
      role: first.role,
      isSupervised: first.supervised === 1,
    },
    wards: rows.flatMap(({ wardId, wardName, rev }) =>
      wardId ? [{ id: wardId, name: wardName ?? '', rev: rev ?? 0 }] : [],
    ),
    startedAt: first.startedAt,
    endsAt: first.endsAt,
    isOver: first.isOver === 1,
    isFresh: first.isFresh === 1,
    owesPassword: first.owesPassword === 1,
  }
}

/** What is known when somebody has signed in. */
export type NewSession = {
  readonly idHash: string
  readonly userId: string
  readonly hours: number
  readonly address: string | null
  readonly userAgent: string | null
}

/** Begins a session, and forgets some of those that ended more than a month ago. */
export async function beginSession(session: NewSession, transaction: Transaction): Promise<void> {
  const userAgent = session.userAgent?.slice(0, 200) ?? null
  await change(
    `INSERT INTO sessions (id_hash, user_id, started_at, seen_at, ends_at, address, user_agent)
     VALUES (:idHash, :userId, UTC_TIMESTAMP(3), UTC_TIMESTAMP(3), UTC_TIMESTAMP(3) + INTERVAL :hours HOUR, :address, :userAgent)`,
    { ...session, userAgent },
    transaction,
  )
  await change('DELETE FROM sessions WHERE ends_at < UTC_TIMESTAMP(3) - INTERVAL 31 DAY LIMIT 50', {}, transaction)
}

/** Notes that the person did something: at most one write a minute. */
export async function touchSession(idHash: string): Promise<void> {
  await transact(transaction =>
    change(
      `UPDATE sessions SET seen_at = UTC_TIMESTAMP(3) WHERE id_hash = :idHash AND ended_at IS NULL
         AND seen_at <= UTC_TIMESTAMP(3) - INTERVAL 1 MINUTE`,
      { idHash },
      transaction,
    ),
  )
}

/** Ends one session; false when it had ended before. */
export async function endSession(idHash: string, because: SessionEnd, transaction: Transaction): Promise<boolean> {
  const ended = await change(
    'UPDATE sessions SET ended_at = UTC_TIMESTAMP(3), ended_because = :because WHERE id_hash = :idHash AND ended_at IS NULL',
    { idHash, because },
    transaction,
  )
  return ended > 0
}

/** Ends a session unless somebody used it, perhaps on another page, within the last minutes. */
export async function endIdleSession(idHash: string, minutes: number, transaction: Transaction): Promise<boolean> {
  const ended = await change(
    `UPDATE sessions SET ended_at = UTC_TIMESTAMP(3), ended_because = 'nobody was there'
     WHERE id_hash = :idHash AND ended_at IS NULL AND seen_at <= UTC_TIMESTAMP(3) - INTERVAL :minutes MINUTE`,
    { idHash, minutes },
    transaction,
  )
  return ended > 0
}

/** Ends all sessions of a person but `except`, and returns how many. They are out at their next request. */
export function endSessionsOf(
  userId: string,
  because: SessionEnd,
  transaction: Transaction,
  except: string | null = null,
): Promise<number> {
  return change(
    `UPDATE sessions SET ended_at = UTC_TIMESTAMP(3), ended_because = :because
     WHERE user_id = :userId AND ended_at IS NULL AND (:except IS NULL OR id_hash <> :except)`,
    { userId, because, except },
    transaction,
  )
}

/** A session as its owner sees it in a list. */
export type OwnSession = {
  idHash: string
  startedAt: Date
  seenAt: Date
  address: string | null
  userAgent: string | null
}

/** The sessions in which a person is signed in now, last used first. */
export function sessionsOf(userId: string, idleMinutes: number): Promise<OwnSession[]> {
  return select<OwnSession>(
    `SELECT id_hash AS idHash, started_at AS startedAt, seen_at AS seenAt, address, user_agent AS userAgent FROM sessions
     WHERE user_id = :userId AND ended_at IS NULL AND ends_at > UTC_TIMESTAMP(3)
       AND seen_at > UTC_TIMESTAMP(3) - INTERVAL :idleMinutes MINUTE
     ORDER BY seen_at DESC, started_at DESC`,
    { userId, idleMinutes },
  )
}

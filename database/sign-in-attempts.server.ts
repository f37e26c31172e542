import type { Transaction } from 'sequelize'
import { change, select, transact } from './sequelize.server.ts'

/** What is counted for one subject, a SHA-256 in hex. `now` is the database's clock. */
export type CountedAttempts = { subject: string; misses: number; lastMissedAt: Date; now: Date }

/** The counts of these subjects, made at zero where there were none, and locked until the transaction ends. */
export async function lockedAttempts(
  subjects: readonly string[],
  transaction: Transaction,
): Promise<readonly CountedAttempts[]> {
  // Always in one order, so that two sign-ins never wait for each other.
  for (const subject of [...subjects].sort()) {
    await change(
      `INSERT INTO sign_in_attempts (subject, misses, last_missed_at) VALUES (:subject, 0, UTC_TIMESTAMP(3))
       ON DUPLICATE KEY UPDATE subject = subject`,
      { subject },
      transaction,
    )
  }
  return select<CountedAttempts>(
    `SELECT subject, misses, last_missed_at AS lastMissedAt, UTC_TIMESTAMP(3) AS now FROM sign_in_attempts
     WHERE subject IN (:subjects) ORDER BY subject FOR UPDATE`,
    { subjects },
    transaction,
  )
}

/** Writes what a subject's count is from now on. */
export async function countAttempts(subject: string, misses: number, transaction: Transaction): Promise<void> {
  await change(
    'UPDATE sign_in_attempts SET misses = :misses, last_missed_at = UTC_TIMESTAMP(3) WHERE subject = :subject',
    { subject, misses },
    transaction,
  )
}

/** Takes back one attempt of each subject: it was no miss. */
export async function uncountAttempt(subjects: readonly string[]): Promise<void> {
  await transact(transaction =>
    change(
      'UPDATE sign_in_attempts SET misses = misses - 1 WHERE subject IN (:subjects) AND misses > 0',
      { subjects: [...subjects].sort() },
      transaction,
    ),
  )
}

/** Starts a subject's count again, and drops some counts that nobody has added to for a day. */
export async function clearAttempts(subject: string): Promise<void> {
  await transact(async transaction => {
    await change('DELETE FROM sign_in_attempts WHERE subject = :subject', { subject }, transaction)
    await change(
      'DELETE FROM sign_in_attempts WHERE last_missed_at < UTC_TIMESTAMP(3) - INTERVAL 1 DAY LIMIT 100',
      {},
      transaction,
    )
  })
}

/** Whether somebody has signed in to this account from this address within a month. */
export async function hasSignedInFrom(email: string, address: string | null): Promise<boolean> {
  const rows = await select(
    `SELECT 1 AS found FROM sessions s JOIN users u ON u.id = s.user_id
     WHERE u.email = :email AND s.address = :address AND s.started_at > UTC_TIMESTAMP(3) - INTERVAL 31 DAY LIMIT 1`,
    { email, address },
  )
  return rows.length > 0
}

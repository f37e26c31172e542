import { change, select, transact } from './sequelize.server.ts'

/** A form as it was sent: each name with its values, in order. */
export type DraftFields = Readonly<Record<string, readonly string[]>>

/** Newest drafts of one person that are kept: more are not typed in a day, and a stolen session cannot fill the disk. */
const MOST_DRAFTS = 20

/** Keeps what somebody had typed on a page, in place of what was kept there before. */
export async function saveDraft(userId: string, path: string, fields: DraftFields, hours: number): Promise<void> {
  await transact(async transaction => {
    await change(
      `INSERT INTO drafts (user_id, path, fields, saved_at) VALUES (:userId, :path, :fields, UTC_TIMESTAMP(3))
       ON DUPLICATE KEY UPDATE fields = VALUE(fields), saved_at = VALUE(saved_at)`,
      { userId, path, fields: JSON.stringify(fields) },
      transaction,
    )
    await change(
      `DELETE FROM drafts WHERE user_id = :userId AND path NOT IN (SELECT path FROM (
         SELECT path FROM drafts WHERE user_id = :userId ORDER BY saved_at DESC, path LIMIT :most) newest)`,
      { userId, most: MOST_DRAFTS },
      transaction,
    )
    await change(
      'DELETE FROM drafts WHERE saved_at < UTC_TIMESTAMP(3) - INTERVAL :hours HOUR LIMIT 100',
      { hours },
      transaction,
    )
  })
}

/** Hands a draft back to the person who typed it, once; null when there is none, or it is too old. */
export async function takeSavedDraft(userId: string, path: string, hours: number): Promise<DraftFields | null> {
  return transact(async transaction => {
    const [draft] = await select<{ fields: DraftFields; isOld: number }>(
      `SELECT fields, saved_at < UTC_TIMESTAMP(3) - INTERVAL :hours HOUR AS isOld FROM drafts
       WHERE user_id = :userId AND path = :path FOR UPDATE`,
      { userId, path, hours },
      transaction,
    )
    if (draft === undefined) return null
    await change('DELETE FROM drafts WHERE user_id = :userId AND path = :path', { userId, path }, transaction)
    return draft.isOld === 1 ? null : draft.fields
  })
}

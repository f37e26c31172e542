import { isDeepStrictEqual } from 'node:util'
import type { Transaction } from 'sequelize'
import { RecordChangeRow } from './models/record-change.server.ts'
import { select } from './sequelize.server.ts'

type Values = Readonly<Record<string, unknown>>

/** One change of a patient, stay, ward or bed, with the values before (null: it was new) and after. Only what changed. */
export type RecordChange = {
  readonly what: string
  readonly changedAt: Date
  readonly changedByName: string
  readonly oldValues: Values | null
  readonly newValues: Values
}

/** Notes a change in the transaction that makes it. Of `old` and `new`, only what differs is kept; nothing when nothing does. */
export async function noteChange(
  change: {
    readonly subject: RecordChangeRow['subject']
    readonly subjectId: string
    readonly what: string
    readonly by: string
    readonly old: Values | null
    readonly new: Values
  },
  transaction: Transaction,
): Promise<void> {
  const { old } = change
  const names = Object.keys(change.new).filter(name => !old || !isDeepStrictEqual(old[name], change.new[name]))
  if (names.length === 0) return
  const only = (values: Values) => Object.fromEntries(names.map(name => [name, values[name] ?? null]))
  const { subject, subjectId, what, by } = change
  const row = { subject, subjectId, what, changedBy: by, oldValues: old && only(old), newValues: only(change.new) }
  await RecordChangeRow.create(row, { transaction })
}

/** The latest changes of these subjects, newest first: at most 200. */
export async function changesOf(subjectIds: readonly string[]): Promise<readonly RecordChange[]> {
  if (subjectIds.length === 0) return []
  return select<RecordChange>(
    `SELECT c.what, c.changed_at AS changedAt, u.name AS changedByName, c.old_values AS oldValues, c.new_values AS newValues
     FROM record_changes c JOIN users u ON u.id = c.changed_by
     WHERE c.subject_id IN (:subjectIds) ORDER BY c.id DESC LIMIT 200`,
    { subjectIds },
  )
}

import type { Transaction } from 'sequelize'
import type { StoredEntry } from '#app/care/kind.ts'
import type { Author } from './entries.server.ts'
import { isUniqueViolation } from './errors.server.ts'
import { change, select, transact } from './sequelize.server.ts'
import { type EntryColumns, entryColumns, entryTables, storedEntry } from './stored-entries.server.ts'

/** An entry that waits for a countersignature, with the patient it is about. */
export interface Uncountersigned {
  readonly entry: StoredEntry
  readonly patientId: string
  readonly familyName: string
  readonly bed: string
  readonly wardId: string
  readonly wardName: string
}

/** Entries that waited for some time come first; more than these are not read in one go. */
export const MOST_TO_COUNTERSIGN = 100

const waiting = `e.under_supervision = 1 AND e.status = 'final'
  AND NOT EXISTS (SELECT 1 FROM entries n WHERE n.supersedes_id = e.id)
  AND NOT EXISTS (SELECT 1 FROM countersignatures c WHERE c.entry_id = e.id)`

/**
 * What somebody may countersign, oldest first: of these wards, by others, and with `named` only where they were named as the
 * second person. One query.
 */
export async function toCountersign(
  userId: string,
  wardIds: readonly string[],
  named = false,
): Promise<readonly Uncountersigned[]> {
  if (wardIds.length === 0) return []
  const rows = await select<EntryColumns & Omit<Uncountersigned, 'entry'>>(
    `SELECT ${entryColumns}, s.patient_id AS patientId, p.family_name AS familyName, b.label AS bed,
       s.ward_id AS wardId, w.name AS wardName
     FROM ${entryTables} JOIN stays s ON s.id = e.stay_id JOIN patients p ON p.id = s.patient_id
       JOIN wards w ON w.id = s.ward_id JOIN beds b ON b.id = s.bed_id
     WHERE ${waiting} AND s.ward_id IN (:wardIds) AND e.recorded_by <> :userId
       ${named ? 'AND e.witness_id = :userId' : ''}
     ORDER BY e.performed_at, e.id LIMIT :most`,
    { userId, wardIds, most: MOST_TO_COUNTERSIGN },
  )
  return rows.map(({ patientId, familyName, bed, wardId, wardName, ...columns }) => {
    return { entry: storedEntry(columns), patientId, familyName, bed, wardId, wardName }
  })
}

/** How many entries of a ward wait for a countersignature. */
export async function countToCountersign(wardId: string): Promise<number> {
  const [row] = await select<{ count: number }>(
    `SELECT COUNT(*) AS count FROM entries e JOIN stays s ON s.id = e.stay_id WHERE ${waiting} AND s.ward_id = :wardId`,
    { wardId },
  )
  return row?.count ?? 0
}

/**
 * Countersigns entries, all or none, and returns how many: those that somebody countersigned, corrected or retracted meanwhile
 * are left out. The database refuses one's own, and those that were not charted under supervision.
 */
export function countersign(entryIds: readonly string[], by: Author): Promise<number> {
  return transact(async transaction => {
    let count = 0
    // In one order, so that two people who countersign the same never wait for each other.
    for (const entryId of [...new Set(entryIds)].sort()) {
      count += await signedOnce(entryId, by, transaction)
    }
    return count
  })
}

/** 1, or 0 for an entry that does not wait any more, such as one that somebody else countersigns at this moment. */
async function signedOnce(entryId: string, by: Author, transaction: Transaction): Promise<number> {
  try {
    return await change(
      `INSERT INTO countersignatures (entry_id, signed_by, signed_role, hash)
       SELECT e.id, :id, :role, '' FROM entries e WHERE e.id = :entryId AND ${waiting}`,
      { entryId, ...by },
      transaction,
    )
  } catch (error) {
    if (isUniqueViolation(error, 'PRIMARY')) return 0
    throw error
  }
}

/** Who countersigned an entry, as what, and when. */
export interface Countersignature {
  readonly by: string
  readonly role: string
  readonly at: Date
}

/** The countersignatures of entries, by entry; one query. */
export async function countersignaturesOf(entryIds: readonly string[]): Promise<ReadonlyMap<string, Countersignature>> {
  if (entryIds.length === 0) return new Map()
  const rows = await select<Countersignature & { entryId: string }>(
    `SELECT c.entry_id AS entryId, u.name AS \`by\`, c.signed_role AS role, c.signed_at AS at
     FROM countersignatures c JOIN users u ON u.id = c.signed_by WHERE c.entry_id IN (:entryIds)`,
    { entryIds },
  )
  return new Map(rows.map(({ entryId, ...signature }) => [entryId, signature]))
}

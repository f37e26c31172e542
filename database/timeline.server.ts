import type { StoredEntry } from '#app/care/kind.ts'
import { select } from './sequelize.server.ts'
import { type EntryColumns, entryColumns, entryTables, storedEntries, storedEntry } from './stored-entries.server.ts'

/** Where a page of the timeline ended: the next one holds what was performed before, at equal times by id. */
export type TimelineCursor = { readonly performedAt: Date; readonly id: string }

/** The entry that took another's place. */
export type Superseding = Pick<StoredEntry, 'id' | 'recordedAt' | 'recordedByName' | 'reason' | 'status'>

/** An entry as the timeline shows it: those that were corrected or retracted stay in view, with what took their place. */
export type TimelineEntry = { readonly entry: StoredEntry; readonly supersededBy: Superseding | null }

type TimelineRow = EntryColumns & {
  byId: string | null
  byRecordedAt: Date
  byName: string
  byReason: string | null
  byStatus: StoredEntry['status']
}

/** A page of a stay's entries, latest performed first, and where the next page starts: null at the end. */
export async function timeline(
  stayId: string,
  options: { readonly limit: number; readonly before?: TimelineCursor | undefined; readonly kind?: string | undefined },
): Promise<{ readonly entries: readonly TimelineEntry[]; readonly next: TimelineCursor | null }> {
  const { limit, before, kind } = options
  const rows = await select<TimelineRow>(
    `SELECT ${entryColumns}, s.id AS byId, s.recorded_at AS byRecordedAt, su.name AS byName, s.reason AS byReason,
       s.status AS byStatus
     FROM ${entryTables} LEFT JOIN entries s ON s.supersedes_id = e.id LEFT JOIN users su ON su.id = s.recorded_by
     WHERE e.stay_id = :stayId ${kind === undefined ? '' : 'AND e.kind = :kind'}
       ${before ? 'AND e.performed_at <= :performedAt AND (e.performed_at < :performedAt OR e.id < :id)' : ''}
     ORDER BY e.performed_at DESC, e.id DESC LIMIT :limit`,
    { stayId, kind: kind ?? null, limit: limit + 1, performedAt: before?.performedAt ?? null, id: before?.id ?? null },
  )
  const entries = rows.slice(0, limit).map(row => ({ entry: storedEntry(row), supersededBy: supersedingOf(row) }))
  const last = rows.length > limit ? entries.at(-1)?.entry : undefined
  return { entries, next: last ? { performedAt: last.performedAt, id: last.id } : null }
}

function supersedingOf(row: TimelineRow): Superseding | null {
  if (row.byId === null) return null
  const { byRecordedAt, byName, byReason, byStatus } = row
  return { id: row.byId, recordedAt: byRecordedAt, recordedByName: byName, reason: byReason, status: byStatus }
}

/** A cursor as a word in an address. */
export function cursorText({ performedAt, id }: TimelineCursor): string {
  return `${performedAt.toISOString()}_${id}`
}

/** The cursor of an address; undefined when it is none. */
export function readCursor(text: string | null): TimelineCursor | undefined {
  const [, at = '', id = ''] = /^(\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}Z)_([0-9a-f-]{36})$/.exec(text ?? '') ?? []
  const performedAt = new Date(at)
  return Number.isNaN(performedAt.getTime()) ? undefined : { performedAt, id }
}

/** An entry with the chain it belongs to, oldest first: what it corrects, itself, and what took its place. */
export type EntryHistory = {
  readonly entry: StoredEntry
  readonly chain: readonly StoredEntry[]
  readonly patientId: string
  /** Where the patient is now, or was last. */
  readonly wardId: string
}

/** One entry with its history, or undefined when there is no such entry. */
export async function entryWithHistory(id: string): Promise<EntryHistory | undefined> {
  const [about] = await select<{ patientId: string; wardId: string }>(
    `SELECT s.patient_id AS patientId, s.ward_id AS wardId FROM entries e JOIN stays s ON s.id = e.stay_id WHERE e.id = :id`,
    { id },
  )
  if (!about) return undefined
  const chain = await storedEntries(
    `WHERE e.id IN (
       WITH RECURSIVE earlier AS (
         SELECT id, supersedes_id FROM entries WHERE id = :id
         UNION ALL SELECT o.id, o.supersedes_id FROM entries o JOIN earlier n ON o.id = n.supersedes_id
       ), later AS (
         SELECT id FROM entries WHERE id = :id
         UNION ALL SELECT n.id FROM entries n JOIN later o ON n.supersedes_id = o.id
       ) SELECT id FROM earlier UNION SELECT id FROM later
     ) ORDER BY e.number`,
    { id },
  )
  const entry = chain.find(link => link.id === id.toLowerCase())
  return entry && { entry, chain, ...about }
}

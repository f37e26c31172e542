import type { StoredEntry } from '#app/care/kind.ts'
import { select } from './sequelize.server.ts'
import { entriesOfStays } from './stay-entries.server.ts'
import { type StayWithPatient, stayRows } from './stay-rows.server.ts'
import { wardRev } from './ward-revs.server.ts'

/**
 * One stay with everything that was charted in it, in the order of recording, superseded entries and retractions included.
 * `entries` is the same array until something is charted.
 */
export type StayRecord = StayWithPatient & { readonly entries: readonly StoredEntry[] }

/** The present patients of a ward by bed. `rev` is the ward's counter: the records are as new as that, or newer. */
export type WardRecords = { readonly rev: number; readonly stays: readonly StayRecord[] }

const MOST_WARDS = 100

const wards = new Map<string, { readonly rev: number; readonly rows: readonly StayWithPatient[] }>()

/**
 * The records of a ward's present patients, from memory where nothing changed. Pass the ward's counter as `rev` when it
 * has just been read, as with the session: then a board that did not change takes no query at all.
 */
export async function wardRecords(wardId: string, rev?: number): Promise<WardRecords> {
  const counted = rev ?? (await wardRev(wardId))
  return { rev: counted, stays: await withEntries(await wardRows(wardId, counted)) }
}

/** The records of the present patients of several wards, by ward and bed: one query for all of them, and one for new entries. */
export async function recordsOfWards(wardIds: readonly string[]): Promise<readonly StayRecord[]> {
  if (wardIds.length === 0) return []
  const rest = 'WHERE s.ward_id IN (:wardIds) AND s.discharged_at IS NULL ORDER BY w.name, b.position, b.label'
  return withEntries(await stayRows(rest, { wardIds: [...wardIds] }))
}

/** One stay's record, also after discharge; undefined when there is no such stay. */
export async function stayRecord(stayId: string): Promise<StayRecord | undefined> {
  const [record] = await withEntries(await stayRows('WHERE s.id = :stayId', { stayId }))
  return record
}

/** The counter is read before the rows: a write between the two is in the rows, and moves the counter for the next reader. */
async function wardRows(wardId: string, rev: number) {
  const known = wards.get(wardId)
  if (known?.rev === rev) return known.rows
  const rows = await stayRows('WHERE s.ward_id = :wardId AND s.discharged_at IS NULL ORDER BY b.position, b.label', {
    wardId,
  })
  if (wards.size >= MOST_WARDS) wards.clear()
  wards.set(wardId, { rev, rows })
  return rows
}

async function withEntries(rows: readonly StayWithPatient[]): Promise<readonly StayRecord[]> {
  const entries = await entriesOfStays(rows.map(({ stay }) => stay))
  return rows.map(row => ({ ...row, entries: entries.get(row.stay.id) ?? [] }))
}

/** A stay that was on a ward, with the moment from which it was there. */
export type StayOnWardRecord = { readonly record: StayRecord; readonly arrivedAt: Date }

/**
 * The stays of a ward since a moment: those there now, and those discharged from it since. Who was moved to another ward is that
 * ward's; who came from one counts from the move. An admission is the first move of a stay.
 */
export async function wardRecordsSince(wardId: string, since: Date): Promise<readonly StayOnWardRecord[]> {
  const there = 's.ward_id = :wardId AND (s.discharged_at IS NULL OR s.discharged_at > :since)'
  const [rows, arrivals] = await Promise.all([
    stayRows(`WHERE ${there} ORDER BY s.admitted_at, s.id`, { wardId, since }),
    select<{ stayId: string; arrivedAt: Date }>(
      `SELECT s.id AS stayId, MIN(m.moved_at) AS arrivedAt FROM stays s JOIN bed_moves m ON m.stay_id = s.id
       WHERE ${there} AND m.ward_id = s.ward_id AND m.moved_at > COALESCE(
         (SELECT MAX(o.moved_at) FROM bed_moves o WHERE o.stay_id = s.id AND o.ward_id <> s.ward_id), '1000-01-01')
       GROUP BY s.id`,
      { wardId, since },
    ),
  ])
  const arrived = new Map(arrivals.map(({ stayId, arrivedAt }) => [stayId, arrivedAt]))
  const records = await withEntries(rows)
  return records.map(record => ({ record, arrivedAt: arrived.get(record.stay.id) ?? record.stay.admittedAt }))
}

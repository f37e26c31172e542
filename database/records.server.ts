import type { StoredEntry } from '#app/care/kind.ts'
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

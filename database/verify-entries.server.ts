import { createHash } from 'node:crypto'
import { findKind } from '#app/care/kinds.ts'
import { readPayload } from '#app/care/payload.ts'
import { select } from './sequelize.server.ts'
import { type EntryColumns, entryColumns, entryTables, storedEntry } from './stored-entries.server.ts'

/** One thing that is not as it was written, or that today's program cannot read. */
export type EntryFault = { readonly stayId: string; readonly number: number; readonly says: string }

/**
 * What a check of all entries found. `digest` stands for the last hash of every stay: kept somewhere else, it shows later
 * whether somebody with all rights wrote a whole stay anew, which nothing in the database can show.
 */
export type EntriesVerdict = {
  readonly stays: number
  readonly entries: number
  readonly faults: readonly EntryFault[]
  readonly digest: string
}

type Head = { stayId: string; entryCount: number; hash: string }
type Row = EntryColumns & { hash: string; recomputed: string }

const ROWS_AT_ONCE = 2000
const STAYS_AT_ONCE = 500

/** Computes the hash of every entry again, stay by stay, and reads every payload with today's kinds. */
export async function verifyEntries(): Promise<EntriesVerdict> {
  const digest = createHash('sha256')
  const faults: EntryFault[] = []
  let stays = 0
  let entries = 0
  for await (const head of allStays()) {
    digest.update(`${head.stayId} ${head.entryCount} ${head.hash}\n`)
    stays += 1
    entries += await verifyStay(head, faults)
  }
  return { stays, entries, faults, digest: digest.digest('hex') }
}

async function* allStays(): AsyncGenerator<Head> {
  let after = ''
  for (;;) {
    const heads = await select<Head>(
      `SELECT id AS stayId, entry_count AS entryCount, last_entry_hash AS hash FROM stays
       WHERE ${after === '' ? 'TRUE' : 'id > :after'} ORDER BY id LIMIT ${STAYS_AT_ONCE}`,
      { after },
    )
    yield* heads
    const last = heads.at(-1)
    if (last === undefined) return
    after = last.stayId
  }
}

/** Checks one stay as far as it was charted when its head was read, adds what is wrong to `faults`, and returns the count. */
async function verifyStay(head: Head, faults: EntryFault[]): Promise<number> {
  let before = { number: 0, hash: '' }
  let entries = 0
  for (;;) {
    const rows = await rowsAfter(before, head)
    for (const row of rows) {
      for (const says of faultsOf(row, before)) faults.push({ stayId: head.stayId, number: row.number, says })
      before = row
    }
    entries += rows.length
    if (rows.length < ROWS_AT_ONCE) break
  }
  if (before.number !== head.entryCount || before.hash !== head.hash) {
    faults.push({
      stayId: head.stayId,
      number: before.number,
      says: `is not the last one: ${head.entryCount} were charted`,
    })
  }
  return entries
}

function faultsOf(row: Row, before: { number: number; hash: string }): string[] {
  const faults: string[] = []
  if (row.number !== before.number + 1) faults.push(`follows ${before.number}: what was between them is gone`)
  if (row.recomputed !== row.hash) faults.push('is not as it was written, or what came before it is not')
  const kind = findKind(row.kind)
  const payload = kind ? readPayload(kind, row.version, storedEntry(row).raw) : undefined
  if (!payload) faults.push(`is of a kind that is not known: ${row.kind}`)
  else if (!payload.ok) faults.push(`cannot be read: ${payload.why}`)
  return faults
}

/** The hash is computed by the server, over the columns as it writes them: the same words as in the trigger of entries. */
function rowsAfter(before: { number: number; hash: string }, head: Head): Promise<Row[]> {
  return select<Row>(
    `SELECT ${entryColumns}, e.hash, SHA2(CONCAT_WS('\\n', COALESCE(LAG(e.hash) OVER (ORDER BY e.number), :hash), e.id,
       e.stay_id, e.number, e.kind, e.version, e.performed_at, e.recorded_at, e.recorded_by, e.recorded_role,
       COALESCE(CAST(e.witness_id AS CHAR), '-'), COALESCE(CAST(e.supersedes_id AS CHAR), '-'), e.status,
       COALESCE(JSON_QUOTE(e.reason), '-'), e.data), 256) AS recomputed
     FROM ${entryTables} WHERE e.stay_id = :stayId AND e.number > :number AND e.number <= :entryCount
     ORDER BY e.number LIMIT ${ROWS_AT_ONCE}`,
    { ...head, ...before },
  )
}

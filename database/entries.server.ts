import type { Transaction } from 'sequelize'
import type { AnyCharted, DataOf, PatientRecord, StoredEntry } from '#app/care/kind.ts'
import { versionOf } from '#app/care/payload.ts'
import { type Charting, type EntryRow, explained } from './entry-outcome.server.ts'
import { isWorthARetry } from './errors.server.ts'
import { select, transact } from './sequelize.server.ts'
import { type StockUse, takeFromStock } from './stock-use.server.ts'

/** Who charts, in the role they have at this moment. */
export type Author = { readonly id: string; readonly role: string }

interface Act {
  /** Minted when the form was opened: the same id twice is the same act. */
  readonly id: string
  readonly performedAt: Date
  readonly recordedBy: Author
  readonly witnessId?: string | undefined
}

/** An act to chart. `reason`: why it is written more than a day late. */
export interface NewEntry<K extends AnyCharted> extends Act {
  readonly kind: K
  readonly stayId: string
  readonly data: DataOf<K>
  readonly reason?: string | undefined
  /** The record before the act, where the caller has it: it tells which of two like things was used. */
  readonly before?: PatientRecord | null | undefined
}

/** An act as it should have been charted, and why. */
export interface Correction<K extends AnyCharted> extends NewEntry<K> {
  readonly supersedes: string
  readonly reason: string
}

/** Takes an entry out of the record: it had not happened, or was another patient's. */
export interface Retraction {
  readonly id: string
  readonly recordedBy: Author
  readonly reason: string
}

/** What is written with an act or not at all, such as what it took from the stock. Not run again for a form that came twice. */
export type Alongside = (transaction: Transaction) => Promise<void>

/** Charts one act. Safe to repeat. Throws `DatabaseUnavailable`; anything else thrown is a mistake of the caller. */
export async function addEntry<K extends AnyCharted>(entry: NewEntry<K>, alongside?: Alongside): Promise<Charting> {
  return chart(rowOf(entry, null), withStock(usageOf(entry), alongside))
}

/** Charts an act anew in the place of an earlier entry of the same stay and kind. */
export async function correctEntry<K extends AnyCharted>(
  correction: Correction<K>,
  alongside?: Alongside,
): Promise<Charting> {
  const use = { ...usageOf(correction), supersedes: correction.supersedes }
  return chart(rowOf(correction, correction.supersedes), withStock(use, alongside))
}

/** Retracts an entry: a row of its own, with the payload of the one that no longer counts. */
export async function retractEntry(
  retraction: Retraction,
  entry: StoredEntry,
  alongside?: Alongside,
): Promise<Charting> {
  const row: EntryRow = {
    id: retraction.id,
    stayId: entry.stayId,
    kind: entry.kind,
    version: entry.version,
    performedAt: entry.performedAt,
    recordedBy: retraction.recordedBy.id,
    recordedRole: retraction.recordedBy.role,
    witnessId: null,
    supersedesId: entry.id,
    reason: retraction.reason,
    status: 'retracted',
    data: JSON.stringify(entry.raw),
  }
  const use = { ...row, used: [], supersedes: entry.id }
  return chart(row, withStock(use, alongside))
}

function usageOf<K extends AnyCharted>({
  id,
  stayId,
  performedAt,
  recordedBy,
  kind,
  data,
  before,
}: NewEntry<K>): StockUse {
  return { id, stayId, performedAt, recordedBy: recordedBy.id, used: kind.uses?.(data, before ?? null) ?? [] }
}

/** Whoever charts what takes from the stock takes it: it is not for a page to think of. */
function withStock(use: StockUse, alongside?: Alongside): Alongside | undefined {
  if (use.used.length === 0 && use.supersedes === undefined) return alongside
  return async transaction => {
    await takeFromStock(use, transaction)
    await alongside?.(transaction)
  }
}

function rowOf<K extends AnyCharted>(entry: NewEntry<K>, supersedesId: string | null): EntryRow {
  return {
    id: entry.id,
    stayId: entry.stayId,
    kind: entry.kind.slug,
    version: versionOf(entry.kind),
    performedAt: entry.performedAt,
    recordedBy: entry.recordedBy.id,
    recordedRole: entry.recordedBy.role,
    witnessId: entry.witnessId ?? null,
    supersedesId,
    reason: entry.reason ?? null,
    status: 'final',
    // Parsed once more, so that nothing is ever stored that could not be read back.
    data: JSON.stringify(entry.kind.schema.parse(entry.data)),
  }
}

/** One statement, whole by itself: triggers number the entry and raise its ward's counter. With something alongside, a transaction. */
async function chart(row: EntryRow, alongside?: Alongside): Promise<Charting> {
  const together = () =>
    transact(async transaction => {
      const charting = await inserted(row, transaction)
      await alongside?.(transaction)
      return charting
    })
  if (alongside) return together().catch(error => explained(row, error))
  try {
    return await inserted(row, null).catch(error => {
      if (!isWorthARetry(error)) throw error
      return together()
    })
  } catch (error) {
    return explained(row, error)
  }
}

async function inserted(row: EntryRow, transaction: Transaction | null): Promise<Charting> {
  const [stored] = await select<{ number: number }>(
    `INSERT INTO entries (id, stay_id, kind, version, performed_at, recorded_by, recorded_role, witness_id, supersedes_id,
       reason, status, data)
     VALUES (:id, :stayId, :kind, :version, :performedAt, :recordedBy, :recordedRole, :witnessId, :supersedesId,
       :reason, :status, :data) RETURNING number`,
    row,
    transaction,
  )
  if (!stored) throw new Error('An entry was inserted and has no number')
  return { outcome: 'charted', entry: { id: row.id, stayId: row.stayId, number: stored.number } }
}

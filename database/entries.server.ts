import { isDeepStrictEqual } from 'node:util'
import { ConnectionError, type Transaction } from 'sequelize'
import type { AnyCharted, DataOf, StoredEntry } from '#app/care/kind.ts'
import { versionOf } from '#app/care/payload.ts'
import { DatabaseUnavailable, isWorthARetry } from './errors.server.ts'
import { select, transact } from './sequelize.server.ts'
import { storedEntries } from './stored-entries.server.ts'

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

export interface Charted {
  readonly id: string
  readonly stayId: string
  readonly number: number
}

/**
 * What became of an act. `already charted`: the same form came again. `other body under this id`: it came again with other
 * answers, and nothing was changed (422). `already corrected`: somebody was faster (409). `stay not open`: there is no such
 * stay, or it had ended when the act is said to have been done; care charted late, of before the discharge, is taken.
 */
export type Charting =
  | { readonly outcome: 'charted'; readonly entry: Charted }
  | { readonly outcome: 'already charted'; readonly entry: Charted }
  | { readonly outcome: 'other body under this id' }
  | { readonly outcome: 'already corrected'; readonly by: string; readonly at: Date; readonly entryId: string }
  | { readonly outcome: 'stay not open'; readonly dischargedAt: Date | null }

/** Charts one act. Safe to repeat. Throws `DatabaseUnavailable`; anything else thrown is a mistake of the caller. */
export async function addEntry<K extends AnyCharted>(entry: NewEntry<K>): Promise<Charting> {
  return chart(rowOf(entry, null))
}

/** Charts an act anew in the place of an earlier entry of the same stay and kind. */
export async function correctEntry<K extends AnyCharted>(correction: Correction<K>): Promise<Charting> {
  return chart(rowOf(correction, correction.supersedes))
}

/** Retracts an entry: a row of its own, with the payload of the one that no longer counts. */
export async function retractEntry(retraction: Retraction, entry: StoredEntry): Promise<Charting> {
  return chart({
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
  })
}

type Row = {
  readonly id: string
  readonly stayId: string
  readonly kind: string
  readonly version: number
  readonly performedAt: Date
  readonly recordedBy: string
  readonly recordedRole: string
  readonly witnessId: string | null
  readonly supersedesId: string | null
  readonly reason: string | null
  readonly status: 'final' | 'retracted'
  readonly data: string
}

function rowOf<K extends AnyCharted>(entry: NewEntry<K>, supersedesId: string | null): Row {
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

/** One statement, whole by itself: triggers number the entry and raise its ward's counter. */
async function chart(row: Row): Promise<Charting> {
  try {
    return await inserted(row, null).catch(error => {
      if (!isWorthARetry(error)) throw error
      return transact(transaction => inserted(row, transaction))
    })
  } catch (error) {
    return explained(row, error)
  }
}

async function inserted(row: Row, transaction: Transaction | null): Promise<Charting> {
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

/**
 * Why an entry was refused, read from what is stored and not from the words of the error: which of two violated rules the
 * server names first is its own affair. Throws the error when nothing explains it.
 */
async function explained(row: Row, error: unknown): Promise<Charting> {
  const isLost = error instanceof DatabaseUnavailable
  if (isLost && error.cause instanceof ConnectionError) throw error
  try {
    const answer = (await sameId(row)) ?? (isLost ? undefined : ((await sameTarget(row)) ?? (await stayOver(row))))
    if (answer) return answer
  } catch (second) {
    if (!isLost) throw second
  }
  // Sent, and no answer came: it may be stored yet. The same form again settles it.
  throw isLost ? new DatabaseUnavailable(error, true) : error
}

async function sameId(row: Row): Promise<Charting | undefined> {
  const [known] = await storedEntries('WHERE e.id = :id', { id: row.id })
  if (!known) return undefined
  const isSame =
    known.stayId === row.stayId.toLowerCase() &&
    known.kind === row.kind &&
    known.performedAt.getTime() === row.performedAt.getTime() &&
    known.recordedById === row.recordedBy.toLowerCase() &&
    known.supersedesId === (row.supersedesId?.toLowerCase() ?? null) &&
    known.reason === row.reason &&
    known.status === row.status &&
    isDeepStrictEqual(known.raw, JSON.parse(row.data))
  if (!isSame) return { outcome: 'other body under this id' }
  return { outcome: 'already charted', entry: { id: known.id, stayId: known.stayId, number: known.number } }
}

async function sameTarget(row: Row): Promise<Charting | undefined> {
  if (row.supersedesId === null) return undefined
  const [other] = await storedEntries('WHERE e.supersedes_id = :supersedesId', { supersedesId: row.supersedesId })
  return other && { outcome: 'already corrected', by: other.recordedByName, at: other.recordedAt, entryId: other.id }
}

async function stayOver(row: Row): Promise<Charting | undefined> {
  const [stay] = await select<{ dischargedAt: Date | null }>(
    'SELECT discharged_at AS dischargedAt FROM stays WHERE id = :stayId',
    row,
  )
  if (!stay) return { outcome: 'stay not open', dischargedAt: null }
  const isOver = stay.dischargedAt !== null && row.performedAt > stay.dischargedAt
  return isOver ? { outcome: 'stay not open', dischargedAt: stay.dischargedAt } : undefined
}

import { isDeepStrictEqual } from 'node:util'
import { ConnectionError } from 'sequelize'
import { DatabaseUnavailable } from './errors.server.ts'
import { select } from './sequelize.server.ts'
import { storedEntries } from './stored-entries.server.ts'

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

/** An act as the table holds it; `data` is JSON. */
export type EntryRow = {
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

/**
 * Why an entry was refused, read from what is stored and not from the words of the error: which of two violated rules the
 * server names first is its own affair. Throws the error when nothing explains it.
 */
export async function explained(row: EntryRow, error: unknown): Promise<Charting> {
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

async function sameId(row: EntryRow): Promise<Charting | undefined> {
  const [known] = await storedEntries('WHERE e.id = :id', { id: row.id })
  if (!known) return undefined
  const isSame =
    known.stayId === row.stayId.toLowerCase() &&
    known.kind === row.kind &&
    known.performedAt.getTime() === row.performedAt.getTime() &&
    known.recordedById === row.recordedBy.toLowerCase() &&
    known.supersedesId === (row.supersedesId?.toLowerCase() ?? null) &&
    known.reason === row.reason &&
    (await witnessOf(row.id)) === (row.witnessId?.toLowerCase() ?? null) &&
    known.status === row.status &&
    isDeepStrictEqual(known.raw, JSON.parse(row.data))
  if (!isSame) return { outcome: 'other body under this id' }
  return { outcome: 'already charted', entry: { id: known.id, stayId: known.stayId, number: known.number } }
}

async function witnessOf(id: string): Promise<string | null | undefined> {
  const [known] = await select<{ witnessId: string | null }>(
    'SELECT witness_id AS witnessId FROM entries WHERE id = :id',
    { id },
  )
  return known?.witnessId
}

async function sameTarget(row: EntryRow): Promise<Charting | undefined> {
  if (row.supersedesId === null) return undefined
  const [other] = await storedEntries('WHERE e.supersedes_id = :supersedesId', { supersedesId: row.supersedesId })
  return other && { outcome: 'already corrected', by: other.recordedByName, at: other.recordedAt, entryId: other.id }
}

async function stayOver(row: EntryRow): Promise<Charting | undefined> {
  const [stay] = await select<{ dischargedAt: Date | null }>(
    'SELECT discharged_at AS dischargedAt FROM stays WHERE id = :stayId',
    row,
  )
  if (!stay) return { outcome: 'stay not open', dischargedAt: null }
  const isOver = stay.dischargedAt !== null && row.performedAt > stay.dischargedAt
  return isOver ? { outcome: 'stay not open', dischargedAt: stay.dischargedAt } : undefined
}

import type { Transaction } from 'sequelize'
import { isUniqueViolation } from './errors.server.ts'
import { BedMoveRow } from './models/bed-move.server.ts'
import { StayRow } from './models/stay.server.ts'
import { noteChange } from './record-changes.server.ts'
import { select, transact } from './sequelize.server.ts'
import { isBedInUse } from './stays.server.ts'
import { raiseWards } from './ward-revs.server.ts'

/** A move to another bed. `id` is minted when the form was opened, so that the same form twice is one move. */
export interface Move {
  readonly id: string
  readonly stayId: string
  readonly wardId: string
  readonly bedId: string
  readonly movedAt: Date
}

/** What became of a move. `before`: the patient came to the present bed at `at`, later than the move is said to have been. */
export type Moved =
  | { readonly outcome: 'moved' | 'already moved' | 'bed taken' | 'bed not in use' | 'same bed' | 'stay not open' }
  | { readonly outcome: 'other body under this id' }
  | { readonly outcome: 'before'; readonly at: Date }

/** Moves a patient to a free bed, of this ward or another. Safe to repeat. */
export async function move(to: Move, by: string): Promise<Moved> {
  try {
    return await transact(transaction => moved(to, by, transaction))
  } catch (error) {
    if (isUniqueViolation(error, 'stays_one_to_a_bed')) return { outcome: 'bed taken' }
    throw error
  }
}

async function moved(to: Move, by: string, transaction: Transaction): Promise<Moved> {
  const { stayId, wardId, bedId, movedAt } = to
  const stay = await StayRow.findByPk(stayId, { transaction, lock: true })
  const last = await lastMove(stayId, transaction)
  const known = await BedMoveRow.findByPk(to.id, { transaction })
  if (known) return { outcome: isSame(known, to) ? 'already moved' : 'other body under this id' }
  if (!stay || stay.dischargedAt) return { outcome: 'stay not open' }
  if (stay.bedId === bedId) return { outcome: 'same bed' }
  if (last && movedAt < last.movedAt) return { outcome: 'before', at: last.movedAt }
  if (!(await isBedInUse(bedId, wardId, transaction))) return { outcome: 'bed not in use' }
  const old = { wardId: stay.wardId, bedId: stay.bedId }
  await stay.update({ wardId, bedId }, { transaction })
  await BedMoveRow.create({ id: to.id, stayId, wardId, bedId, movedAt, recordedBy: by }, { transaction })
  const change = {
    subject: 'stay',
    subjectId: stayId,
    what: 'moved',
    by,
    old,
    new: { wardId, bedId, movedAt },
  } as const
  await noteChange(change, transaction)
  await raiseWards([old.wardId, wardId], transaction)
  return { outcome: 'moved' }
}

function isSame(known: BedMoveRow, to: Move) {
  return known.stayId === to.stayId.toLowerCase() && known.bedId === to.bedId.toLowerCase()
}

function lastMove(stayId: string, transaction: Transaction) {
  return BedMoveRow.findOne({ where: { stayId }, order: [['movedAt', 'DESC']], transaction })
}

/** The end of a stay. `careAfter`: the person knows that care was charted for later than that, and means it. */
export interface Discharge {
  readonly stayId: string
  readonly dischargedAt: Date
  /** Where to, in a word or two. */
  readonly reason: string
  readonly note: string | null
  readonly careAfter: boolean
}

/** What became of a discharge. `care after`: care was charted for as late as `at`. `before`: the patient came at `at`. */
export type Discharged =
  | { readonly outcome: 'discharged' | 'already discharged' | 'not there' }
  | { readonly outcome: 'discharged by others'; readonly at: Date }
  | { readonly outcome: 'before' | 'care after'; readonly at: Date }

/** Ends a stay and frees its bed. Care of before the discharge can still be charted. Safe to repeat. */
export async function discharge(end: Discharge, by: string): Promise<Discharged> {
  return transact(transaction => discharged(end, by, transaction))
}

async function discharged(end: Discharge, by: string, transaction: Transaction): Promise<Discharged> {
  const { stayId, dischargedAt } = end
  const stay = await StayRow.findByPk(stayId, { transaction, lock: true })
  if (!stay) return { outcome: 'not there' }
  if (stay.dischargedAt) {
    const isAgain = stay.dischargedAt.getTime() === dischargedAt.getTime() && stay.dischargeReason === end.reason
    return isAgain ? { outcome: 'already discharged' } : { outcome: 'discharged by others', at: stay.dischargedAt }
  }
  const last = await lastMove(stayId, transaction)
  if (last && dischargedAt < last.movedAt) return { outcome: 'before', at: last.movedAt }
  const careAt = await lastCareAt(stayId, transaction)
  if (careAt && careAt > dischargedAt && !end.careAfter) return { outcome: 'care after', at: careAt }
  const ended = { dischargedAt, dischargeReason: end.reason, dischargeNote: end.note }
  await stay.update(ended, { transaction })
  const old = { dischargedAt: null, dischargeReason: null, dischargeNote: null }
  await noteChange({ subject: 'stay', subjectId: stayId, what: 'discharged', by, old, new: ended }, transaction)
  await raiseWards([stay.wardId], transaction)
  return { outcome: 'discharged' }
}

/** When the latest care that counts was done. */
async function lastCareAt(stayId: string, transaction: Transaction): Promise<Date | undefined> {
  const [row] = await select<{ performedAt: Date }>(
    `SELECT e.performed_at AS performedAt FROM entries e
     WHERE e.stay_id = :stayId AND e.status = 'final'
       AND NOT EXISTS (SELECT 1 FROM entries s WHERE s.supersedes_id = e.id)
     ORDER BY e.performed_at DESC, e.id DESC LIMIT 1`,
    { stayId },
    transaction,
  )
  return row?.performedAt
}

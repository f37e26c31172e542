import { type LotDecision, type Recall, recallsInForce } from '#app/care/recall.ts'
import { namesOfRenamedLines } from './catalogue-lines.server.ts'
import { isUniqueViolation } from './errors.server.ts'
import { marks } from './marks.server.ts'
import { change, select, transact } from './sequelize.server.ts'
import { raiseAllWards } from './ward-revs.server.ts'

/** A decision to keep. `id` is minted when the form is opened: the same id twice is the same decision. */
export interface NewLotDecision extends Pick<LotDecision, 'lot' | 'line' | 'reason' | 'isRecalled'> {
  readonly id: string
  readonly decidedBy: string
}

interface Kept {
  readonly mark: string
  readonly decisions: readonly LotDecision[]
  readonly inForce: readonly Recall[]
}

let kept: Kept = { mark: '', decisions: [], inForce: [] }

/** Kept in memory: decisions, and former names of lines, are only ever added, so their numbers tell. */
async function known(): Promise<Kept> {
  const { lots: mark } = await marks()
  if (mark !== kept.mark) {
    const [decisions, names] = await Promise.all([allDecisions(), namesOfRenamedLines()])
    kept = { mark, decisions, inForce: recallsInForce(decisions, names) }
  }
  return kept
}

/** Every decision about lots, the latest first. */
export async function lotDecisions(): Promise<readonly LotDecision[]> {
  return (await known()).decisions
}

/** The recalls in force, each under every name of its line. */
export async function recalls(): Promise<readonly Recall[]> {
  return (await known()).inForce
}

async function allDecisions(): Promise<readonly LotDecision[]> {
  const rows = await select<Omit<LotDecision, 'isRecalled'> & { isRecalled: number }>(
    `SELECT r.lot, r.line, r.is_recalled AS isRecalled, r.reason, r.decided_at AS recalledAt, u.name AS recalledByName
     FROM lot_recalls r JOIN users u ON u.id = r.decided_by ORDER BY r.number DESC`,
  )
  return rows.map(row => ({ ...row, isRecalled: Boolean(row.isRecalled) }))
}

/** Keeps a decision about a lot; boards show it from then on. Sent twice, it is kept once. */
export async function decideLot(decision: NewLotDecision): Promise<void> {
  try {
    await transact(async transaction => {
      await change(
        `INSERT INTO lot_recalls (id, lot, line, is_recalled, reason, decided_by)
         VALUES (:id, :lot, :line, :isRecalled, :reason, :decidedBy)`,
        { ...decision },
        transaction,
      )
      await raiseAllWards(transaction)
    })
  } catch (error) {
    if (!isUniqueViolation(error, 'PRIMARY')) throw error
  }
}

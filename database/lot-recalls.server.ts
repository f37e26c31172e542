import type { Recall } from '#app/care/recall.ts'
import { isUniqueViolation } from './errors.server.ts'
import { marks } from './marks.server.ts'
import { change, select, transact } from './sequelize.server.ts'
import { raiseAllWards } from './ward-revs.server.ts'

/** A decision about a lot, as it is kept: recalled, or the recall before it lifted. */
export interface LotDecision extends Recall {
  readonly isRecalled: boolean
}

/** A decision to keep. `id` is minted when the form is opened: the same id twice is the same decision. */
export interface NewLotDecision extends Pick<LotDecision, 'lot' | 'line' | 'reason' | 'isRecalled'> {
  readonly id: string
  readonly decidedBy: string
}

let kept: { readonly mark: string; readonly decisions: readonly LotDecision[] } = { mark: '', decisions: [] }

/** Every decision about lots, the latest first. Kept in memory: they are only ever added, so the last number tells. */
export async function lotDecisions(): Promise<readonly LotDecision[]> {
  const { lots: mark } = await marks()
  if (mark !== kept.mark) kept = { mark, decisions: await allDecisions() }
  return kept.decisions
}

/** The recalls in force: of each lot and line the latest decision, where it was not to lift one. */
export async function recalls(): Promise<readonly Recall[]> {
  const decisions = await lotDecisions()
  const keyOf = ({ lot, line }: Recall) => JSON.stringify([lot.toLowerCase(), line?.toLowerCase()])
  const latest = new Map(decisions.toReversed().map(decision => [keyOf(decision), decision]))
  return [...latest.values()].filter(({ isRecalled }) => isRecalled)
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

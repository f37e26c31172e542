import { DatabaseError } from 'sequelize'
import { isUniqueViolation } from './errors.server.ts'
import { change, transact } from './sequelize.server.ts'
import { raiseWards } from './ward-revs.server.ts'

/** What became of taking a version back: it never comes, it had started, or somebody else had taken it back. */
export type WithdrawalOutcome = 'withdrawn' | 'started' | 'withdrawn before'

/** Takes a version of a ward back before it starts. The database refuses it afterwards. */
export async function withdrawPolicy(
  policy: { readonly id: string; readonly wardId: string },
  reason: string,
  by: string,
): Promise<WithdrawalOutcome> {
  try {
    return await transact<WithdrawalOutcome>(async transaction => {
      await change(
        'INSERT INTO policy_withdrawals (policy_id, reason, withdrawn_by) VALUES (:id, :reason, :by)',
        { id: policy.id, reason, by },
        transaction,
      )
      await raiseWards([policy.wardId], transaction)
      return 'withdrawn'
    })
  } catch (error) {
    if (isUniqueViolation(error, 'PRIMARY')) return 'withdrawn before'
    if (error instanceof DatabaseError && /this policy has started/.test(error.message)) return 'started'
    throw error
  }
}

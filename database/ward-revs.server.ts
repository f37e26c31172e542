import type { Transaction } from 'sequelize'
import { change, select } from './sequelize.server.ts'

/**
 * Raises the counters of wards whose board a transaction changed. Call it last: these rows are the hottest, and always in
 * the order of their ids, so that two moves between the same wards do not wait for each other in a circle.
 */
export async function raiseWards(wardIds: readonly string[], transaction: Transaction): Promise<void> {
  for (const wardId of [...new Set(wardIds)].sort()) {
    await change(
      'INSERT INTO ward_revs (ward_id) VALUES (:wardId) ON DUPLICATE KEY UPDATE rev = rev + 1',
      { wardId },
      transaction,
    )
  }
}

/** Raises the counter of every ward: for what all boards show, such as the policy of the hospital. */
export async function raiseAllWards(transaction: Transaction): Promise<void> {
  await change('UPDATE ward_revs SET rev = rev + 1', {}, transaction)
}

/** A ward's counter: it stands for as long as nothing changes that the ward's board shows. 0 when there is no such ward. */
export async function wardRev(wardId: string): Promise<number> {
  const [row] = await select<{ rev: number }>('SELECT rev FROM ward_revs WHERE ward_id = :wardId', { wardId })
  return row?.rev ?? 0
}

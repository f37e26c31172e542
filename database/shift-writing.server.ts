import { select } from './sequelize.server.ts'

/** Something that somebody wrote down on a ward by themselves. */
export interface WardWriting {
  readonly wardId: string
  readonly userId: string
  readonly at: Date
  readonly kind: string
  readonly isAct: boolean
}

/**
 * Who wrote what on these wards since a moment, not under supervision; a patient who was moved counts for the ward of that time. One
 * query. Care from before that moment that was only written down since is left out: with it, every entry of a stay would be read.
 */
export async function writtenSince(wardIds: readonly string[], since: Date): Promise<readonly WardWriting[]> {
  if (wardIds.length === 0) return []
  const rows = await select<Omit<WardWriting, 'isAct'> & { isAct: number }>(
    `SELECT w.ward_id AS wardId, w.recorded_by AS userId, w.recorded_at AS at, w.kind, w.is_act AS isAct FROM (
       SELECT e.recorded_by, e.recorded_at, e.kind, (e.supersedes_id IS NULL AND e.status = 'final') AS is_act,
         (SELECT m.ward_id FROM bed_moves m WHERE m.stay_id = e.stay_id AND m.moved_at <= e.recorded_at
          ORDER BY m.moved_at DESC, m.id DESC LIMIT 1) AS ward_id
       FROM stays s JOIN entries e ON e.stay_id = s.id
       WHERE (s.discharged_at IS NULL OR s.discharged_at > :since) AND e.performed_at >= :since
         AND e.recorded_at >= :since AND e.under_supervision = 0) w
     WHERE w.ward_id IN (:wardIds)`,
    { wardIds, since },
  )
  return rows.map(({ isAct, ...row }) => ({ ...row, isAct: isAct === 1 }))
}

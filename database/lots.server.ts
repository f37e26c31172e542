import { select } from './sequelize.server.ts'

/** One charted act with a device of a lot, and whose it was. */
export interface LotUse {
  readonly entryId: string
  readonly kind: string
  readonly performedAt: Date
  readonly lot: string
  readonly line: string | null
  readonly size: string | null
  readonly patientId: string
  readonly familyName: string
  readonly givenName: string
  readonly recordNumber: string
  readonly wardId: string
  readonly wardName: string
  readonly bedLabel: string | null
  readonly dischargedAt: Date | null
}

/** Past this many a recall needs a list from the database itself. */
export const MOST_LOT_USES = 2000

/**
 * Every effective entry with a device of this lot, latest first, up to `MOST_LOT_USES`: which patients had it. One query by an
 * index; a corrected entry counts with its correction alone, a retracted one not at all.
 */
export async function usesOfLot(lot: string): Promise<readonly LotUse[]> {
  return select<LotUse>(
    `SELECT e.id AS entryId, e.kind, e.performed_at AS performedAt, e.lot, JSON_VALUE(e.data, '$.line') AS line,
       JSON_VALUE(e.data, '$.size') AS size, p.id AS patientId, p.family_name AS familyName, p.given_name AS givenName,
       p.record_number AS recordNumber, w.id AS wardId, w.name AS wardName, b.label AS bedLabel,
       s.discharged_at AS dischargedAt
     FROM entries e JOIN stays s ON s.id = e.stay_id JOIN patients p ON p.id = s.patient_id
       JOIN wards w ON w.id = s.ward_id LEFT JOIN beds b ON b.id = s.bed_id
     WHERE e.lot = :lot AND e.status = 'final' AND NOT EXISTS (SELECT 1 FROM entries n WHERE n.supersedes_id = e.id)
     ORDER BY e.performed_at DESC, e.id DESC LIMIT ${MOST_LOT_USES}`,
    { lot },
  )
}

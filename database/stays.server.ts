import type { Transaction } from 'sequelize'
import { select } from './sequelize.server.ts'
import { type Stay, type StayWithPatient, stayRows } from './stay-rows.server.ts'

export type { Patient, Sex, Stay, StayWithPatient } from './stay-rows.server.ts'

/** A stay with its patient, open or not; undefined when there is none of that id. */
export async function stayById(stayId: string): Promise<StayWithPatient | undefined> {
  const [row] = await stayRows('WHERE s.id = :stayId', { stayId })
  return row
}

/** The open stay of a patient, if there is one. */
export async function currentStay(patientId: string): Promise<Stay | undefined> {
  const [row] = await stayRows('WHERE s.open_patient_id = :patientId', { patientId })
  return row?.stay
}

/** All stays of a patient, the latest first. */
export async function staysOf(patientId: string): Promise<readonly Stay[]> {
  const rows = await stayRows('WHERE s.patient_id = :patientId ORDER BY s.admitted_at DESC, s.id DESC', { patientId })
  return rows.map(({ stay }) => stay)
}

/** A patient came to a bed. The first of a stay is the admission. */
export type BedMove = {
  readonly wardId: string
  readonly wardName: string
  readonly bedLabel: string
  readonly movedAt: Date
  readonly recordedAt: Date
  readonly recordedByName: string
}

/** The beds of a stay, the latest first. */
export async function bedMovesOf(stayId: string): Promise<readonly BedMove[]> {
  return select<BedMove>(
    `SELECT m.ward_id AS wardId, w.name AS wardName, b.label AS bedLabel, m.moved_at AS movedAt, m.recorded_at AS recordedAt,
       u.name AS recordedByName
     FROM bed_moves m JOIN wards w ON w.id = m.ward_id JOIN beds b ON b.id = m.bed_id JOIN users u ON u.id = m.recorded_by
     WHERE m.stay_id = :stayId ORDER BY m.moved_at DESC, m.recorded_at DESC`,
    { stayId },
  )
}

/** Whether a patient may come to this bed: it is there and in use. Holds it as it is until the transaction ends. */
export async function isBedInUse(bedId: string, wardId: string, transaction: Transaction): Promise<boolean> {
  const beds = await select(
    `SELECT 1 FROM beds b JOIN wards w ON w.id = b.ward_id
     WHERE b.id = :bedId AND b.ward_id = :wardId AND NOT b.retired AND NOT w.retired LOCK IN SHARE MODE`,
    { bedId, wardId },
    transaction,
  )
  return beds.length > 0
}

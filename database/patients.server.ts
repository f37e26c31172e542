import type { Transaction } from 'sequelize'
import { isUniqueViolation } from './errors.server.ts'
import { PatientRow } from './models/patient.server.ts'
import { noteChange } from './record-changes.server.ts'
import { transact } from './sequelize.server.ts'
import { type Patient, type Stay, stayRows } from './stay-rows.server.ts'
import { raiseWards } from './ward-revs.server.ts'

/** Who it is and where: the person with their open stay, or the last one when they are not here now. One query. */
export async function patientSummary(
  patientId: string,
): Promise<{ readonly patient: Patient; readonly stay: Stay } | undefined> {
  const [row] = await stayRows(
    'WHERE s.patient_id = :patientId ORDER BY s.discharged_at IS NULL DESC, s.admitted_at DESC, s.id DESC LIMIT 1',
    { patientId },
  )
  return row
}

/** What may be edited of a patient. */
export type PatientDetails = Omit<Patient, 'id' | 'demo' | 'version'>

/** What became of an edit. `changed by others`: somebody edited the patient since `version` was read. */
export type PatientChange = { readonly outcome: 'saved' | 'changed by others' | 'number taken' | 'not there' }

/**
 * Changes what is known of a patient and notes who changed what. An edit that was begun on an older version is refused,
 * unless it says what is stored already: then it is the same form again.
 */
export async function changePatient(
  id: string,
  version: number,
  details: PatientDetails,
  by: string,
): Promise<PatientChange> {
  try {
    return await transact(transaction => changed(id, version, details, by, transaction))
  } catch (error) {
    if (isUniqueViolation(error, 'patients_record_number')) return { outcome: 'number taken' }
    throw error
  }
}

async function changed(
  id: string,
  version: number,
  details: PatientDetails,
  by: string,
  transaction: Transaction,
): Promise<PatientChange> {
  const row = await PatientRow.findByPk(id, { transaction, lock: true })
  if (!row) return { outcome: 'not there' }
  const old = { ...row.get({ plain: true }) }
  row.set({ ...details })
  if (!row.changed()) return { outcome: 'saved' }
  if (old.version !== version) return { outcome: 'changed by others' }
  await row.set({ version: version + 1 }).save({ transaction })
  await noteChange({ subject: 'patient', subjectId: id, what: 'details changed', by, old, new: details }, transaction)
  const open = await stayRows('WHERE s.open_patient_id = :id', { id }, transaction)
  await raiseWards(
    open.map(({ stay }) => stay.wardId),
    transaction,
  )
  return { outcome: 'saved' }
}

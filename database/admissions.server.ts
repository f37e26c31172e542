import type { Transaction } from 'sequelize'
import { isUniqueViolation } from './errors.server.ts'
import { BedMoveRow } from './models/bed-move.server.ts'
import { PatientRow } from './models/patient.server.ts'
import { StayRow } from './models/stay.server.ts'
import { noteChange } from './record-changes.server.ts'
import { select, transact } from './sequelize.server.ts'
import type { Patient } from './stay-rows.server.ts'
import { currentStay, isBedInUse } from './stays.server.ts'
import { raiseWards } from './ward-revs.server.ts'

/** A person who was never here, with the facts that rules ask for. */
export type NewPatient = Omit<Patient, 'version' | 'demo'> & { readonly demo?: boolean }

export type Identifiers = Pick<Patient, 'recordNumber' | 'bornOn'>

/** An admission. `stayId` is minted when the form was opened, so that the same form twice is one stay. */
export interface Admission {
  readonly stayId: string
  readonly wardId: string
  readonly bedId: string
  readonly admittedAt: Date
  /** Somebody new, or the two identifiers of somebody known. */
  readonly patient: NewPatient | Identifiers
}

/**
 * What became of an admission. `number taken`: a new patient was given the record number of somebody known. `number
 * unknown`: nobody has this number and this date of birth.
 */
export type Admitted =
  | { readonly outcome: 'admitted' | 'already admitted'; readonly stayId: string; readonly patientId: string }
  | { readonly outcome: 'is admitted'; readonly wardId: string; readonly wardName: string; readonly bedLabel: string }
  | {
      readonly outcome:
        | 'bed taken'
        | 'bed not in use'
        | 'number taken'
        | 'number unknown'
        | 'before the last discharge'
        | 'other body under this id'
    }

/** Admits a patient to a free bed. Safe to repeat. */
export async function admit(admission: Admission, by: string): Promise<Admitted> {
  try {
    return (await repeated(admission)) ?? (await transact(transaction => admitted(admission, by, transaction)))
  } catch (error) {
    return refused(admission, error)
  }
}

async function admitted(admission: Admission, by: string, transaction: Transaction): Promise<Admitted> {
  const { stayId, wardId, bedId, admittedAt, patient } = admission
  if (!(await isBedInUse(bedId, wardId, transaction))) return { outcome: 'bed not in use' }
  const patientId =
    'id' in patient ? await addPatient(patient, by, transaction) : await knownPatient(patient, transaction)
  if (patientId === undefined) return { outcome: 'number unknown' }
  if (await wasHereAfter(patientId, admittedAt, transaction)) return { outcome: 'before the last discharge' }
  const stay = { id: stayId, patientId, wardId, bedId, admittedAt }
  await StayRow.create(stay, { transaction })
  await BedMoveRow.create({ id: stayId, stayId, wardId, bedId, movedAt: admittedAt, recordedBy: by }, { transaction })
  await noteChange({ subject: 'stay', subjectId: stayId, what: 'admitted', by, old: null, new: stay }, transaction)
  await raiseWards([wardId], transaction)
  return { outcome: 'admitted', stayId, patientId }
}

async function addPatient(patient: NewPatient, by: string, transaction: Transaction) {
  await PatientRow.create({ ...patient }, { transaction })
  await noteChange(
    { subject: 'patient', subjectId: patient.id, what: 'patient added', by, old: null, new: patient },
    transaction,
  )
  return patient.id
}

async function knownPatient({ recordNumber, bornOn }: Identifiers, transaction: Transaction) {
  const [row] = await select<{ id: string }>(
    'SELECT id FROM patients WHERE record_number = :recordNumber AND born_on = :bornOn LOCK IN SHARE MODE',
    { recordNumber, bornOn },
    transaction,
  )
  return row?.id
}

async function wasHereAfter(patientId: string, admittedAt: Date, transaction: Transaction) {
  const later = await select(
    'SELECT 1 FROM stays WHERE patient_id = :patientId AND discharged_at > :admittedAt LIMIT 1',
    { patientId, admittedAt },
    transaction,
  )
  return later.length > 0
}

/** The same form again: it is answered as the first time, if it says the same. The bed is that of the admission. */
async function repeated({ stayId, bedId, admittedAt, patient }: Admission): Promise<Admitted | undefined> {
  const [known] = await select<{ patientId: string; recordNumber: string; bedId: string; admittedAt: Date }>(
    `SELECT s.patient_id AS patientId, p.record_number AS recordNumber, m.bed_id AS bedId, s.admitted_at AS admittedAt
     FROM stays s JOIN patients p ON p.id = s.patient_id JOIN bed_moves m ON m.id = s.id WHERE s.id = :stayId`,
    { stayId },
  )
  if (!known) return undefined
  const isSame =
    known.bedId === bedId.toLowerCase() &&
    known.admittedAt.getTime() === admittedAt.getTime() &&
    known.recordNumber.toLowerCase() === patient.recordNumber.toLowerCase()
  if (!isSame) return { outcome: 'other body under this id' }
  return { outcome: 'already admitted', stayId, patientId: known.patientId }
}

async function refused(admission: Admission, error: unknown): Promise<Admitted> {
  const again = await repeated(admission)
  if (again) return again
  if (isUniqueViolation(error, 'PRIMARY')) return { outcome: 'other body under this id' }
  if (isUniqueViolation(error, 'patients_record_number')) return { outcome: 'number taken' }
  if (isUniqueViolation(error, 'stays_one_to_a_bed')) return { outcome: 'bed taken' }
  if (isUniqueViolation(error, 'stays_one_to_a_patient')) {
    const open = await openStay(admission.patient.recordNumber)
    if (open) return { outcome: 'is admitted', wardId: open.wardId, wardName: open.wardName, bedLabel: open.bedLabel }
  }
  throw error
}

async function openStay(recordNumber: string) {
  const [row] = await select<{ id: string }>('SELECT id FROM patients WHERE record_number = :recordNumber', {
    recordNumber,
  })
  return row && currentStay(row.id)
}

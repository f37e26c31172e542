import { type Replacements, select } from './sequelize.server.ts'
import { type StayWithPatient, stayRows } from './stay-rows.server.ts'

export interface PatientSearch {
  /** Only these wards are looked in: those of the person who asks. */
  readonly wardIds: readonly string[]
  /** Parts of a name, a record number or a bed; each word must be found. Empty finds all. */
  readonly words: string
  /** Also those who were discharged, from the ward where they were last. */
  readonly discharged: boolean
  /** From 1. */
  readonly page: number
  readonly pageSize: number
}

export interface PatientsFound {
  readonly patients: readonly StayWithPatient[]
  readonly total: number
}

/** Patients by their last stay in one of the wards: those here now by ward and bed, then the others, last discharged first. */
export async function searchPatients(search: PatientSearch): Promise<PatientsFound> {
  const { wardIds, discharged, page, pageSize } = search
  if (wardIds.length === 0) return { patients: [], total: 0 }
  const { conditions, replacements } = wordConditions(search.words)
  const where = ['s.ward_id IN (:wardIds)', discharged ? LAST_STAY : 's.discharged_at IS NULL', ...conditions].join(
    ' AND ',
  )
  const values: Replacements = { ...replacements, wardIds }
  const [counted] = await select<{ total: number }>(
    `SELECT COUNT(*) AS total FROM stays s JOIN patients p ON p.id = s.patient_id JOIN beds b ON b.id = s.bed_id WHERE ${where}`,
    values,
  )
  const patients = await stayRows(
    `WHERE ${where}
     ORDER BY s.discharged_at IS NOT NULL, s.discharged_at DESC, w.name, b.position, b.label, s.id LIMIT :limit OFFSET :offset`,
    { ...values, limit: pageSize, offset: (page - 1) * pageSize },
  )
  return { patients, total: counted?.total ?? 0 }
}

const LAST_STAY = `NOT EXISTS (SELECT 1 FROM stays n WHERE n.patient_id = s.patient_id
  AND (n.admitted_at > s.admitted_at OR (n.admitted_at = s.admitted_at AND n.id > s.id)))`

const MOST_WORDS = 5

/** A bed is found by its whole label, since "1" is part of every second one. */
function wordConditions(words: string) {
  const each = words.trim().split(/\s+/).filter(Boolean).slice(0, MOST_WORDS)
  const conditions = each.map(
    (_, i) => `(p.family_name LIKE :part${i} OR p.given_name LIKE :part${i}
      OR p.record_number LIKE :part${i} OR b.label = :word${i})`,
  )
  const replacements = Object.fromEntries(
    each.flatMap((word, i) => [
      [`part${i}`, `%${word.replace(/[\\%_]/g, '\\$&')}%`],
      [`word${i}`, word],
    ]),
  )
  return { conditions, replacements }
}

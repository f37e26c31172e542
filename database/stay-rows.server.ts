import type { Transaction } from 'sequelize'
import type { BedMove, PatientFacts } from '#app/care/kind.ts'
import type { LocalDay } from '#app/time/zone.ts'
import { type Replacements, select } from './sequelize.server.ts'

export type Sex = 'female' | 'male' | 'other' | 'not known'

/** A person, with the facts that hold until somebody changes them. `allergies` null: nobody has asked. */
export type Patient = PatientFacts & {
  readonly id: string
  readonly recordNumber: string
  readonly familyName: string
  readonly givenName: string
  readonly bornOn: LocalDay
  readonly sex: Sex
  readonly allergies: string | null
  readonly oxygen: string | null
  readonly demo: boolean
  /** Raised by each edit: an edit that was begun on an older one is told so. */
  readonly version: number
}

/** One stay, in the bed where the patient is (or was last). `entryCount` is the number of its last entry. */
export type Stay = {
  readonly id: string
  readonly patientId: string
  readonly wardId: string
  readonly wardName: string
  readonly bedId: string
  readonly bedLabel: string
  readonly admittedAt: Date
  /** From bed to bed after the admission, oldest first. */
  readonly moves: readonly BedMove[]
  readonly dischargedAt: Date | null
  readonly dischargeReason: string | null
  readonly dischargeNote: string | null
  readonly entryCount: number
  /** How many countersignatures its entries have had. */
  readonly countersignCount: number
}

export type StayWithPatient = { readonly stay: Stay; readonly patient: Patient }

type Flat = Omit<Patient, 'id' | 'ventilated' | 'demo'> &
  Omit<Stay, 'id' | 'moves'> & { stayId: string; beds: readonly BedOfStay[] | null; ventilated: number; demo: number }

/** A bed of a stay, with the moment (ms) from which the patient was there. */
type BedOfStay = { readonly at: number; readonly bed: string; readonly ward: string }

/** The columns of a patient under the alias `p`, apart from the id. */
const patientColumns = `p.record_number AS recordNumber, p.family_name AS familyName, p.given_name AS givenName,
  p.born_on AS bornOn, p.sex, p.allergies, p.upper_airway AS upperAirway, p.laryngoscopy, p.airway_notes AS airwayNotes, p.ventilated, p.oxygen, p.spo2_low AS spo2Low,
  p.spo2_high AS spo2High, p.demo, p.version`

/** The beds of a stay under the alias `s`, oldest first; the first is that of the admission. */
const bedsOfStay = `(SELECT JSON_ARRAYAGG(JSON_OBJECT('at', ROUND(UNIX_TIMESTAMP(m.moved_at) * 1000), 'bed', mb.label, 'ward', mw.name)
  ORDER BY m.moved_at, m.recorded_at) FROM bed_moves m JOIN beds mb ON mb.id = m.bed_id JOIN wards mw ON mw.id = m.ward_id
  WHERE m.stay_id = s.id)`

/** Stays with their patients, by what stands after FROM stays s JOIN patients p, wards w, beds b. */
export async function stayRows(
  rest: string,
  replacements: Replacements,
  transaction: Transaction | null = null,
): Promise<readonly StayWithPatient[]> {
  const rows = await select<Flat>(
    `SELECT s.id AS stayId, s.patient_id AS patientId, s.ward_id AS wardId, w.name AS wardName, s.bed_id AS bedId,
       b.label AS bedLabel, s.admitted_at AS admittedAt, s.discharged_at AS dischargedAt,
       s.discharge_reason AS dischargeReason, s.discharge_note AS dischargeNote, s.entry_count AS entryCount,
       s.countersign_count AS countersignCount, ${bedsOfStay} AS beds, ${patientColumns}
     FROM stays s JOIN patients p ON p.id = s.patient_id JOIN wards w ON w.id = s.ward_id JOIN beds b ON b.id = s.bed_id
     ${rest}`,
    replacements,
    transaction,
  )
  return rows.map(row => ({ stay: stayOf(row), patient: patientOf({ ...row, id: row.patientId }) }))
}

function stayOf(row: Flat): Stay {
  return {
    id: row.stayId,
    patientId: row.patientId,
    wardId: row.wardId,
    wardName: row.wardName,
    bedId: row.bedId,
    bedLabel: row.bedLabel,
    admittedAt: row.admittedAt,
    moves: movesOf(row.beds ?? []),
    dischargedAt: row.dischargedAt,
    dischargeReason: row.dischargeReason,
    dischargeNote: row.dischargeNote,
    entryCount: row.entryCount,
    countersignCount: row.countersignCount,
  }
}

function movesOf(beds: readonly BedOfStay[]): readonly BedMove[] {
  return beds.slice(1).map(({ at, bed, ward }, before) => ({
    at: new Date(at),
    bed,
    ward: ward === beds[before]?.ward ? null : ward,
  }))
}

type PatientColumns = Omit<Patient, 'ventilated' | 'demo'> & {
  readonly ventilated: number
  readonly demo: number
}

/** A patient from the columns above and the id. MariaDB's booleans are numbers. */
function patientOf(row: PatientColumns): Patient {
  return {
    id: row.id,
    recordNumber: row.recordNumber,
    familyName: row.familyName,
    givenName: row.givenName,
    bornOn: row.bornOn,
    sex: row.sex,
    allergies: row.allergies,
    upperAirway: row.upperAirway,
    laryngoscopy: row.laryngoscopy ?? null,
    airwayNotes: row.airwayNotes ?? null,
    ventilated: Boolean(row.ventilated),
    oxygen: row.oxygen,
    spo2Low: row.spo2Low,
    spo2High: row.spo2High,
    demo: Boolean(row.demo),
    version: row.version,
  }
}

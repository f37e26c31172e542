import type { Catalogue } from '#app/catalogue/known-items.ts'
import { demoCatalogueChanges } from './catalogue.ts'
import { competenceRows } from './competences.ts'
import type { DemoChange, DemoEntry, DemoHospital, DemoPatient, DemoPolicy, DemoStockMove } from './rows.ts'

/** Rows of one table by the names of its columns. */
export interface TableRows {
  readonly table: string
  readonly rows: readonly Readonly<Record<string, string | number | boolean | Date | null>>[]
}

/** The demo hospital table by table, each after those that it refers to. */
export function demoTables(hospital: DemoHospital, passwordHash: string): readonly TableRows[] {
  const { wards, patients, changes, policies, entries } = hospital
  return [
    ...peopleTables(hospital, passwordHash),
    { table: 'ward_revs', rows: wards.map(({ id }) => ({ ward_id: id })) },
    { table: 'patients', rows: patients.map(patientRow) },
    ...stayTables(hospital),
    { table: 'record_changes', rows: changes.map(changeRow) },
    { table: 'policies', rows: policies.map(policyRow) },
    ...catalogueTables(hospital),
    { table: 'entries', rows: entries.map(entryRow) },
    { table: 'competences', rows: competenceRows(hospital.signOffs) },
    { table: 'stock_moves', rows: hospital.stockMoves.map(stockMoveRow) },
  ]
}

function peopleTables({ people, wards, beds, seededAt }: DemoHospital, passwordHash: string): readonly TableRows[] {
  const wardRows = wards.map(({ id, name, shiftTimes, pressureUnit, emergencyNumbers }) => {
    const numbers = JSON.stringify(emergencyNumbers)
    const shifts = JSON.stringify(shiftTimes)
    return { id, name, shift_times: shifts, pressure_unit: pressureUnit, emergency_numbers: numbers }
  })
  const users = people.map(({ id, name, email, role, supervised, addedAt }) => {
    return {
      id,
      name,
      email,
      role,
      supervised,
      password_hash: passwordHash,
      password_set_at: seededAt,
      added_at: addedAt,
    }
  })
  const members = people.flatMap(({ id, wardIds, addedAt }) =>
    wardIds.map(wardId => ({ user_id: id, ward_id: wardId, added_at: addedAt })),
  )
  const bedRows = beds.map(({ id, wardId, label, position }) => ({ id, ward_id: wardId, label, position }))
  return [
    { table: 'wards', rows: wardRows },
    { table: 'beds', rows: bedRows },
    { table: 'users', rows: users },
    { table: 'ward_members', rows: members },
  ]
}

function catalogueTables({ catalogue, people }: DemoHospital): readonly TableRows[] {
  const { lines, tubes, innerCannulas, fits } = catalogue
  const specialist = people.find(({ role }) => role === 'tracheostomy specialist')
  const fitRows = fits.map(({ tubeId, innerCannulaId }) => ({ tube_id: tubeId, inner_cannula_id: innerCannulaId }))
  return [
    { table: 'tube_lines', rows: lines.map(({ id, line, maker }) => ({ id, name: line, maker })) },
    { table: 'tubes', rows: tubes.map(tubeRow) },
    { table: 'inner_cannulas', rows: innerCannulas.map(innerCannulaRow) },
    { table: 'inner_cannula_fits', rows: fitRows },
    { table: 'catalogue_changes', rows: specialist ? demoCatalogueChanges(catalogue, specialist.id) : [] },
  ]
}

function tubeRow(tube: Catalogue['tubes'][number]) {
  const { id, lineId, size, construction, od, cuff, connector, flange, gtin, version } = tube
  const numbers = {
    id_with_inner: tube.idWithInner,
    id_without_inner: tube.idWithoutInner,
    od,
    length_mm: tube.lengthMm,
  }
  const inner = { inner_cannula: tube.innerCannula, reusable_inner_cannulas: tube.reusableInnerCannulas }
  const kind = {
    size,
    size_system: tube.sizeSystem,
    construction,
    cuff,
    fenestrated: tube.fenestrated === 'yes',
    connector,
    flange,
  }
  const rest = {
    longest_use_days: tube.longestUseDays,
    insertion_aid: tube.insertionAid,
    gtin,
    retired_at: tube.retiredAt,
    version,
  }
  return { id, line_id: lineId, ...kind, ...numbers, ...inner, ...rest }
}

function innerCannulaRow({
  id,
  lineId,
  size,
  use,
  fenestrated,
  packSize,
  gtin,
  retiredAt,
  version,
}: Catalogue['innerCannulas'][number]) {
  const kind = { size, used_as: use, fenestrated: fenestrated === 'yes', pack_size: packSize }
  return { id, line_id: lineId, ...kind, gtin, retired_at: retiredAt, version }
}

function patientRow(patient: DemoPatient) {
  const { id, recordNumber, familyName, givenName, bornOn, sex, allergies, oxygen } = patient
  const names = { record_number: recordNumber, family_name: familyName, given_name: givenName }
  const { upperAirway, laryngoscopy = null, airwayNotes = null, ventilated } = patient
  const known = { laryngoscopy, airway_notes: airwayNotes }
  const airway = { upper_airway: upperAirway, ...known, ventilated, oxygen }
  const target = { spo2_low: patient.spo2Low, spo2_high: patient.spo2High }
  return { id, ...names, born_on: bornOn, sex, allergies, ...airway, ...target, demo: true }
}

function stayTables({ stays, moves }: DemoHospital): readonly TableRows[] {
  return [
    {
      table: 'stays',
      rows: stays.map(stay => ({
        id: stay.id,
        patient_id: stay.patientId,
        ward_id: stay.wardId,
        bed_id: stay.bedId,
        admitted_at: stay.admittedAt,
        discharged_at: stay.dischargedAt,
        discharge_reason: stay.dischargeReason,
        discharge_note: stay.dischargeNote,
      })),
    },
    {
      table: 'bed_moves',
      rows: moves.map(move => ({
        id: move.id,
        stay_id: move.stayId,
        ward_id: move.wardId,
        bed_id: move.bedId,
        moved_at: move.movedAt,
        recorded_at: move.movedAt,
        recorded_by: move.recordedBy,
      })),
    },
  ]
}

function changeRow({ subject, subjectId, what, changedBy, changedAt, oldValues, newValues }: DemoChange) {
  const values = { old_values: oldValues && JSON.stringify(oldValues), new_values: JSON.stringify(newValues) }
  return { subject, subject_id: subjectId, what, changed_by: changedBy, changed_at: changedAt, ...values }
}

function policyRow(policy: DemoPolicy) {
  const { id, name, version, wardId, reviewedBy, reviewedOn, startsAt, reason, createdBy, values } = policy
  const review = { reviewed_by: reviewedBy, reviewed_on: reviewedOn, starts_at: startsAt, reason }
  const made = { created_by: createdBy, created_at: startsAt }
  return { id, name, version, ward_id: wardId, ...review, ...made, setting_values: JSON.stringify(values) }
}

function entryRow(entry: DemoEntry) {
  const { id, kind, version, reason, status } = entry
  const times = { performed_at: entry.performedAt, recorded_at: entry.recordedAt }
  const people = { recorded_by: entry.recordedById, recorded_role: entry.recordedRole, witness_id: entry.witnessId }
  const rest = { supersedes_id: entry.supersedesId, reason, status, data: JSON.stringify(entry.raw) }
  return { id, stay_id: entry.stayId, kind, version, ...times, ...people, ...rest }
}

function stockMoveRow(move: DemoStockMove) {
  const { part, act, quantity, counted, reason, item } = move
  const named = { supply: null, tube_id: null, inner_cannula_id: null }
  const kept =
    'supply' in item
      ? { supply: item.supply }
      : 'tubeId' in item
        ? { tube_id: item.tubeId }
        : { inner_cannula_id: item.innerCannulaId }
  const place = { ward_id: move.wardId, bed_id: move.bedId }
  const whose = { entry_id: move.entryId, stay_id: move.stayId, recorded_by: move.recordedBy }
  const times = { moved_at: move.movedAt, recorded_at: move.recordedAt }
  return { act_id: move.actId, part, act, ...place, ...named, ...kept, quantity, counted, ...whose, ...times, reason }
}

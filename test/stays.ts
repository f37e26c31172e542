import { v7 as uuidv7 } from 'uuid'
import { cuffPressure } from '#app/care/cuff-pressure/kind.ts'
import type { DataOf } from '#app/care/kind.ts'
import { type Admission, admit, type NewPatient } from '#database/admissions.server.ts'
import { addBed } from '#database/beds.server.ts'
import type { NewEntry } from '#database/entries.server.ts'
import { addWard } from '#database/wards.server.ts'
import { aPerson } from './people.ts'

/** A moment in November 2026, winter time in London: `on('02', '10:00')`. */
export const on = (day: string, time: string): Date => new Date(`2026-11-${day}T${time}:00.000Z`)

/** A ward with its beds, by label '1' to `beds`, and a nurse of it. */
export async function aWardOf(beds: number, name = 'Ward 7', shiftTimes = ['07:00', '15:00', '23:00']) {
  const id = uuidv7()
  const admin = await aPerson({ name: `Admin of ${name}`, role: 'administrator' })
  await addWard({ id, name, shiftTimes, pressureUnit: 'cmH2O' }, admin.id)
  const bedIds: string[] = []
  for (let label = 1; label <= beds; label += 1) {
    const bedId = uuidv7()
    await addBed({ id: bedId, wardId: id, label: String(label) }, admin.id)
    bedIds.push(bedId)
  }
  const nurse = await aPerson({ name: `Nurse of ${name}`, wardIds: [id] })
  return { id, bedIds, nurse, admin }
}

/** Somebody new, with an own record number. */
export function somebodyNew(more: Partial<NewPatient> = {}): NewPatient {
  const id = uuidv7()
  return {
    id,
    recordNumber: `R-${id.slice(-10)}`,
    familyName: 'Okafor',
    givenName: 'Ada',
    bornOn: '1961-03-14',
    sex: 'female',
    allergies: null,
    upperAirway: 'open',
    ventilated: false,
    oxygen: null,
    spo2Low: null,
    spo2High: null,
    ...more,
  }
}

/** An admission on 1 November at 08:00. Throws when it does not come about. */
export async function admitted(
  wardId: string,
  bedId: string,
  by: string,
  more: Partial<Pick<Admission, 'admittedAt' | 'patient'>> = {},
) {
  const outcome = await admit(
    { stayId: uuidv7(), wardId, bedId, admittedAt: on('01', '08:00'), patient: somebodyNew(), ...more },
    by,
  )
  if (outcome.outcome !== 'admitted') throw new Error(`Not admitted: ${outcome.outcome}`)
  return outcome
}

/** One patient in the first bed of a ward of three. */
export async function aStay() {
  const ward = await aWardOf(3)
  const { stayId, patientId } = await admitted(ward.id, ward.bedIds[0] ?? '', ward.nurse.id)
  return { ward, nurse: ward.nurse, stayId, patientId }
}

export const pressureOf26: DataOf<typeof cuffPressure> = {
  found: 26,
  unit: 'cmH2O',
  method: 'manometer',
  position: 'head up',
}

/** A cuff pressure of 26 cmH2O on 2 November at 10:00, not charted yet. */
export function aCuffPressure(
  stayId: string,
  by: { readonly id: string; readonly role: string },
  more: Partial<NewEntry<typeof cuffPressure>> = {},
): NewEntry<typeof cuffPressure> {
  const act = { id: uuidv7(), kind: cuffPressure, stayId, performedAt: on('02', '10:00') }
  return { ...act, recordedBy: { id: by.id, role: by.role }, data: pressureOf26, ...more }
}

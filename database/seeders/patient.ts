import type { DemoPatient } from './rows.ts'

/** Somebody who does not exist: a record number, names and a day of birth, and what is usual unless said otherwise. */
export function patient(
  recordNumber: string,
  familyName: string,
  givenName: string,
  sex: DemoPatient['sex'],
  bornOn: string,
  more: Partial<DemoPatient> = {},
): Omit<DemoPatient, 'id'> {
  return {
    recordNumber,
    familyName,
    givenName,
    sex,
    bornOn,
    allergies: 'No known allergies',
    upperAirway: 'open',
    ventilated: false,
    oxygen: 'Humidified air by tracheostomy mask',
    spo2Low: 94,
    spo2High: 98,
    ...more,
  }
}

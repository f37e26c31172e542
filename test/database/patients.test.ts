import { beforeEach, expect, test } from 'vitest'
import { searchPatients } from '#database/patient-search.server.ts'
import { changePatient, type PatientDetails, patientSummary } from '#database/patients.server.ts'
import { changesOf } from '#database/record-changes.server.ts'
import { discharge } from '#database/stay-changes.server.ts'
import { wardRev } from '#database/ward-revs.server.ts'
import { cleared } from '#test/database.ts'
import { admitted, aWardOf, on, somebodyNew } from '#test/stays.ts'

let ward: Awaited<ReturnType<typeof aWardOf>>

beforeEach(async () => {
  await cleared()
  ward = await aWardOf(4)
})

const here = (bed: number, familyName: string, givenName: string, recordNumber: string) =>
  admitted(ward.id, ward.bedIds[bed - 1] ?? '', ward.nurse.id, {
    patient: somebodyNew({ familyName, givenName, recordNumber }),
  })

const found = async (words: string, more: Partial<Parameters<typeof searchPatients>[0]> = {}) => {
  const all = { wardIds: [ward.id], words, discharged: false, page: 1, pageSize: 25, ...more }
  const { patients, total } = await searchPatients(all)
  return { names: patients.map(({ patient }) => patient.familyName), total }
}

test.each<[string, string[]]>([
  ['', ["O'Neill", 'Müller', 'Okafor']],
  ['neill', ["O'Neill"]],
  ['muller', ['Müller']],
  ['ada okafor', ['Okafor']],
  ['okafor zoë', []],
  ['77', ['Müller']],
  ['3', ['Okafor']],
  ['%', []],
  ['_', []],
  ['\\', []],
  ["' OR '1'='1", []],
  ['x'.repeat(5000), []],
])('%j finds %j', async (words, names) => {
  await here(1, "O'Neill", 'Zoë', 'A-100')
  await here(2, 'Müller', 'Jan', 'B-775')
  await here(3, 'Okafor', 'Ada', 'C-201')
  expect((await found(words)).names).toEqual(names)
})

test('only the wards of the person who asks are looked in', async () => {
  const other = await aWardOf(1, 'Ward 8')
  await here(1, "O'Neill", 'Zoë', 'A-100')
  expect(await found('neill', { wardIds: [other.id] })).toEqual({ names: [], total: 0 })
  expect(await found('neill', { wardIds: [] })).toEqual({ names: [], total: 0 })
})

test('the discharged are found when they are asked for, each by their last stay', async () => {
  const { stayId } = await here(1, "O'Neill", 'Zoë', 'A-100')
  await here(2, 'Okafor', 'Ada', 'C-201')
  const end = { stayId, dischargedAt: on('05', '12:00'), reason: 'home', note: null, careAfter: false }
  await discharge(end, ward.nurse.id)
  expect((await found('')).names).toEqual(['Okafor'])
  expect((await found('', { discharged: true })).names).toEqual(['Okafor', "O'Neill"])
  const again = { patient: { recordNumber: 'A-100', bornOn: '1961-03-14' }, admittedAt: on('06', '12:00') }
  await admitted(ward.id, ward.bedIds[2] ?? '', ward.nurse.id, again)
  expect(await found('neill', { discharged: true })).toEqual({ names: ["O'Neill"], total: 1 })
})

test('pages hold what they say and the total counts all', async () => {
  for (const bed of [1, 2, 3, 4]) await here(bed, `Name ${bed}`, 'Ada', `A-${bed}`)
  expect(await found('', { pageSize: 3 })).toEqual({ names: ['Name 1', 'Name 2', 'Name 3'], total: 4 })
  expect(await found('', { pageSize: 3, page: 2 })).toEqual({ names: ['Name 4'], total: 4 })
  expect(await found('', { pageSize: 3, page: 900 })).toEqual({ names: [], total: 4 })
})

async function details(patientId: string): Promise<{ version: number; details: PatientDetails }> {
  const patient = (await patientSummary(patientId))?.patient
  if (!patient) throw new Error('No patient')
  const { id: _id, demo: _demo, version, ...rest } = patient
  return { version, details: rest }
}

test('an edit is kept with who changed what, and only what changed', async () => {
  const { patientId } = await here(1, 'Okafor', 'Ada', 'C-201')
  const rev = await wardRev(ward.id)
  const { version, details: old } = await details(patientId)
  const edited = { ...old, allergies: 'Latex', spo2Low: 88, spo2High: 92 }
  expect(await changePatient(patientId, version, edited, ward.nurse.id)).toEqual({ outcome: 'saved' })
  expect((await details(patientId)).details).toEqual(edited)
  expect(await wardRev(ward.id)).toBe(rev + 1)
  expect((await changesOf([patientId]))[0]).toMatchObject({
    ...{ what: 'details changed', changedByName: 'Nurse of Ward 7' },
    oldValues: { allergies: null, spo2Low: null, spo2High: null },
    newValues: { allergies: 'Latex', spo2Low: 88, spo2High: 92 },
  })
})

test('of two edits at once the second is told, and the same form again is taken as saved', async () => {
  const { patientId } = await here(1, 'Okafor', 'Ada', 'C-201')
  const { version, details: old } = await details(patientId)
  const outcomes = await Promise.all([
    changePatient(patientId, version, { ...old, allergies: 'Latex' }, ward.nurse.id),
    changePatient(patientId, version, { ...old, allergies: 'Iodine' }, ward.nurse.id),
  ])
  expect(outcomes.map(({ outcome }) => outcome).sort()).toEqual(['changed by others', 'saved'])
  const now = await details(patientId)
  expect(await changePatient(patientId, version, now.details, ward.nurse.id)).toEqual({ outcome: 'saved' })
  expect((await details(patientId)).version).toBe(version + 1)
})

test('a record number of somebody else is not taken', async () => {
  await here(1, "O'Neill", 'Zoë', 'A-100')
  const { patientId } = await here(2, 'Okafor', 'Ada', 'C-201')
  const { version, details: old } = await details(patientId)
  expect(await changePatient(patientId, version, { ...old, recordNumber: 'a-100' }, ward.nurse.id)).toEqual({
    outcome: 'number taken',
  })
})

import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { type Admission, admit } from '#database/admissions.server.ts'
import { bedsOf, changeBed, freeBeds } from '#database/beds.server.ts'
import { addEntry } from '#database/entries.server.ts'
import { patientSummary } from '#database/patients.server.ts'
import { changesOf } from '#database/record-changes.server.ts'
import { discharge, move } from '#database/stay-changes.server.ts'
import { bedMovesOf, currentStay, staysOf } from '#database/stays.server.ts'
import { wardRev } from '#database/ward-revs.server.ts'
import { cleared } from '#test/database.ts'
import { aCuffPressure, admitted, aWardOf, on, somebodyNew } from '#test/stays.ts'

let ward: Awaited<ReturnType<typeof aWardOf>>

beforeEach(async () => {
  await cleared()
  ward = await aWardOf(3)
})

const bed = (label: number) => ward.bedIds[label - 1] ?? ''

function anAdmission(more: Partial<Admission> = {}): Admission {
  const patient = somebodyNew()
  return { stayId: uuidv7(), wardId: ward.id, bedId: bed(1), admittedAt: on('01', '08:00'), patient, ...more }
}

const admitting = (admission: Admission) => admit(admission, ward.nurse.id)

const leaving = (stayId: string, more: Partial<Parameters<typeof discharge>[0]> = {}) =>
  discharge(
    { stayId, dischargedAt: on('05', '12:00'), reason: 'home', note: null, careAfter: false, ...more },
    ward.nurse.id,
  )

const moving = (stayId: string, to: number, more: Partial<Parameters<typeof move>[0]> = {}) =>
  move({ id: uuidv7(), stayId, wardId: ward.id, bedId: bed(to), movedAt: on('03', '09:00'), ...more }, ward.nurse.id)

test('an admission takes the bed, keeps who admitted, and raises the counter of the ward', async () => {
  const rev = await wardRev(ward.id)
  const { stayId, patientId } = await admitted(ward.id, bed(1), ward.nurse.id)
  expect(await wardRev(ward.id)).toBe(rev + 1)
  expect(await currentStay(patientId)).toMatchObject({ id: stayId, bedLabel: '1', wardName: 'Ward 7', entryCount: 0 })
  expect((await freeBeds(ward.id)).map(({ label }) => label)).toEqual(['2', '3'])
  expect(await bedMovesOf(stayId)).toMatchObject([{ bedLabel: '1', recordedByName: 'Nurse of Ward 7' }])
  expect(await changesOf([stayId, patientId])).toMatchObject([{ what: 'admitted' }, { what: 'patient added' }])
})

test('the same admission twice, or ten times at once, is one stay', async () => {
  const admission = anAdmission()
  const outcomes = await Promise.all(
    Array.from({ length: 10 }, () => admitting({ ...admission, patient: { ...admission.patient, id: uuidv7() } })),
  )
  expect(outcomes.filter(({ outcome }) => outcome === 'admitted')).toHaveLength(1)
  expect(outcomes.filter(({ outcome }) => outcome === 'already admitted')).toHaveLength(9)
  expect(await admitting(admission)).toMatchObject({ outcome: 'already admitted', stayId: admission.stayId })
  expect(await admitting({ ...admission, bedId: bed(2) })).toEqual({ outcome: 'other body under this id' })
})

test('of ten people who want the last bed at once one gets it', async () => {
  const outcomes = await Promise.all(Array.from({ length: 10 }, () => admitting(anAdmission())))
  expect(outcomes.map(({ outcome }) => outcome).sort()).toEqual(['admitted', ...Array(9).fill('bed taken')])
})

test('a record number that is known is not taken for somebody new', async () => {
  const patient = somebodyNew({ recordNumber: 'AB 12' })
  await admitting(anAdmission({ patient }))
  const other = somebodyNew({ recordNumber: 'ab 12' })
  expect(await admitting(anAdmission({ bedId: bed(2), patient: other }))).toEqual({ outcome: 'number taken' })
})

test('somebody who was here before comes back under their number and date of birth', async () => {
  const patient = somebodyNew({ recordNumber: 'AB 12' })
  const first = await admitted(ward.id, bed(1), ward.nurse.id, { patient })
  const again = (more: Partial<Admission> = {}) =>
    admitting(anAdmission({ bedId: bed(2), patient: { recordNumber: 'AB 12', bornOn: '1961-03-14' }, ...more }))
  expect(await again()).toMatchObject({ outcome: 'is admitted', wardName: 'Ward 7', bedLabel: '1' })
  await leaving(first.stayId)
  expect(await again()).toEqual({ outcome: 'before the last discharge' })
  const later = { admittedAt: on('08', '10:00') }
  expect(await again({ ...later, patient: { recordNumber: 'AB 12', bornOn: '1961-03-15' } })).toEqual({
    outcome: 'number unknown',
  })
  expect(await again(later)).toMatchObject({ outcome: 'admitted', patientId: first.patientId })
  expect(await staysOf(first.patientId)).toHaveLength(2)
  expect((await patientSummary(first.patientId))?.stay).toMatchObject({ bedLabel: '2', dischargedAt: null })
})

test('nobody is admitted to a bed that is out of use or of another ward', async () => {
  const other = await aWardOf(1, 'Ward 8')
  expect(await admitting(anAdmission({ bedId: other.bedIds[0] ?? '' }))).toEqual({ outcome: 'bed not in use' })
  const [second] = (await bedsOf(ward.id)).filter(({ id }) => id === bed(2))
  if (!second) throw new Error('No second bed')
  const { occupied: _, ...rest } = second
  await changeBed({ ...rest, retired: true }, ward.admin.id)
  expect(await admitting(anAdmission({ bedId: bed(2) }))).toEqual({ outcome: 'bed not in use' })
})

test('a move frees the bed and takes the other, once', async () => {
  const { stayId } = await admitted(ward.id, bed(1), ward.nurse.id)
  const id = uuidv7()
  expect(await moving(stayId, 2, { id })).toEqual({ outcome: 'moved' })
  expect(await moving(stayId, 2, { id })).toEqual({ outcome: 'already moved' })
  expect(await moving(stayId, 3, { id })).toEqual({ outcome: 'other body under this id' })
  expect((await freeBeds(ward.id)).map(({ label }) => label)).toEqual(['1', '3'])
  expect((await bedMovesOf(stayId)).map(({ bedLabel }) => bedLabel)).toEqual(['2', '1'])
})

test('a move to a bed that is taken, the same one, or from before the last move is refused', async () => {
  const { stayId } = await admitted(ward.id, bed(1), ward.nurse.id)
  await admitted(ward.id, bed(2), ward.nurse.id)
  expect(await moving(stayId, 2)).toEqual({ outcome: 'bed taken' })
  expect(await moving(stayId, 1)).toEqual({ outcome: 'same bed' })
  expect(await moving(stayId, 3, { movedAt: on('01', '07:59') })).toEqual({ outcome: 'before', at: on('01', '08:00') })
  expect(await moving(uuidv7(), 3)).toEqual({ outcome: 'stay not open' })
})

test('two moves to one bed at once end with one patient in it', async () => {
  const one = await admitted(ward.id, bed(1), ward.nurse.id)
  const two = await admitted(ward.id, bed(2), ward.nurse.id)
  const outcomes = await Promise.all([moving(one.stayId, 3), moving(two.stayId, 3)])
  expect(outcomes.map(({ outcome }) => outcome).sort()).toEqual(['bed taken', 'moved'])
})

test('a discharge frees the bed, once, and says so to whoever comes second', async () => {
  const { stayId, patientId } = await admitted(ward.id, bed(1), ward.nurse.id)
  expect(await leaving(stayId)).toEqual({ outcome: 'discharged' })
  expect(await leaving(stayId)).toEqual({ outcome: 'already discharged' })
  expect(await leaving(stayId, { reason: 'died' })).toEqual({ outcome: 'discharged by others', at: on('05', '12:00') })
  expect(await currentStay(patientId)).toBeUndefined()
  expect(await freeBeds(ward.id)).toHaveLength(3)
  expect(await moving(stayId, 2)).toEqual({ outcome: 'stay not open' })
})

test('a discharge of before the last care is asked about, and of before the last bed refused', async () => {
  const { stayId } = await admitted(ward.id, bed(1), ward.nurse.id)
  await moving(stayId, 2)
  await addEntry(aCuffPressure(stayId, ward.nurse, { performedAt: on('04', '10:00') }))
  expect(await leaving(stayId, { dischargedAt: on('02', '10:00') })).toEqual({
    outcome: 'before',
    at: on('03', '09:00'),
  })
  const early = { dischargedAt: on('04', '09:00') }
  expect(await leaving(stayId, early)).toEqual({ outcome: 'care after', at: on('04', '10:00') })
  expect(await leaving(stayId, { ...early, careAfter: true })).toEqual({ outcome: 'discharged' })
})

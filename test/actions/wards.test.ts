import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { roles } from '#app/auth/permissions.ts'
import * as one from '#app/routes/admin-ward.tsx'
import * as all from '#app/routes/admin-wards.tsx'
import * as patients from '#app/routes/patients.tsx'
import { bedsOf } from '#database/beds.server.ts'
import { allWards, wardById } from '#database/wards.server.ts'
import { cleared } from '#test/database.ts'
import { answerOf, aPerson, contextOf, formRequest } from '#test/people.ts'
import { admitted, aWardOf, somebodyNew } from '#test/stays.ts'

let ward: Awaited<ReturnType<typeof aWardOf>>

beforeEach(async () => {
  await cleared()
  ward = await aWardOf(2)
})

type Fields = Record<string, string>

const aNewWard = (more: Fields = {}): Fields => ({
  ...{ id: uuidv7(), name: 'Ward 9', shiftTimes: '07:30 19:30', pressureUnit: 'mmHg' },
  ...more,
})

async function add(fields: Fields, user = ward.admin) {
  const request = formRequest('/admin/wards', fields)
  const args = { request, url: new URL(request.url), context: contextOf(user), params: {} }
  return answerOf(async () => all.action({ ...args, pattern: '/admin/wards' }))
}

async function change(fields: Fields, wardId = ward.id, user = ward.admin) {
  const request = formRequest(`/admin/wards/${wardId}`, fields)
  const args = { request, url: new URL(request.url), context: contextOf(user), params: { wardId } }
  return answerOf(async () => one.action({ ...args, pattern: '/admin/wards/:wardId' }))
}

const errorsOf = ({ says }: { says?: unknown }) =>
  (says as { reply?: { error?: Record<string, string[]> } }).reply?.error ?? {}

test('a ward is added once, with its shifts and its unit', async () => {
  const form = aNewWard()
  expect(await add(form)).toMatchObject({ status: 302, location: `/admin/wards/${form.id}` })
  expect(await add(form)).toMatchObject({ status: 302, location: `/admin/wards/${form.id}` })
  expect(await wardById(form.id ?? '')).toMatchObject({ shiftTimes: ['07:30', '19:30'], pressureUnit: 'mmHg' })
  expect(await allWards()).toHaveLength(2)
})

test.each<[string, Fields, string, RegExp]>([
  ['no name', { name: ' ' }, 'name', /Enter the name/],
  ['a name that is taken', { name: 'ward 7' }, 'name', /Another ward/],
  ['a name of 5000 letters', { name: 'x'.repeat(5000) }, 'name', /at most 80/],
  ['no shifts', { shiftTimes: ' , ' }, 'shiftTimes', /at least one/],
  ['shifts that are no times', { shiftTimes: 'early, late' }, 'shiftTimes', /24-hour time/],
  ['shifts out of order', { shiftTimes: '15:00, 07:00' }, 'shiftTimes', /in order/],
  ['an unknown unit', { pressureUnit: 'psi' }, 'pressureUnit', /Choose the unit/],
])('a ward with %s is put right at its field', async (_, wrong, field, words) => {
  const answer = await add(aNewWard(wrong))
  expect(answer.status).toBe(400)
  expect(errorsOf(answer)[field]?.join()).toMatch(words)
  expect(await allWards()).toHaveLength(1)
})

test('settings, beds and use of a ward are changed one by one', async () => {
  const settings = { intent: 'ward', name: 'Ward 7 north', shiftTimes: '08:00, 20:00', pressureUnit: 'kPa' }
  expect((await change(settings)).status).toBe(200)
  expect((await change({ intent: 'add bed', id: uuidv7(), label: '3A' })).status).toBe(200)
  const [first] = await bedsOf(ward.id)
  const bed = { intent: 'bed', id: first?.id ?? '', label: 'Window', position: '9', retired: 'no' }
  expect((await change(bed)).status).toBe(200)
  expect((await bedsOf(ward.id)).map(({ label }) => label)).toEqual(['2', '3A', 'Window'])
  expect((await change({ intent: 'use', retired: 'yes' })).status).toBe(200)
  expect(await wardById(ward.id)).toMatchObject({ name: 'Ward 7 north', retired: true })
})

test('what somebody lies in stays in use', async () => {
  await admitted(ward.id, ward.bedIds[0] ?? '', ward.nurse.id)
  expect(errorsOf(await change({ intent: 'use', retired: 'yes' })).retired?.[0]).toMatch(/patients on this ward/)
  const bed = { intent: 'bed', id: ward.bedIds[0] ?? '', label: '1', position: '1', retired: 'yes' }
  expect(errorsOf(await change(bed)).retired?.[0]).toMatch(/Somebody lies/)
})

test('a bed of another ward, a ward that is not there and a form of elsewhere are no way in', async () => {
  const other = await aWardOf(1, 'Ward 8')
  const bed = { intent: 'bed', id: other.bedIds[0] ?? '', label: 'x', position: '1', retired: 'no' }
  expect((await change(bed)).status).toBe(404)
  expect((await change({ intent: 'use', retired: 'yes' }, uuidv7())).status).toBe(404)
  expect((await change({ intent: 'drop' })).status).toBe(400)
  expect((await change({ ...bed, id: ward.bedIds[0] ?? '', position: '1e9' })).status).toBe(400)
})

test.each(roles)('wards are kept by administrators, and by %s only if that is one', async role => {
  const user = await aPerson({ name: `One ${role}`, role, wardIds: [ward.id] })
  const allowed = role === 'administrator'
  expect((await add(aNewWard(), user)).status).toBe(allowed ? 302 : 403)
  expect((await change({ intent: 'use', retired: 'no' }, ward.id, user)).status).toBe(allowed ? 200 : 403)
})

async function find(fields: Fields, user = ward.nurse) {
  const request = formRequest('/patients', fields)
  const args = { request, url: new URL(request.url), context: contextOf(user), params: {} }
  return answerOf(async () => patients.action({ ...args, pattern: '/patients' }))
}

test('patients are searched in the own wards alone, and by POST', async () => {
  const other = await aWardOf(1, 'Ward 8')
  const named = (familyName: string) => ({ patient: somebodyNew({ familyName }) })
  await admitted(ward.id, ward.bedIds[0] ?? '', ward.nurse.id, named('Here'))
  await admitted(other.id, other.bedIds[0] ?? '', other.nurse.id, named('Hereabouts'))
  expect(await find({ find: 'here' })).toMatchObject({
    total: 1,
    patients: [{ name: 'HERE, Ada', where: 'Ward 7, bed 1' }],
  })
  expect(await find({ find: 'here', page: '-1' })).toMatchObject({ page: 1, total: 1 })
  expect(await find({ find: 'x'.repeat(5000) })).toMatchObject({ total: 0 })
})

test.each(['administrator', 'educator'] as const)('%s sees no list of patients', async role => {
  expect((await find({}, await aPerson({ role, wardIds: [ward.id] }))).status).toBe(403)
})

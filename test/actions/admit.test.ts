import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { action, loader } from '#app/routes/admit.tsx'
import { freeBeds } from '#database/beds.server.ts'
import { patientSummary } from '#database/patients.server.ts'
import { select } from '#database/sequelize.server.ts'
import { discharge } from '#database/stay-changes.server.ts'
import { cleared } from '#test/database.ts'
import { answerOf, aPerson, contextOf, formRequest } from '#test/people.ts'
import { admitted, aWardOf, on, somebodyNew } from '#test/stays.ts'

let ward: Awaited<ReturnType<typeof aWardOf>>

beforeEach(async () => {
  await cleared()
  ward = await aWardOf(2)
})

type Fields = Record<string, string>

/** The form as it was opened by the nurse on 1 December at 14:06, filled in for somebody new. */
function filledIn(more: Fields = {}): Fields {
  return {
    ...{ id: uuidv7(), openedBy: ward.nurse.id, at: '2026-12-01T14:06:40.000Z', when: 'other' },
    ...{ day: '2026-11-02', time: '10:15', bedId: ward.bedIds[0] ?? '' },
    ...{ 'person.recordNumber': 'AB-12', 'person.bornOn': '1961-03-14', 'person.familyName': 'Okafor' },
    ...{ 'person.givenName': 'Ada', 'person.sex': 'female', 'person.upperAirway': 'open', 'person.ventilated': 'no' },
    ...more,
  }
}

const known = (more: Fields = {}): Fields => {
  const { id = '', openedBy = '', at = '', bedId = '' } = filledIn()
  const when = { when: 'other', day: '2026-11-20', time: '10:15' }
  return { id, openedBy, at, bedId, ...when, 'person.recordNumber': 'AB-12', 'person.bornOn': '1961-03-14', ...more }
}

async function send(fields: Fields, options: { user?: CurrentUser; path?: string; wardId?: string } = {}) {
  const { user = ward.nurse, wardId = ward.id, path = '' } = options
  const request = formRequest(`/wards/${wardId}/admit${path}`, fields)
  const args = { request, url: new URL(request.url), context: contextOf(user), params: { wardId } }
  return answerOf(async () => action({ ...args, pattern: '/wards/:wardId/admit' }))
}

/** What a refused form says, by field. */
const errorsOf = (answer: Awaited<ReturnType<typeof send>>) =>
  (answer.says as { reply: { error?: Record<string, string[]>; initialValue?: Record<string, unknown> } }).reply

const stays = () => select<{ id: string }>('SELECT id FROM stays')

test('somebody new is admitted to a free bed, at the time by the clock of the ward', async () => {
  const form = filledIn({
    day: '2026-10-20',
    'person.spo2Low': '88',
    'person.spo2High': '92',
    'person.ventilated': 'yes',
  })
  const answer = await send(form)
  const patientId = answer.location?.split('/').at(-1) ?? ''
  expect(answer).toMatchObject({ status: 302, location: `/patients/${patientId}` })
  expect(await patientSummary(patientId)).toMatchObject({
    patient: {
      recordNumber: 'AB-12',
      familyName: 'Okafor',
      ventilated: true,
      spo2Low: 88,
      spo2High: 92,
      allergies: null,
    },
    stay: { id: form.id, bedLabel: '1', admittedAt: new Date('2026-10-20T09:15:00Z') },
  })
  expect(await freeBeds(ward.id)).toHaveLength(1)
  expect(await select('SELECT action FROM access_log')).toEqual([{ action: 'admitted patient' }])
})

test('the same form twice is one stay, and both times leads to the patient', async () => {
  const form = filledIn()
  const answers = [await send(form), await send(form)]
  expect(answers[1]?.location).toBe(answers[0]?.location)
  expect(await stays()).toHaveLength(1)
})

test('somebody who was here before is found by two identifiers, and their details are to be checked', async () => {
  const patient = somebodyNew({ recordNumber: 'AB-12' })
  const { stayId, patientId } = await admitted(ward.id, ward.bedIds[0] ?? '', ward.nurse.id, { patient })
  const end = { stayId, dischargedAt: on('05', '12:00'), reason: 'home', note: null, careAfter: false }
  await discharge(end, ward.nurse.id)
  const wrong = await send(known({ 'person.bornOn': '1961-03-15' }), { path: '?known' })
  expect(errorsOf(wrong).error).toEqual({
    'person.recordNumber': ['Nobody with this number and date of birth was here before'],
  })
  expect(await send(known(), { path: '?known' })).toMatchObject({
    status: 302,
    location: `/patients/${patientId}/details?admitted`,
  })
})

test.each<[string, Fields, string, RegExp]>([
  ['no record number', { 'person.recordNumber': '' }, 'person.recordNumber', /Enter the record number/],
  ['no bed', { bedId: '' }, 'bedId', /Choose a free bed/],
  ['a bed that is none', { bedId: 'x' }, 'bedId', /Choose a free bed/],
  ['a bed of nowhere', { bedId: '018f0000-0000-7000-8000-000000000000' }, 'bedId', /not free any more/],
  ['no sex', { 'person.sex': '' }, 'person.sex', /Choose the sex/],
  ['an unknown answer', { 'person.upperAirway': 'maybe' }, 'person.upperAirway', /Choose the upper airway/],
  ['a name of 5000 letters', { 'person.familyName': 'x'.repeat(5000) }, 'person.familyName', /at most 80/],
  ['a control character', { 'person.givenName': 'A\u0000da' }, 'person.givenName', /cannot be stored/],
  ['a birth that is no day', { 'person.bornOn': '1961-02-30' }, 'person.bornOn', /date of birth/],
  ['a birth to come', { 'person.bornOn': '2026-11-03' }, 'person.bornOn', /has not come yet/],
  ['a birth long ago', { 'person.bornOn': '1061-03-14' }, 'person.bornOn', /year of birth/],
  ['half a target', { 'person.spo2Low': '88' }, 'person.spo2High', /upper end/],
  ['a target upside down', { 'person.spo2Low': '92', 'person.spo2High': '88' }, 'person.spo2High', /at least/],
  ['a target past 100', { 'person.spo2Low': '88', 'person.spo2High': '101' }, 'person.spo2High', /from 50 to 100/],
  ['a target in words', { 'person.spo2Low': 'low', 'person.spo2High': '92' }, 'person.spo2Low', /from 50 to 100/],
  ['a time to come', { day: '2126-11-02' }, 'time', /has not come yet/],
  ['a time that is none', { time: '25:00' }, 'time', /such as 14:06/],
  ['a time that clocks showed twice', { day: '2026-10-25', time: '01:30' }, 'occurrence', /showed 01:30 twice/],
  ['a time that clocks never showed', { day: '2026-03-29', time: '01:30' }, 'time', /never showed 01:30/],
])('%s is said at its field, and what was typed is kept', async (_, wrong, field, words) => {
  const answer = await send(filledIn(wrong))
  expect(answer.status).toBe(400)
  const { error = {}, initialValue } = errorsOf(answer)
  expect(error[field]?.join(' ')).toMatch(words)
  expect(initialValue).toMatchObject({ day: wrong.day ?? '2026-11-02' })
  expect(await stays()).toEqual([])
})

test('a field that comes twice, one that no form has, and a path are no way in', async () => {
  const request = formRequest(
    `/wards/${ward.id}/admit`,
    filledIn({ 'person.__proto__.x': '1', 'person[999999999]': '1' }),
  )
  const body = new URLSearchParams(await request.text())
  body.append('person.familyName', 'Other')
  body.append('admittedBy', 'x')
  const doubled = new Request(request.url, { method: 'POST', body, headers: request.headers })
  const args = {
    request: doubled,
    url: new URL(doubled.url),
    context: contextOf(ward.nurse),
    params: { wardId: ward.id },
  }
  const answer = await answerOf(async () => action({ ...args, pattern: '/wards/:wardId/admit' }))
  expect(answer.status).toBe(400)
  expect(errorsOf(answer).error).toEqual({ 'person.familyName': ['Enter the family name'] })
})

test('a form that somebody else opened is not sent under this name', async () => {
  const answer = await send(filledIn({ openedBy: uuidv7() }))
  expect(answer.status).toBe(409)
  expect(await stays()).toEqual([])
})

test('a used form with other answers changes nothing', async () => {
  const form = filledIn()
  await send(form)
  expect((await send({ ...form, bedId: ward.bedIds[1] ?? '' })).status).toBe(422)
  expect(await stays()).toHaveLength(1)
})

test('a bed that was taken meanwhile is said at its field', async () => {
  await admitted(ward.id, ward.bedIds[0] ?? '', ward.nurse.id)
  expect(errorsOf(await send(filledIn())).error?.bedId?.[0]).toMatch(/not free any more/)
})

test.each([
  ['nurse', 'own', 302],
  ['charge nurse', 'own', 302],
  ['tracheostomy specialist', 'own', 302],
  ['respiratory therapist', 'own', 403],
  ['observer', 'own', 403],
  ['educator', 'own', 404],
  ['administrator', 'own', 404],
  ['nurse', 'another', 404],
  ['charge nurse', 'another', 404],
] as const)('%s of their %s ward is answered %i', async (role, whose, status) => {
  const user = await aPerson({ role, wardIds: whose === 'own' ? [ward.id] : [] })
  expect((await send(filledIn({ openedBy: user.id }), { user })).status).toBe(status)
  const request = new Request(`http://127.0.0.1:3000/wards/${ward.id}/admit`)
  const args = { request, url: new URL(request.url), context: contextOf(user), params: { wardId: ward.id } }
  const page = await answerOf(async () => loader({ ...args, pattern: '/wards/:wardId/admit' }))
  expect(page.status ?? 302).toBe(status)
})

test('a ward that is not there is a 404', async () => {
  expect((await send(filledIn(), { wardId: uuidv7() })).status).toBe(404)
  expect((await send(filledIn(), { wardId: 'x' })).status).toBe(404)
})

import { QueryTypes } from 'sequelize'
import { beforeEach, expect, test } from 'vitest'
import { patientContext, patientGate, patientOnly } from '#app/auth/patient-access.server.ts'
import type { Act, CurrentUser, Role } from '#app/auth/permissions.ts'
import { loader as askReason, action as giveReason } from '#app/routes/patient-access.tsx'
import { loader as wardAccess } from '#app/routes/ward-access.tsx'
import { cleared, owner } from '#test/database.ts'
import { answerOf, aPatientOn, aPerson, aWard, contextOf, formRequest, site } from '#test/people.ts'

let here: string
let elsewhere: string
let patientId: string

beforeEach(async () => {
  await cleared()
  here = await aWard('Ward 7')
  elsewhere = await aWard('Ward 8')
  patientId = await aPatientOn(here)
})

const gate = (user: CurrentUser, act: Act = 'see patients', id = patientId) =>
  answerOf(() => patientGate(user, id, { path: `/patients/${id}?span=24`, act }))

const reasonPage = () =>
  `/patients/${patientId}/access?returnTo=${encodeURIComponent(`/patients/${patientId}?span=24`)}`

async function reason(user: CurrentUser, words: string, path = reasonPage()) {
  const request = formRequest(path, { reason: words })
  const args = { request, url: new URL(request.url), context: contextOf(user), params: { patientId } }
  return answerOf(() => giveReason({ ...args, pattern: '/patients/:patientId/access' }))
}

const logged = (action: string) =>
  owner.query<{ purpose: string; outcome: string; path: string }>(
    'SELECT purpose, outcome, path FROM access_log WHERE action = :action',
    { replacements: { action }, type: QueryTypes.SELECT },
  )

test.each<[Role, number | 'open']>([
  ['nurse', 'open'],
  ['respiratory therapist', 'open'],
  ['charge nurse', 'open'],
  ['tracheostomy specialist', 'open'],
  ['observer', 'open'],
  ['educator', 404],
  ['administrator', 404],
])('on their own ward, a patient is for %s: %s', async (role, answer) => {
  const found = await gate(await aPerson({ role, wardIds: [here] }))
  expect(found.status ?? 'open').toBe(answer)
})

test.each<[Role, number]>([
  ['nurse', 302],
  ['respiratory therapist', 302],
  ['charge nurse', 302],
  ['tracheostomy specialist', 302],
  ['observer', 404],
  ['educator', 404],
  ['administrator', 404],
])('from another ward, %s is answered %i', async (role, status) => {
  const found = await gate(await aPerson({ role, wardIds: [elsewhere] }))
  expect(found.status).toBe(status)
  if (status === 302) expect(found.location).toBe(reasonPage())
})

test('a patient that does not exist, and an id that is none, are a 404 for everybody', async () => {
  const user = await aPerson({ wardIds: [here] })
  expect(await gate(user, 'see patients', '018f0000-0000-7000-8000-000000000000')).toMatchObject({ status: 404 })
  expect(await gate(user, 'see patients', 'x')).toMatchObject({ status: 404 })
})

test('an act that is not theirs is refused on their own ward, and the refusal is logged', async () => {
  const observer = await aPerson({ role: 'observer', wardIds: [here] })
  expect(await gate(observer, 'chart care')).toMatchObject({ status: 403 })
  expect(await logged('chart care')).toEqual([{ purpose: 'TREAT', outcome: 'refused', path: `/patients/${patientId}` }])
})

test('a reason opens the bedside of that patient and no more', async () => {
  const user = await aPerson({ role: 'charge nurse', wardIds: [elsewhere] })
  const answer = await reason(user, 'Covering Ward 7 tonight')
  expect(answer).toMatchObject({ status: 302, location: `/patients/${patientId}?span=24` })
  expect(await gate(user)).toMatchObject({ wardId: here, via: 'grant' })
  expect(await gate(user, 'chart care')).toMatchObject({ via: 'grant' })
  expect(await gate(user, 'discharge patients')).toMatchObject({ status: 403 })
  expect(await logged('gave a reason')).toMatchObject([{ purpose: 'BTG', outcome: 'done' }])
})

test('a reason is for one person', async () => {
  await reason(await aPerson({ wardIds: [elsewhere] }), 'Covering Ward 7 tonight')
  expect(await gate(await aPerson({ name: 'Bea Lindqvist', wardIds: [elsewhere] }))).toMatchObject({ status: 302 })
})

test('a reason lasts an hour', async () => {
  const user = await aPerson({ wardIds: [elsewhere] })
  await owner.query(
    `INSERT INTO access_grants (id, user_id, patient_id, ward_id, reason, granted_at, ends_at)
     VALUES (UUID(), :userId, :patientId, :here, 'Covering Ward 7', UTC_TIMESTAMP(3) - INTERVAL 1 HOUR, UTC_TIMESTAMP(3))`,
    { replacements: { userId: user.id, patientId, here } },
  )
  expect(await gate(user)).toMatchObject({ status: 302 })
  await reason(user, 'Still covering Ward 7')
  const [row] = await owner.query<{ minutes: number }>(
    'SELECT MAX(TIMESTAMPDIFF(MINUTE, granted_at, ends_at)) AS minutes FROM access_grants',
    { type: QueryTypes.SELECT },
  )
  expect(row?.minutes).toBe(60)
})

test('a patient who moves on needs a new reason', async () => {
  const user = await aPerson({ wardIds: [elsewhere] })
  await reason(user, 'Covering Ward 7 tonight')
  const third = await aWard('Ward 9')
  await owner.query('UPDATE stays SET ward_id = :third, bed_id = (SELECT id FROM beds WHERE ward_id = :third)', {
    replacements: { third },
  })
  expect(await gate(user)).toMatchObject({ status: 302 })
})

test('nine characters are no reason, and the form says so', async () => {
  const user = await aPerson({ wardIds: [elsewhere] })
  expect(await reason(user, ' cover 7   ')).toMatchObject({ status: 400 })
  expect(await gate(user)).toMatchObject({ status: 302 })
})

test('a reason never leads off the site', async () => {
  const user = await aPerson({ wardIds: [elsewhere] })
  const path = `/patients/${patientId}/access?returnTo=${encodeURIComponent('//elsewhere.example')}`
  expect(await reason(user, 'Covering Ward 7 tonight', path)).toMatchObject({ location: `/patients/${patientId}` })
})

test('who needs no reason is not asked for one, and who may not give one is told there is no patient', async () => {
  const ask = async (user: CurrentUser) => {
    const request = new Request(`${site}${reasonPage()}`)
    const args = { request, url: new URL(request.url), context: contextOf(user), params: { patientId } }
    return answerOf(() => askReason({ ...args, pattern: '/patients/:patientId/access' }))
  }
  expect(await ask(await aPerson({ name: 'A', wardIds: [here] }))).toMatchObject({ status: 302 })
  expect(await ask(await aPerson({ name: 'B', wardIds: [elsewhere] }))).toMatchObject({ wardName: 'Ward 7' })
  expect(await ask(await aPerson({ name: 'C', role: 'observer', wardIds: [elsewhere] }))).toMatchObject({ status: 404 })
})

/** Opens a page of the patient as the layout of those pages does. */
async function opens(user: CurrentUser, path = `/patients/${patientId}`) {
  const request = new Request(`${site}${path}`)
  const context = contextOf(user)
  const args = { request, url: new URL(request.url), context, params: { patientId }, pattern: '/patients/:patientId' }
  const answer = await answerOf(async () => (await patientOnly(args, async () => new Response('page'))) ?? {})
  return { answer, context }
}

test('opening a page of a patient is one row in the log, however often the page refreshes', async () => {
  const user = await aPerson({ wardIds: [here] })
  const { context } = await opens(user, `/patients/${patientId}?span=24`)
  await opens(user, `/patients/${patientId}?span=72`)
  expect(context.get(patientContext)).toMatchObject({ patientId, wardId: here, via: 'ward' })
  expect(await logged('opened patient')).toEqual([
    { purpose: 'TREAT', outcome: 'done', path: `/patients/${patientId}` },
  ])
})

test('the charge nurse of the ward reads who from elsewhere opened its patients, why, and how much', async () => {
  const visitor = await aPerson({ name: 'Bea Lindqvist', role: 'respiratory therapist', wardIds: [elsewhere] })
  await reason(visitor, 'Cuff round on all wards')
  await opens(visitor)
  await opens(visitor, `/patients/${patientId}/timeline`)
  const read = async (user: CurrentUser) => {
    const request = new Request(`${site}/wards/${here}/access`)
    const args = { request, url: new URL(request.url), context: contextOf(user), params: { wardId: here } }
    return answerOf(() => wardAccess({ ...args, pattern: '/wards/:wardId/access' }))
  }
  expect(await read(await aPerson({ name: 'A', role: 'charge nurse', wardIds: [here] }))).toMatchObject({
    wardName: 'Ward 7',
    openings: [
      { userName: 'Bea Lindqvist', userRole: 'respiratory therapist', reason: 'Cuff round on all wards', looks: 2 },
    ],
  })
  expect(await logged('read access log')).toHaveLength(1)
  expect(await read(await aPerson({ name: 'B', role: 'charge nurse', wardIds: [elsewhere] }))).toMatchObject({
    status: 404,
  })
  expect(await read(await aPerson({ name: 'C', role: 'nurse', wardIds: [here] }))).toMatchObject({ status: 403 })
})

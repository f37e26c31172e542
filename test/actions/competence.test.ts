import { QueryTypes } from 'sequelize'
import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import type { CurrentUser } from '#app/auth/permissions.ts'
import type { AnyCareKind } from '#app/care/kind.ts'
import { careKinds } from '#app/care/kinds.ts'
import { aTube } from '#app/care/make.ts'
import { tubeChange } from '#app/care/tube-change/kind.ts'
import { loader as list } from '#app/routes/competence.tsx'
import { action, loader } from '#app/routes/competence-person.tsx'
import { loader as round } from '#app/routes/round.tsx'
import { sequelize } from '#database/sequelize.server.ts'
import { aCharting, chart, openedForm, wholeForm } from '#test/charting.ts'
import { cleared, owner } from '#test/database.ts'
import { answerOf, aPerson, contextOf, password, site } from '#test/people.ts'

let given: Awaited<ReturnType<typeof aCharting>>
let educator: CurrentUser

beforeEach(async () => {
  await cleared()
  given = await aCharting()
  educator = await aPerson({ name: 'Percival Okonhale', role: 'educator' })
})

const skill = 'tube change, performing'
const today = () => new Date().toISOString().slice(0, 10)

function send(user: CurrentUser, userId: string, fields: Readonly<Record<string, string>> = {}) {
  const whole = { id: uuidv7(), intent: 'sign off', skill, level: 'independent', assessedOn: today() }
  const body = new URLSearchParams({ ...whole, signerPassword: password, ...fields })
  const request = new Request(`${site}/competence/${userId}`, { method: 'POST', body, headers: { Origin: site } })
  const args = { request, url: new URL(request.url), context: contextOf(user), params: { userId } }
  return answerOf(() => action({ ...args, pattern: '/competence/:userId' }))
}

function opened(user: CurrentUser, userId: string) {
  const request = new Request(`${site}/competence/${userId}`)
  const args = { request, url: new URL(request.url), context: contextOf(user), params: { userId } }
  return answerOf(() => loader({ ...args, pattern: '/competence/:userId' }))
}

function listed(user: CurrentUser) {
  const request = new Request(`${site}/competence`)
  const args = { request, url: new URL(request.url), context: contextOf(user), params: {} }
  return answerOf(() => list({ ...args, pattern: '/competence' }))
}

async function roundOf(user: CurrentUser) {
  const request = new Request(`${site}/round`)
  const args = { request, url: new URL(request.url), context: contextOf(user), params: {} }
  return answerOf(() => round({ ...args, pattern: '/round' }))
}

const stored = () =>
  owner.query<{ id: string; level: string }>('SELECT id, level FROM competences ORDER BY signed_at', {
    type: QueryTypes.SELECT,
  })
const competenceThen = async () => {
  const [row] = await owner.query<{ competence: string }>('SELECT competence FROM entry_signatures', {
    type: QueryTypes.SELECT,
  })
  return row?.competence
}

test('the educator signs a skill off with their own password, once for one form', async () => {
  const id = uuidv7()
  expect(await send(educator, given.nurse.id, { id })).toMatchObject({ status: 302 })
  expect(await send(educator, given.nurse.id, { id })).toMatchObject({ status: 302 })
  expect(await stored()).toEqual([{ id, level: 'independent' }])
})

test.each([
  ['a wrong password', { signerPassword: 'not it at all' }, 'signerPassword', 400],
  ['no password', { signerPassword: '' }, 'signerPassword', 400],
  ['no level', { level: '' }, 'level', 400],
  ['a skill that is none', { skill: 'juggling' }, 'skill', 400],
  ['a day to come', { assessedOn: '2126-01-01' }, 'assessedOn', 400],
])('%s is said at its field, and nothing is signed', async (_, fields, field, status) => {
  const answer = await send(educator, given.nurse.id, fields)
  expect(answer).toMatchObject({ status, says: { errors: { [field]: [expect.any(String)] } } })
  expect(JSON.stringify(answer)).not.toContain('not it at all')
  expect(await stored()).toEqual([])
})

test('an assessor signs off their skill on their ward, and no other, nobody else’s and not their own', async () => {
  const assessor = await aPerson({ name: 'Odalys Verstraeten', role: 'charge nurse', wardIds: [given.ward.id] })
  expect(await send(assessor, given.nurse.id)).toMatchObject({ status: 403 })
  await send(educator, assessor.id, { level: 'assessor' })
  expect(await send(assessor, given.nurse.id)).toMatchObject({ status: 302 })
  expect(await send(assessor, given.nurse.id, { skill: 'suction' })).toMatchObject({
    says: { errors: { skill: [/not an/] } },
  })
  expect(await send(assessor, assessor.id)).toMatchObject({ status: 403 })
  const away = await aPerson({ name: 'Somebody Away' })
  expect(await send(assessor, away.id)).toMatchObject({ status: 404 })
})

test('everybody sees their own, a colleague does not, whoever leads the ward does', async () => {
  const charge = await aPerson({ name: 'Odalys Verstraeten', role: 'charge nurse', wardIds: [given.ward.id] })
  const colleague = await aPerson({ name: 'Kofi Lindstrand', wardIds: [given.ward.id] })
  expect(await opened(given.nurse, given.nurse.id)).toMatchObject({ name: 'Nurse of Ward 7' })
  expect(await opened(charge, given.nurse.id)).toMatchObject({ name: 'Nurse of Ward 7' })
  expect(await opened(colleague, given.nurse.id)).toMatchObject({ status: 404 })
  expect(await listed(given.nurse)).toMatchObject({ status: 302, location: `/competence/${given.nurse.id}` })
  expect(await listed(charge)).toMatchObject({
    wards: [{ gaps: expect.arrayContaining([expect.objectContaining({ name: 'Nurse of Ward 7' })]) }],
  })
})

test('what is withdrawn counts no more and stays readable', async () => {
  const id = uuidv7()
  await send(educator, given.nurse.id, { id })
  expect(await send(educator, given.nurse.id, { id, intent: 'withdraw', reason: '' })).toMatchObject({ status: 400 })
  const withdrawal = { id, intent: 'withdraw', reason: 'Signed for another person' }
  expect(await send(educator, given.nurse.id, withdrawal)).toMatchObject({ status: 302 })
  const { history, asked } = await opened(given.nurse, given.nurse.id)
  expect(history?.[0]?.withdrawn).toMatch(/Percival Okonhale: Signed for another person/)
  expect(asked).toContainEqual({ label: 'Tube change, performing', value: 'no sign-off' })
})

const asking = careKinds.filter((kind: AnyCareKind) => kind.needsCompetence !== undefined)

test('a tube change, a removal and a trial with valve or cap ask for a skill', () => {
  expect(asking.map(({ title }) => title)).toEqual(['Tube change', 'Weaning trial', 'Tube removal for good'])
})

test.each(asking.map((kind): [string, AnyCareKind] => [kind.title, kind]))(
  '%s without its competence warns, is charted, and the entry says so',
  async (_, kind) => {
    expect((await openedForm(given.nurse, given.patientId, kind.slug)).signing?.lacks).toMatch(/no sign-off/)
    const form = wholeForm(kind, given.nurse)
    expect(await chart(given.nurse, given.patientId, kind.slug, form)).toMatchObject({ status: 302 })
    expect(await competenceThen()).toBe('missing')
  },
)

test('a sign-off that ran out reminds the person on their own page and on their round', async () => {
  expect(await opened(given.nurse, given.nurse.id)).toMatchObject({ reminders: [] })
  await send(educator, given.nurse.id, { assessedOn: '2024-02-29' })
  const says = ['Tube change, performing: the sign-off ran out on 28-Feb-2025.']
  expect(await opened(given.nurse, given.nurse.id)).toMatchObject({ reminders: says })
  expect(await roundOf(given.nurse)).toMatchObject({ reminders: { lines: says } })
})

test('an act with its competence does not', async () => {
  await send(educator, given.nurse.id)
  expect((await openedForm(given.nurse, given.patientId, tubeChange.slug)).signing?.lacks).toBeNull()
  await chart(given.nurse, given.patientId, tubeChange.slug, wholeForm(tubeChange, given.nurse, aTube()))
  expect(await competenceThen()).toBe('held')
})

test.each([
  ["UPDATE competences SET level = 'assessor'"],
  ['DELETE FROM competences'],
  ["UPDATE competence_withdrawals SET reason = 'x'"],
  ['DELETE FROM competence_withdrawals'],
])('%s is refused to everybody', async statement => {
  const id = uuidv7()
  await send(educator, given.nurse.id, { id })
  await send(educator, given.nurse.id, { id, intent: 'withdraw', reason: 'Signed for another person' })
  await expect(owner.query(statement)).rejects.toThrow(/append-only/)
  await expect(sequelize.query(statement)).rejects.toThrow(/denied/)
})

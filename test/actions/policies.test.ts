import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { inspectionInterval } from '#app/care/inner-cannula/settings.ts'
import { ruleSetInForce } from '#app/care/policy.ts'
import * as draftRoute from '#app/routes/policy-draft.tsx'
import * as reviewRoute from '#app/routes/policy-review.tsx'
import * as withdrawRoute from '#app/routes/policy-withdraw.tsx'
import { policies } from '#database/policies.server.ts'
import { policyDraft } from '#database/policy-drafts.server.ts'
import { cleared } from '#test/database.ts'
import { answerOf, aPerson, contextOf, formRequest } from '#test/people.ts'
import { aWardOf } from '#test/stays.ts'

let ward: Awaited<ReturnType<typeof aWardOf>>
let author: Awaited<ReturnType<typeof aPerson>>
let colleague: Awaited<ReturnType<typeof aPerson>>

beforeEach(async () => {
  await cleared()
  ward = await aWardOf(1)
  author = await aPerson({ name: 'Sana Author', role: 'tracheostomy specialist', wardIds: [ward.id] })
  colleague = await aPerson({ name: 'Cleo Charge', role: 'charge nurse', wardIds: [ward.id] })
})

type Fields = Record<string, string>

const hoursField = `value.${inspectionInterval.name}`
const scope = () => ({ wardId: ward.id, ruleSet: 'adults' as const })
const versions = async () => (await policies()).filter(({ wardId }) => wardId === ward.id)
const inForce = async (at = new Date()) => ruleSetInForce(await policies(), ward.id, 'adults', at)

function sentTo(path: string, fields: Fields, user: typeof author) {
  const request = formRequest(`${path}?ward=${ward.id}`, fields)
  return { request, url: new URL(request.url), context: contextOf(user) }
}

async function save(fields: Fields, user = author) {
  const args = { ...sentTo('/policy/draft', { rev: '0', intent: 'save', ...fields }, user), params: {} }
  return answerOf(async () => draftRoute.action({ ...args, pattern: '/policy/draft' }))
}

async function publish(more: Fields = {}, user = author) {
  const said = { name: 'Tracheostomy care, Ward 7', reason: 'Two blocked inner cannulas', start: 'now' }
  const fields = { id: uuidv7(), rev: '1', reviewer: colleague.id, reviewedOn: '2026-01-02', ...said, ...more }
  const args = { ...sentTo('/policy/review', fields, user), params: {} }
  return answerOf(async () => reviewRoute.action({ ...args, pattern: '/policy/review' }))
}

async function withdraw(policyId: string, user = author) {
  const args = sentTo(`/policy/versions/${policyId}/withdraw`, { reason: 'Not agreed after all' }, user)
  const pattern = '/policy/versions/:policyId/withdraw' as const
  return answerOf(async () => withdrawRoute.action({ ...args, params: { policyId }, pattern }))
}

const repliesOf = ({ says }: { says?: unknown }) => (says as { error?: Record<string, string[]> }).error ?? {}

test.each<[string, RegExp]>([
  ['25', /1 to 24/],
  ['0', /1 to 24/],
  ['-6', /1 to 24/],
  ['six', /number/],
  ['', /./],
])('an inspection every "%s" hours is refused at its field, and what was typed stays', async (typed, words) => {
  const answer = await save({ [hoursField]: typed })
  expect(answer).toMatchObject({ status: 400, says: { typed: { [inspectionInterval.name]: typed } } })
  expect((answer.says as { errors: Fields }).errors[inspectionInterval.name]).toMatch(words)
  expect(await policyDraft(scope())).toBeNull()
})

test('a draft that somebody else saved meanwhile says who, and what they changed', async () => {
  await save({ [hoursField]: '6' }, colleague)
  const answer = await save({ [hoursField]: '4' })
  expect(answer).toMatchObject({ status: 409, says: { typed: { [inspectionInterval.name]: '4' }, stale: { rev: 1 } } })
  const { stale } = answer.says as { stale: { says: string; theirs: { label: string; says: string }[] } }
  expect(stale.says).toMatch(/^Cleo Charge saved this draft on /)
  expect(stale.theirs.map(({ label, says }) => `${label}: ${says}`)).toEqual([
    expect.stringMatching(/^Inner cannula looked at every: .*8 h.*6 h/),
  ])
  expect((await policyDraft(scope()))?.values[inspectionInterval.name]).toBe(6)
})

test('a draft becomes the version in force, once, with its reviewer and its reason', async () => {
  await save({ [hoursField]: '6' })
  const id = uuidv7()
  expect(await publish({ id })).toMatchObject({ status: 302, location: `/policy?ward=${ward.id}&published` })
  expect(await publish({ id })).toMatchObject({ status: 302 })
  expect(await versions()).toHaveLength(1)
  expect(await inForce()).toMatchObject({ version: 1, reviewedBy: 'Cleo Charge, charge nurse' })
  expect((await inForce())?.values[inspectionInterval.name]).toBe(6)
  expect(await policyDraft(scope())).toBeNull()
})

test.each<[string, () => Fields, string, RegExp]>([
  ['its publisher from the list', () => ({ reviewer: author.id }), 'reviewer', /other than the author/],
  [
    'its publisher by name',
    () => ({ reviewer: '', otherReviewer: 'sana  AUTHOR', otherRole: 'x' }),
    'otherReviewer',
    /other than the author/,
  ],
  ['nobody', () => ({ reviewer: '' }), 'reviewer', /Choose the reviewer/],
  ['somebody without a role', () => ({ reviewer: '', otherReviewer: 'Dr E. Osei' }), 'otherRole', /Enter the role/],
  ['two people', () => ({ otherReviewer: 'Dr E. Osei', otherRole: 'lead' }), 'otherReviewer', /Name one reviewer/],
])('a draft reviewed by %s is not published', async (_, fields, field, words) => {
  await save({ [hoursField]: '6' })
  const answer = await publish(fields())
  expect(answer.status).toBe(400)
  expect(repliesOf(answer)[field]?.join()).toMatch(words)
  expect(await versions()).toEqual([])
})

test('whoever saved the draft last cannot be its reviewer, whoever publishes it', async () => {
  await save({ [hoursField]: '6' }, colleague)
  expect(repliesOf(await publish()).reviewer?.join()).toMatch(/other than the author/)
})

test('a draft that changed after it was looked at is not published', async () => {
  await save({ [hoursField]: '6' })
  await save({ rev: '1', [hoursField]: '5' }, colleague)
  expect(await publish()).toMatchObject({ status: 409 })
  expect(await versions()).toEqual([])
  expect((await policyDraft(scope()))?.values[inspectionInterval.name]).toBe(5)
})

const tomorrow = () => new Date(Date.now() + 86_400_000)

test('a version that starts tomorrow changes nothing today, and can be withdrawn until it starts', async () => {
  await save({ [hoursField]: '6' })
  const day = tomorrow().toISOString().slice(0, 10)
  expect(await publish({ start: 'later', day, time: '07:00' })).toMatchObject({ status: 302 })
  const [coming] = await versions()
  const later = new Date(`${day}T12:00:00Z`)
  expect([await inForce(), (await inForce(later))?.id]).toEqual([undefined, coming?.id])
  expect(await withdraw(coming?.id ?? '')).toMatchObject({ status: 302 })
  expect(await inForce(later)).toBeUndefined()
})

test.each<[string, Fields, string]>([
  ['in the past', { day: '2026-01-02', time: '07:00' }, 'time'],
  ['without a day', { time: '07:00' }, 'day'],
  ['without a time', { day: '2030-01-02' }, 'time'],
  ['years ahead', { day: '2099-01-02', time: '07:00' }, 'day'],
])('a start %s is refused', async (_, when, field) => {
  await save({ [hoursField]: '6' })
  const answer = await publish({ start: 'later', ...when })
  expect([answer.status, Object.keys(repliesOf(answer))]).toEqual([400, [field]])
})

test('a version that has started stays', async () => {
  await save({ [hoursField]: '6' })
  await publish()
  const [version] = await versions()
  expect(await withdraw(version?.id ?? '')).toMatchObject({ status: 409 })
  expect((await inForce())?.id).toBe(version?.id)
})

import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { policyInForce, ruleSetInForce } from '#app/care/policy.ts'
import { addPolicy, type NewPolicy, policies, policyIdFor } from '#database/policies.server.ts'
import { discardPolicyDraft, policyDraft, publishDraft, savePolicyDraft } from '#database/policy-drafts.server.ts'
import { withdrawPolicy } from '#database/policy-withdrawals.server.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson } from '#test/people.ts'
import { aWardOf } from '#test/stays.ts'

let ward: Awaited<ReturnType<typeof aWardOf>>
let author: { readonly id: string }
let scope: { readonly wardId: string; readonly ruleSet: 'adults' }
const HOUR = 3_600_000

beforeEach(async () => {
  await cleared()
  ward = await aWardOf(1)
  author = await aPerson({ name: 'S. Author', role: 'tracheostomy specialist', wardIds: [ward.id] })
  scope = { wardId: ward.id, ruleSet: 'adults' }
})

const soon = () => new Date(Date.now() + HOUR)

const aVersion = (more: Partial<NewPolicy> = {}): NewPolicy => ({
  id: uuidv7(),
  name: 'Tracheostomy care',
  wardId: ward.id,
  ruleSet: 'adults',
  reviewedBy: 'Dr E. Osei, clinical lead',
  reviewedOn: '2026-10-20',
  startsAt: soon(),
  reason: 'Checks more often',
  values: { 'check-hours': 6 },
  ...more,
})

const save = (rev: number, hours: number) =>
  savePolicyDraft({ ...scope, id: uuidv7(), rev, values: { 'check-hours': hours } }, author.id)

test('a draft is kept with who changed it, and each save raises its number', async () => {
  expect(await policyDraft(scope)).toBeNull()
  expect(await save(0, 6)).toEqual({ outcome: 'done' })
  expect(await save(1, 5)).toEqual({ outcome: 'done' })
  expect(await policyDraft(scope)).toMatchObject({ rev: 2, values: { 'check-hours': 5 }, changedByName: 'S. Author' })
})

test('a form that saw an older draft is told so, and changes nothing', async () => {
  await save(0, 6)
  await save(1, 5)
  expect(await save(1, 4)).toMatchObject({ outcome: 'stale', now: { rev: 2, values: { 'check-hours': 5 } } })
  expect(await discardPolicyDraft({ ...scope, rev: 1 })).toMatchObject({ outcome: 'stale' })
  expect((await policyDraft(scope))?.values).toEqual({ 'check-hours': 5 })
})

test('of two first drafts at once one is kept and the other is told', async () => {
  const outcomes = await Promise.all([save(0, 6), save(0, 4)])
  expect(outcomes.map(({ outcome }) => outcome).sort()).toEqual(['done', 'stale'])
})

test('the draft for children stands beside that for adults', async () => {
  await save(0, 6)
  await savePolicyDraft({ wardId: ward.id, ruleSet: 'children', id: uuidv7(), rev: 0, values: {} }, author.id)
  expect(await discardPolicyDraft({ ...scope, rev: 1 })).toEqual({ outcome: 'done' })
  expect(await policyDraft({ wardId: ward.id, ruleSet: 'children' })).toMatchObject({ rev: 1 })
})

test('publishing adds a version to every chosen ward, ends the draft, and twice is once', async () => {
  const other = await aWardOf(1, 'Ward 8')
  await save(0, 6)
  const first = aVersion()
  const versions = [first, aVersion({ id: policyIdFor(first.id, other.id), wardId: other.id })]
  expect(await publishDraft({ ...scope, rev: 1 }, versions, author.id)).toEqual({ outcome: 'done' })
  expect(await publishDraft({ ...scope, rev: 1 }, versions, author.id)).toEqual({ outcome: 'done' })
  expect((await policies()).map(({ wardId, version }) => [wardId, version])).toEqual(
    expect.arrayContaining([
      [ward.id, 1],
      [other.id, 1],
    ]),
  )
  expect(await policies()).toHaveLength(2)
  expect(await policyDraft(scope)).toBeNull()
})

test('a draft that somebody saved since is not published', async () => {
  await save(0, 6)
  await save(1, 5)
  expect(await publishDraft({ ...scope, rev: 1 }, [aVersion()], author.id)).toMatchObject({ outcome: 'stale' })
  expect(await policies()).toEqual([])
})

test('nobody reviews their own version, not even past the forms', async () => {
  await expect(addPolicy(aVersion({ reviewerId: author.id }), author.id)).rejects.toThrow(/reviewed_by_another/)
})

test('a version that is still to come can be withdrawn, once, and is never in force', async () => {
  const coming = aVersion()
  await addPolicy(coming, author.id)
  expect(policyInForce(await policies(), ward.id, new Date(Date.now() + 2 * HOUR))?.id).toBe(coming.id)
  expect(await withdrawPolicy({ id: coming.id, wardId: ward.id }, 'Not agreed yet', author.id)).toBe('withdrawn')
  expect(await withdrawPolicy({ id: coming.id, wardId: ward.id }, 'Again', author.id)).toBe('withdrawn before')
  expect(policyInForce(await policies(), ward.id, new Date(Date.now() + 2 * HOUR))).toBeUndefined()
  expect((await policies())[0]?.withdrawal).toMatchObject({ by: 'S. Author', reason: 'Not agreed yet' })
})

test('a version that has started stays, and a withdrawal cannot be changed', async () => {
  const started = aVersion({ startsAt: new Date(Date.now() - HOUR) })
  await addPolicy(started, author.id)
  expect(await withdrawPolicy({ id: started.id, wardId: ward.id }, 'Too late', author.id)).toBe('started')
  const coming = aVersion()
  await addPolicy(coming, author.id)
  await withdrawPolicy({ id: coming.id, wardId: ward.id }, 'Not agreed yet', author.id)
  await expect(owner.query("UPDATE policy_withdrawals SET reason = 'x'")).rejects.toThrow(/append-only/)
})

test('versions of a rule set for children count apart and stand beside that for adults', async () => {
  const started = new Date(Date.now() - HOUR)
  await addPolicy(aVersion({ startsAt: started }), author.id)
  expect(await addPolicy(aVersion({ startsAt: started, ruleSet: 'children' }), author.id)).toEqual({ version: 1 })
  const known = await policies()
  expect(policyInForce(known, ward.id, new Date())?.children?.ruleSet).toBe('children')
  expect(ruleSetInForce(known, ward.id, 'adults', new Date())?.ruleSet).toBe('adults')
})

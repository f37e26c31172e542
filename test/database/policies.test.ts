import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { policyInForce } from '#app/care/policy.ts'
import { addPolicy, type NewPolicy, policies } from '#database/policies.server.ts'
import { wardRev } from '#database/ward-revs.server.ts'
import { cleared } from '#test/database.ts'
import { aWardOf, on } from '#test/stays.ts'

let ward: Awaited<ReturnType<typeof aWardOf>>

beforeEach(async () => {
  await cleared()
  ward = await aWardOf(1)
})

const aPolicy = (more: Partial<NewPolicy> = {}): NewPolicy => ({
  id: uuidv7(),
  name: 'Tracheostomy care',
  wardId: null,
  reviewedBy: 'Dr E. Osei',
  reviewedOn: '2026-10-20',
  startsAt: on('01', '00:00'),
  reason: 'First policy',
  values: { 'cuff-check-hours': 8, 'stocked-sizes': [6, 7, 8], strict: true },
  ...more,
})

test('a policy comes back as it was added, with who added it', async () => {
  const policy = aPolicy()
  expect(await addPolicy(policy, ward.admin.id)).toEqual({ version: 1 })
  expect(await policies()).toEqual([
    {
      ...policy,
      ruleSet: 'adults',
      withdrawn: false,
      withdrawal: null,
      version: 1,
      createdAt: expect.any(Date),
      createdByName: 'Admin of Ward 7',
    },
  ])
})

test('versions count for the hospital and for each ward apart', async () => {
  const versions = []
  for (const wardId of [null, null, ward.id, null, ward.id]) {
    versions.push((await addPolicy(aPolicy({ wardId }), null)).version)
  }
  expect(versions).toEqual([1, 2, 1, 3, 2])
})

test('the same form twice is one version, and ten at once are ten', async () => {
  const policy = aPolicy()
  await addPolicy(policy, null)
  expect(await addPolicy(policy, null)).toEqual({ version: 1 })
  const added = await Promise.all(Array.from({ length: 10 }, () => addPolicy(aPolicy(), null)))
  expect(added.map(({ version }) => version).sort((a, b) => a - b)).toEqual([2, 3, 4, 5, 6, 7, 8, 9, 10, 11])
})

test('a new policy is seen at once and raises the counters of the wards it is for', async () => {
  const other = await aWardOf(1, 'Ward 8')
  await policies()
  const before = [await wardRev(ward.id), await wardRev(other.id)]
  await addPolicy(aPolicy({ wardId: ward.id }), null)
  expect(policyInForce(await policies(), ward.id, on('02', '00:00'))?.wardId).toBe(ward.id)
  expect(policyInForce(await policies(), other.id, on('02', '00:00'))).toBeUndefined()
  expect([await wardRev(ward.id), await wardRev(other.id)]).toEqual([(before[0] ?? 0) + 1, before[1]])
  await addPolicy(aPolicy(), null)
  expect([await wardRev(ward.id), await wardRev(other.id)]).toEqual([(before[0] ?? 0) + 2, (before[1] ?? 0) + 1])
})

test('policies that did not change are the same array', async () => {
  await addPolicy(aPolicy(), null)
  expect(await policies()).toBe(await policies())
})

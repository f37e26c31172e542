import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import type { CurrentUser, Role } from '#app/auth/permissions.ts'
import { carePlan } from '#app/care/care-plan/kind.ts'
import { cuffPressure } from '#app/care/cuff-pressure/kind.ts'
import { grantAccess } from '#database/access-grants.server.ts'
import { aCharting, chart, openedForm, wholeForm } from '#test/charting.ts'
import { cleared } from '#test/database.ts'
import { aChartedPressure, aCorrectionForm, aRetractionForm, entryPages } from '#test/entries.ts'
import { aPerson, aWard, traceOfTest } from '#test/people.ts'

let given: Awaited<ReturnType<typeof aCharting>>
let elsewhere: string
let entryId: string

beforeEach(async () => {
  await cleared()
  given = await aCharting()
  elsewhere = await aWard('Ward 8')
  entryId = await aChartedPressure(given.stayId, given.nurse)
})

const { see, correct, retract, openCorrect } = entryPages
const statusOf = ({ status }: { status?: number }) => status ?? 200

const charts = (user: CurrentUser, kind: typeof cuffPressure | typeof carePlan = cuffPressure) =>
  chart(user, given.patientId, kind.slug, wholeForm(kind, user)).then(statusOf)

interface Answers {
  readonly chart: number
  readonly plan: number
  readonly see: number
  readonly correct: number
  readonly retract: number
}

async function answers(user: CurrentUser): Promise<Answers> {
  return {
    chart: await charts(user),
    plan: await charts(user, carePlan),
    see: statusOf(await see(user, entryId)),
    correct: statusOf(await openCorrect(user, entryId)),
    retract: statusOf(await retract(user, entryId, aRetractionForm(user))),
  }
}

const nothing: Answers = { chart: 404, plan: 404, see: 404, correct: 404, retract: 404 }
const bedside: Answers = { chart: 302, plan: 403, see: 200, correct: 403, retract: 403 }
const leading: Answers = { chart: 302, plan: 302, see: 200, correct: 200, retract: 302 }

test.each<[Role, Answers]>([
  ['nurse', bedside],
  ['respiratory therapist', bedside],
  ['charge nurse', leading],
  ['tracheostomy specialist', leading],
  ['observer', { chart: 403, plan: 403, see: 200, correct: 403, retract: 403 }],
  ['educator', nothing],
  ['administrator', nothing],
])('what a colleague charted, on their own ward, is for %s as their role says', async (role, expected) => {
  expect(await answers(await aPerson({ name: 'Colleague', role, wardIds: [given.ward.id] }))).toEqual(expected)
})

const asksWhy: Answers = { chart: 302, plan: 302, see: 302, correct: 302, retract: 302 }

test.each<[Role, Answers]>([
  ['nurse', asksWhy],
  ['respiratory therapist', asksWhy],
  ['charge nurse', asksWhy],
  ['tracheostomy specialist', asksWhy],
  ['observer', nothing],
  ['educator', nothing],
  ['administrator', nothing],
])('from another ward, %s is asked for a reason or sees nothing', async (role, expected) => {
  const user = await aPerson({ name: 'From elsewhere', role, wardIds: [elsewhere] })
  expect(await answers(user)).toEqual(expected)
  if (expected !== asksWhy) return
  const form = wholeForm(cuffPressure, user)
  const { location } = await chart(user, given.patientId, cuffPressure.slug, form)
  expect(location).toMatch(new RegExp(`^/patients/${given.patientId}/access\\?returnTo=`))
  expect((await see(user, entryId)).location).toContain(encodeURIComponent(`/entries/${entryId}`))
})

test('a reason opens charting and one’s own entries, not plans and not those of others', async () => {
  const user = await aPerson({ name: 'From elsewhere', role: 'charge nurse', wardIds: [elsewhere] })
  const by = traceOfTest(user)
  const grant = { userId: user.id, patientId: given.patientId, stayId: given.stayId, wardId: given.ward.id }
  await grantAccess({ ...grant, reason: 'Covering Ward 7 tonight', minutes: 60 }, by)
  expect(await answers(user)).toEqual(bedside)
  const own = await aChartedPressure(given.stayId, user)
  expect(await correct(user, own, aCorrectionForm(user))).toMatchObject({ status: 302 })
})

test('the author corrects and retracts what they charted', async () => {
  expect(await see(given.nurse, entryId)).toMatchObject({ mayCorrect: true, mayRetract: true })
  expect(await correct(given.nurse, entryId, aCorrectionForm(given.nurse))).toMatchObject({ status: 302 })
})

test('a form does not open for somebody who may not send it', async () => {
  const observer = await aPerson({ name: 'Observer', role: 'observer', wardIds: [given.ward.id] })
  expect(await openedForm(observer, given.patientId, cuffPressure.slug)).toMatchObject({ status: 403 })
  expect(await openedForm(given.nurse, given.patientId, carePlan.slug)).toMatchObject({ status: 403 })
})

test.each([uuidv7(), 'x', '__proto__', "' OR 1=1 --"])('there is no entry %s', async id => {
  expect(await see(given.nurse, id)).toMatchObject({ status: 404 })
  expect(await correct(given.nurse, id, aCorrectionForm(given.nurse))).toMatchObject({ status: 404 })
})

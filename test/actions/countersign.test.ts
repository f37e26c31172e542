import { QueryTypes } from 'sequelize'
import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { authorOf, type CurrentUser } from '#app/auth/permissions.ts'
import { action, loader } from '#app/routes/countersign.tsx'
import { addEntry, correctEntry, retractEntry } from '#database/entries.server.ts'
import { sequelize } from '#database/sequelize.server.ts'
import { storedEntries } from '#database/stored-entries.server.ts'
import { verifySignatures } from '#database/verify-signatures.server.ts'
import { cleared, owner } from '#test/database.ts'
import { answerOf, aPerson, contextOf, site } from '#test/people.ts'
import { aCuffPressure, aStay, aWardOf } from '#test/stays.ts'

let bedside: Awaited<ReturnType<typeof aStay>>
let student: CurrentUser
let charge: CurrentUser

beforeEach(async () => {
  await cleared()
  bedside = await aStay()
  student = await aPerson({ name: 'Elodie Varnhagen', wardIds: [bedside.ward.id], isSupervised: true })
  charge = await aPerson({ name: 'Odalys Verstraeten', role: 'charge nurse', wardIds: [bedside.ward.id] })
})

async function charted(by = student, more: { witnessId?: string } = {}) {
  const act = aCuffPressure(bedside.stayId, authorOf(by), { id: uuidv7(), ...more })
  await addEntry(act)
  return act
}

async function listed(user: CurrentUser, search = '') {
  const request = new Request(`${site}/countersign${search}`)
  const args = { request, url: new URL(request.url), context: contextOf(user), params: {}, pattern: '/countersign' }
  return answerOf(() => loader({ ...args, pattern: '/countersign' as const }))
}
const idsOf = async (user: CurrentUser, search = '') => (await listed(user, search)).entries?.map(({ id }) => id)

function sign(user: CurrentUser, ids: readonly string[], supervised = 'yes') {
  const body = new URLSearchParams([...ids.map(id => ['entry', id]), ['supervised', supervised]])
  const request = new Request(`${site}/countersign`, { method: 'POST', body, headers: { Origin: site } })
  const args = { request, url: new URL(request.url), context: contextOf(user), params: {} }
  return answerOf(() => action({ ...args, pattern: '/countersign' as const }))
}

const signatures = () =>
  owner.query<{ entryId: string; by: string; role: string }>(
    'SELECT entry_id AS entryId, signed_by AS `by`, signed_role AS role FROM countersignatures',
    { type: QueryTypes.SELECT },
  )

test('what a student charts waits on the list of the ward, and a colleague countersigns several at once', async () => {
  const acts = [await charted(), await charted()]
  await charted(bedside.nurse)
  const ids = acts.map(({ id }) => id)
  expect(await idsOf(charge)).toEqual(ids)
  expect(await sign(charge, ids)).toMatchObject({ status: 200, says: { ok: true, signed: 2, left: 0 } })
  expect(await signatures()).toHaveLength(2)
  expect(await idsOf(charge)).toEqual([])
  expect(await verifySignatures()).toMatchObject({ signatures: 2, faults: [] })
})

test('only those where one was the second person, when asked', async () => {
  await charted()
  const { id } = await charted(student, { witnessId: charge.id })
  expect(await idsOf(charge, '?show=mine')).toEqual([id])
})

test('nothing is countersigned without saying that it was supervised, and the chosen stay chosen', async () => {
  const { id } = await charted()
  expect(await sign(charge, [id], 'no')).toMatchObject({ status: 400, says: { fieldId: 'supervised', chosen: [id] } })
  expect(await sign(charge, [])).toMatchObject({ status: 400, says: { fieldId: 'entries' } })
  expect(await signatures()).toEqual([])
})

test('nobody under supervision countersigns, not even what another student charted', async () => {
  const { id } = await charted()
  const other = await aPerson({ name: 'Second Student', wardIds: [bedside.ward.id], isSupervised: true })
  for (const user of [student, other]) {
    expect(await listed(user)).toMatchObject({ status: 403 })
    expect(await sign(user, [id])).toMatchObject({ status: 403 })
  }
})

test('whoever was a student then does not countersign their own entries later', async () => {
  const { id } = await charted()
  const registered = { ...student, isSupervised: false }
  expect(await idsOf(registered)).toEqual([])
  expect(await sign(registered, [id])).toMatchObject({ says: { ok: true, signed: 0, left: 1 } })
})

test('entries of another ward are neither shown nor signed', async () => {
  const { id } = await charted()
  const other = await aWardOf(1, 'Ward 8')
  expect(await idsOf(other.nurse)).toEqual([])
  expect(await sign(other.nurse, [id])).toMatchObject({ says: { ok: true, signed: 0, left: 1 } })
  expect(await signatures()).toEqual([])
})

test('two who countersign at once leave one countersignature', async () => {
  const { id } = await charted()
  const answers = await Promise.all([sign(charge, [id]), sign(bedside.nurse, [id])])
  expect(answers.map(({ status }) => status)).toEqual([200, 200])
  expect(await signatures()).toHaveLength(1)
})

test('a correction by the student is to be countersigned anew, and a retraction is not', async () => {
  const act = await charted()
  await sign(charge, [act.id])
  const correction = { ...act, id: uuidv7(), supersedes: act.id, reason: 'Misread the manometer' }
  await correctEntry(correction)
  expect(await idsOf(charge)).toEqual([correction.id])
  const [stored] = await storedEntries('WHERE e.id = :id', { id: correction.id })
  if (!stored) throw new Error('The correction is not stored')
  await retractEntry({ id: uuidv7(), recordedBy: authorOf(student), reason: 'Other patient' }, stored)
  expect(await idsOf(charge)).toEqual([])
})

const insert = (entryId: string, by: string, role = 'charge nurse') =>
  owner.query('INSERT INTO countersignatures (entry_id, signed_by, signed_role) VALUES (:entryId, :by, :role)', {
    replacements: { entryId, by, role },
  })

test('the database itself refuses what is nobody’s to countersign', async () => {
  const own = await charted()
  const registered = await charted(bedside.nurse)
  await expect(insert(own.id, student.id)).rejects.toThrow(/registered colleague/)
  await expect(insert(own.id, charge.id, 'nurse under supervision')).rejects.toThrow(/registered colleague/)
  await expect(insert(registered.id, charge.id)).rejects.toThrow(/charted under supervision/)
  await correctEntry({ ...own, id: uuidv7(), supersedes: own.id, reason: 'Misread' })
  await expect(insert(own.id, charge.id)).rejects.toThrow(/entries that count/)
})

test.each([["UPDATE countersignatures SET signed_role = 'x'"], ['DELETE FROM countersignatures']])(
  '%s is refused to everybody',
  async statement => {
    const { id } = await charted()
    await sign(charge, [id])
    await expect(owner.query(statement)).rejects.toThrow(/append-only/)
    await expect(sequelize.query(statement)).rejects.toThrow(/denied/)
  },
)

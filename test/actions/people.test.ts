import { QueryTypes } from 'sequelize'
import { afterAll, beforeEach, expect, test } from 'vitest'
import { closePasswords, passwordMatches } from '#app/auth/password.server.ts'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { sessionOf, signIn } from '#app/auth/session.server.ts'
import { sessionContext } from '#app/auth/signed-in.server.ts'
import { action as changeOwn } from '#app/routes/account.tsx'
import { loader as listPeople } from '#app/routes/admin-people.tsx'
import { action as change } from '#app/routes/admin-person.tsx'
import { action as add } from '#app/routes/admin-person-new.tsx'
import { credentialsOf, people } from '#database/users.server.ts'
import { cleared, owner } from '#test/database.ts'
import { answerOf, aPerson, aWard, contextOf, formRequest, password, site, traceOfTest } from '#test/people.ts'

let admin: CurrentUser

beforeEach(async () => {
  await cleared()
  admin = await aPerson({ name: 'Ines Duarte', role: 'administrator' })
})
afterAll(closePasswords)

type Outcome = { password?: string; says?: string; reply?: { error?: Record<string, string[]>; initialValue?: object } }

async function sent(work: () => Promise<object>): Promise<{ status: number | undefined } & Outcome> {
  const { status, says } = await answerOf(work)
  return { status, ...(typeof says === 'object' ? says : {}) }
}

const adding = (fields: Record<string, string>, by: CurrentUser = admin) => {
  const request = formRequest('/admin/people/new', fields)
  const args = { request, url: new URL(request.url), context: contextOf(by), params: {}, pattern: '/admin/people/new' }
  return sent(() => add(args))
}

const changing = (userId: string, fields: Record<string, string>, by: CurrentUser = admin) => {
  const request = formRequest(`/admin/people/${userId}`, fields)
  const args = { request, url: new URL(request.url), context: contextOf(by), params: { userId } }
  return sent(() => change({ ...args, pattern: '/admin/people/:userId' }))
}

const somebody = { name: 'Bea Lindqvist', email: ' Bea.Lindqvist@Ward.example', role: 'nurse' }

const loggedActions = async () => {
  const rows = await owner.query<{ action: string }>(
    `SELECT action FROM access_log WHERE purpose = 'ADMIN' ORDER BY at, chain, seq`,
    { type: QueryTypes.SELECT },
  )
  return rows.map(({ action }) => action)
}

test('a person is added with a one-time password that only the administrator has seen', async () => {
  const wardId = await aWard()
  const { status, password: oneTime = '' } = await adding({ ...somebody, wardIds: wardId })
  expect(status).toBe(200)
  const account = await credentialsOf('bea.lindqvist@ward.example')
  expect(account).toMatchObject({ role: 'nurse', mayEnter: 1 })
  expect(await passwordMatches(oneTime, account?.passwordHash ?? null)).toBe(true)
  const bea = (await people()).find(({ name }) => name === 'Bea Lindqvist')
  expect(bea).toMatchObject({ wards: [{ id: wardId, name: 'Ward 7' }], disabledAt: null })
  expect(bea?.oneTimeUntil).not.toBeNull()
  expect(await loggedActions()).toEqual(['added person'])
})

test('a form that is not right comes back with what was typed, and adds nobody', async () => {
  const { status, reply } = await adding({ name: 'B', email: 'bea@', role: 'matron' })
  expect(status).toBe(400)
  expect(reply?.error).toEqual({
    name: ['Enter the first and the last name'],
    email: ['Enter an e-mail address such as name@hospital.example'],
    role: ['Choose a role'],
  })
  expect(reply?.initialValue).toMatchObject({ name: 'B', email: 'bea@', role: 'matron' })
  expect(await people()).toHaveLength(1)
})

test('an address that is taken is refused at its field', async () => {
  const { status, reply } = await adding({ ...somebody, email: 'INES.duarte@ward.example' })
  expect(status).toBe(400)
  expect(reply?.error).toEqual({ email: ['Somebody has this e-mail address already'] })
})

test.each(['nurse', 'charge nurse', 'tracheostomy specialist', 'educator', 'observer'] as const)(
  'a %s keeps nobody’s account',
  async role => {
    const by = await aPerson({ role, wardIds: [await aWard()] })
    expect(await adding(somebody, by)).toMatchObject({ status: 403 })
    expect(await changing(admin.id, { intent: 'disable' }, by)).toMatchObject({ status: 403 })
    const request = new Request(`${site}/admin/people`)
    const args = { request, url: new URL(request.url), context: contextOf(by), params: {}, pattern: '/admin/people' }
    expect(await answerOf(() => listPeople(args))).toMatchObject({ status: 403 })
  },
)

test('a new role ends the sessions of that person, a new ward does not', async () => {
  const user = await aPerson()
  const request = new Request(site)
  const cookie = (await signIn(request, user, traceOfTest())).split(';')[0] ?? ''
  const visit = new Request(site, { headers: { Cookie: cookie } })
  const details = { intent: 'details', name: user.name, email: user.email }
  const wardId = await aWard()
  expect(await changing(user.id, { ...details, role: 'nurse', wardIds: wardId })).toMatchObject({ status: 200 })
  expect((await sessionOf(visit))?.user.wardIds).toEqual([wardId])
  expect(await changing(user.id, { ...details, role: 'charge nurse' })).toMatchObject({ status: 200 })
  expect(await sessionOf(visit)).toBeNull()
})

test('disabling puts somebody out at once, and letting in again gives their password back', async () => {
  const user = await aPerson()
  await changing(user.id, { intent: 'disable' })
  expect(await credentialsOf(user.email)).toMatchObject({ mayEnter: 0 })
  await changing(user.id, { intent: 'enable' })
  expect(await credentialsOf(user.email)).toMatchObject({ mayEnter: 1 })
  expect(await loggedActions()).toEqual(['disabled person', 'enabled person'])
})

test('a reset gives a one-time password, and the old one is dead', async () => {
  const user = await aPerson()
  const { password: oneTime = '' } = await changing(user.id, { intent: 'reset' })
  const account = await credentialsOf(user.email)
  expect(await passwordMatches(password, account?.passwordHash ?? null)).toBe(false)
  expect(await passwordMatches(oneTime, account?.passwordHash ?? null)).toBe(true)
})

test('the last administrator can neither be disabled nor become something else', async () => {
  expect(await changing(admin.id, { intent: 'disable' })).toMatchObject({ status: 400 })
  const details = { intent: 'details', name: admin.name, email: admin.email, role: 'nurse' }
  expect((await changing(admin.id, details)).reply?.error).toMatchObject({ role: [expect.stringMatching(/only/)] })
  const second = await aPerson({ name: 'Tom Reid', role: 'administrator' })
  expect(await changing(admin.id, { intent: 'disable' }, second)).toMatchObject({ status: 200 })
})

/** Replaces one's own password on the account page. */
async function replacing(user: CurrentUser, fields: Record<string, string>) {
  const request = formRequest('/account', fields)
  const context = contextOf(user)
  const session = context.get(sessionContext)
  const args = { request, url: new URL(request.url), context, params: {}, pattern: '/account' }
  const answer = await answerOf(() => changeOwn(args))
  return { ...answer, owesPassword: session?.owesPassword }
}

test('a new password needs the current one, ends other sessions and keeps this one', async () => {
  const user = await aPerson()
  const other = (await signIn(new Request(site), user, traceOfTest())).split(';')[0] ?? ''
  const cookie = (await signIn(new Request(site), user, traceOfTest())).split(';')[0] ?? ''
  const visit = (value: string) => sessionOf(new Request(site, { headers: { Cookie: value } }))
  const here = await visit(cookie)
  const fields = { currentPassword: password, newPassword: 'lantern orbit thistle' }
  expect(await replacing(here?.user ?? user, fields)).toMatchObject({ status: 302, location: '/account?changed=yes' })
  expect(await visit(cookie)).not.toBeNull()
  expect(await visit(other)).toBeNull()
  const account = await credentialsOf(user.email)
  expect(await passwordMatches('lantern orbit thistle', account?.passwordHash ?? null)).toBe(true)
})

test.each([
  [
    'a wrong current password',
    { currentPassword: 'wrong kettle', newPassword: 'lantern orbit thistle' },
    'not your password',
  ],
  ['the same password again', { currentPassword: password, newPassword: password }, 'another one than before'],
  ['the ward and the year', { currentPassword: password, newPassword: 'Ward 7 2026 !!' }, 'easy to guess'],
  ['the own name', { currentPassword: password, newPassword: 'NgoziAdeyemi7' }, 'easy to guess'],
  ['eleven characters', { currentPassword: password, newPassword: 'fern kettle' }, 'at least 12'],
])('%s is refused, and nothing typed goes back', async (_, fields, words) => {
  await aWard('Ward 7')
  const { status, says } = await replacing(await aPerson(), fields)
  expect(status).toBe(400)
  expect(JSON.stringify(says)).toContain(words)
  expect(JSON.stringify(says)).not.toContain(fields.newPassword)
})

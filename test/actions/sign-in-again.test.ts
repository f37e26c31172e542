import { QueryTypes } from 'sequelize'
import { beforeEach, expect, test } from 'vitest'
import { takeDraft } from '#app/auth/draft.server.ts'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { signIn } from '#app/auth/session.server.ts'
import { loadUser, sameOriginOnly, signedInOnly, userContext } from '#app/auth/signed-in.server.ts'
import { action as handIn } from '#app/routes/draft.ts'
import { loader as home } from '#app/routes/home.ts'
import { action as setTheme } from '#app/routes/theme.ts'
import { cleared, owner } from '#test/database.ts'
import { answerOf, aPerson, aWard, contextOf, formRequest, site, traceOfTest } from '#test/people.ts'

beforeEach(cleared)

const cookieOf = async (user: CurrentUser) => (await signIn(new Request(site), user, traceOfTest())).split(';')[0] ?? ''

/** Sends a request through the middleware of the root and of the signed-in layout to a page that answers 'page'. */
async function visit(request: Request) {
  const context = contextOf()
  const args = { request, url: new URL(request.url), context, params: {}, pattern: '/' }
  const page = async () => new Response('page')
  const layout = async () => (await signedInOnly(args, page)) ?? new Response()
  const known = async () => (await loadUser(args, layout)) ?? new Response()
  const answer = await answerOf(async () => (await sameOriginOnly(args, known)) ?? new Response())
  return { ...answer, user: context.get(userContext) }
}

const read = (path: string, cookie?: string) =>
  new Request(`${site}${path}`, cookie ? { headers: { Cookie: cookie } } : {})
const ago = (minutes: number) =>
  owner.query('UPDATE sessions SET seen_at = UTC_TIMESTAMP(3) - INTERVAL :minutes MINUTE', {
    replacements: { minutes },
  })

async function minutesUnseen(): Promise<number | undefined> {
  const [row] = await owner.query<{ minutes: number }>(
    'SELECT TIMESTAMPDIFF(MINUTE, seen_at, UTC_TIMESTAMP(3)) AS minutes FROM sessions',
    { type: QueryTypes.SELECT },
  )
  return row?.minutes
}

test('somebody who is not signed in is sent to sign in, and back afterwards', async () => {
  expect(await visit(read('/patients/1?span=24'))).toMatchObject({
    status: 302,
    location: '/sign-in?returnTo=%2Fpatients%2F1%3Fspan%3D24',
  })
})

test('somebody who is signed in gets the page', async () => {
  const user = await aPerson()
  expect(await visit(read('/round', await cookieOf(user)))).toMatchObject({ status: 200, user: { id: user.id } })
})

test.each([
  ['another site', { Origin: 'https://elsewhere.example' }, 403],
  ['nowhere that can be told', {}, 403],
  ['this site', { Origin: site }, 200],
  ['this site, by the browser’s word', { 'Sec-Fetch-Site': 'same-origin' }, 200],
])('a write from %s is answered %#', async (_, headers: Record<string, string>, status) => {
  const cookie = await cookieOf(await aPerson())
  const request = new Request(`${site}/round`, { method: 'POST', body: 'x=1', headers: { ...headers, Cookie: cookie } })
  expect((await visit(request)).status).toBe(status)
})

test('a write keeps a session awake, a poll does not', async () => {
  const cookie = await cookieOf(await aPerson())
  await ago(30)
  await visit(read('/round', cookie))
  expect(await minutesUnseen()).toBe(30)
  await visit(formRequest('/still-here', {}, cookie))
  expect(await minutesUnseen()).toBe(0)
})

test('what was sent after the session had ended waits for its author, without passwords, and for nobody else', async () => {
  const [user, other] = [await aPerson(), await aPerson({ name: 'Bea Lindqvist' })]
  const cookie = await cookieOf(user)
  await ago(61)
  const fields = { pressure: '26', note: 'Leak heard', currentPassword: 'secret', empty: '' }
  expect(await visit(formRequest('/patients/1/chart/cuff-pressure', fields, cookie))).toMatchObject({
    status: 302,
    location: '/sign-in?returnTo=%2Fpatients%2F1%2Fchart%2Fcuff-pressure&kept=yes',
    user: null,
  })
  expect(await takeDraft(other.id, '/patients/1/chart/cuff-pressure')).toBeNull()
  expect(await takeDraft(user.id, '/patients/2/chart/cuff-pressure')).toBeNull()
  expect(await takeDraft(user.id, '/patients/1/chart/cuff-pressure')).toEqual({
    pressure: ['26'],
    note: ['Leak heard'],
  })
  expect(await takeDraft(user.id, '/patients/1/chart/cuff-pressure')).toBeNull()
})

test('a draft is gone after a day', async () => {
  const user = await aPerson()
  const cookie = await cookieOf(user)
  await ago(61)
  await visit(formRequest('/round', { note: 'Leak heard' }, cookie))
  await owner.query('UPDATE drafts SET saved_at = saved_at - INTERVAL 1441 MINUTE')
  expect(await takeDraft(user.id, '/round')).toBeNull()
})

test('what is too long to be a draft is not kept, and the page says nothing of it', async () => {
  const user = await aPerson()
  const cookie = await cookieOf(user)
  await ago(61)
  const answer = await visit(formRequest('/round', { note: 'x'.repeat(70_000) }, cookie))
  expect(answer.location).toBe('/sign-in?returnTo=%2Fround')
})

test('after signing out nothing is kept of what the dead cookie sends', async () => {
  const user = await aPerson()
  const cookie = await cookieOf(user)
  await owner.query(`UPDATE sessions SET ended_at = UTC_TIMESTAMP(3), ended_because = 'signed out'`)
  expect(await visit(formRequest('/round', { note: 'Leak heard' }, cookie))).toMatchObject({
    location: '/sign-in?returnTo=%2Fround',
  })
  expect(await takeDraft(user.id, '/round')).toBeNull()
})

test('a one-time password opens the page that replaces it and no other', async () => {
  const user = await aPerson()
  await owner.query('UPDATE users SET one_time_until = UTC_TIMESTAMP(3) + INTERVAL 1 HOUR')
  const cookie = await cookieOf(user)
  expect(await visit(read('/round', cookie))).toMatchObject({ status: 302, location: '/account' })
  expect(await visit(read('/account', cookie))).toMatchObject({ status: 200 })
})

/** What the idle watch of a page sends. */
async function leave(cookie: string, fields: Record<string, string>) {
  const request = formRequest('/draft', fields, cookie)
  const context = contextOf()
  const args = { request, url: new URL(request.url), context, params: {}, pattern: '/draft' }
  let answer: Response | undefined
  await loadUser(args, async () => {
    answer = await handIn(args)
    return answer
  })
  return answer?.json()
}

test('a page that nobody uses hands in what was typed and ends the session', async () => {
  const user = await aPerson()
  const cookie = await cookieOf(user)
  await ago(59)
  const typed = { 'draft-path': '/patients/1/chart/suction', note: 'Thick', newPassword: 'x' }
  expect(await leave(cookie, typed)).toEqual({ ended: true, kept: true })
  expect(await visit(read('/round', cookie))).toMatchObject({ status: 302, user: null })
  expect(await takeDraft(user.id, '/patients/1/chart/suction')).toEqual({ note: ['Thick'] })
})

test('a page left alone does not end the session of another page in use', async () => {
  const user = await aPerson()
  const cookie = await cookieOf(user)
  await ago(5)
  expect(await leave(cookie, { 'draft-path': '/round', note: 'Thick' })).toEqual({ ended: false, kept: false })
  expect(await visit(read('/round', cookie))).toMatchObject({ status: 200 })
  expect(await takeDraft(user.id, '/round')).toBeNull()
})

test('the start leads each role to the page they want first', async () => {
  const ward = await aWard()
  const starts = async (role: CurrentUser['role'], wardIds: readonly string[]) => {
    const user = { ...(await aPerson({ name: `${role} ${wardIds.length}`, role })), wardIds }
    const request = read('/')
    const args = { request, url: new URL(request.url), context: contextOf(user), params: {}, pattern: '/' }
    return (await answerOf(() => home(args))).location
  }
  expect(await starts('nurse', [ward])).toBe('/round')
  expect(await starts('charge nurse', [ward])).toBe(`/wards/${ward}/board`)
  expect(await starts('observer', [ward])).toBe(`/wards/${ward}/board`)
  expect(await starts('administrator', [])).toBe('/admin/people')
  expect(await starts('educator', [])).toBe('/competence')
  expect(await starts('nurse', [])).toBe('/policy')
})

test('the theme is remembered, and going back stays on the site', async () => {
  const choose = async (theme: string, back: string) => {
    const request = formRequest('/theme', { theme, back })
    return setTheme({ request, url: new URL(request.url), context: contextOf(), params: {}, pattern: '/theme' })
  }
  const chosen = await choose('night', '/round?x=1')
  expect(chosen.headers.get('Set-Cookie')).toMatch(/^theme=night;/)
  expect(chosen.headers.get('Location')).toBe('/round?x=1')
  expect((await choose('purple', '//elsewhere.example')).headers.get('Location')).toBe('/')
})

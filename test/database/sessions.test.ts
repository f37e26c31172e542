import { QueryTypes } from 'sequelize'
import { beforeEach, expect, test } from 'vitest'
import { sessionOf, signIn, signOut } from '#app/auth/session.server.ts'
import { transact } from '#database/sequelize.server.ts'
import { endIdleSession, endSessionsOf, sessionsOf, touchSession } from '#database/sessions.server.ts'
import { disablePerson } from '#database/user-changes.server.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson, aWard, site, traceOfTest } from '#test/people.ts'

beforeEach(cleared)

const visit = (cookie: string | undefined, origin = site) =>
  new Request(`${origin}/`, cookie === undefined ? {} : { headers: { Cookie: cookie.split(';')[0] ?? '' } })

/** Moves what the database knows of all sessions into the past. */
const later = (minutes: number) =>
  owner.query(
    `UPDATE sessions SET started_at = started_at - INTERVAL :minutes MINUTE, seen_at = seen_at - INTERVAL :minutes MINUTE,
       ends_at = ends_at - INTERVAL :minutes MINUTE`,
    { replacements: { minutes } },
  )

test('somebody who has signed in is known, with their wards and each ward’s counter', async () => {
  const icu = await aWard('Intensive care')
  const ward = await aWard('Ward 7')
  const user = await aPerson({ role: 'charge nurse', wardIds: [ward, icu] })
  const session = await sessionOf(visit(await signIn(visit(undefined), user, traceOfTest())))
  expect(session).toMatchObject({
    user: { id: user.id, name: 'Ngozi Adeyemi', role: 'charge nurse', wardIds: [icu, ward] },
    wards: [
      { id: icu, name: 'Intensive care', rev: 1 },
      { id: ward, name: 'Ward 7', rev: 1 },
    ],
    isOver: false,
    owesPassword: false,
  })
})

test('the cookie is out of reach of scripts and other sites, and has a guarded name over TLS', async () => {
  const user = await aPerson()
  const plain = await signIn(visit(undefined), user, traceOfTest())
  expect(plain).toMatch(/^cannulary=[^;]{40,}; Max-Age=43200; Path=\/; HttpOnly; SameSite=Lax$/)
  const secure = await signIn(visit(undefined, 'https://ward.example'), user, traceOfTest())
  expect(secure).toMatch(/^__Host-cannulary=[^;]{40,}; Max-Age=43200; Path=\/; HttpOnly; Secure; SameSite=Lax$/)
})

test('the secret of a session is nowhere in the database', async () => {
  const user = await aPerson()
  const cookie = await signIn(visit(undefined), user, traceOfTest())
  const [row] = await owner.query<{ idHash: string }>('SELECT id_hash AS idHash FROM sessions', {
    type: QueryTypes.SELECT,
  })
  expect(row?.idHash).toMatch(/^[0-9a-f]{64}$/)
  expect(cookie).not.toContain(row?.idHash)
})

test('signing in again gives a new secret, and the old one is dead', async () => {
  const user = await aPerson()
  const first = await signIn(visit(undefined), user, traceOfTest())
  const second = await signIn(visit(first), user, traceOfTest())
  expect(second).not.toBe(first)
  expect(await sessionOf(visit(first))).toBeNull()
  expect(await sessionOf(visit(second))).not.toBeNull()
})

test('an unknown, a changed and an empty cookie are nobody', async () => {
  const cookie = await signIn(visit(undefined), await aPerson(), traceOfTest())
  for (const tried of [undefined, 'cannulary=', 'cannulary=%00', cookie.replace('cannulary=', 'cannulary=A')]) {
    expect(await sessionOf(visit(tried))).toBeNull()
  }
})

test('a session that nobody used for an hour is over, one minute before it is not', async () => {
  const cookie = await signIn(visit(undefined), await aPerson(), traceOfTest())
  await later(59)
  expect(await sessionOf(visit(cookie))).toMatchObject({ isOver: false, isFresh: false })
  await later(1)
  expect(await sessionOf(visit(cookie))).toMatchObject({ isOver: true })
})

test('a session in use is over after twelve hours all the same', async () => {
  const cookie = await signIn(visit(undefined), await aPerson(), traceOfTest())
  await later(12 * 60 - 1)
  await owner.query('UPDATE sessions SET seen_at = UTC_TIMESTAMP(3)')
  expect(await sessionOf(visit(cookie))).toMatchObject({ isOver: false, isFresh: true })
  await later(1)
  await owner.query('UPDATE sessions SET seen_at = UTC_TIMESTAMP(3)')
  expect(await sessionOf(visit(cookie))).toMatchObject({ isOver: true })
})

test('being there is written at most once a minute', async () => {
  const user = await aPerson()
  const cookie = await signIn(visit(undefined), user, traceOfTest())
  const { sessionHash } = (await sessionOf(visit(cookie)))?.user ?? user
  const seen = async () => (await sessionsOf(user.id, 60))[0]?.seenAt
  const atFirst = await seen()
  await touchSession(sessionHash)
  expect(await seen()).toEqual(atFirst)
  await later(2)
  await touchSession(sessionHash)
  expect(await sessionOf(visit(cookie))).toMatchObject({ isFresh: true })
})

test('signing out ends the session, and a copy of its cookie is dead', async () => {
  const user = await aPerson()
  const cookie = await signIn(visit(undefined), user, traceOfTest())
  const headers = await signOut(visit(cookie), traceOfTest(user))
  expect(headers.get('Set-Cookie')).toMatch(/^cannulary=; Max-Age=0/)
  expect(headers.get('Clear-Site-Data')).toBe('"cache"')
  expect(await sessionOf(visit(cookie))).toBeNull()
})

test('signing out everywhere ends every session of that person, and nobody else’s', async () => {
  const user = await aPerson()
  const other = await aPerson({ name: 'Bea Lindqvist' })
  const [bedside, desk] = [
    await signIn(visit(undefined), user, traceOfTest()),
    await signIn(visit(undefined), user, traceOfTest()),
  ]
  const elsewhere = await signIn(visit(undefined), other, traceOfTest())
  expect(await sessionsOf(user.id, 60)).toHaveLength(2)
  expect(await transact(transaction => endSessionsOf(user.id, 'signed out everywhere', transaction))).toBe(2)
  expect(await sessionOf(visit(bedside))).toBeNull()
  expect(await sessionOf(visit(desk))).toBeNull()
  expect(await sessionOf(visit(elsewhere))).not.toBeNull()
})

test('a disabled person is out at the next request', async () => {
  const user = await aPerson()
  const cookie = await signIn(visit(undefined), user, traceOfTest())
  await disablePerson(user.id, traceOfTest())
  expect(await sessionOf(visit(cookie))).toBeNull()
})

test('a page that thinks nobody is there does not end a session that is used on another page', async () => {
  const user = await aPerson()
  const cookie = await signIn(visit(undefined), user, traceOfTest())
  const { sessionHash } = (await sessionOf(visit(cookie)))?.user ?? user
  expect(await transact(transaction => endIdleSession(sessionHash, 58, transaction))).toBe(false)
  await later(58)
  expect(await transact(transaction => endIdleSession(sessionHash, 58, transaction))).toBe(true)
})

test('a move to another ward counts from the next request on', async () => {
  const [seven, eight] = [await aWard('Ward 7'), await aWard('Ward 8')]
  const user = await aPerson({ wardIds: [seven] })
  const cookie = await signIn(visit(undefined), user, traceOfTest())
  await owner.query('UPDATE ward_members SET ward_id = :eight', { replacements: { eight } })
  expect((await sessionOf(visit(cookie)))?.user.wardIds).toEqual([eight])
})

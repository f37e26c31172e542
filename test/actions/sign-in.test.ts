import { QueryTypes } from 'sequelize'
import { afterAll, beforeEach, expect, test } from 'vitest'
import { closePasswords, passwordHash as hashed, isOutdated } from '#app/auth/password.server.ts'
import { sessionOf } from '#app/auth/session.server.ts'
import { action } from '#app/routes/sign-in.tsx'
import { cleared, owner } from '#test/database.ts'
import { aPerson, contextOf, formRequest, password, site } from '#test/people.ts'

beforeEach(cleared)
afterAll(closePasswords)

type Answer = { status: number; says?: string; location?: string; cookie?: string }

async function trySignIn(fields: Record<string, string>, returnTo?: string, address?: string): Promise<Answer> {
  const path = returnTo === undefined ? '/sign-in' : `/sign-in?${new URLSearchParams({ returnTo })}`
  const request = formRequest(path, fields)
  const context = contextOf(null, address)
  const answer = await action({ request, url: new URL(request.url), context, params: {}, pattern: '/sign-in' })
  if (!(answer instanceof Response)) return { status: answer.init?.status ?? 200, says: answer.data.says }
  const cookie = answer.headers.get('Set-Cookie')?.split(';')[0]
  return { status: answer.status, location: answer.headers.get('Location') ?? '', ...(cookie ? { cookie } : {}) }
}

const email = 'ngozi.adeyemi@ward.example'

const logged = () =>
  owner.query<{ chain: string; outcome: string }>('SELECT chain, outcome FROM access_log ORDER BY at, seq', {
    type: QueryTypes.SELECT,
  })

test('the right password signs in, in whatever case the address was typed, and both are logged', async () => {
  const user = await aPerson()
  const { status, location, cookie = '' } = await trySignIn({ email: ' Ngozi.Adeyemi@Ward.example ', password })
  expect({ status, location }).toEqual({ status: 302, location: '/' })
  const session = await sessionOf(new Request(site, { headers: { Cookie: cookie } }))
  expect(session?.user.id).toBe(user.id)
  expect(await logged()).toEqual([{ chain: `user:${user.id}`, outcome: 'done' }])
})

test('an unknown account and a wrong password get the same answer', async () => {
  const user = await aPerson()
  const unknown = await trySignIn({ email: 'nobody@ward.example', password })
  const wrong = await trySignIn({ email, password: `${password}!` })
  expect(unknown).toEqual({ status: 400, says: 'The e-mail address or the password is not right.' })
  expect(wrong).toEqual(unknown)
  expect(await logged()).toEqual([
    { chain: 'nobody', outcome: 'refused' },
    { chain: `user:${user.id}`, outcome: 'refused' },
  ])
})

test('a disabled account and a one-time password past its time get that answer too', async () => {
  const user = await aPerson()
  await owner.query('UPDATE users SET disabled_at = UTC_TIMESTAMP(3)')
  expect(await trySignIn({ email, password })).toMatchObject({ status: 400 })
  await owner.query('UPDATE users SET disabled_at = NULL, one_time_until = UTC_TIMESTAMP(3) - INTERVAL 1 SECOND')
  expect(await trySignIn({ email, password })).toMatchObject({ status: 400 })
  await owner.query('UPDATE users SET one_time_until = UTC_TIMESTAMP(3) + INTERVAL 1 HOUR WHERE id = :id', {
    replacements: { id: user.id },
  })
  expect(await trySignIn({ email, password })).toMatchObject({ status: 302 })
})

test('an empty form is told what is missing', async () => {
  expect(await trySignIn({ email, password: '' })).toEqual({
    status: 400,
    says: 'Enter your e-mail address and your password.',
  })
})

test('somebody who was sent to sign in comes back to where they were', async () => {
  await aPerson()
  expect(await trySignIn({ email, password }, '/patients/1?span=24')).toMatchObject({ location: '/patients/1?span=24' })
})

test.each(['https://elsewhere.example/', '//elsewhere.example', '/\\elsewhere.example', '/\t/elsewhere.example'])(
  'coming back never leads to %j',
  async returnTo => {
    await aPerson()
    expect(await trySignIn({ email, password }, returnTo)).toMatchObject({ status: 302, location: '/' })
  },
)

/** Sets what was missed before, just now: the counters themselves are what a test of a wait needs. */
const missed = (misses: number) =>
  owner.query('UPDATE sign_in_attempts SET misses = :misses, last_missed_at = UTC_TIMESTAMP(3)', {
    replacements: { misses },
  })

test('after five misses even the right password waits, and it is let in once the wait is over', async () => {
  await aPerson()
  await trySignIn({ email, password: 'wrong kettle orbit' })
  await missed(11)
  expect(await trySignIn({ email, password })).toEqual({
    status: 429,
    says: 'Too many tries. Wait 60 seconds, then try again.',
  })
  await owner.query('UPDATE sign_in_attempts SET last_missed_at = last_missed_at - INTERVAL 61 SECOND')
  expect(await trySignIn({ email, password })).toMatchObject({ status: 302 })
  expect(await trySignIn({ email, password: 'wrong kettle orbit' })).toMatchObject({ status: 400 })
})

test('an unknown account waits like a known one', async () => {
  await trySignIn({ email: 'nobody@ward.example', password })
  await missed(11)
  expect(await trySignIn({ email: 'nobody@ward.example', password })).toMatchObject({ status: 429 })
})

test('another spelling that the index takes for the same address is another address', async () => {
  await aPerson()
  for (const spelling of ['ngozi.adeye\u00admi@ward.example', 'ngozi.adeyemi@\uff57ard.example']) {
    expect(await trySignIn({ email: spelling, password })).toMatchObject({ status: 400 })
  }
})

test('of twelve guesses at once only five are looked at', async () => {
  await aPerson()
  const guesses = await Promise.all(
    Array.from({ length: 12 }, (_, at) => trySignIn({ email, password: `wrong kettle ${at}` })),
  )
  expect(guesses.filter(({ status }) => status === 400)).toHaveLength(5)
  expect(guesses.filter(({ status }) => status === 429)).toHaveLength(7)
})

test('a stranger who guesses from elsewhere does not keep somebody waiting where they usually are', async () => {
  await aPerson()
  await trySignIn({ email, password }, '/', '203.0.113.7')
  await trySignIn({ email, password: 'wrong kettle orbit' }, '/', '198.51.100.9')
  await missed(12)
  expect(await trySignIn({ email, password }, '/', '198.51.100.9')).toMatchObject({ status: 429 })
  expect(await trySignIn({ email, password }, '/', '203.0.113.7')).toMatchObject({ status: 302 })
})

test('a hash with older parameters is made again at sign-in', async () => {
  await aPerson()
  const old = '$argon2id$v=19$m=4096,t=3,p=1$YlyWFnyMBvrYc30omHVcvw$P2xvBFPgjKIjTy+7ZY5nQ9+GxajpPbvYsOmo6N+v9Vk'
  await owner.query('UPDATE users SET password_hash = :old', { replacements: { old } })
  expect(await trySignIn({ email, password })).toMatchObject({ status: 302 })
  const [row] = await owner.query<{ hash: string }>('SELECT password_hash AS hash FROM users', {
    type: QueryTypes.SELECT,
  })
  expect(isOutdated(row?.hash ?? '')).toBe(false)
  expect(await trySignIn({ email, password })).toMatchObject({ status: 302 })
})

test('when too many are signing in at once, some are asked to come again and nothing is held against them', async () => {
  await aPerson()
  const busy = Array.from({ length: 66 }, () => hashed('fern lantern orbit').catch(() => null))
  expect(await trySignIn({ email, password })).toMatchObject({ status: 503 })
  await closePasswords()
  await Promise.all(busy)
  const counts = await owner.query<{ misses: number }>('SELECT misses FROM sign_in_attempts', {
    type: QueryTypes.SELECT,
  })
  expect(counts.map(({ misses }) => misses)).toEqual([0, 0])
})

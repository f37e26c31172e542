import { RouterContextProvider } from 'react-router'
import { v7 as uuidv7 } from 'uuid'
import type { CurrentUser, Role } from '#app/auth/permissions.ts'
import { hashOf } from '#app/auth/session.server.ts'
import { sessionContext, userContext } from '#app/auth/signed-in.server.ts'
import { requestContext } from '#app/request-context.server.ts'
import type { Trace } from '#database/access-log.server.ts'
import { owner } from './database.ts'

/** The origin under which tests call loaders and actions. */
export const site = 'http://127.0.0.1:3000'

/** A password that the rules accept, and its hash made ahead of time, so that a test does not wait for one. */
export const password = 'kettle fern gravel'
export const passwordHash =
  '$argon2id$v=19$m=19456,t=2,p=1$lB4uwUy4twAnPwj2mXHr0w$ZWhgFuzeX/4fNrGZF1+EMV+NnSlWNU3h0uNHqUexpoQ'

/** Adds a ward with its counter and a bed, and returns its id. */
export async function aWard(name = 'Ward 7'): Promise<string> {
  const id = uuidv7()
  await owner.query(
    `INSERT INTO wards (id, name, shift_times, pressure_unit) VALUES (:id, :name, '["07:00","15:00","23:00"]', 'cmH2O')`,
    { replacements: { id, name } },
  )
  await owner.query('INSERT INTO ward_revs (ward_id) VALUES (:id)', { replacements: { id } })
  await owner.query(`INSERT INTO beds (id, ward_id, label, position) VALUES (:bed, :id, '1', 1)`, {
    replacements: { id, bed: uuidv7() },
  })
  return id
}

/** Adds a patient who is in the first bed of that ward, and returns their id. */
export async function aPatientOn(wardId: string, familyName = 'Okafor'): Promise<string> {
  const id = uuidv7()
  await owner.query(
    `INSERT INTO patients (id, record_number, family_name, given_name, born_on, sex, upper_airway, ventilated)
     VALUES (:id, :number, :familyName, 'Ada', '1961-03-14', 'female', 'open', FALSE)`,
    { replacements: { id, familyName, number: id.slice(-12) } },
  )
  await owner.query(
    `INSERT INTO stays (id, patient_id, ward_id, bed_id, admitted_at)
     SELECT :stay, :id, :wardId, id, '2026-11-20 09:00:00' FROM beds WHERE ward_id = :wardId LIMIT 1`,
    { replacements: { stay: uuidv7(), id, wardId } },
  )
  return id
}

/** What a test may say about somebody; the rest is a nurse of no ward who has chosen their password. */
export type Somebody = {
  readonly name?: string
  readonly role?: Role
  readonly wardIds?: readonly string[]
  readonly isSupervised?: boolean
}

/** Adds somebody who may sign in with `password`, and returns them as if they had. */
export async function aPerson(somebody: Somebody = {}) {
  const { name = 'Ngozi Adeyemi', role = 'nurse', wardIds = [], isSupervised = false } = somebody
  const id = uuidv7()
  const email = `${name.toLowerCase().replaceAll(' ', '.')}@ward.example`
  await owner.query(
    `INSERT INTO users (id, name, email, role, supervised, password_hash, password_set_at, added_at)
     VALUES (:id, :name, :email, :role, :isSupervised, :passwordHash, UTC_TIMESTAMP(3), UTC_TIMESTAMP(3))`,
    { replacements: { id, name, email, role, isSupervised, passwordHash } },
  )
  for (const wardId of wardIds) {
    await owner.query('INSERT INTO ward_members (user_id, ward_id, added_at) VALUES (:id, :wardId, UTC_TIMESTAMP(3))', {
      replacements: { id, wardId },
    })
  }
  const user: CurrentUser = { id, name, email, role, wardIds, sessionHash: hashOf(id), isSupervised }
  return user
}

/** A request's context in which this person is signed in; without one, nobody is. */
export function contextOf(
  user: CurrentUser | null = null,
  address = '203.0.113.7',
  startedAt = new Date(),
): RouterContextProvider {
  const context = new RouterContextProvider()
  context.set(requestContext, { address, requestId: 'request-1', nonce: undefined, logged: {} })
  if (user === null) return context
  const wards = user.wardIds.map(id => ({ id, name: 'Ward 7', rev: 1 }))
  const endsAt = new Date('2026-12-01T19:00:00.000Z')
  context.set(userContext, user)
  context.set(sessionContext, { user, wards, startedAt, endsAt, isOver: false, isFresh: true, owesPassword: false })
  return context
}

/** What `traceOf` says of a request by this person. */
export function traceOfTest(user: CurrentUser | null = null, path = '/'): Trace {
  return { actor: user, path, address: '203.0.113.7', userAgent: 'test', requestId: 'request-1' }
}

/** A form as a browser of this site sends it. */
export function formRequest(path: string, fields: Record<string, string>, cookie?: string): Request {
  return new Request(`${site}${path}`, {
    method: 'POST',
    body: new URLSearchParams(fields),
    headers: { Origin: site, ...(cookie === undefined ? {} : { Cookie: cookie }) },
  })
}

/** What came of a loader, an action or a gate: what it returned or threw, with the status and the way on beside it. */
export async function answerOf<T extends object>(
  work: () => Promise<T> | T,
): Promise<Partial<T> & { status?: number; location?: string | null; says?: unknown }> {
  try {
    return describedAnswer(await work())
  } catch (thrown) {
    if (typeof thrown !== 'object' || thrown === null || thrown instanceof Error) throw thrown
    return describedAnswer(thrown)
  }
}

function describedAnswer(answer: object) {
  if (answer instanceof Response) return { status: answer.status, location: answer.headers.get('Location') }
  if ('init' in answer && 'data' in answer) {
    const { init, data } = answer as { init: ResponseInit | null; data: unknown }
    return { status: init?.status ?? 200, says: data }
  }
  return answer
}

import { createHash, randomBytes } from 'node:crypto'
import { type Cookie, createCookie } from 'react-router'
import { logAccess, type Trace } from '#database/access-log.server.ts'
import { transact } from '#database/sequelize.server.ts'
import {
  beginSession,
  endIdleSession,
  endSession,
  endSessionsOf,
  type KnownSession,
  knownSession,
} from '#database/sessions.server.ts'
import { IDLE_LIMIT_MINUTES, SESSION_LIMIT_HOURS, WARNING_MINUTES } from './limits.ts'
import type { CurrentUser } from './permissions.ts'

/** A session with its person as the rest of the application knows them. Past a limit (`isOver`) nobody is signed in. */
export type Session = Omit<KnownSession, 'user'> & { readonly user: CurrentUser }

const settings = { httpOnly: true, sameSite: 'lax', path: '/', maxAge: SESSION_LIMIT_HOURS * 3600 } as const

// A `__Host-` cookie needs TLS, which a floor and a bench on 127.0.0.1 do not have.
const secureCookie = createCookie('__Host-cannulary', { ...settings, secure: true })
const plainCookie = createCookie('cannulary', settings)

const cookieFor = (request: Request): Cookie => (request.url.startsWith('https:') ? secureCookie : plainCookie)

/** What the database stores of a session's secret. */
export const hashOf = (secret: string): string => createHash('sha256').update(secret).digest('hex')

async function cookieHash(request: Request): Promise<string | null> {
  const secret: unknown = await cookieFor(request).parse(request.headers.get('Cookie'))
  return typeof secret === 'string' && secret !== '' ? hashOf(secret) : null
}

/** The session a request belongs to; null for none, one that was ended, or one whose person is disabled. One query. */
export async function sessionOf(request: Request): Promise<Session | null> {
  const sessionHash = await cookieHash(request)
  const known = sessionHash === null ? null : await knownSession(sessionHash, IDLE_LIMIT_MINUTES)
  if (known === null || sessionHash === null) return null
  const wardIds = known.wards.map(({ id }) => id)
  return { ...known, user: { ...known.user, wardIds, sessionHash } }
}

/**
 * Signs somebody in: a new secret each time, and whatever session the browser came with ends. Returns the `Set-Cookie`
 * value that carries the secret, of which nothing is kept here but its hash.
 */
export async function signIn(request: Request, user: Pick<CurrentUser, 'id' | 'role'>, by: Trace): Promise<string> {
  const secret = randomBytes(32).toString('base64url')
  const idHash = hashOf(secret)
  const before = await cookieHash(request)
  const { address, userAgent } = by
  const actor = { id: user.id, role: user.role, sessionHash: idHash }
  await transact(async transaction => {
    if (before !== null) await endSession(before, 'signed in again', transaction)
    await beginSession({ idHash, userId: user.id, hours: SESSION_LIMIT_HOURS, address, userAgent }, transaction)
    await logAccess({ action: 'signed in', purpose: 'SIGN-IN', by: { ...by, actor } }, transaction)
  })
  return cookieFor(request).serialize(secret)
}

/** Ends this session. Returns the headers that take the cookie away and what the browser kept of our pages. */
export async function signOut(request: Request, by: Trace): Promise<Headers> {
  const sessionHash = await cookieHash(request)
  if (sessionHash !== null) {
    await transact(async transaction => {
      const ended = await endSession(sessionHash, 'signed out', transaction)
      if (ended) await logAccess({ action: 'signed out', purpose: 'SIGN-IN', by }, transaction)
    })
  }
  return signedOutHeaders(request)
}

/** Ends every session of this person, this one too. Returns the headers that take the cookie away. */
export async function signOutEverywhere(request: Request, userId: string, by: Trace): Promise<Headers> {
  await transact(async transaction => {
    await endSessionsOf(userId, 'signed out everywhere', transaction)
    await logAccess({ action: 'signed out everywhere', purpose: 'SIGN-IN', by }, transaction)
  })
  return signedOutHeaders(request)
}

/** Ends a session on the word of a page that nobody used; false when another page of it was used meanwhile. */
export function signOutIdle(sessionHash: string, by: Trace): Promise<boolean> {
  return transact(async transaction => {
    const ended = await endIdleSession(sessionHash, IDLE_LIMIT_MINUTES - WARNING_MINUTES, transaction)
    if (ended) await logAccess({ action: 'left alone', purpose: 'SIGN-IN', by }, transaction)
    return ended
  })
}

/** Takes the cookie away. Storage is left alone: it may hold entries that are still to be sent. */
async function signedOutHeaders(request: Request): Promise<Headers> {
  return new Headers({
    'Set-Cookie': await cookieFor(request).serialize('', { maxAge: 0 }),
    'Clear-Site-Data': '"cache"',
  })
}

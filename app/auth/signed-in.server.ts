import { createContext, data, type MiddlewareFunction, type RouterContextProvider, redirect } from 'react-router'
import { requestContext } from '#app/request-context.server.ts'
import { touchSession } from '#database/sessions.server.ts'
import { keepDraft } from './draft.server.ts'
import type { CurrentUser } from './permissions.ts'
import { isActivity, isFromElsewhere, isWrite } from './request-kind.ts'
import { signInPath } from './return-to.ts'
import { type Session, sessionOf } from './session.server.ts'

/**
 * Who is signed in, set by `loadUser`; null on pages that are open to everybody, past a session's end, and with a one-time
 * password everywhere but where it is replaced.
 */
export const userContext = createContext<CurrentUser | null>(null)

/** The session behind a request, with its wards and their counters; it may be over. */
export const sessionContext = createContext<Session | null>(null)

const OWN_PASSWORD_PAGE = '/account'

/** What a one-time password opens: the page that replaces it, and what that page asks for on its own. */
const openToOneTime = [OWN_PASSWORD_PAGE, '/still-here', '/draft', '/sign-out']

/** Refuses a write that a page of another site may have sent, on every route. For the root, before anything else. */
export const sameOriginOnly: MiddlewareFunction<Response> = ({ request, url }, next) => {
  if (isFromElsewhere(request, url.origin)) throw data('This request did not come from a page of this site.', 403)
  return next()
}

/** Finds out who is signed in, and notes that they are there. For the root. */
export const loadUser: MiddlewareFunction<Response> = async ({ request, url, context }, next) => {
  const session = await sessionOf(request)
  context.set(sessionContext, session)
  if (session === null || session.isOver) return next()
  if (!session.owesPassword || openToOneTime.includes(url.pathname)) context.set(userContext, session.user)
  context.get(requestContext).logged.userId = session.user.id
  if (!session.isFresh && isActivity(request, url.pathname)) await touchSession(session.user.sessionHash)
  return next()
}

/**
 * Lets only people in who are signed in; the others sign in first and come back. What somebody sent after their session
 * had ended waits for them as a draft. A one-time password opens the page that replaces it, and no other.
 */
export const signedInOnly: MiddlewareFunction<Response> = async ({ request, url, context }, next) => {
  const session = context.get(sessionContext)
  if (context.get(userContext) === null) {
    if (session !== null && !session.isOver) throw redirect(OWN_PASSWORD_PAGE)
    const isKept = session !== null && isWrite(request) && (await keepDraft(session.user.id, url.pathname, request))
    throw redirect(`${signInPath(url.pathname + url.search)}${isKept ? '&kept=yes' : ''}`)
  }
  return next()
}

/** The person who is signed in. Throws a 401 where nobody is, which behind `signedInOnly` cannot be. */
export function signedIn(context: Readonly<RouterContextProvider>): CurrentUser {
  const user = context.get(userContext)
  if (user === null) throw data('Sign in first.', 401)
  return user
}

/** The session of the person who is signed in, with their wards. Throws a 401 where nobody is. */
export function ownSession(context: Readonly<RouterContextProvider>): Session {
  const session = context.get(sessionContext)
  if (session === null || context.get(userContext) === null) throw data('Sign in first.', 401)
  return session
}

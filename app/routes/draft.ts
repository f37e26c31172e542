import { data } from 'react-router'
import { keepFields } from '#app/auth/draft.server.ts'
import { returnPath } from '#app/auth/return-to.ts'
import { signOutIdle } from '#app/auth/session.server.ts'
import { sessionContext } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { sentForm } from '#app/sent-form.server.ts'
import type { Route } from './+types/draft.ts'

/**
 * A page that nobody uses any more hands in what was typed on it, and ends its session. `ended` is false when the same
 * session is in use on another page, which then stays signed in.
 */
export async function action({ request, url, context }: Route.ActionArgs) {
  const session = context.get(sessionContext)
  if (session === null) throw data('Sign in first.', 401)
  const ended = session.isOver || (await signOutIdle(session.user.sessionHash, traceOf({ request, url, context })))
  if (!ended) return Response.json({ ended, kept: false })
  const form = await sentForm(request)
  const path = new URL(returnPath(form.get('draft-path')), url).pathname
  form.delete('draft-path')
  return Response.json({ ended, kept: await keepFields(session.user.id, path, form) })
}

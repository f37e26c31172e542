import { data } from 'react-router'
import { SESSION_LIMIT_HOURS } from '#app/auth/limits.ts'
import { can } from '#app/auth/permissions.ts'
import { ownSession, signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { boardJson, boardTag, wardBoard } from '#app/views/ward-board.server.ts'
import { logLook } from '#database/access-log.server.ts'
import type { Route } from './+types/api-board.ts'

/**
 * The board as data, for a page that keeps itself up to date. Whether anything changed is answered from the session's
 * own query, which brings the ward's counter: an unchanged board costs no second one. It is the look at the page that asks,
 * so it is logged once a session, and only when that page was not.
 */
export async function loader({ params: { wardId }, context, request, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  if (!can(user, 'see ward', wardId)) throw data('There is no such ward.', 404)
  const now = new Date()
  const rev = ownSession(context).wards.find(ward => ward.id === wardId)?.rev
  if (rev !== undefined && request.headers.get('if-none-match') === boardTag(wardId, rev, now)) {
    return new Response(null, { status: 304, headers: { ETag: boardTag(wardId, rev, now) } })
  }
  const served = await wardBoard(wardId, now, rev)
  if (!served) throw data('There is no such ward.', 404)
  const by = { ...traceOf({ request, url, context }), path: `/wards/${wardId}/board` }
  await logLook({ action: 'saw board', purpose: 'TREAT', by, wardId }, SESSION_LIMIT_HOURS * 60)
  const headers = { 'Content-Type': 'application/json', ETag: served.etag, 'Cache-Control': 'no-store' }
  return new Response(boardJson(served), { headers })
}

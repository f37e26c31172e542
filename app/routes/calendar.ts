import { data } from 'react-router'
import { calendarHash } from '#app/auth/calendar-secret.server.ts'
import { can } from '#app/auth/permissions.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { tubeDays } from '#app/rules/tube-calendar.ts'
import { icalendar } from '#app/time/icalendar.ts'
import { tubesOfWards } from '#app/views/tube-list.server.ts'
import { logLook } from '#database/access-log.server.ts'
import { feedOwner } from '#database/calendar-feeds.server.ts'
import type { Route } from './+types/calendar.ts'

const LOOK_MINUTES = 12 * 60 // a calendar program asks every hour: two lines of the log a day and ward are enough

/**
 * Days of tube changes for a calendar program, at an address that is itself the key. What its owner may see now is in it, under bed
 * and initials. The address is kept out of the log: whoever reads the log must not be able to open it.
 */
export async function loader({ params: { secret }, context, request, url }: Route.LoaderArgs) {
  const hash = calendarHash(secret)
  const owner = await feedOwner(hash)
  const wardIds = owner?.wardIds.filter(id => can(owner, 'see tubes of wards', id)) ?? []
  if (!owner || wardIds.length === 0) throw data('There is no such calendar.', 404)
  const now = new Date()
  const tubes = await tubesOfWards(wardIds, now)
  const actor = { id: owner.id, role: owner.role, sessionHash: hash }
  const by = { ...traceOf({ request, url, context }), path: '/calendar', actor }
  for (const wardId of wardIds) await logLook({ action: 'read calendar', purpose: 'TREAT', by, wardId }, LOOK_MINUTES)
  return new Response(icalendar('Tube changes', tubeDays(tubes), now), {
    headers: {
      'Content-Type': 'text/calendar; charset=utf-8',
      'Content-Disposition': 'inline; filename="tubes.ics"',
      'Cache-Control': 'private, no-store',
      'Referrer-Policy': 'no-referrer',
    },
  })
}

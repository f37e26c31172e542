import { SESSION_LIMIT_HOURS } from '#app/auth/limits.ts'
import { logPatientLook, patientGate } from '#app/auth/patient-access.server.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { patientCare } from '#app/views/patient-context.server.ts'
import { patientTimeline, timelineTag } from '#app/views/patient-timeline.server.ts'
import type { Route } from './+types/api-timeline.ts'

/**
 * A patient's page as data, for a page that keeps itself up to date; a 304 when nothing changed. It is the look at the page
 * that asks, so it is logged once a session, and only when that page was not.
 */
export async function loader({ params: { patientId }, context, request, url }: Route.LoaderArgs) {
  const by = { ...traceOf({ request, url, context }), path: `/patients/${patientId}` }
  const opened = await patientGate(signedIn(context), patientId, { path: null, act: 'see patients', by })
  const now = new Date()
  const patient = await patientCare(opened.stayId, now)
  const tag = timelineTag(patient.record, url, now)
  if (request.headers.get('if-none-match') === tag) return new Response(null, { status: 304, headers: { ETag: tag } })
  const served = await patientTimeline(patient, url, now)
  await logPatientLook(opened, by, SESSION_LIMIT_HOURS * 60)
  return Response.json(
    { data: served.data, at: served.at },
    { headers: { ETag: served.etag, 'Cache-Control': 'no-store' } },
  )
}

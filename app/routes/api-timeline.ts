import { patientGate } from '#app/auth/patient-access.server.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { patientCare } from '#app/views/patient-context.server.ts'
import { patientTimeline, timelineTag } from '#app/views/patient-timeline.server.ts'
import type { Route } from './+types/api-timeline.ts'

/** A patient's page as data, for a page that keeps itself up to date; a 304 when nothing changed. */
export async function loader({ params: { patientId }, context, request, url }: Route.LoaderArgs) {
  const { stayId } = await patientGate(signedIn(context), patientId, {
    path: `/patients/${patientId}`,
    act: 'see patients',
  })
  const now = new Date()
  const patient = await patientCare(stayId, now)
  const tag = timelineTag(patient.record, url, now)
  if (request.headers.get('if-none-match') === tag) return new Response(null, { status: 304, headers: { ETag: tag } })
  const served = await patientTimeline(patient, url, now)
  return Response.json(
    { data: served.data, at: served.at },
    { headers: { ETag: served.etag, 'Cache-Control': 'no-store' } },
  )
}

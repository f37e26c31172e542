import { data } from 'react-router'
import { validate as isUuid } from 'uuid'
import { patientGate } from '#app/auth/patient-access.server.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { logLook } from '#database/access-log.server.ts'
import { photographStore } from '#database/photograph-store.server.ts'
import { fileNames, photographById } from '#database/photographs.server.ts'
import type { Route } from './+types/photograph.ts'

/** A photograph, for whoever may see its patient. Each look is checked and logged anew, so the browser asks every time. */
export async function loader({ params: { photographId }, context, request, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  const found = isUuid(photographId) ? await photographById(photographId) : undefined
  if (!found) throw data('There is no such photograph.', 404)
  const { id, patientId, stayId, file } = found
  const by = traceOf({ context, request, url })
  const { wardId, via } = await patientGate(user, patientId, { path: null, act: 'see patients', by })
  const purpose = via === 'grant' ? 'BTG' : 'TREAT'
  const resource = { type: 'photograph', id }
  await logLook({ action: 'saw photograph', purpose, by, resource, patientId, stayId, wardId })
  const size = url.searchParams.get('size') === 'small' ? 'small' : 'large'
  const headers = { 'Cache-Control': 'private, no-cache', ETag: `"${id}-${size}"`, 'X-Content-Type-Options': 'nosniff' }
  if (request.headers.get('If-None-Match') === headers.ETag) return new Response(null, { status: 304, headers })
  const bytes = await photographStore.read(fileNames(file)[size])
  if (!bytes) throw data('The file of this photograph is missing. Tell those who look after the server.', 404)
  return new Response(new Uint8Array(bytes), { headers: { ...headers, 'Content-Type': 'image/webp' } })
}

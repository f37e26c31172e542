import { data, type RouterContextProvider } from 'react-router'
import { patientGate } from '#app/auth/patient-access.server.ts'
import type { Act } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import type { Trace } from '#database/access-log.server.ts'
import { type StayWithPatient, stayById } from '#database/stays.server.ts'

type Arrived = {
  readonly params: { readonly patientId: string }
  readonly request: Request
  readonly url: URL
  readonly context: Readonly<RouterContextProvider>
}

/** The latest stay of the patient in the address, if this person may do this there; `by` is for the access log. */
export async function openedStay(arrived: Arrived, act: Act): Promise<StayWithPatient & { readonly by: Trace }> {
  const { params, url, context } = arrived
  const by = traceOf(arrived)
  const asked = { path: url.pathname + url.search, act, by }
  const { stayId } = await patientGate(signedIn(context), params.patientId, asked)
  const found = await stayById(stayId)
  if (!found) throw data('There is no such patient.', 404)
  return { ...found, by }
}

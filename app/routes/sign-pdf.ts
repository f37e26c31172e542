import { redirect } from 'react-router'
import { logPatientLook, patientGate } from '#app/auth/patient-access.server.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { hangingSign, signOf } from '#app/views/bed-head-sign.server.ts'
import { patientCare } from '#app/views/patient-context.server.ts'
import type { Route } from './+types/sign-pdf.ts'

/** The PDF of the sign that was noted as printed last, while it is true; otherwise the page on which a new one is made. */
export async function loader({ params, context, request, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  const by = traceOf({ context, request, url })
  const page = `/patients/${params.patientId}/sign`
  const opened = await patientGate(user, params.patientId, { path: page, act: 'see patients', by })
  await logPatientLook(opened, by)
  const now = new Date()
  const care = await patientCare(opened.stayId, now)
  const hanging = hangingSign(care)
  if (!hanging || hanging.changed.length > 0) throw redirect(page)
  const { sign } = await signOf(care, hanging.printedAt)
  if (!sign) throw redirect(page)
  // Read with the first sheet: what draws it would make every start wait.
  const { signPdf } = await import('#app/print/sign-pdf.server.ts')
  const pdf = await signPdf(sign, `${url.origin}/patients/${params.patientId}`)
  return new Response(new Uint8Array(pdf), {
    headers: {
      'Content-Type': 'application/pdf',
      'Content-Disposition': `attachment; filename="bed-head-sign.pdf"`,
      'Cache-Control': 'private, no-store',
    },
  })
}

import { useForm } from '@conform-to/react'
import { data, Form, redirect } from 'react-router'
import { GRANT_MINUTES } from '#app/auth/limits.ts'
import { patientElsewhere, reasonSchema } from '#app/auth/patient-reason.server.ts'
import { returnPath } from '#app/auth/return-to.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { Button } from '#app/components/button.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { Notice } from '#app/components/notice.tsx'
import { TextArea } from '#app/components/text-field.tsx'
import { errorsOf, textOf } from '#app/components/text-of.ts'
import { readForm, sentForm } from '#app/sent-form.server.ts'
import { grantAccess } from '#database/access-grants.server.ts'
import type { Route } from './+types/patient-access.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Patient of another ward | Cannulary' }]

export async function loader({ params: { patientId }, url, context }: Route.LoaderArgs) {
  const place = await patientElsewhere(signedIn(context), patientId)
  if (place === 'open') throw redirect(wayOn(url, patientId))
  return { wardName: place.wardName }
}

export async function action({ request, params: { patientId }, url, context }: Route.ActionArgs) {
  const user = signedIn(context)
  const place = await patientElsewhere(user, patientId)
  if (place === 'open') return redirect(wayOn(url, patientId))
  const submission = readForm(await sentForm(request), reasonSchema)
  if (submission.status !== 'success') return data(submission.reply(), 400)
  const { reason } = submission.value
  await grantAccess({ ...place, userId: user.id, reason, minutes: GRANT_MINUTES }, traceOf({ request, url, context }))
  return redirect(wayOn(url, patientId))
}

const wayOn = (url: URL, patientId: string): string =>
  returnPath(url.searchParams.get('returnTo'), `/patients/${patientId}`)

export default function PatientAccess({ loaderData, actionData }: Route.ComponentProps) {
  const [form, { reason }] = useForm<{ reason: string }>({ lastResult: actionData ?? null })
  return (
    <div className="grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">This patient is on {loaderData.wardName}</h1>
      <Notice tone="amber" action="Say why you need to open this patient.">
        You do not belong to that ward. Your name and your reason are shown to its charge nurse, and every page you open
        is logged. It stays open for {GRANT_MINUTES} minutes.
      </Notice>
      <Form method="post" id={form.id} onSubmit={form.onSubmit} noValidate={form.noValidate} className="grid gap-4">
        <ErrorSummary title="Not open yet. Please check:" errors={errorsOf(form)} />
        <TextArea
          {...textOf(reason)}
          label="Reason"
          hint="For example: covering the ward tonight, tube round, asked by the nurse in charge"
          required
          minLength={10}
          maxLength={500}
        />
        <Button variant="primary" size={56}>
          Open the patient
        </Button>
      </Form>
    </div>
  )
}

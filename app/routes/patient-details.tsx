import { getFormProps, useForm } from '@conform-to/react'
import { parseWithZod } from '@conform-to/zod/v4'
import { data, Form, redirect } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { fieldsOf } from '#app/care/field.ts'
import { Button, LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { CareFields } from '#app/components/care-fields.tsx'
import { drawnFields } from '#app/components/conform-fields.ts'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { Notice } from '#app/components/notice.tsx'
import { PatientHistory } from '#app/components/patient-history.tsx'
import { errorsOf } from '#app/components/text-of.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { openedStay } from '#app/stays/opened-stay.server.ts'
import { detailsChangedBy } from '#app/stays/patient-details.server.ts'
import { patientHistory } from '#app/stays/patient-history.server.ts'
import { answersOf, detailsSchema, person } from '#app/stays/patient-schema.ts'
import { logAccess } from '#database/access-log.server.ts'
import type { Route } from './+types/patient-details.ts'

const ACT = 'edit patient details'

export const meta: Route.MetaFunction = () => [{ title: 'Patient details | Cannulary' }]

export async function loader(arrived: Route.LoaderArgs) {
  const { stay, patient } = await openedStay(arrived, ACT)
  const user = signedIn(arrived.context)
  const isOpen = stay.dischargedAt === null
  return {
    form: { version: patient.version, person: answersOf(patient) },
    history: await patientHistory(stay),
    isSaved: arrived.url.searchParams.has('saved'),
    isAdmitted: arrived.url.searchParams.has('admitted'),
    moves: isOpen && can(user, 'move patients', stay.wardId),
    discharges: isOpen && can(user, 'discharge patients', stay.wardId),
  }
}

export async function action(arrived: Route.ActionArgs) {
  const { stay, by } = await openedStay(arrived, ACT)
  const { id: stayId, patientId, wardId } = stay
  const asked = { user: signedIn(arrived.context), patientId, now: new Date() }
  const outcome = await detailsChangedBy(await sentForm(arrived.request), asked)
  if ('reply' in outcome) return data({ reply: outcome.reply }, outcome.status)
  await logAccess({ action: 'changed patient details', purpose: 'TREAT', by, patientId, stayId, wardId })
  throw redirect(outcome.to)
}

export default function PatientDetails({ loaderData, actionData, params }: Route.ComponentProps) {
  const { form, history, isSaved, isAdmitted, moves, discharges } = loaderData
  const here = `/patients/${params.patientId}`
  return (
    <div className="grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <header className="flex flex-wrap items-center justify-between gap-3">
        <h1 className="text-2xl font-bold">Patient details</h1>
        <div className="flex flex-wrap gap-2">
          {moves && <LinkButton href={`${here}/move`}>Move</LinkButton>}
          {discharges && <LinkButton href={`${here}/discharge`}>Discharge</LinkButton>}
          <LinkButton href={here}>Back to the chart</LinkButton>
        </div>
      </header>
      {isSaved && !actionData && <p role="status">Saved.</p>}
      {isAdmitted && !actionData && (
        <Notice tone="amber" action="Check each of these.">
          They are from the last stay, and may not hold any more.
        </Notice>
      )}
      <Card>
        <DetailsForm key={form.version} form={form} reply={actionData?.reply} />
      </Card>
      <PatientHistory {...history} />
    </div>
  )
}

interface DetailsFormProps {
  readonly form: Route.ComponentProps['loaderData']['form']
  readonly reply: NonNullable<Route.ComponentProps['actionData']>['reply'] | undefined
}

function DetailsForm({ form: stored, reply }: DetailsFormProps) {
  const [form, fields] = useForm({
    lastResult: reply ?? null,
    defaultValue: stored,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: detailsSchema }),
    shouldRevalidate: 'onInput',
  })
  const personFields = fields.person.getFieldset()
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-5">
      <ErrorSummary title="Not saved yet. Please check:" errors={errorsOf(form)} />
      <input type="hidden" name="version" defaultValue={fields.version.initialValue} />
      <CareFields fields={drawnFields(fieldsOf(person), personFields)} />
      <Button variant="primary" size={56}>
        Save
      </Button>
    </Form>
  )
}

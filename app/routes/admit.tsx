import { getFormProps, useForm } from '@conform-to/react'
import { parseWithZod } from '@conform-to/zod/v4'
import { data, Form, redirect } from 'react-router'
import { v7 as uuidv7 } from 'uuid'
import type { z } from 'zod'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { fieldsOf } from '#app/care/field.ts'
import { Button, LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { CareFields } from '#app/components/care-fields.tsx'
import { drawnFields } from '#app/components/conform-fields.ts'
import { Empty } from '#app/components/empty.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { BedField, MomentFields, momentErrorsOf } from '#app/components/stay-fields.tsx'
import { env } from '#app/env.server.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { admission } from '#app/stays/admission.server.ts'
import { admittingWard } from '#app/stays/admitting-ward.server.ts'
import { knownPerson, person } from '#app/stays/patient-schema.ts'
import { knownAdmission, newAdmission } from '#app/stays/stay-forms.ts'
import { logAccess } from '#database/access-log.server.ts'
import { freeBeds } from '#database/beds.server.ts'
import type { Route } from './+types/admit.ts'

const DAYS_BACK = 60

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Admit to ${loaderData?.ward.name ?? 'a ward'} | Cannulary` },
]

export const middleware: Route.MiddlewareFunction[] = [
  async ({ params, context }, next) => {
    await admittingWard(context, params.wardId)
    return next()
  },
]

export async function loader({ params, url, context }: Route.LoaderArgs) {
  const { id, name } = await admittingWard(context, params.wardId)
  return {
    ward: { id, name },
    beds: await freeBeds(id),
    zone: env.hospitalTimeZone,
    known: url.searchParams.has('known'),
    form: { id: uuidv7(), openedBy: signedIn(context).id, at: new Date().toISOString() },
  }
}

export async function action({ params, request, url, context }: Route.ActionArgs) {
  const user = signedIn(context)
  const { id: wardId } = await admittingWard(context, params.wardId)
  const asked = { user, wardId, now: new Date(), known: url.searchParams.has('known') }
  const outcome = await admission(await sentForm(request), asked)
  if ('reply' in outcome) return data({ reply: outcome.reply }, outcome.status)
  if ('to' in outcome) throw redirect(outcome.to)
  const { stayId, patientId } = outcome
  const by = traceOf({ request, url, context })
  await logAccess({ action: 'admitted patient', purpose: 'TREAT', by, patientId, stayId, wardId })
  throw redirect(asked.known ? `/patients/${patientId}/details?admitted` : `/patients/${patientId}`)
}

export default function Admit({ loaderData, actionData }: Route.ComponentProps) {
  const { ward, beds, known } = loaderData
  const here = `/wards/${ward.id}/admit`
  return (
    <div className="grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">Admit to {ward.name}</h1>
      <nav aria-label="Who is admitted" className="flex flex-wrap gap-2">
        <LinkButton href={here} variant={known ? 'plain' : 'primary'}>
          Somebody new
        </LinkButton>
        <LinkButton href={`${here}?known`} variant={known ? 'primary' : 'plain'}>
          Somebody who was here before
        </LinkButton>
      </nav>
      <Card>
        {beds.length === 0 ? (
          <Empty title="No bed is free on this ward">Move or discharge somebody first.</Empty>
        ) : (
          <AdmitForm key={String(known)} shown={loaderData} reply={actionData?.reply} />
        )}
      </Card>
    </div>
  )
}

interface AdmitFormProps {
  readonly shown: Route.ComponentProps['loaderData']
  readonly reply: NonNullable<Route.ComponentProps['actionData']>['reply'] | undefined
}

function AdmitForm({ shown, reply }: AdmitFormProps) {
  const { known, beds, zone } = shown
  const [form, fields] = useForm<z.input<typeof newAdmission>, unknown>({
    lastResult: reply ?? null,
    defaultValue: shown.form,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: known ? knownAdmission : newAdmission }),
    shouldRevalidate: 'onInput',
  })
  const personFields = fields.person.getFieldset()
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-5">
      <ErrorSummary title="Not admitted yet. Please check:" errors={momentErrorsOf(form)} />
      <CareFields fields={drawnFields(fieldsOf(known ? knownPerson : person), personFields)} />
      <BedField field={fields.bedId} beds={beds} />
      <MomentFields fields={fields} zone={zone} label="Admitted" daysBack={DAYS_BACK} />
      <Button variant="primary" size={56}>
        Admit
      </Button>
    </Form>
  )
}

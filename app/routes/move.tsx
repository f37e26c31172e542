import { getFormProps, useForm } from '@conform-to/react'
import { parseWithZod } from '@conform-to/zod/v4'
import { data, Form, redirect } from 'react-router'
import { v7 as uuidv7 } from 'uuid'
import type { z } from 'zod'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { Card } from '#app/components/card.tsx'
import { Empty } from '#app/components/empty.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { FormFoot } from '#app/components/form-foot.tsx'
import { BedField, MomentFields, momentErrorsOf } from '#app/components/stay-fields.tsx'
import { env } from '#app/env.server.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { openedStay } from '#app/stays/opened-stay.server.ts'
import { moveBy } from '#app/stays/stay-changes.server.ts'
import { moveSchema } from '#app/stays/stay-forms.ts'
import { logAccess } from '#database/access-log.server.ts'
import { freeBeds } from '#database/beds.server.ts'
import type { Route } from './+types/move.ts'

const DAYS_BACK = 14

export const meta: Route.MetaFunction = () => [{ title: 'Move to another bed | Cannulary' }]

export async function loader(arrived: Route.LoaderArgs) {
  const { stay } = await openedStay(arrived, 'move patients')
  const beds = await freeBeds()
  const here = beds.filter(bed => bed.wardId === stay.wardId)
  const elsewhere = beds.filter(bed => bed.wardId !== stay.wardId)
  return {
    isOpen: stay.dischargedAt === null,
    beds: [
      ...here.map(({ id, label }) => ({ id, label: `Bed ${label}` })),
      ...elsewhere.map(({ id, label, wardName }) => ({ id, label: `${wardName}, bed ${label}` })),
    ],
    zone: env.hospitalTimeZone,
    form: { id: uuidv7(), openedBy: signedIn(arrived.context).id, at: new Date().toISOString() },
  }
}

export async function action(arrived: Route.ActionArgs) {
  const { stay, by } = await openedStay(arrived, 'move patients')
  const user = signedIn(arrived.context)
  const outcome = await moveBy(await sentForm(arrived.request), { user, stay, now: new Date() })
  if ('reply' in outcome) return data({ reply: outcome.reply }, outcome.status)
  const { id: stayId, patientId, wardId } = stay
  await logAccess({ action: 'moved patient', purpose: 'TREAT', by, patientId, stayId, wardId })
  throw redirect(outcome.to)
}

export default function Move({ loaderData, actionData, params }: Route.ComponentProps) {
  return (
    <div className="grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">Move to another bed</h1>
      <Card>
        {loaderData.isOpen && loaderData.beds.length > 0 ? (
          <MoveForm shown={loaderData} reply={actionData?.reply} back={`/patients/${params.patientId}`} />
        ) : (
          <Empty title={loaderData.isOpen ? 'No bed is free' : 'This stay has ended'} />
        )}
      </Card>
    </div>
  )
}

interface MoveFormProps {
  readonly shown: Route.ComponentProps['loaderData']
  readonly reply: NonNullable<Route.ComponentProps['actionData']>['reply'] | undefined
  readonly back: string
}

function MoveForm({ shown, reply, back }: MoveFormProps) {
  const [form, fields] = useForm<z.input<typeof moveSchema>>({
    lastResult: reply ?? null,
    defaultValue: shown.form,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: moveSchema }),
    shouldRevalidate: 'onInput',
  })
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-5">
      <ErrorSummary title="Not moved yet. Please check:" errors={momentErrorsOf(form)} />
      <BedField field={fields.bedId} beds={shown.beds} />
      <MomentFields fields={fields} zone={shown.zone} label="Moved" daysBack={DAYS_BACK} />
      <FormFoot words="Move" back={back} />
    </Form>
  )
}

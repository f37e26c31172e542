import { getFormProps, useForm } from '@conform-to/react'
import { parseWithZod } from '@conform-to/zod/v4'
import { data, Form, redirect } from 'react-router'
import { v7 as uuidv7 } from 'uuid'
import type { z } from 'zod'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { Card } from '#app/components/card.tsx'
import { ChoiceField } from '#app/components/choice-field.tsx'
import { Empty } from '#app/components/empty.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { FormFoot } from '#app/components/form-foot.tsx'
import { MomentFields, momentErrorsOf } from '#app/components/stay-fields.tsx'
import { TextArea } from '#app/components/text-field.tsx'
import { chosenOf, textOf } from '#app/components/text-of.ts'
import { env } from '#app/env.server.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { openedStay } from '#app/stays/opened-stay.server.ts'
import { dischargeBy } from '#app/stays/stay-changes.server.ts'
import { dischargeSchema, dischargeWords } from '#app/stays/stay-forms.ts'
import { logAccess } from '#database/access-log.server.ts'
import type { Route } from './+types/discharge.ts'

const DAYS_BACK = 14

export const meta: Route.MetaFunction = () => [{ title: 'Discharge | Cannulary' }]

export async function loader(arrived: Route.LoaderArgs) {
  const { stay } = await openedStay(arrived, 'discharge patients')
  return {
    isOpen: stay.dischargedAt === null,
    zone: env.hospitalTimeZone,
    form: { id: uuidv7(), openedBy: signedIn(arrived.context).id, at: new Date().toISOString() },
  }
}

export async function action(arrived: Route.ActionArgs) {
  const { stay, by } = await openedStay(arrived, 'discharge patients')
  const user = signedIn(arrived.context)
  const outcome = await dischargeBy(await sentForm(arrived.request), { user, stay, now: new Date() })
  if ('reply' in outcome) return data({ reply: outcome.reply }, outcome.status)
  const { id: stayId, patientId, wardId } = stay
  await logAccess({ action: 'discharged patient', purpose: 'TREAT', by, patientId, stayId, wardId })
  throw redirect(outcome.to)
}

export default function Discharge({ loaderData, actionData, params }: Route.ComponentProps) {
  return (
    <div className="grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">Discharge</h1>
      <p className="text-ink2">
        The bed becomes free and nothing is due any more. Care of before the discharge can still be charted.
      </p>
      <Card>
        {loaderData.isOpen ? (
          <DischargeForm shown={loaderData} reply={actionData?.reply} back={`/patients/${params.patientId}`} />
        ) : (
          <Empty title="This stay has ended" />
        )}
      </Card>
    </div>
  )
}

interface DischargeFormProps {
  readonly shown: Route.ComponentProps['loaderData']
  readonly reply: NonNullable<Route.ComponentProps['actionData']>['reply'] | undefined
  readonly back: string
}

function DischargeForm({ shown, reply, back }: DischargeFormProps) {
  const [form, fields] = useForm<z.input<typeof dischargeSchema>>({
    lastResult: reply ?? null,
    defaultValue: shown.form,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: dischargeSchema }),
    shouldRevalidate: 'onInput',
  })
  const { reason, note, careAfter } = fields
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-5">
      <ErrorSummary title="Not discharged yet. Please check:" errors={momentErrorsOf(form)} />
      <ChoiceField {...chosenOf(reason)} label="Destination" options={dischargeWords} />
      <MomentFields fields={fields} zone={shown.zone} label="Left" daysBack={DAYS_BACK} />
      {(careAfter.errors !== undefined || careAfter.initialValue !== undefined) && (
        <ChoiceField
          {...chosenOf(careAfter)}
          label="Care was charted for later"
          options={{ yes: 'The time is right: discharge all the same' }}
          several
        />
      )}
      <TextArea key={note.key} {...textOf(note)} label="Note" maxLength={500} rows={2} optional />
      <FormFoot words="Discharge" back={back} />
    </Form>
  )
}

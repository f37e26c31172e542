import { getFormProps, useForm } from '@conform-to/react'
import { parseWithZod } from '@conform-to/zod/v4'
import { data, Form } from 'react-router'
import { v7 as uuidv7 } from 'uuid'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { BedForms } from '#app/components/bed-forms.tsx'
import { Button } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { FieldErrors } from '#app/components/field-parts.tsx'
import { errorsOf } from '#app/components/text-of.ts'
import { WardFields } from '#app/components/ward-fields.tsx'
import { sentForm } from '#app/sent-form.server.ts'
import { numbersText } from '#app/wards/emergency-numbers.ts'
import { wardChangedBy } from '#app/wards/ward-forms.server.ts'
import { wardSchema } from '#app/wards/ward-schema.ts'
import { logAccess } from '#database/access-log.server.ts'
import { bedsOf } from '#database/beds.server.ts'
import { wardById } from '#database/wards.server.ts'
import type { Route } from './+types/admin-ward.ts'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.ward.name ?? 'Ward'} | Cannulary` },
]

export async function loader({ params: { wardId }, context }: Route.LoaderArgs) {
  if (!can(signedIn(context), 'manage wards')) throw data('Wards are kept by the administrators.', 403)
  const ward = await wardById(wardId)
  if (!ward) throw data('There is no such ward.', 404)
  const { name, shiftTimes, pressureUnit, emergencyNumbers } = ward
  const numbers = numbersText(emergencyNumbers)
  const form = { name, shiftTimes: shiftTimes.join(', '), pressureUnit, emergencyNumbers: numbers }
  return { ward, form, beds: await bedsOf(wardId), newBedId: uuidv7() }
}

export async function action({ params: { wardId }, request, url, context }: Route.ActionArgs) {
  const user = signedIn(context)
  if (!can(user, 'manage wards')) throw data('Wards are kept by the administrators.', 403)
  const outcome = await wardChangedBy(await sentForm(request), wardId, user.id)
  if (outcome.reply) return data(outcome, 400)
  await logAccess({ action: 'changed ward', purpose: 'ADMIN', by: traceOf({ request, url, context }), wardId })
  return data(outcome)
}

export default function AdminWard({ loaderData, actionData }: Route.ComponentProps) {
  const { ward, form, beds, newBedId } = loaderData
  const replyTo = (intent: string) => (actionData?.intent === intent ? actionData.reply : undefined)
  return (
    <div className="grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">{ward.name}</h1>
      {actionData?.saved && <p role="status">{actionData.saved}</p>}
      <Card title="Ward">
        <SettingsForm form={form} reply={replyTo('ward')} />
      </Card>
      <Card title="Beds">
        <BedForms key={beds.length} beds={beds} newBedId={newBedId} replyTo={replyTo} />
      </Card>
      <Card title={ward.retired ? 'Out of use' : 'In use'}>
        <UseForm retired={ward.retired} reply={replyTo('use')} />
      </Card>
    </div>
  )
}

type Reply = NonNullable<Route.ComponentProps['actionData']>['reply']

interface SettingsFormProps {
  readonly form: Route.ComponentProps['loaderData']['form']
  readonly reply: Reply
}

function SettingsForm({ form: stored, reply }: SettingsFormProps) {
  const [form, fields] = useForm({
    lastResult: reply ?? null,
    defaultValue: stored,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: wardSchema.omit({ id: true }) }),
    shouldRevalidate: 'onInput',
  })
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-5">
      <ErrorSummary title="Not saved yet. Please check:" errors={errorsOf(form)} />
      <WardFields fields={fields} />
      <Button name="intent" value="ward" variant="primary" size={48} className="justify-self-start">
        Save
      </Button>
    </Form>
  )
}

interface UseFormProps {
  readonly retired: boolean
  readonly reply: Reply
}

/** A ward out of use takes no patients, and keeps the stays that were there. */
function UseForm({ retired, reply }: UseFormProps) {
  return (
    <Form method="post" className="grid gap-3">
      <p>{retired ? 'It takes no patients.' : 'A ward without patients can be taken out of use.'}</p>
      <FieldErrors id="use" errors={reply?.error?.retired ?? undefined} />
      <input type="hidden" name="intent" value="use" />
      <Button name="retired" value={retired ? 'no' : 'yes'} className="justify-self-start">
        {retired ? 'Take into use again' : 'Take out of use'}
      </Button>
    </Form>
  )
}

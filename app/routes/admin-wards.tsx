import { getFormProps, useForm } from '@conform-to/react'
import { parseWithZod } from '@conform-to/zod/v4'
import { data, Form, Link, redirect } from 'react-router'
import { v7 as uuidv7 } from 'uuid'
import type { z } from 'zod'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { Button } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { Table } from '#app/components/table.tsx'
import { Tag } from '#app/components/tag.tsx'
import { errorsOf } from '#app/components/text-of.ts'
import { WardFields } from '#app/components/ward-fields.tsx'
import { sentForm } from '#app/sent-form.server.ts'
import { wardAddedBy } from '#app/wards/ward-forms.server.ts'
import { wardSchema } from '#app/wards/ward-schema.ts'
import { logAccess } from '#database/access-log.server.ts'
import { allWards } from '#database/wards.server.ts'
import type { Route } from './+types/admin-wards.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Wards | Cannulary' }]

export async function loader({ context }: Route.LoaderArgs) {
  if (!can(signedIn(context), 'manage wards')) throw data('Wards are kept by the administrators.', 403)
  const form = { id: uuidv7(), name: '', shiftTimes: '07:00, 15:00, 23:00', pressureUnit: 'cmH2O' as const }
  return { wards: await allWards(), form }
}

export async function action({ request, url, context }: Route.ActionArgs) {
  const user = signedIn(context)
  if (!can(user, 'manage wards')) throw data('Wards are kept by the administrators.', 403)
  const outcome = await wardAddedBy(await sentForm(request), user.id)
  if ('reply' in outcome) return data(outcome, 400)
  const { wardId } = outcome
  await logAccess({ action: 'added ward', purpose: 'ADMIN', by: traceOf({ request, url, context }), wardId })
  throw redirect(`/admin/wards/${wardId}`)
}

export default function Wards({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <div className="grid gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">Wards</h1>
      <Card flush>
        <Table
          caption="Wards"
          columns={[
            { label: 'Ward' },
            { label: 'Shifts from' },
            { label: 'Beds', numeric: true },
            { label: 'Patients', numeric: true },
            { label: 'State' },
          ]}
          rows={loaderData.wards.map(ward => ({ key: ward.id, cells: cellsOf(ward) }))}
        />
      </Card>
      <Card title="Add a ward" className="max-w-3xl">
        <AddWardForm key={loaderData.wards.length} form={loaderData.form} reply={actionData?.reply} />
      </Card>
    </div>
  )
}

function cellsOf(ward: Route.ComponentProps['loaderData']['wards'][number]) {
  const link = (
    <Link
      key="name"
      to={`/admin/wards/${ward.id}`}
      className="inline-flex min-h-11 min-w-11 items-center underline underline-offset-3"
    >
      {ward.name}
    </Link>
  )
  const state = ward.retired ? <Tag key="state">Out of use</Tag> : 'In use'
  return [link, ward.shiftTimes.join(', '), ward.beds, ward.patients, state]
}

interface AddWardFormProps {
  readonly form: Route.ComponentProps['loaderData']['form']
  readonly reply: NonNullable<Route.ComponentProps['actionData']>['reply'] | undefined
}

function AddWardForm({ form: fresh, reply }: AddWardFormProps) {
  const [form, fields] = useForm<z.input<typeof wardSchema>, z.output<typeof wardSchema>>({
    lastResult: reply ?? null,
    defaultValue: fresh,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: wardSchema }),
    shouldRevalidate: 'onInput',
  })
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-5">
      <ErrorSummary title="Not added yet. Please check:" errors={errorsOf(form)} />
      <input type="hidden" name="id" defaultValue={fields.id.initialValue} />
      <WardFields fields={fields} />
      <Button variant="primary" size={48} className="justify-self-start">
        Add the ward
      </Button>
    </Form>
  )
}

import { useForm } from '@conform-to/react'
import { parseWithZod } from '@conform-to/zod/v4'
import { data, Form } from 'react-router'
import { ONE_TIME_PASSWORD_HOURS } from '#app/auth/limits.ts'
import { addedPerson } from '#app/auth/people.server.ts'
import { can, roles } from '#app/auth/permissions.ts'
import { personSchema } from '#app/auth/person-schema.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { Button, LinkButton } from '#app/components/button.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { OneTimePassword } from '#app/components/one-time-password.tsx'
import { PersonFields } from '#app/components/person-fields.tsx'
import { errorsOf } from '#app/components/text-of.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { allWards } from '#database/wards.server.ts'
import type { Route } from './+types/admin-person-new.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Add a person | Cannulary' }]

export async function loader({ context }: Route.LoaderArgs) {
  if (!can(signedIn(context), 'manage people')) throw data('People are kept by the administrators.', 403)
  const wards = await allWards()
  return { wards: wards.filter(ward => !ward.retired).map(({ id, name }) => ({ id, name })) }
}

export async function action({ request, url, context }: Route.ActionArgs) {
  const by = traceOf({ request, url, context })
  if (!can(signedIn(context), 'manage people')) throw data('People are kept by the administrators.', 403)
  const outcome = await addedPerson(await sentForm(request), by)
  return data(outcome, outcome.status)
}

export default function AddPerson({ loaderData, actionData }: Route.ComponentProps) {
  const { name = '', password } = actionData ?? {}
  return (
    <div className="grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">{password ? `${name} is added` : 'Add a person'}</h1>
      {password ? (
        <>
          <OneTimePassword name={name} password={password} hours={ONE_TIME_PASSWORD_HOURS} />
          <div className="flex flex-wrap gap-3">
            <LinkButton href="/admin/people">All people</LinkButton>
            <LinkButton href="/admin/people/new" reload>
              Add another
            </LinkButton>
          </div>
        </>
      ) : (
        <NewPersonForm wards={loaderData.wards} reply={actionData?.reply} />
      )}
    </div>
  )
}

type Reply = NonNullable<Route.ComponentProps['actionData']>['reply']
interface NewPersonFormProps {
  readonly wards: readonly { readonly id: string; readonly name: string }[]
  readonly reply: Reply | undefined
}

function NewPersonForm({ wards, reply }: NewPersonFormProps) {
  const [form, fields] = useForm({
    lastResult: reply ?? null,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: personSchema }),
    shouldRevalidate: 'onInput',
  })
  return (
    <Form method="post" id={form.id} onSubmit={form.onSubmit} noValidate={form.noValidate} className="grid gap-4">
      <ErrorSummary title="Not added yet. Please check:" errors={errorsOf(form)} />
      <PersonFields fields={fields} roles={roles} wards={wards} />
      <Button variant="primary" size={56}>
        Add, and show a one-time password
      </Button>
    </Form>
  )
}

import { useForm } from '@conform-to/react'
import { parseWithZod } from '@conform-to/zod/v4'
import { data, Form } from 'react-router'
import { ONE_TIME_PASSWORD_HOURS } from '#app/auth/limits.ts'
import { changedPerson } from '#app/auth/people.server.ts'
import { can, roles } from '#app/auth/permissions.ts'
import { personSchema } from '#app/auth/person-schema.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { Button, LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { OneTimePassword } from '#app/components/one-time-password.tsx'
import { PersonFields } from '#app/components/person-fields.tsx'
import { Tag } from '#app/components/tag.tsx'
import { errorsOf } from '#app/components/text-of.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { person } from '#database/users.server.ts'
import { allWards } from '#database/wards.server.ts'
import type { Route } from './+types/admin-person.ts'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.person.name ?? 'Person'} | Cannulary` },
]

export async function loader({ params: { userId }, context }: Route.LoaderArgs) {
  if (!can(signedIn(context), 'manage people')) throw data('People are kept by the administrators.', 403)
  const [found, wards] = await Promise.all([person(userId), allWards()])
  if (found === null) throw data('There is no such person.', 404)
  const { name, email, role, supervised, disabledAt, oneTimeUntil } = found
  const wardIds = found.wards.map(ward => ward.id)
  return {
    person: { name, email, role, wardIds, supervised },
    isDisabled: disabledAt !== null,
    owesPassword: oneTimeUntil !== null,
    wards: wards
      .filter(ward => !ward.retired || wardIds.includes(ward.id))
      .map(ward => ({ id: ward.id, name: ward.name })),
  }
}

export async function action({ request, url, params: { userId }, context }: Route.ActionArgs) {
  const user = signedIn(context)
  if (!can(user, 'manage people')) throw data('People are kept by the administrators.', 403)
  if ((await person(userId)) === null) throw data('There is no such person.', 404)
  const form = await sentForm(request)
  const outcome = await changedPerson(userId, form, traceOf({ request, url, context }))
  return data(outcome, outcome.status)
}

export default function Person({ loaderData, actionData }: Route.ComponentProps) {
  const { person, isDisabled, owesPassword } = loaderData
  const { says, password } = actionData ?? {}
  return (
    <div className="grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <header className="flex flex-wrap items-center gap-3">
        <h1 className="text-2xl font-bold">{person.name}</h1>
        {isDisabled && <Tag tone="late">Disabled</Tag>}
        {owesPassword && <Tag>One-time password</Tag>}
      </header>
      <div role="status" className="empty:-mb-4">
        {says && <p className="font-semibold text-brand">{says}</p>}
      </div>
      {password && <OneTimePassword name={person.name} password={password} hours={ONE_TIME_PASSWORD_HOURS} />}
      <DetailsForm {...loaderData} reply={actionData?.reply} />
      <Card title="Access">
        <Form method="post" className="flex flex-wrap gap-3">
          <Button name="intent" value="reset">
            Make a one-time password
          </Button>
          <Button name="intent" value={isDisabled ? 'enable' : 'disable'} variant={isDisabled ? 'plain' : 'danger'}>
            {isDisabled ? 'Let in again' : 'Disable, and sign out everywhere'}
          </Button>
        </Form>
      </Card>
      <div>
        <LinkButton href="/admin/people">All people</LinkButton>
      </div>
    </div>
  )
}

type DetailsFormProps = Pick<Route.ComponentProps['loaderData'], 'person' | 'wards'> & {
  readonly reply: NonNullable<Route.ComponentProps['actionData']>['reply'] | undefined
}

function DetailsForm({ person, wards, reply }: DetailsFormProps) {
  const [form, fields] = useForm({
    lastResult: reply ?? null,
    defaultValue: person,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: personSchema }),
    shouldRevalidate: 'onInput',
  })
  return (
    <Form method="post" id={form.id} onSubmit={form.onSubmit} noValidate={form.noValidate} className="grid gap-4">
      <ErrorSummary title="Not saved yet. Please check:" errors={errorsOf(form)} />
      <PersonFields fields={fields} roles={roles} wards={wards} />
      <Button name="intent" value="details" variant="primary" size={48}>
        Save
      </Button>
    </Form>
  )
}

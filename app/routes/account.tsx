import { useForm } from '@conform-to/react'
import { parseWithZod } from '@conform-to/zod/v4'
import { data, Form, redirect } from 'react-router'
import { deviceWords } from '#app/auth/device.ts'
import { IDLE_LIMIT_MINUTES } from '#app/auth/limits.ts'
import { replacedPassword } from '#app/auth/new-password.server.ts'
import { newPasswordSchema } from '#app/auth/new-password.ts'
import { ownSession, signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { Button, LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { Notice } from '#app/components/notice.tsx'
import { Table } from '#app/components/table.tsx'
import { TextField } from '#app/components/text-field.tsx'
import { errorsOf, textOf } from '#app/components/text-of.ts'
import { env } from '#app/env.server.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { showDateTime } from '#app/time/display.ts'
import { sessionsOf } from '#database/sessions.server.ts'
import type { Route } from './+types/account.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Your account | Cannulary' }]

export async function loader({ context, url }: Route.LoaderArgs) {
  const { id, name, email, sessionHash } = signedIn(context)
  const sessions = await sessionsOf(id, IDLE_LIMIT_MINUTES)
  return {
    person: { name, email },
    owesPassword: ownSession(context).owesPassword,
    isChanged: url.searchParams.has('changed'),
    zone: env.hospitalTimeZone,
    sessions: sessions.map(({ idHash, startedAt, seenAt, address, userAgent }, at) => ({
      ...{ key: String(at), startedAt, seenAt, isThis: idHash === sessionHash },
      from: `${deviceWords(userAgent)}${address === null ? '' : `, ${address}`}`,
    })),
  }
}

export async function action({ request, url, context }: Route.ActionArgs) {
  const { owesPassword } = ownSession(context)
  const by = traceOf({ request, url, context })
  const reply = await replacedPassword(signedIn(context), await sentForm(request), by)
  if (reply !== null) return data(reply, 400)
  return redirect(owesPassword ? '/' : '/account?changed=yes')
}

export default function Account({ loaderData, actionData }: Route.ComponentProps) {
  const { person, owesPassword, isChanged } = loaderData
  return (
    <div className="grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">{owesPassword ? 'Choose your own password' : person.name}</h1>
      {owesPassword && (
        <Notice tone="blue" action="You signed in with a one-time password.">
          Choose one of your own, that nobody else knows, to go on.
        </Notice>
      )}
      <div role="status" className="empty:-mb-4">
        {isChanged && <p className="font-semibold text-brand">Your password is changed.</p>}
      </div>
      <Card title={owesPassword ? 'New password' : 'Change your password'}>
        <PasswordForm email={person.email} lastResult={actionData ?? null} />
      </Card>
      {!owesPassword && <Sessions {...loaderData} />}
      {!owesPassword && (
        <div>
          <LinkButton href="/competence">Competence</LinkButton>
        </div>
      )}
    </div>
  )
}

interface PasswordFormProps {
  readonly email: string
  readonly lastResult: Route.ComponentProps['actionData'] | null
}

function PasswordForm({ email, lastResult }: PasswordFormProps) {
  const [form, fields] = useForm({
    lastResult: lastResult ?? null,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: newPasswordSchema }),
    shouldRevalidate: 'onBlur',
  })
  const { currentPassword, newPassword, keepOthers } = fields
  return (
    <Form method="post" id={form.id} onSubmit={form.onSubmit} noValidate={form.noValidate} className="grid gap-4">
      <ErrorSummary title="Not changed yet. Please check:" errors={errorsOf(form)} />
      <input type="text" autoComplete="username" name="username" value={email} readOnly hidden />
      <TextField
        {...textOf(currentPassword)}
        type="password"
        label="Password you signed in with"
        autoComplete="current-password"
      />
      <TextField
        {...textOf(newPassword)}
        type="password"
        label="New password"
        hint="At least 12 characters. Several unrelated words are best, and may be pasted."
        autoComplete="new-password"
      />
      <label className="flex min-h-11 items-center gap-3">
        <input type="checkbox" name={keepOthers.name} className="size-5" />
        Stay signed in on other devices
      </label>
      <Button variant="primary" size={48}>
        Change the password
      </Button>
    </Form>
  )
}

function Sessions({ sessions, zone }: Pick<Route.ComponentProps['loaderData'], 'sessions' | 'zone'>) {
  return (
    <Card title="Where you are signed in" flush>
      <Table
        caption="Your sessions"
        columns={[{ label: 'Since' }, { label: 'Last used' }, { label: 'From' }]}
        rows={sessions.map(session => ({
          key: session.key,
          cells: [
            showDateTime(session.startedAt, zone),
            session.isThis ? 'This one' : showDateTime(session.seenAt, zone),
            session.from,
          ],
        }))}
      />
      <Form method="post" action="/sign-out-everywhere" className="p-4">
        <Button variant="danger">Sign out everywhere</Button>
      </Form>
    </Card>
  )
}

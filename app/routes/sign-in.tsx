import { data, Form, redirect } from 'react-router'
import { authenticator, SignInRefused } from '#app/auth/authenticator.server.ts'
import { returnPath } from '#app/auth/return-to.ts'
import { signIn } from '#app/auth/session.server.ts'
import { userContext } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { Button } from '#app/components/button.tsx'
import { DemoAccounts } from '#app/components/demo-accounts.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { Notice } from '#app/components/notice.tsx'
import { PlainPage } from '#app/components/plain-page.tsx'
import { TextField } from '#app/components/text-field.tsx'
import { sentForm } from '#app/sent-form.server.ts'
import { demoAccounts, demoPassphrase } from '#database/demo.server.ts'
import type { Route } from './+types/sign-in.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Sign in | Cannulary' }]

export async function loader({ context, url }: Route.LoaderArgs) {
  if (context.get(userContext) !== null) throw redirect(returnPath(url.searchParams.get('returnTo')))
  const accounts = await demoAccounts()
  return {
    isBack: url.searchParams.has('returnTo'),
    isKept: url.searchParams.has('kept'),
    demo: accounts.length > 0 ? { accounts, passphrase: demoPassphrase } : null,
  }
}

export async function action({ request, url, context }: Route.ActionArgs) {
  const by = traceOf({ request, url, context })
  await sentForm(request.clone()) // remix-auth would fail on a body that is no form
  try {
    const user = await authenticator(by).authenticate('form', request)
    const headers = { 'Set-Cookie': await signIn(request, user, by) }
    return redirect(returnPath(url.searchParams.get('returnTo')), { headers })
  } catch (error) {
    if (!(error instanceof SignInRefused)) throw error
    return data({ says: error.message, email: error.email }, { status: error.status })
  }
}

export default function SignIn({ loaderData, actionData }: Route.ComponentProps) {
  const { isBack, isKept, demo } = loaderData
  return (
    <PlainPage>
      <h1 className="text-2xl font-bold">Sign in</h1>
      <div className="mt-4 grid gap-4">
        {isBack && !actionData && (
          <Notice tone="blue" action="Sign in to go on.">
            {isKept
              ? 'Your session had ended. What you had typed is kept for you, and comes back when you sign in.'
              : 'Afterwards you come back to the page you asked for.'}
          </Notice>
        )}
        {actionData && <ErrorSummary title="Not signed in" errors={[{ says: actionData.says }]} />}
        <Form method="post" className="grid gap-4">
          <TextField
            id="email"
            name="email"
            type="email"
            label="E-mail address"
            autoComplete="username"
            autoCapitalize="none"
            spellCheck={false}
            required
            defaultValue={actionData?.email}
          />
          <TextField
            id="password"
            name="password"
            type="password"
            label="Password"
            autoComplete="current-password"
            required
          />
          <Button variant="primary" size={56}>
            Sign in
          </Button>
        </Form>
        <p className="text-ink2">
          No account, or the password is lost? An administrator of your hospital gives you a one-time password.
        </p>
        {demo && <DemoAccounts {...demo} />}
      </div>
    </PlainPage>
  )
}

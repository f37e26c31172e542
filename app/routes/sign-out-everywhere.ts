import { redirect } from 'react-router'
import { signOutEverywhere } from '#app/auth/session.server.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import type { Route } from './+types/sign-out-everywhere.ts'

export function loader() {
  return redirect('/account')
}

export async function action({ request, url, context }: Route.ActionArgs) {
  const user = signedIn(context)
  const headers = await signOutEverywhere(request, user.id, traceOf({ request, url, context }))
  return redirect('/sign-in', { headers })
}

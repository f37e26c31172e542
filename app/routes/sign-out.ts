import { redirect } from 'react-router'
import { signOut } from '#app/auth/session.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import type { Route } from './+types/sign-out.ts'

/** Somebody who typed the address: signing out changes something, so it needs its button. */
export function loader() {
  return redirect('/')
}

export async function action({ request, url, context }: Route.ActionArgs) {
  const headers = await signOut(request, traceOf({ request, url, context }))
  return redirect('/sign-in', { headers })
}

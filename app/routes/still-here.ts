import { signedIn } from '#app/auth/signed-in.server.ts'
import type { Route } from './+types/still-here.ts'

/** The page says that somebody is using it: as a write it has already kept the session awake. */
export function action({ context }: Route.ActionArgs) {
  signedIn(context)
  return new Response(null, { status: 204 })
}

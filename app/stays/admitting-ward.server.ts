import { data, type RouterContextProvider } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { type Ward, wardById } from '#database/wards.server.ts'

/** The ward, if this person admits patients to it. Throws a 404 for a ward that is not theirs to see, else a 403. */
export async function admittingWard(context: Readonly<RouterContextProvider>, wardId: string): Promise<Ward> {
  const user = signedIn(context)
  const ward = can(user, 'see ward', wardId) ? await wardById(wardId) : undefined
  if (!ward || ward.retired) throw data('There is no such ward.', 404)
  if (!can(user, 'admit patients', wardId)) throw data('Your role does not admit patients.', 403)
  return ward
}

import { data } from 'react-router'
import { type CurrentUser, can } from '#app/auth/permissions.ts'
import { wardById } from '#database/wards.server.ts'

/** The ward whose supplies this person may keep. Throws a 404 for a ward that is not theirs, a 403 for a role that only reads. */
export async function suppliesGate(user: CurrentUser, wardId: string): Promise<{ id: string; name: string }> {
  const ward = can(user, 'see ward', wardId) ? await wardById(wardId) : undefined
  if (!ward) throw data('There is no such ward.', 404)
  if (!can(user, 'keep supplies', wardId)) throw data('Supplies are kept by those at the bedside.', 403)
  return { id: ward.id, name: ward.name }
}

import { data } from 'react-router'
import { z } from 'zod'
import { placeOf } from '#database/access-grants.server.ts'
import { type CurrentUser, can } from './permissions.ts'

/** Why somebody opens a patient of another ward, for that ward's charge nurse to read. */
export const reasonSchema = z.object({
  reason: z
    .string({ error: 'Say why, in a few words' })
    .trim()
    .min(10, 'Say why in at least 10 characters')
    .max(500, 'Use at most 500 characters'),
})

/** Where the patient is that needs a reason. */
export type ElsewherePlace = {
  readonly patientId: string
  readonly stayId: string
  readonly wardId: string
  readonly wardName: string
}

/**
 * The place of a patient of another ward; 'open' when this person needs no reason, or has given one that still counts.
 * Throws a 404 where there is no patient for them, as it does for those who may not look elsewhere at all.
 */
export async function patientElsewhere(user: CurrentUser, patientId: string): Promise<ElsewherePlace | 'open'> {
  const place = z.uuid().safeParse(patientId).success ? await placeOf(patientId, user.id) : null
  const { wardId, wardName, stayId, grantedUntil } = place ?? {}
  const isElsewhere = can(user, 'open patients elsewhere')
  if (!wardId || !wardName || !stayId || !isElsewhere) throw data('There is no such patient.', 404)
  if (can(user, 'see patients', wardId) || grantedUntil) return 'open'
  return { patientId, stayId, wardId, wardName }
}

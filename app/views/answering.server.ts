import { v7 as uuidv7 } from 'uuid'
import type { CurrentUser } from '#app/auth/permissions.ts'
import type { Answering } from '#app/components/standing-warnings.tsx'

/** What a page needs so that this person can answer these warnings in one tap. */
export function answeringOf(
  warnings: readonly { readonly name: string }[],
  { patientId, user, now }: { readonly patientId: string; readonly user: CurrentUser; readonly now: Date },
): Answering {
  const ids = Object.fromEntries(warnings.map(({ name }) => [name, uuidv7()]))
  return { patientId, userId: user.id, at: now.toISOString(), ids }
}

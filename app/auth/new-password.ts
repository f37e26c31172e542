import { z } from 'zod'
import { LONGEST_PASSWORD, SHORTEST_PASSWORD } from './password-rules.ts'

/** The form with which somebody replaces their password. */
export const newPasswordSchema = z.object({
  currentPassword: z.string({ error: 'Enter the password you signed in with' }).max(LONGEST_PASSWORD * 4),
  newPassword: z
    .string({ error: 'Enter a new password' })
    .min(SHORTEST_PASSWORD, `Use at least ${SHORTEST_PASSWORD} characters. Several words are fine`)
    .max(LONGEST_PASSWORD * 4, `Use at most ${LONGEST_PASSWORD} characters`),
  keepOthers: z.boolean().optional(),
})

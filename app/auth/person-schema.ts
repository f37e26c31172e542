import { z } from 'zod'
import { emailField } from './email.ts'
import { roles } from './permissions.ts'

/** What an administrator says about somebody. */
export const personSchema = z.object({
  name: z
    .string({ error: 'Enter a name' })
    .trim()
    .min(2, 'Enter the first and the last name')
    .max(120, 'Use at most 120 characters'),
  email: emailField,
  role: z.enum(roles, { error: 'Choose a role' }),
  wardIds: z.array(z.uuid()).default([]),
  supervised: z.boolean().default(false),
})

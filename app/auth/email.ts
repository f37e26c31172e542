import { z } from 'zod'

/** An e-mail address as accounts are stored under it: without spaces around it, in small letters. */
export const emailField = z
  .string({ error: 'Enter an e-mail address' })
  .trim()
  .toLowerCase()
  .pipe(z.email({ error: 'Enter an e-mail address such as name@hospital.example' }).max(254, 'This is too long'))

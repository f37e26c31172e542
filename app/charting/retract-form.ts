import { z } from 'zod'
import type { FormErrors } from './assess.ts'

const REASON_LENGTH = 500 // characters that the record keeps of a reason

const lost = 'This form has lost a part of itself. Open it again.'

const schema = z.object({
  /** Minted when the form was opened. */
  id: z.uuid(lost),
  openedBy: z.uuid(lost),
  reason: z
    .string('Enter why this entry is in error')
    .trim()
    .min(1, 'Enter why this entry is in error')
    .max(REASON_LENGTH, `The reason must be at most ${REASON_LENGTH} characters`)
    .regex(/^(?:[^\p{Cc}\p{Cs}]|[\n\r\t])*$/u, 'The reason has characters that cannot be stored'),
})

/** What the form of a retraction says. */
export type Retracting = z.output<typeof schema>

/** Reads the form of a retraction: each field once, or it counts as missing. */
export function readRetraction(
  sent: FormData,
): { readonly ok: true; readonly value: Retracting } | { readonly ok: false; readonly errors: FormErrors } {
  const once = (name: string) => {
    const [value, ...others] = sent.getAll(name)
    return others.length === 0 ? value : undefined
  }
  const parsed = schema.safeParse({ id: once('id'), openedBy: once('openedBy'), reason: once('reason') })
  if (parsed.success) return { ok: true, value: parsed.data }
  return { ok: false, errors: z.flattenError(parsed.error).fieldErrors }
}

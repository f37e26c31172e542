import { z } from 'zod'

const LOST = 'This form has lost a part of itself. Open it again.'
const line = (label: string, most: number) =>
  z
    .string(`Enter the ${label}`)
    .trim()
    .max(most, `The ${label} must be at most ${most} characters`)
    .regex(/^[^\p{Cc}\p{Cs}]*$/u, `The ${label} has characters that cannot be stored`)

/** A lot as somebody asks for it. */
export const lotName = line('lot', 20).min(1, 'Enter the lot')

/** A decision about a lot: recalled, or the recall lifted; of one line, or with an empty one of every line. */
export const lotDecisionForm = z.object({
  id: z.uuid(LOST),
  lot: lotName,
  line: line('line', 120).optional(),
  decision: z.enum(['recall', 'lift'], LOST),
  reason: line('reason', 500).min(1, 'Enter the reason'),
})

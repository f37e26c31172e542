import { z } from 'zod'
import { tubeChangeSchema } from '../care/tube-change/schema.ts'
import { itemFields } from './tube-schema.ts'

/** What a form says of a line: its name as printed on the flange, its maker, and both as they stood when the form was opened. */
export const lineSchema = z.object({
  line: tubeChangeSchema.shape.line,
  maker: itemFields.maker,
  wasLine: z.string(),
  wasMaker: z.string(),
})

export type LineValues = z.output<typeof lineSchema>

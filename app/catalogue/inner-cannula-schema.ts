import type { z } from 'zod'
import { careFields, choice, quantity } from '../care/field.ts'
import { tubeChangeSchema } from '../care/tube-change/schema.ts'
import { gtinIsOne, itemFields, sizeIsPlain } from './tube-schema.ts'

const charted = tubeChangeSchema.shape

/** An inner cannula of the catalogue as its form and its line in a file say it. */
export const innerCannulaSchema = careFields({
  line: charted.line,
  maker: itemFields.maker,
  size: charted.size,
  use: choice({ label: 'Use', options: { disposable: 'Disposable', reusable: 'Reusable' } }),
  fenestrated: charted.fenestrated,
  packSize: quantity({ label: 'Pieces in a box', unit: 'pieces', min: 1, max: 1000 }),
  gtin: itemFields.gtin,
})
  .superRefine(gtinIsOne)
  .superRefine(sizeIsPlain)

export type InnerCannulaValues = z.output<typeof innerCannulaSchema>

import type { z } from 'zod'
import { careFields, choice, quantity, text, yesNo } from '../care/field.ts'
import { tubeChangeSchema, wallsNest } from '../care/tube-change/schema.ts'
import { isGtin } from '../clinical/gs1-gtin.ts'

const charted = tubeChangeSchema.shape
const dual = { field: 'construction', is: ['dual'] }

/** What every item says of itself. A semicolon separates the inner cannulas of a tube in a file, so no size has one. */
export const itemFields = {
  maker: text({ label: 'Maker', maxLength: 80 }),
  gtin: text({ label: 'GTIN', hint: 'The number under the barcode: 8, 12, 13 or 14 digits', maxLength: 14 }).optional(),
}

/** The number under the barcode has to be one: a wrong digit would name another item. */
export function gtinIsOne(
  item: { readonly gtin?: string | undefined },
  context: Pick<z.core.$RefinementCtx<unknown>, 'addIssue'>,
): void {
  if (item.gtin === undefined || isGtin(item.gtin)) return
  context.addIssue({
    code: 'custom',
    path: ['gtin'],
    message: 'GTIN must be 8, 12, 13 or 14 digits with the right check digit',
  })
}

/** A size that can stand in a list of sizes. */
export function sizeIsPlain(
  item: { readonly size: string },
  context: Pick<z.core.$RefinementCtx<unknown>, 'addIssue'>,
): void {
  if (!item.size.includes(';')) return
  context.addIssue({ code: 'custom', path: ['size'], message: 'Size on the label must have no semicolon' })
}

/** A tube of the catalogue as its form and its line in a file say it; what a charted tube says too is asked in the same words. */
export const tubeSchema = careFields({
  line: charted.line,
  maker: itemFields.maker,
  sizeSystem: charted.sizeSystem,
  size: charted.size,
  construction: charted.construction,
  innerCannula: choice({
    label: 'Inner cannula',
    options: { disposable: 'Disposable', reusable: 'Reusable' },
    when: dual,
    neededThen: true,
  }).optional(),
  idWithInner: charted.idWithInner,
  idWithoutInner: charted.idWithoutInner,
  od: charted.od,
  lengthMm: charted.lengthMm,
  cuff: charted.cuff,
  fenestrated: charted.fenestrated,
  connector: charted.connector,
  flange: charted.flange,
  longestUseDays: charted.longestUseDays,
  insertionAid: choice({ label: 'Insertion aid in the box', section: 'What comes with it', options: yesNo }),
  reusableInnerCannulas: quantity({ label: 'Reusable inner cannulas in the box', unit: 'pieces', min: 0, max: 10 }),
  gtin: itemFields.gtin,
})
  .superRefine(wallsNest)
  .superRefine(gtinIsOne)
  .superRefine(sizeIsPlain)

export type TubeValues = z.output<typeof tubeSchema>

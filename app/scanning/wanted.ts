import type { CataloguedItem } from '#app/care/catalogued-item.ts'
import { fitByCatalogue, isMadeFor } from '#app/care/inner-cannula/fit.ts'
import type { AnyCareKind, CareContext } from '#app/care/kind.ts'
import { tubeInPlace } from '#app/care/tube-change/tube.ts'
import { comparedOf } from '#app/catalogue/compare.ts'
import { tubeName } from '#app/catalogue/item.ts'
import { itemField } from '#app/charting/item-problems.ts'
import type { InHand } from './findings.ts'

type Scanned = Omit<CataloguedItem, 'formerLines'>

/** What a form wants scanned, and whether this item is it: an inner cannula has to be made for the tube in place. */
export function wantedBy(kind: AnyCareKind, context: CareContext | null, item: Scanned): InHand['wanted'] {
  const of = itemField(kind)?.meta.of
  if (of === undefined) return null
  const tube = context ? tubeInPlace(context.record)?.data : undefined
  if (!context || !tube || of === 'tube') return { of, tube: null, fits: true }
  const cannula = { line: item.line, size: item.size, ...fitByCatalogue({ item: item.id }, context, item) }
  return { of, tube: tubeName(comparedOf(tube)), fits: isMadeFor(tube, cannula) }
}

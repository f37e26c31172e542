import { gtin14 } from '../clinical/gs1-gtin.ts'
import type { InnerCannulaValues } from './inner-cannula-schema.ts'
import type { CatalogueInnerCannula, CatalogueTube } from './item.ts'
import type { TubeValues } from './tube-schema.ts'

/** What an item is apart from what its form says. */
type Kept = Pick<CatalogueTube, 'id' | 'lineId' | 'retiredAt' | 'version'>

/** A tube of the catalogue, from what its form says of it. */
export function asTube(values: TubeValues, kept: Kept): CatalogueTube {
  const { innerCannula = null, idWithInner = null, longestUseDays = null } = values
  const insertionAid = values.insertionAid === 'yes'
  return {
    ...values,
    ...kept,
    innerCannula,
    idWithInner,
    longestUseDays,
    insertionAid,
    gtin: gtin14(values.gtin ?? ''),
  }
}

/** An inner cannula of the catalogue, from what its form says of it. */
export function asInnerCannula(values: InnerCannulaValues, kept: Kept): CatalogueInnerCannula {
  return { ...values, ...kept, gtin: gtin14(values.gtin ?? '') }
}

/** What a tube's form holds of a tube that is known. */
export function tubeValues(tube: CatalogueTube): Readonly<Record<string, unknown>> {
  return { ...tube, insertionAid: tube.insertionAid ? 'yes' : 'no' }
}

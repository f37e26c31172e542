import { v7 as uuidv7 } from 'uuid'
import type { InnerCannulaValues } from '#app/catalogue/inner-cannula-schema.ts'
import type { TubeValues } from '#app/catalogue/tube-schema.ts'
import { type ItemToSave, saveItems } from '#database/catalogue-writes.server.ts'

/** What a form says of a plain tube, with what a test says otherwise. */
export function someTube(values: Partial<TubeValues> = {}): TubeValues {
  return {
    line: 'Ferrin',
    maker: 'Oskerry',
    sizeSystem: 'ISO 5366',
    size: '8.0',
    construction: 'single',
    idWithoutInner: 8,
    od: 11,
    lengthMm: 80,
    cuff: 'air',
    fenestrated: 'no',
    connector: 'outer',
    flange: 'fixed',
    insertionAid: 'yes',
    reusableInnerCannulas: 0,
    ...values,
  }
}

/** A dual-cannula tube. */
export function someDualTube(values: Partial<TubeValues> = {}): TubeValues {
  return someTube({ construction: 'dual', innerCannula: 'disposable', idWithInner: 8, idWithoutInner: 9, ...values })
}

/** What a form says of an inner cannula. */
export function someInnerCannula(values: Partial<InnerCannulaValues> = {}): InnerCannulaValues {
  const kind = { use: 'disposable', fenestrated: 'no', packSize: 10 } as const
  return { line: 'Ferrin', maker: 'Oskerry', size: '8.0', ...kind, ...values }
}

/** A tube to be saved as new. */
export function aTubeToSave(values: TubeValues = someTube(), rest: Partial<ItemToSave> = {}): ItemToSave {
  return { id: uuidv7(), version: null, fitIds: [], retired: false, ...rest, item: 'tube', values }
}

/** An inner cannula to be saved as new. */
export function aCannulaToSave(
  values: InnerCannulaValues = someInnerCannula(),
  rest: Partial<ItemToSave> = {},
): ItemToSave {
  return { id: uuidv7(), version: null, fitIds: [], retired: false, ...rest, item: 'inner cannula', values }
}

/** Adds a tube to the catalogue and returns its id. */
export async function aCatalogueTube(by: string, values: TubeValues = someTube()): Promise<string> {
  const tube = aTubeToSave(values)
  await saveItems([tube], by)
  return tube.id
}

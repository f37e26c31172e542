import type { CatalogueInnerCannula, CatalogueTube } from './item.ts'

/** The two kinds of item, as a file names them. */
export const itemKinds = ['tube', 'inner cannula'] as const
export type ItemKind = (typeof itemKinds)[number]

/** What a file of the catalogue holds, by the heading of its column, in order. The same words name a change in the history. */
export const headings = {
  item: 'Item',
  id: 'Id',
  line: 'Line',
  maker: 'Maker',
  size: 'Size',
  sizeSystem: 'Size system',
  construction: 'Construction',
  innerCannula: 'Inner cannula',
  idWithInner: 'ID with inner cannula mm',
  idWithoutInner: 'ID of outer tube mm',
  od: 'OD mm',
  lengthMm: 'Length mm',
  cuff: 'Cuff',
  fenestrated: 'Fenestrated',
  connector: '15 mm connector',
  flange: 'Flange',
  longestUseDays: 'Longest use days',
  insertionAid: 'Insertion aid',
  reusableInnerCannulas: 'Reusable inner cannulas',
  fits: 'Inner cannulas that fit',
  use: 'Use',
  packSize: 'Pack size',
  gtin: 'GTIN',
  retired: 'Retired',
} as const

export type Column = keyof typeof headings
export const columns = Object.keys(headings) as readonly Column[]

/** An item as the cells of its line in a file; empty where a column does not concern it. */
export type Cells = Readonly<Record<Column, string>>

const empty = Object.fromEntries(columns.map(column => [column, ''])) as Cells
const words = (value: string | number | null): string => (value === null ? '' : String(value))
const yesOrNo = (value: boolean): string => (value ? 'yes' : 'no')

/** How a tube's line names an inner cannula that fits it: `8.0 disposable fenestrated x10`. */
export function fitWords(cannula: Pick<CatalogueInnerCannula, 'size' | 'use' | 'fenestrated' | 'packSize'>): string {
  return `${cannula.size} ${cannula.use}${cannula.fenestrated === 'yes' ? ' fenestrated' : ''} x${cannula.packSize}`
}

/** A tube, with the inner cannulas that fit it, as cells. */
export function tubeCells(tube: CatalogueTube, fitting: readonly CatalogueInnerCannula[]): Cells {
  const { id, line, maker, size, sizeSystem, construction, cuff, fenestrated, connector, flange } = tube
  return {
    ...empty,
    ...{ item: 'tube', id, line, maker, size, sizeSystem, construction, cuff, fenestrated, connector, flange },
    innerCannula: words(tube.innerCannula),
    idWithInner: words(tube.idWithInner),
    idWithoutInner: words(tube.idWithoutInner),
    od: words(tube.od),
    lengthMm: words(tube.lengthMm),
    longestUseDays: words(tube.longestUseDays),
    insertionAid: yesOrNo(tube.insertionAid),
    reusableInnerCannulas: words(tube.reusableInnerCannulas),
    fits: fitting.map(fitWords).sort().join('; '),
    gtin: words(tube.gtin),
    retired: yesOrNo(tube.retiredAt !== null),
  }
}

/** An inner cannula as cells. */
export function innerCannulaCells(cannula: CatalogueInnerCannula): Cells {
  const { id, line, maker, size, use, fenestrated, packSize, gtin, retiredAt } = cannula
  return {
    ...empty,
    ...{ item: 'inner cannula', id, line, maker, size, use, fenestrated },
    packSize: words(packSize),
    gtin: words(gtin),
    retired: yesOrNo(retiredAt !== null),
  }
}

/** One thing about an item that changes. */
export interface CellChange {
  readonly heading: string
  readonly was: string
  readonly now: string
}

/** What differs between an item's cells before and after. */
export function cellChanges(before: Cells, after: Cells): readonly CellChange[] {
  return columns
    .filter(column => before[column] !== after[column])
    .map(column => ({ heading: headings[column], was: before[column], now: after[column] }))
}

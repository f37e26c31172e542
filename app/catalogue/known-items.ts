import { type Cells, innerCannulaCells, tubeCells } from './columns.ts'
import type { CatalogueInnerCannula, CatalogueTube, TubeLine } from './item.ts'

/** The whole catalogue as it stands. */
export interface Catalogue {
  readonly lines: readonly TubeLine[]
  readonly tubes: readonly CatalogueTube[]
  readonly innerCannulas: readonly CatalogueInnerCannula[]
  readonly fits: readonly { readonly tubeId: string; readonly innerCannulaId: string }[]
}

/** Every item as cells, in the order of a file: line by line, inner cannulas before the tubes that name them. */
export function catalogueCells(catalogue: Catalogue): readonly Cells[] {
  const byId = new Map(catalogue.innerCannulas.map(cannula => [cannula.id, cannula]))
  const fitting = new Map<string, CatalogueInnerCannula[]>(catalogue.tubes.map(({ id }) => [id, []]))
  for (const { tubeId, innerCannulaId } of catalogue.fits) {
    const cannula = byId.get(innerCannulaId)
    if (cannula) fitting.get(tubeId)?.push(cannula)
  }
  const cells = [
    ...catalogue.innerCannulas.map(innerCannulaCells),
    ...catalogue.tubes.map(tube => tubeCells(tube, fitting.get(tube.id) ?? [])),
  ]
  return cells.toSorted((a, b) => compareWords(orderOf(a), orderOf(b)))
}

const orderOf = ({ line, item, sizeSystem, size, id }: Cells) =>
  [line, item, sizeSystem, size.padStart(12), id] as const

function compareWords(one: readonly string[], other: readonly string[]): number {
  const at = one.findIndex((word, i) => word !== other[i])
  if (at < 0) return 0
  return (one[at] ?? '') < (other[at] ?? '') ? -1 : 1
}

/** What an item is recognized by when neither id nor GTIN says which it is: no two items of a catalogue share it. */
export function descriptionOf(cells: Cells): string {
  const { item, line, size, sizeSystem, construction, innerCannula, cuff, fenestrated, connector, flange } = cells
  const ofTube = [sizeSystem, construction, innerCannula, cuff, fenestrated, connector, flange, cells.lengthMm]
  const told = item === 'tube' ? ofTube : [cells.use, fenestrated, cells.packSize]
  return [item, line, size, ...told].join('|').toLowerCase()
}

/** A catalogue as it is looked up: by id, by GTIN or by description, and lines by their name in lower case. */
export interface KnownItems {
  readonly byId: ReadonlyMap<string, Cells>
  readonly byGtin: ReadonlyMap<string, Cells>
  readonly byDescription: ReadonlyMap<string, Cells>
  readonly lines: ReadonlyMap<string, TubeLine>
}

/** A catalogue made ready to be looked up in. */
export function knownItems(catalogue: Catalogue): KnownItems {
  const all = catalogueCells(catalogue)
  return {
    byId: new Map(all.map(cells => [cells.id, cells])),
    byGtin: new Map(all.filter(({ gtin }) => gtin !== '').map(cells => [cells.gtin, cells])),
    byDescription: new Map(all.map(cells => [descriptionOf(cells), cells])),
    lines: new Map(catalogue.lines.map(line => [line.line.toLowerCase(), line])),
  }
}

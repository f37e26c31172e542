import type { Transaction } from 'sequelize'
import { type Cells, innerCannulaCells, tubeCells } from '#app/catalogue/columns.ts'
import type { CatalogueInnerCannula, CatalogueTube } from '#app/catalogue/item.ts'
import { innerCannulasWhere, tubesWhere } from './catalogue.server.ts'
import { select } from './sequelize.server.ts'

/** An item as it is stored, with its cells. */
export interface StoredItem {
  readonly stored: CatalogueTube | CatalogueInnerCannula
  readonly cells: Cells
}

/** Items by their ids, as one transaction sees them. */
export async function storedItems(
  ids: readonly string[],
  transaction: Transaction,
): Promise<ReadonlyMap<string, StoredItem>> {
  const tubes = await tubesWhere('i.id IN (:ids)', { ids }, undefined, transaction)
  const cannulas = await innerCannulasWhere('i.id IN (:ids)', { ids }, undefined, transaction)
  const fitting = await fittingOf(ids, transaction)
  return new Map<string, StoredItem>([
    ...tubes.map(tube => [tube.id, { stored: tube, cells: tubeCells(tube, fitting.get(tube.id) ?? []) }] as const),
    ...cannulas.map(cannula => [cannula.id, { stored: cannula, cells: innerCannulaCells(cannula) }] as const),
  ])
}

async function fittingOf(
  tubeIds: readonly string[],
  transaction: Transaction,
): Promise<ReadonlyMap<string, readonly CatalogueInnerCannula[]>> {
  const pairs = await select<{ tubeId: string; innerCannulaId: string }>(
    'SELECT tube_id AS tubeId, inner_cannula_id AS innerCannulaId FROM inner_cannula_fits WHERE tube_id IN (:tubeIds)',
    { tubeIds },
    transaction,
  )
  if (pairs.length === 0) return new Map()
  const ids = [...new Set(pairs.map(({ innerCannulaId }) => innerCannulaId))]
  const cannulas = await innerCannulasWhere('i.id IN (:ids)', { ids }, undefined, transaction)
  const byId = new Map(cannulas.map(cannula => [cannula.id, cannula]))
  const fitting = new Map<string, CatalogueInnerCannula[]>()
  for (const { tubeId, innerCannulaId } of pairs) {
    const cannula = byId.get(innerCannulaId)
    if (cannula) fitting.set(tubeId, [...(fitting.get(tubeId) ?? []), cannula])
  }
  return fitting
}

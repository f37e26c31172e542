import type { Transaction } from 'sequelize'
import type { CatalogueInnerCannula, CatalogueTube } from '#app/catalogue/item.ts'
import { InnerCannulaRow } from './models/inner-cannula.server.ts'
import { InnerCannulaFitRow } from './models/inner-cannula-fit.server.ts'
import { TubeRow } from './models/tube.server.ts'
import { change } from './sequelize.server.ts'

/** Writes tubes as they are to be: those that are known are changed, the others added. */
export async function writeTubes(
  tubes: readonly CatalogueTube[],
  known: ReadonlySet<string>,
  transaction: Transaction,
): Promise<void> {
  const rows = tubes.map(tube => ({ ...tube, fenestrated: tube.fenestrated === 'yes' }))
  await freeGtins('tubes', tubes, known, transaction)
  for (const row of rows) if (known.has(row.id)) await TubeRow.update(row, { where: { id: row.id }, transaction })
  await TubeRow.bulkCreate(
    rows.filter(({ id }) => !known.has(id)),
    { transaction },
  )
}

/** Writes inner cannulas as they are to be: those that are known are changed, the others added. */
export async function writeInnerCannulas(
  cannulas: readonly CatalogueInnerCannula[],
  known: ReadonlySet<string>,
  transaction: Transaction,
): Promise<void> {
  const rows = cannulas.map(cannula => ({
    ...cannula,
    usedAs: cannula.use,
    fenestrated: cannula.fenestrated === 'yes',
  }))
  await freeGtins('inner_cannulas', cannulas, known, transaction)
  for (const row of rows)
    if (known.has(row.id)) await InnerCannulaRow.update(row, { where: { id: row.id }, transaction })
  await InnerCannulaRow.bulkCreate(
    rows.filter(({ id }) => !known.has(id)),
    { transaction },
  )
}

/** Two items of one file may exchange their GTINs. */
async function freeGtins(
  table: 'tubes' | 'inner_cannulas',
  items: readonly { readonly id: string }[],
  known: ReadonlySet<string>,
  transaction: Transaction,
): Promise<void> {
  const ids = items.map(({ id }) => id).filter(id => known.has(id))
  if (ids.length > 0) await change(`UPDATE ${table} SET gtin = NULL WHERE id IN (:ids)`, { ids }, transaction)
}

/** Writes which inner cannulas fit each of these tubes, in place of what was written before. */
export async function writeFits(
  tubes: readonly { readonly id: string; readonly fitIds: readonly string[] }[],
  transaction: Transaction,
): Promise<void> {
  if (tubes.length === 0) return
  await change(
    'DELETE FROM inner_cannula_fits WHERE tube_id IN (:ids)',
    { ids: tubes.map(({ id }) => id) },
    transaction,
  )
  const rows = tubes.flatMap(({ id, fitIds }) => fitIds.map(innerCannulaId => ({ tubeId: id, innerCannulaId })))
  await InnerCannulaFitRow.bulkCreate(rows, { transaction })
}

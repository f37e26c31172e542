import type { Transaction } from 'sequelize'
import type { CatalogueInnerCannula, CatalogueTube, TubeLine } from '#app/catalogue/item.ts'
import type { Catalogue } from '#app/catalogue/known-items.ts'
import { type Replacements, select } from './sequelize.server.ts'

export type { CatalogueInnerCannula, CatalogueTube, TubeLine } from '#app/catalogue/item.ts'

const shared =
  'i.id, i.line_id AS lineId, l.name AS line, l.maker, i.size, i.gtin, i.retired_at AS retiredAt, i.version'

const tubeRows = `SELECT ${shared}, i.size_system AS sizeSystem, i.construction, i.inner_cannula AS innerCannula,
    CAST(i.id_with_inner AS DOUBLE) AS idWithInner, CAST(i.id_without_inner AS DOUBLE) AS idWithoutInner,
    CAST(i.od AS DOUBLE) AS od, CAST(i.length_mm AS DOUBLE) AS lengthMm, i.cuff, IF(i.fenestrated, 'yes', 'no') AS fenestrated,
    i.connector, i.flange, i.longest_use_days AS longestUseDays, i.insertion_aid AS insertionAid,
    i.reusable_inner_cannulas AS reusableInnerCannulas
  FROM tubes i JOIN tube_lines l ON l.id = i.line_id`

const innerCannulaRows = `SELECT ${shared}, i.used_as AS \`use\`, IF(i.fenestrated, 'yes', 'no') AS fenestrated, i.pack_size AS packSize
  FROM inner_cannulas i JOIN tube_lines l ON l.id = i.line_id`

/** Sizes are words: by length first, 6 comes before 10 and 7.5 before 10.0. */
const bySize = 'l.name, LENGTH(i.size), i.size'

/** Tubes by a condition on `i` (the tube) and `l` (its line). */
export async function tubesWhere(
  condition: string,
  replacements: Replacements = {},
  order = `${bySize}, i.cuff, i.id`,
  transaction: Transaction | null = null,
): Promise<readonly CatalogueTube[]> {
  const rows = await select<Omit<CatalogueTube, 'insertionAid'> & { insertionAid: number }>(
    `${tubeRows} WHERE ${condition} ORDER BY ${order}`,
    replacements,
    transaction,
  )
  return rows.map(row => ({ ...row, insertionAid: Boolean(row.insertionAid) }))
}

/** Inner cannulas by a condition on `i` (the cannula) and `l` (its line). */
export async function innerCannulasWhere(
  condition: string,
  replacements: Replacements = {},
  order = `${bySize}, i.fenestrated, i.used_as, i.id`,
  transaction: Transaction | null = null,
): Promise<readonly CatalogueInnerCannula[]> {
  return select<CatalogueInnerCannula>(
    `${innerCannulaRows} WHERE ${condition} ORDER BY ${order}`,
    replacements,
    transaction,
  )
}

/** A tube by its id, retired or not. */
export async function catalogueTube(id: string): Promise<CatalogueTube | undefined> {
  const [tube] = await tubesWhere('i.id = :id', { id })
  return tube
}

/** An inner cannula by its id, retired or not. */
export async function catalogueInnerCannula(id: string): Promise<CatalogueInnerCannula | undefined> {
  const [cannula] = await innerCannulasWhere('i.id = :id', { id })
  return cannula
}

/** The tube that carries this trade item number of 14 digits, retired or not. */
export async function tubeByGtin(gtin: string): Promise<CatalogueTube | undefined> {
  const [tube] = await tubesWhere('i.gtin = :gtin', { gtin })
  return tube
}

/** The inner cannula that carries this trade item number of 14 digits, retired or not. */
export async function innerCannulaByGtin(gtin: string): Promise<CatalogueInnerCannula | undefined> {
  const [cannula] = await innerCannulasWhere('i.gtin = :gtin', { gtin })
  return cannula
}

/** The inner cannulas that are made for a tube, retired ones too: one may still lie at a bed. */
export async function innerCannulasFitting(tubeId: string): Promise<readonly CatalogueInnerCannula[]> {
  return innerCannulasWhere('i.id IN (SELECT inner_cannula_id FROM inner_cannula_fits WHERE tube_id = :tubeId)', {
    tubeId,
  })
}

/** The tubes that an inner cannula is made for, retired ones too: one may still be in place. */
export async function tubesFitting(innerCannulaId: string): Promise<readonly CatalogueTube[]> {
  return tubesWhere('i.id IN (SELECT tube_id FROM inner_cannula_fits WHERE inner_cannula_id = :innerCannulaId)', {
    innerCannulaId,
  })
}

/** Every line by name. */
export async function tubeLines(): Promise<readonly TubeLine[]> {
  return select<TubeLine>('SELECT id, name AS line, maker FROM tube_lines ORDER BY name')
}

/** The whole catalogue, retired items too: what an export writes and an import is compared with. */
export async function wholeCatalogue(): Promise<Catalogue> {
  const [lines, tubes, innerCannulas, fits] = await Promise.all([
    tubeLines(),
    tubesWhere('TRUE'),
    innerCannulasWhere('TRUE'),
    select<Catalogue['fits'][number]>(
      'SELECT tube_id AS tubeId, inner_cannula_id AS innerCannulaId FROM inner_cannula_fits',
    ),
  ])
  return { lines, tubes, innerCannulas, fits }
}

import type { Transaction } from 'sequelize'
import { supplyWords, type UsedCannula, type UsedItem, type UsedTube } from '#app/care/supply.ts'
import { type Identify, identifyIn, type Listing, type StockItem } from '#app/catalogue/identify.ts'
import { innerCannulaName, tubeName } from '#app/catalogue/item.ts'
import { innerCannulasWhere, tubesWhere } from './catalogue.server.ts'
import { select } from './sequelize.server.ts'

export { type Identify, itemKey, type StockItem } from '#app/catalogue/identify.ts'

/** A name that is kept, or the tube or inner cannula of that id; undefined when there is neither. */
export async function itemOfKey(key: string): Promise<StockItem | undefined> {
  if (supplyWords(key) !== undefined) return { supply: key }
  const [found] = await select<{ what: 'tube' | 'inner cannula' }>(
    `SELECT 'tube' AS what FROM tubes WHERE id = :key UNION ALL SELECT 'inner cannula' FROM inner_cannulas WHERE id = :key`,
    { key },
  )
  if (!found) return undefined
  return found.what === 'tube' ? { tubeId: key } : { innerCannulaId: key }
}

/** What an item is called, and how many come in a box, where the catalogue knows. */
export interface ItemWords {
  readonly words: string
  readonly packSize: number | null
}

/** What items are called, by key, in two queries whatever their number. */
export async function wordsOfItems(keys: readonly string[]): Promise<ReadonlyMap<string, ItemWords>> {
  const named = keys.flatMap(key => {
    const words = supplyWords(key)
    return words === undefined ? [] : [[key, { words, packSize: null }] as const]
  })
  const ids = keys.filter(key => supplyWords(key) === undefined)
  if (ids.length === 0) return new Map<string, ItemWords>(named)
  const [tubes, cannulas] = await Promise.all([
    tubesWhere('i.id IN (:ids)', { ids }),
    innerCannulasWhere('i.id IN (:ids)', { ids }),
  ])
  return new Map<string, ItemWords>([
    ...named,
    ...tubes.map(tube => [tube.id, { words: tubeWords(tube), packSize: null }] as const),
    ...cannulas.map(one => [one.id, { words: cannulaWords(one), packSize: one.packSize }] as const),
  ])
}

/** `Tube Corvane Dual 8.0 ISO 5366, dual (disposable), air cuff, 78 mm`. */
export function tubeWords(tube: Parameters<typeof tubeName>[0]): string {
  return `Tube ${tubeName(tube)}`
}

/** `Inner cannula Corvane Dual 8.0, disposable, box of 10`. */
export function cannulaWords(cannula: Parameters<typeof innerCannulaName>[0]): string {
  return `Inner cannula ${innerCannulaName(cannula)}`
}

/**
 * Which items some used things are, in three queries whatever their number. A device is its catalogue reference, else the
 * one item of the catalogue that is printed so; where there is none, or several, it is not identified.
 */
export async function identified(items: readonly UsedItem[], transaction: Transaction | null): Promise<Identify> {
  const devices = items.flatMap(item => ('device' in item ? [item] : []))
  return identifyIn(
    devices.length === 0 ? { tubes: [], cannulas: [], fits: [] } : await listingOf(devices, transaction),
  )
}

async function listingOf(
  devices: readonly (UsedTube | UsedCannula)[],
  transaction: Transaction | null,
): Promise<Listing> {
  const all = devices.flatMap(one => (one.device === 'tube' ? [one] : [one, ...(one.ofTube ? [one.ofTube] : [])]))
  const ids = [...new Set(all.flatMap(({ id }) => (id === undefined ? [] : [id]))), NOBODY]
  const lines = [...new Set(all.map(({ line }) => line.trim()))]
  const where = '(i.id IN (:ids) OR (l.name IN (:lines) AND i.retired_at IS NULL))'
  const columns = "i.id, l.name AS line, i.size, IF(i.fenestrated, 'yes', 'no') AS fenestrated"
  const tubes = await select<Listing['tubes'][number]>(
    `SELECT ${columns}, i.cuff FROM tubes i JOIN tube_lines l ON l.id = i.line_id WHERE ${where}`,
    { ids, lines },
    transaction,
  )
  const tubeIds = [...tubes.map(({ id }) => id), NOBODY]
  const fits = await select<Listing['fits'][number]>(
    'SELECT tube_id AS tubeId, inner_cannula_id AS innerCannulaId FROM inner_cannula_fits WHERE tube_id IN (:tubeIds)',
    { tubeIds },
    transaction,
  )
  const cannulas = await select<Listing['cannulas'][number]>(
    `SELECT ${columns}, i.used_as AS \`use\` FROM inner_cannulas i JOIN tube_lines l ON l.id = i.line_id
     WHERE ${where} OR i.id IN (:fitting)`,
    { ids, lines, fitting: [...fits.map(({ innerCannulaId }) => innerCannulaId), NOBODY] },
    transaction,
  )
  return { tubes, cannulas, fits }
}

// Stands in a list of ids that may be empty, which SQL has no word for.
const NOBODY = '00000000-0000-0000-0000-000000000000'

import type { Transaction } from 'sequelize'
import { v7 as uuidv7 } from 'uuid'
import { asInnerCannula, asTube } from '#app/catalogue/as-item.ts'
import type { ItemValues } from '#app/catalogue/read-values.ts'
import { noteCatalogueChanges } from './catalogue-changes.server.ts'
import { writeFits, writeInnerCannulas, writeTubes } from './catalogue-rows.server.ts'
import { databaseNow } from './clock.server.ts'
import { isUniqueViolation } from './errors.server.ts'
import { TubeLineRow } from './models/tube-line.server.ts'
import { select, transact } from './sequelize.server.ts'
import { type StoredItem, storedItems } from './stored-items.server.ts'

/** An item as it is to be. The id was minted when its form was opened or its file was read: saving it twice adds one. */
export type ItemToSave = ItemValues & {
  readonly id: string
  /** Of the item that was looked at; null for one that was not there. */
  readonly version: number | null
  /** Inner cannulas that fit, for a tube. */
  readonly fitIds: readonly string[]
  readonly retired: boolean
}

export interface CatalogueSaving {
  readonly outcome: 'saved' | 'gtin taken' | 'described already' | 'other maker' | 'other line' | 'changed meanwhile'
}

/** Adds and changes items, all or none of them, and notes who changed what. A line that is new is added with its maker. */
export async function saveItems(items: readonly ItemToSave[], by: string): Promise<CatalogueSaving> {
  if (items.length === 0) return { outcome: 'saved' }
  try {
    return await transact(transaction => saved(items, by, transaction))
  } catch (error) {
    if (['tubes_gtin', 'inner_cannulas_gtin'].some(index => isUniqueViolation(error, index)))
      return { outcome: 'gtin taken' }
    if (['tubes_described', 'inner_cannulas_described'].some(index => isUniqueViolation(error, index)))
      return { outcome: 'described already' }
    throw error
  }
}

async function saved(items: readonly ItemToSave[], by: string, transaction: Transaction): Promise<CatalogueSaving> {
  const ids = items.map(({ id }) => id)
  const before = await storedItems(ids, transaction)
  if (items.some(({ id, version }) => version !== null && version !== before.get(id)?.stored.version))
    return { outcome: 'changed meanwhile' }
  if (items.some(({ id, values: { line } }) => isOther(before.get(id)?.stored.line, line)))
    return { outcome: 'other line' }
  if (await isGtinTaken(items, transaction)) return { outcome: 'gtin taken' }
  const lines = await linesOf(items, transaction)
  if (!lines) return { outcome: 'other maker' }
  const now = await databaseNow(transaction)
  const kept = (item: ItemToSave) => keptOf(item, before.get(item.id), lines, now)
  const known = new Set(before.keys())
  const cannulas = items.flatMap(item => (item.item === 'inner cannula' ? asInnerCannula(item.values, kept(item)) : []))
  const tubes = items.flatMap(item => (item.item === 'tube' ? asTube(item.values, kept(item)) : []))
  await writeInnerCannulas(cannulas, known, transaction)
  await writeTubes(tubes, known, transaction)
  await writeFits(
    items.filter(({ item }) => item === 'tube'),
    transaction,
  )
  const after = await storedItems(ids, transaction)
  const pairs = ids.flatMap(id => {
    const cells = after.get(id)?.cells
    return cells ? [{ before: before.get(id)?.cells ?? null, after: cells }] : []
  })
  await noteCatalogueChanges(pairs, by, transaction)
  return { outcome: 'saved' }
}

/** What fits an item is said within its line, so an item stays in it. */
const isOther = (known: string | undefined, line: string): boolean =>
  known !== undefined && known.toLowerCase() !== line.toLowerCase()

/** A GTIN names one thing that is sold, so a tube and an inner cannula never share one either. */
async function isGtinTaken(items: readonly ItemToSave[], transaction: Transaction): Promise<boolean> {
  const gtins = items.flatMap(({ values }) => values.gtin?.padStart(14, '0') ?? [])
  if (gtins.length === 0) return false
  const taken = await select(
    `SELECT id FROM tubes WHERE gtin IN (:gtins) AND id NOT IN (:ids)
     UNION ALL SELECT id FROM inner_cannulas WHERE gtin IN (:gtins) AND id NOT IN (:ids) LIMIT 1`,
    { gtins, ids: items.map(({ id }) => id) },
    transaction,
  )
  return taken.length > 0
}

/** Ids of the lines by their names in lower case, new lines added; undefined when one of them is another maker's. */
async function linesOf(items: readonly ItemToSave[], transaction: Transaction) {
  const wanted = new Map(items.map(({ values: { line, maker } }) => [line.toLowerCase(), { name: line, maker }]))
  const known = await select<{ id: string; name: string; maker: string }>(
    'SELECT id, name, maker FROM tube_lines WHERE name IN (:names) FOR UPDATE',
    { names: [...wanted.keys()] },
    transaction,
  )
  const lines = new Map(known.map(({ name, id, maker }) => [name.toLowerCase(), { id, maker }]))
  if (items.some(({ values: { line, maker } }) => (lines.get(line.toLowerCase())?.maker ?? maker) !== maker))
    return undefined
  const added = [...wanted.entries()].filter(([key]) => !lines.has(key)).map(([, line]) => ({ id: uuidv7(), ...line }))
  await TubeLineRow.bulkCreate(added, { transaction })
  return new Map([...lines, ...added.map(({ id, name, maker }) => [name.toLowerCase(), { id, maker }] as const)])
}

function keptOf(
  { id, retired, values }: ItemToSave,
  before: StoredItem | undefined,
  lines: ReadonlyMap<string, { readonly id: string }>,
  now: Date,
) {
  const lineId = lines.get(values.line.toLowerCase())?.id
  if (lineId === undefined) throw new Error(`The line ${values.line} was not written`)
  const { retiredAt = null, version = 0 } = before?.stored ?? {}
  return { id, lineId, retiredAt: retired ? (retiredAt ?? now) : null, version: version + 1 }
}

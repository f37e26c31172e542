import type { CreationAttributes, Transaction } from 'sequelize'
import { isUniqueViolation } from './errors.server.ts'
import { StockMoveRow } from './models/stock-move.server.ts'
import { select, transact } from './sequelize.server.ts'
import { itemKey, type StockItem } from './stock-items.server.ts'

/** A store of a ward (`bedId` null), or a bed of it. */
export type Place = { readonly wardId: string; readonly bedId: string | null }

interface Act {
  /** Minted when the form was opened: the same id twice is the same act. */
  readonly id: string
  readonly item: StockItem
  readonly at: Date
  readonly by: string
  readonly reason: string | null
}

/** Something that somebody did with the stock itself. Quantities are pieces, above 0; a count may find none. */
export type StockAct = Act &
  (
    | { readonly act: 'received'; readonly to: Place; readonly quantity: number }
    | { readonly act: 'moved'; readonly from: Place; readonly to: Place; readonly quantity: number }
    | { readonly act: 'wasted'; readonly from: Place; readonly quantity: number }
    | { readonly act: 'counted'; readonly in: Place; readonly counted: number }
  )

/** What became of it. `was`: what the moves added up to before a count. */
export type StockActed =
  | { readonly outcome: 'recorded' | 'already recorded'; readonly was?: number }
  | { readonly outcome: 'other body under this id' | 'no such place' }

/** Writes down what somebody did with the stock. Safe to repeat. Throws `DatabaseUnavailable`. */
export async function recordStockAct(act: StockAct): Promise<StockActed> {
  try {
    return await transact(transaction => recorded(act, transaction))
  } catch (error) {
    if (isUniqueViolation(error, 'PRIMARY')) return transact(transaction => known(act, transaction))
    throw error
  }
}

type Move = CreationAttributes<StockMoveRow>

async function recorded(act: StockAct, transaction: Transaction): Promise<StockActed> {
  if (await StockMoveRow.findOne({ where: { actId: act.id }, transaction })) return known(act, transaction)
  for (const place of placesOf(act)) if (!(await isPlace(place, transaction))) return { outcome: 'no such place' }
  if (act.act !== 'counted') {
    await StockMoveRow.bulkCreate(movesOf(act), { transaction })
    return { outcome: 'recorded' }
  }
  const was = await lockedStock(act.in, act.item, transaction)
  const counted = { ...spineOf(act, act.in), quantity: act.counted - was, counted: act.counted }
  await StockMoveRow.create({ ...counted, part: 0 }, { transaction })
  return { outcome: 'recorded', was }
}

function placesOf(act: StockAct): readonly Place[] {
  if (act.act === 'moved') return [act.from, act.to]
  if (act.act === 'counted') return [act.in]
  return [act.act === 'received' ? act.to : act.from]
}

function movesOf(act: Exclude<StockAct, { act: 'counted' }>): Move[] {
  const left = 'from' in act ? [{ ...spineOf(act, act.from), quantity: -act.quantity }] : []
  const came = 'to' in act ? [{ ...spineOf(act, act.to), quantity: act.quantity }] : []
  return [...left, ...came].map((move, part): Move => ({ ...move, part }))
}

function spineOf({ id, act, item, at, by, reason }: StockAct, { wardId, bedId }: Place) {
  return { actId: id, act, wardId, bedId, ...item, movedAt: at, recordedBy: by, reason }
}

async function isPlace({ wardId, bedId }: Place, transaction: Transaction): Promise<boolean> {
  const rows = await select(
    `SELECT 1 FROM wards w LEFT JOIN beds b ON b.ward_id = w.id AND b.id = :bedId
     WHERE w.id = :wardId AND (:bedId IS NULL OR b.id IS NOT NULL)`,
    { wardId, bedId },
    transaction,
  )
  return rows.length > 0
}

/** What lies there, with the ward's counter locked: of two counts at once the second has to see the first. */
async function lockedStock({ wardId, bedId }: Place, item: StockItem, transaction: Transaction): Promise<number> {
  await select('SELECT rev FROM ward_revs WHERE ward_id = :wardId FOR UPDATE', { wardId }, transaction)
  const [row] = await select<{ stock: number | null }>(
    `SELECT CAST(SUM(quantity) AS SIGNED) AS stock FROM stock_moves
     WHERE ward_id = :wardId AND item = :item AND bed_id <=> :bedId`,
    { wardId, bedId, item: itemKey(item) },
    transaction,
  )
  return row?.stock ?? 0
}

/** The same form again is the same act; under a used id with other answers nothing is changed. */
async function known(act: StockAct, transaction: Transaction): Promise<StockActed> {
  const rows = await StockMoveRow.findAll({ where: { actId: act.id }, order: ['part'], transaction })
  const asked =
    act.act === 'counted' ? [{ ...spineOf(act, act.in), counted: act.counted, quantity: null }] : movesOf(act)
  const isSame = rows.length === asked.length && rows.every((row, part) => isSameMove(row, asked[part]))
  return { outcome: isSame ? 'already recorded' : 'other body under this id' }
}

function isSameMove(row: StockMoveRow, asked: object | undefined): boolean {
  const values: Readonly<Record<string, unknown>> = row.get({ plain: true })
  return Object.entries(asked ?? { none: true }).every(([name, value]) => {
    if (name === 'quantity' && value === null) return true
    const stored = values[name]
    if (stored instanceof Date && value instanceof Date) return stored.getTime() === value.getTime()
    return (
      (typeof value === 'string' ? value.toLowerCase() : value) ===
      (typeof stored === 'string' ? stored.toLowerCase() : (stored ?? null))
    )
  })
}

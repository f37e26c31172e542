import type { CreationAttributes, Transaction } from 'sequelize'
import type { Used } from '#app/care/supply.ts'
import { StockMoveRow } from './models/stock-move.server.ts'
import { select } from './sequelize.server.ts'
import { identified, itemKey, type StockItem } from './stock-items.server.ts'

/** An act of care that takes something, or takes the place of one that did. */
export interface StockUse {
  /** The entry that is being charted. */
  readonly id: string
  readonly stayId: string
  readonly performedAt: Date
  readonly recordedBy: string
  /** Empty for a retraction. */
  readonly used: readonly Used[]
  /** The entry that no longer counts: what it took is given back. */
  readonly supersedes?: string | undefined
}

type Move = CreationAttributes<StockMoveRow>
type Place = { readonly wardId: string; readonly bedId: string | null }

/**
 * Takes what an act used from the stock, in the transaction of its entry: from what lies at the bed where the patient was, else
 * from the ward's store, which may go below nothing: a shelf that was not counted never stops care from being charted.
 */
export async function takeFromStock(use: StockUse, transaction: Transaction): Promise<void> {
  const back = use.supersedes === undefined ? [] : await givenBack(use, use.supersedes, transaction)
  if (back.length > 0) await StockMoveRow.bulkCreate(back, { transaction })
  const taken = use.used.length === 0 ? [] : await takenBy(use, transaction)
  if (taken.length > 0) await StockMoveRow.bulkCreate(numbered(taken, back.length), { transaction })
}

function numbered(moves: readonly Omit<Move, 'part'>[], from: number): Move[] {
  return moves.map((move, index): Move => ({ ...move, part: from + index }))
}

/** To the places where it came from, and at the time of the use, so that what was used in a while adds up without it. */
async function givenBack(use: StockUse, entryId: string, transaction: Transaction): Promise<Move[]> {
  const rows = await StockMoveRow.findAll({ where: { entryId, act: 'used' }, order: ['part'], transaction })
  const moves = rows.map(row => {
    const { wardId, bedId, supply, tubeId, innerCannulaId, stayId, movedAt } = row
    const what = { wardId, bedId, supply, tubeId, innerCannulaId, stayId, movedAt, entryId }
    return { ...what, actId: use.id, act: 'given back', quantity: -row.quantity, recordedBy: use.recordedBy }
  })
  return numbered(moves, 0)
}

async function takenBy(use: StockUse, transaction: Transaction) {
  const itemOf = await identified(
    use.used.map(({ item }) => item),
    transaction,
  )
  const wanted = added(use.used.map(({ item, quantity }) => ({ item: itemOf(item), quantity })))
  const { place, atBed } = await bedOf(use, wanted, transaction)
  return wanted.flatMap(({ item, quantity }) => {
    const fromBed = Math.min(quantity, Math.max(0, atBed.get(itemKey(item)) ?? 0))
    return [
      ...(fromBed > 0 ? [taking(use, place, item, fromBed)] : []),
      ...(fromBed < quantity ? [taking(use, { ...place, bedId: null }, item, quantity - fromBed)] : []),
    ]
  })
}

function taking(use: StockUse, place: Place, item: StockItem, quantity: number) {
  const { id: actId, stayId, performedAt: movedAt, recordedBy } = use
  const whose = { entryId: actId, stayId, movedAt, recordedBy }
  return { actId, act: 'used', ...place, ...item, quantity: -quantity, ...whose }
}

type Wanted = { readonly item: StockItem; readonly quantity: number }

/** The same item twice is one row of the sum. */
function added(wanted: readonly Wanted[]): readonly Wanted[] {
  const sums = new Map<string, Wanted>()
  for (const { item, quantity } of wanted) {
    const known = sums.get(itemKey(item))
    sums.set(itemKey(item), { item, quantity: quantity + (known?.quantity ?? 0) })
  }
  return [...sums.values()]
}

/** Where the patient was when the care was done, since what is charted late was taken there; and what lay at that bed of each item. */
async function bedOf({ stayId, performedAt }: StockUse, wanted: readonly Wanted[], transaction: Transaction) {
  const rows = await select<Place & { item: string | null; stock: number | null }>(
    `SELECT place.ward_id AS wardId, place.bed_id AS bedId, m.item, CAST(SUM(m.quantity) AS SIGNED) AS stock FROM (
       SELECT ward_id, bed_id FROM (
         SELECT ward_id, bed_id, moved_at, recorded_at, 1 AS known FROM bed_moves WHERE stay_id = :stayId AND moved_at <= :performedAt
         UNION ALL SELECT ward_id, bed_id, admitted_at, admitted_at, 0 FROM stays WHERE id = :stayId
       ) places ORDER BY known DESC, moved_at DESC, recorded_at DESC LIMIT 1
     ) place LEFT JOIN stock_moves m ON m.bed_id = place.bed_id AND m.item IN (:items)
     GROUP BY place.ward_id, place.bed_id, m.item`,
    { stayId, performedAt, items: wanted.map(({ item }) => itemKey(item)) },
    transaction,
  )
  const [first] = rows
  if (!first) throw new Error('An entry was charted in a stay that is not there')
  const atBed = new Map(rows.flatMap(({ item, stock }) => (item === null ? [] : [[item, stock ?? 0] as const])))
  return { place: { wardId: first.wardId, bedId: first.bedId }, atBed }
}

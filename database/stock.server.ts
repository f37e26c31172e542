import { select } from './sequelize.server.ts'

/** What lies at a place by its moves; `bedId` null: in the ward's store. Below nothing: more was charted than was there. */
export type Stock = { readonly item: string; readonly bedId: string | null; readonly stock: number }

/** The stock of a ward, item by item and place by place, as the sum of its moves. */
export async function stockOfWard(wardId: string): Promise<readonly Stock[]> {
  return select<Stock>(
    `SELECT item, bed_id AS bedId, CAST(SUM(quantity) AS SIGNED) AS stock FROM stock_moves
     WHERE ward_id = :wardId GROUP BY item, bed_id`,
    { wardId },
  )
}

/** What lies at one bed, item by item. */
export async function stockOfBed(bedId: string): Promise<readonly Stock[]> {
  return select<Stock>(
    `SELECT item, bed_id AS bedId, CAST(SUM(quantity) AS SIGNED) AS stock FROM stock_moves
     WHERE bed_id = :bedId GROUP BY item, bed_id`,
    { bedId },
  )
}

/** How many of an item one stay used from a moment on, what was given back left out. `day`: how many whole days before `until`. */
export type StayUse = { readonly stayId: string; readonly item: string; readonly day: number; readonly used: number }

/**
 * What stays used within so many days before a moment, day by day: 24 elapsed hours each, the last one is day 0. One query
 * whatever the number of stays.
 */
export async function usedByStays(stayIds: readonly string[], until: Date, days: number): Promise<readonly StayUse[]> {
  if (stayIds.length === 0) return []
  return select<StayUse>(
    `SELECT stay_id AS stayId, item, TIMESTAMPDIFF(DAY, moved_at, :until) AS day, -CAST(SUM(quantity) AS SIGNED) AS used
     FROM stock_moves WHERE stay_id IN (:stayIds) AND moved_at > :until - INTERVAL :days DAY
     GROUP BY stay_id, item, day HAVING used <> 0`,
    { stayIds, until, days },
  )
}

/** What lies in the store of a ward of some items. */
export async function stockOfStore(wardId: string, items: readonly string[]): Promise<ReadonlyMap<string, number>> {
  if (items.length === 0) return new Map()
  const rows = await select<Stock>(
    `SELECT item, CAST(SUM(quantity) AS SIGNED) AS stock FROM stock_moves
     WHERE ward_id = :wardId AND bed_id IS NULL AND item IN (:items) GROUP BY item`,
    { wardId, items },
  )
  return new Map(rows.map(({ item, stock }) => [item, stock]))
}

/** When a ward's stock was first kept: the time of the move that was recorded first; undefined before that. */
export async function stockKeptSince(wardId: string): Promise<Date | undefined> {
  const [row] = await select<{ at: Date }>(
    'SELECT moved_at AS at FROM stock_moves WHERE ward_id = :wardId ORDER BY recorded_at, act_id, part LIMIT 1',
    { wardId },
  )
  return row?.at
}

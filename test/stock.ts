import { QueryTypes } from 'sequelize'
import { v7 as uuidv7 } from 'uuid'
import type { DataOf } from '#app/care/kind.ts'
import { suction } from '#app/care/suction/kind.ts'
import type { Author } from '#database/entries.server.ts'
import { stockOfWard } from '#database/stock.server.ts'
import { recordStockAct } from '#database/stock-acts.server.ts'
import { itemKey, type StockItem } from '#database/stock-items.server.ts'
import { owner } from './database.ts'
import { on } from './stays.ts'

const [episode] = suction.examples.filter(({ route }) => route === 'tube open')
if (!episode) throw new Error('No example of suction through the open tube')

/** An episode of suction through the open tube, with a catheter of this size. */
export const suctionWith = (catheter: '12 Fr' | '14 Fr'): DataOf<typeof suction> => ({ ...episode, catheter })

/** A look at the need for suction, which takes nothing. */
export const noSuction: DataOf<typeof suction> = { act: 'need only' }

export const catheter12: StockItem = { supply: 'catheter-12-fr' }

/** Suction on 2 November at 10:00, not charted yet. */
export function aSuction(stayId: string, by: Author, data: DataOf<typeof suction> = suctionWith('12 Fr')) {
  return { id: uuidv7(), kind: suction, stayId, performedAt: on('02', '10:00'), recordedBy: by, data }
}

/** A box that came to a place on 1 November at 09:00. */
export function received(
  to: { wardId: string; bedId: string | null },
  quantity: number,
  by: string,
  item = catheter12,
) {
  return recordStockAct({ id: uuidv7(), act: 'received', item, to, quantity, by, at: on('01', '09:00'), reason: null })
}

/** What lies where: `store catheter-12-fr 9`, `1 catheter-12-fr 2`, by the labels of the beds; nothing left is left out. */
export async function stockWords(wardId: string): Promise<readonly string[]> {
  const beds = await owner.query<{ id: string; label: string }>('SELECT id, label FROM beds', {
    type: QueryTypes.SELECT,
  })
  const labels = new Map(beds.map(({ id, label }) => [id, label]))
  return (await stockOfWard(wardId))
    .filter(({ stock }) => stock !== 0)
    .map(({ item, bedId, stock }) => `${bedId === null ? 'store' : labels.get(bedId)} ${item} ${stock}`)
    .toSorted()
}

/** The key under which an item is added up. */
export const keyOf = itemKey

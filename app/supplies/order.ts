import { csvText } from '../catalogue/csv-text.ts'
import type { ItemRow } from './ward-stock.ts'

/** The items that have to be ordered, the most pressing first. */
export function orderList(items: readonly ItemRow[]): readonly ItemRow[] {
  return items.filter(({ order }) => order > 0)
}

const COLUMNS = ['Item', 'Pieces to order', 'Boxes', 'Pieces in a box', 'Stock', 'Use a day', 'Need over the horizon']

/** The order list as rows of cells, its headings first. */
function orderTable(items: readonly ItemRow[]): readonly (readonly (string | number)[])[] {
  const rows = orderList(items).map(({ words, order, boxes, packSize, stock, perDay, need }) => {
    return [words, order, boxes ?? '', packSize ?? '', stock, Number(perDay), need]
  })
  return [COLUMNS, ...rows]
}

/** The order list as a CSV file. */
export function orderCsv(items: readonly ItemRow[]): string {
  return csvText(orderTable(items))
}

import type { ItemRow } from './ward-stock.ts'

/** The items that have to be ordered, the most pressing first. */
export function orderList(items: readonly ItemRow[]): readonly ItemRow[] {
  return items.filter(({ order }) => order > 0)
}

const COLUMNS = ['Item', 'Pieces to order', 'Boxes', 'Pieces in a box', 'Stock', 'Use a day', 'Need over the horizon']

/** The order list as rows of cells, its headings first. */
export function orderTable(items: readonly ItemRow[]): readonly (readonly string[])[] {
  const rows = orderList(items).map(({ words, order, boxes, packSize, stock, perDay, need }) => {
    return [words, order, boxes ?? '', packSize ?? '', stock, perDay, need].map(String)
  })
  return [COLUMNS, ...rows]
}

// Programs of tables take a cell that begins so for a formula and run it; a number may begin with its sign.
const FORMULA = /^[=+\-@\t\r]/

/** The order list as a CSV file: marked as UTF-8, lines ended by CR LF, every cell that is no number in quotes. */
export function orderCsv(items: readonly ItemRow[]): string {
  const cell = (text: string) => {
    if (/^-?\d+(\.\d+)?$/.test(text)) return text
    return `"${(FORMULA.test(text) ? `'${text}` : text).replaceAll('"', '""')}"`
  }
  return `\ufeff${orderTable(items)
    .map(cells => `${cells.map(cell).join(',')}\r\n`)
    .join('')}`
}

import { expect, test } from 'vitest'
import { readCsvText } from '../catalogue/csv-text.ts'
import { orderCsv, orderList } from './order.ts'
import { type ItemFacts, itemRows } from './ward-stock.ts'

const rule = { wastage: 20, leadDays: 3, safetyDays: 7, horizonDays: 28 }
const rate = { perDay: 2, counted: 1, planned: 0, fewestDays: 14 }
const rowsOf = (...all: readonly Partial<ItemFacts>[]) =>
  itemRows(
    all.map(one => ({
      ...{ item: 'gel', words: 'Gel', packSize: null, store: 0, atBeds: 0, anyBelow: false, rate },
      ...one,
    })),
    rule,
  )

const headings = 'Item,Pieces to order,Boxes,Pieces in a box,Stock,Use a day,Need over the horizon'

test('only what has to be ordered is on the list, the most pressing first', () => {
  const rows = rowsOf({ item: 'a' }, { item: 'b', store: 90 }, { item: 'c', store: -1 })
  expect(orderList(rows).map(({ item }) => item)).toEqual(['c', 'a'])
})

test('the file has a line for each item, with a stock below nothing as the number that it is', () => {
  const file = orderCsv(rowsOf({ words: 'Inner cannula Corvane Dual 8.0, disposable', packSize: 10, store: -4 }))
  expect(file).toBe(`\uFEFF${headings}\r\n"Inner cannula Corvane Dual 8.0, disposable",72,8,10,-4,2,68\r\n`)
})

test('nothing to order is a file of headings', () => {
  expect(orderCsv(rowsOf({ store: 90 }))).toBe(`\uFEFF${headings}\r\n`)
})

test('a name that a table program would run is only a name', () => {
  const words = '=HYPERLINK("http://x.example")'
  const file = orderCsv(rowsOf({ words }))
  expect(file).toContain(`"'=HYPERLINK(""http://x.example"")"`)
  const read = readCsvText(file)
  expect('rows' in read && read.rows[1]?.cells[0]).toBe(words)
})

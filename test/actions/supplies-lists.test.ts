import { beforeEach, expect, test } from 'vitest'
import { suction } from '#app/care/suction/kind.ts'
import { readCsvText } from '#app/catalogue/csv-text.ts'
import { addEntry } from '#database/entries.server.ts'
import { aCatalogueTube, someTube } from '#test/catalogue.ts'
import { aCharting, daysAgo } from '#test/charting.ts'
import { cleared } from '#test/database.ts'
import { aSuction, suctionWith } from '#test/stock.ts'
import { aStockForm, type StockForm, suppliesPages } from '#test/supplies.ts'

let given: Awaited<ReturnType<typeof aCharting>>

beforeEach(async () => {
  await cleared()
  given = await aCharting()
})

const send = (act: string, changes: StockForm = {}) =>
  suppliesPages.send(given.nurse, given.ward.id, act, aStockForm(given.nurse, changes))

async function orderRows() {
  const { type, text = '' } = await suppliesPages.order(given.nurse, given.ward.id)
  expect(type).toBe('text/csv; charset=utf-8')
  const read = readCsvText(text)
  return 'rows' in read ? read.rows.map(({ cells }) => cells) : []
}

test('what is below nothing is on the order list as a number, and a name is only a name', async () => {
  const tubeId = await aCatalogueTube(given.nurse.id, someTube({ line: '=cmd', size: '8.0' }))
  await send('waste', { item: tubeId, quantity: '2' })
  const rows = await orderRows()
  expect(rows.slice(1).find(([item]) => item?.includes('=cmd'))).toEqual([
    ...['Tube =cmd 8.0 ISO 5366, air cuff, 80 mm', '2', '', '', '-2', '0', '0'],
  ])
})

test('the history says who did what, and pages by item', async () => {
  await send('receive', { quantity: '10' })
  await send('receive', { item: 'exchanger', quantity: '1' })
  await send('count', { quantity: '8' })
  const entry = { ...aSuction(given.stayId, given.nurse, suctionWith('12 Fr')), performedAt: daysAgo(1) }
  await addEntry({ ...entry, kind: suction })
  const { moves = [], of } = await suppliesPages.history(given.nurse, given.ward.id, '?item=catheter-12-fr')
  expect(of).toBe('Suction catheter 12 Fr')
  expect(moves.map(({ what, pieces, place, by }) => [what, pieces, place, by])).toEqual([
    ['Used', '-1', 'Store', given.nurse.name],
    ['Counted', '-2, 8 there', 'Store', given.nurse.name],
    ['Received', '+10', 'Store', given.nurse.name],
  ])
  expect(moves[0]?.href).toBe(`/entries/${entry.id}`)
})

test.each(['?item=toString', '?item=%00', '?before=x', '?before=2026-13-45T00:00:00.000Z_x_1'])(
  'a history asked for with %s is the whole one',
  async search => {
    await send('receive')
    const { moves = [] } = await suppliesPages.history(given.nurse, given.ward.id, search)
    expect(moves.length).toBeGreaterThan(0)
  },
)

test('a form offers what lies on the ward, and finds the rest in the catalogue', async () => {
  const tubeId = await aCatalogueTube(given.nurse.id)
  const found = await suppliesPages.open(given.nurse, given.ward.id, 'receive', '?find=ferrin')
  expect(found.choices).toMatchObject({ found: 1, items: { [tubeId]: 'Tube Ferrin 8.0 ISO 5366, air cuff, 80 mm' } })
  const none = await suppliesPages.open(given.nurse, given.ward.id, 'receive', '?find=nothing+such')
  expect(none.choices?.found).toBe(0)
  const named = await suppliesPages.open(given.nurse, given.ward.id, 'move', `?item=${tubeId}`)
  expect(named.choices?.items).toHaveProperty(tubeId)
  const plain = await suppliesPages.open(given.nurse, given.ward.id, 'receive', '?item=exchanger&find=')
  expect(plain.choices?.items).not.toHaveProperty(tubeId)
  expect([plain.form?.item, plain.choices?.found]).toEqual(['exchanger', null])
  expect((await suppliesPages.open(given.nurse, given.ward.id, 'receive', '?item=x%27')).form?.item).toBe('')
})

test('an address names the places of a move, where the ward has them', async () => {
  const bed = given.ward.bedIds[0] ?? ''
  const { form } = await suppliesPages.open(given.nurse, given.ward.id, 'move', `?from=store&to=${bed}`)
  expect(form).toMatchObject({ from: 'store', to: bed })
  const { form: other } = await suppliesPages.open(given.nurse, given.ward.id, 'move', '?from=toString&to=x%00')
  expect(other).toMatchObject({ from: '', to: '' })
})

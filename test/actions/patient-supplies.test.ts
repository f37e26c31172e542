import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { replacedWithNew } from '#app/care/inner-cannula/examples.ts'
import { innerCannula } from '#app/care/inner-cannula/kind.ts'
import { patientCare } from '#app/views/patient-context.server.ts'
import { suppliesAtBed } from '#app/views/patient-supplies.server.ts'
import { saveItems } from '#database/catalogue-writes.server.ts'
import { addEntry } from '#database/entries.server.ts'
import { discharge, move } from '#database/stay-changes.server.ts'
import { recordStockAct } from '#database/stock-acts.server.ts'
import { aCannulaToSave, aTubeToSave, someDualTube, someInnerCannula } from '#test/catalogue.ts'
import { aCharting, daysAgo } from '#test/charting.ts'
import { cleared } from '#test/database.ts'

let given: Awaited<ReturnType<typeof aCharting>>
let cannula: string

// The tube in place is an Alder 8.0; its inner cannula is the one of the catalogue that is printed so.
beforeEach(async () => {
  await cleared()
  given = await aCharting()
  const saved = aCannulaToSave(someInnerCannula({ line: 'Alder' }))
  await saveItems([saved, aTubeToSave(someDualTube({ line: 'Alder' }), { fitIds: [saved.id] })], given.nurse.id)
  cannula = saved.id
})

const bedId = () => given.ward.bedIds[0] ?? ''

function receive(quantity: number, bed: string | null, ago = 20) {
  const to = { wardId: given.ward.id, bedId: bed }
  const item = { innerCannulaId: cannula }
  return recordStockAct({
    ...{ id: uuidv7(), act: 'received', item, to, quantity, by: given.nurse.id, at: daysAgo(ago), reason: null },
  })
}

async function fitted(ago: number) {
  const { stayId, nurse } = given
  const act = { id: uuidv7(), kind: innerCannula, stayId, performedAt: daysAgo(ago), recordedBy: nurse }
  await addEntry({ ...act, data: { ...replacedWithNew, line: 'Alder', item: cannula } })
}

const atBed = async () => suppliesAtBed(await patientCare(given.stayId, new Date()), new Date())
const ofCannula = async () => (await atBed())?.items.find(({ item }) => item === cannula)

test('what the tube in place needs is shown though none lies there, with the store beside it', async () => {
  await receive(30, null)
  expect(await ofCannula()).toMatchObject({ stock: 0, store: 30, lasts: 'not used now', notice: null })
  for (let ago = 0.5; ago < 14; ago += 0.9) await fitted(ago)
  expect(await ofCannula()).toMatchObject({
    ...{
      words: 'Inner cannula Alder 8.0, disposable, box of 10',
      stock: 0,
      store: 15,
      use: '1.1 a day, 14 days of data',
    },
    ...{ lasts: 'nothing left', isLow: true, notice: 'Less than a day: bring some from the store.' },
  })
})

test('days left follow what was used, day by day', async () => {
  await receive(30, bedId())
  for (const ago of [0.5, 1.5, 2.5, 3.5]) await fitted(ago)
  expect(await ofCannula()).toMatchObject({ stock: 26, store: 0, use: '0.3 a day, 14 days of data', notice: null })
})

test('a bed below nothing is shown as that', async () => {
  const wasted = { id: uuidv7(), act: 'wasted', item: { innerCannulaId: cannula }, quantity: 3 } as const
  const from = { wardId: given.ward.id, bedId: bedId() }
  await recordStockAct({ ...wasted, from, by: given.nurse.id, at: daysAgo(1), reason: 'Pack torn' })
  expect(await ofCannula()).toMatchObject({ stock: -3, notice: expect.stringMatching(/^Below nothing/) })
})

test('it is the bed where the patient is now, and nothing once they have left', async () => {
  await receive(9, bedId())
  const to = { id: uuidv7(), stayId: given.stayId, wardId: given.ward.id, bedId: given.ward.bedIds[1] ?? '' }
  await move({ ...to, movedAt: daysAgo(1) }, given.nurse.id)
  expect(await atBed()).toMatchObject({
    bed: '2',
    items: expect.arrayContaining([expect.objectContaining({ stock: 0 })]),
  })
  const end = { stayId: given.stayId, dischargedAt: new Date(), reason: 'home', note: null, careAfter: true }
  await discharge(end, given.nurse.id)
  expect(await atBed()).toBeNull()
})

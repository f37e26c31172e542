import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { innerCannula } from '#app/care/inner-cannula/kind.ts'
import { recallOf } from '#app/care/recall.ts'
import { typedFrom } from '#app/charting/chart-form.ts'
import { action as naming, loader as open } from '#app/routes/catalogue-line.tsx'
import { catalogueHistory } from '#app/views/catalogue-item.server.ts'
import { catalogueInnerCannula } from '#database/catalogue.server.ts'
import { saveItems } from '#database/catalogue-writes.server.ts'
import { addEntry } from '#database/entries.server.ts'
import { decideLot, recalls } from '#database/lot-recalls.server.ts'
import { aCannulaToSave, aTubeToSave, someInnerCannula, someTube } from '#test/catalogue.ts'
import { aCharting, daysAgo } from '#test/charting.ts'
import { cleared } from '#test/database.ts'
import { aCorrectionForm, entryPages } from '#test/entries.ts'
import { answerOf, aPerson, contextOf, formRequest } from '#test/people.ts'

let specialist: CurrentUser
let cannulaId: string
let lineId: string

beforeEach(async () => {
  await cleared()
  specialist = await aPerson({ name: 'Elsa Solberg', role: 'tracheostomy specialist' })
  const cannula = aCannulaToSave(someInnerCannula({ line: 'Ferin' }))
  await saveItems(
    [cannula, aTubeToSave(someTube({ line: 'Ferin' })), aTubeToSave(someTube({ line: 'Tarn' }))],
    specialist.id,
  )
  cannulaId = cannula.id
  lineId = (await catalogueInnerCannula(cannulaId))?.lineId ?? ''
})

const opened = { wasLine: 'Ferin', wasMaker: 'Oskerry' }
const named = (fields: Record<string, string>, user = specialist) => {
  const request = formRequest(`/catalogue/lines/${lineId}`, { line: 'Ferrin', maker: 'Oskerry', ...opened, ...fields })
  return answerOf(() => naming({ request, context: contextOf(user), params: { lineId } } as never))
}
const seen = async () =>
  (await open({ context: contextOf(specialist), params: { lineId } } as never)) as never as {
    readonly line: Readonly<Record<string, unknown>>
  }

test('a line is named anew for all of its items, and its history and theirs say who did', async () => {
  await named({ maker: 'Oskerry Ltd' })
  expect((await seen()).line).toMatchObject({
    line: 'Ferrin',
    maker: 'Oskerry Ltd',
    formerNames: ['Ferin'],
    tubes: 1,
    innerCannulas: 1,
  })
  expect(await catalogueInnerCannula(cannulaId)).toMatchObject({ line: 'Ferrin', maker: 'Oskerry Ltd', version: 1 })
  const what = 'Line changed. Line: Ferin, now Ferrin. Maker: Oskerry, now Oskerry Ltd'
  expect(await catalogueHistory(lineId)).toMatchObject([{ who: 'Elsa Solberg', what }])
  expect((await catalogueHistory(cannulaId, lineId)).map(change => change.what)).toEqual([what, 'Inner cannula added'])
})

test('sent twice, or as it was, it is noted once at most', async () => {
  await named({ line: 'Ferin' })
  expect(await catalogueHistory(lineId)).toEqual([])
  await named({})
  expect(await named({})).toMatchObject({ status: 409 })
  expect(await catalogueHistory(lineId)).toHaveLength(1)
})

test.each([
  ['the name of another line', { line: 'tarn' }, { line: ['Another line of the catalogue has this name'] }],
  ['no name', { line: ' ' }, { line: [expect.stringContaining('Enter')] }],
  ['a name that is too long', { line: 'x'.repeat(200) }, { line: [expect.stringContaining('at most')] }],
  ['no maker', { maker: '' }, { maker: ['Enter the maker'] }],
])('%s is refused at its field, and what was typed stays', async (_, fields, error) => {
  const { status, says } = await named(fields)
  expect(status).toBe(400)
  const kept = Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== ''))
  expect(says).toMatchObject({ reply: { error, initialValue: kept } })
  expect((await seen()).line).toMatchObject({ line: 'Ferin', formerNames: [] })
})

test.each(['nurse', 'charge nurse', 'educator', 'observer'] as const)('a %s names no line', async role => {
  expect(await named({}, await aPerson({ name: 'Some Body', role }))).toMatchObject({ status: 403 })
})

test('a recall finds a device under every name of its line, and is lifted under any', async () => {
  const decision = { lot: '7B', reason: 'Leaks', decidedBy: specialist.id }
  await decideLot({ ...decision, id: uuidv7(), line: 'Ferin', isRecalled: true })
  await named({})
  for (const line of ['Ferin', 'Ferrin']) expect(recallOf({ lot: '7B', line }, await recalls())).toBeDefined()
  expect(recallOf({ lot: '7B', line: 'Tarn' }, await recalls())).toBeUndefined()
  await decideLot({ ...decision, id: uuidv7(), line: 'Ferrin', isRecalled: false })
  expect(await recalls()).toEqual([])
})

test('what was charted and scanned under the old name can still be corrected', async () => {
  const { stayId, nurse } = await aCharting()
  const id = uuidv7()
  const [example] = innerCannula.examples
  if (!example) throw new Error('There is no example')
  const data = { ...example, line: 'Ferin', size: '8.0', item: cannulaId, lot: '7B' }
  await addEntry({ id, kind: innerCannula, stayId, performedAt: daysAgo(1), recordedBy: nurse, data })
  await named({})
  const spine = aCorrectionForm(nurse).filter(([name]) => !name.startsWith('care.'))
  const care = Object.entries(typedFrom({ ...data, lot: '7C' })).flatMap(([name, values]) =>
    values.map(value => [name, value] as const),
  )
  expect(await entryPages.correct(nurse, id, [...spine, ...care])).toMatchObject({ status: 302 })
})

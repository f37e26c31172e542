import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { aTube } from '#app/care/make.ts'
import { tubeChange } from '#app/care/tube-change/kind.ts'
import { action as decide, loader as trace } from '#app/routes/lots.tsx'
import { loader as download } from '#app/routes/lots-export.ts'
import { addEntry, retractEntry } from '#database/entries.server.ts'
import { recalls } from '#database/lot-recalls.server.ts'
import { usesOfLot } from '#database/lots.server.ts'
import { storedEntries } from '#database/stored-entries.server.ts'
import { aCharting, daysAgo } from '#test/charting.ts'
import { cleared } from '#test/database.ts'
import { answerOf, aPerson, aWard, contextOf, formRequest, site } from '#test/people.ts'

let given: Awaited<ReturnType<typeof aCharting>>
let specialist: CurrentUser

beforeEach(async () => {
  await cleared()
  given = await aCharting()
  specialist = await aPerson({ name: 'Mads Larsen', role: 'tracheostomy specialist', wardIds: [given.ward.id] })
})

/** Charts a tube of that lot on some day, and returns the entry. */
async function chartedLot(lot: string, ago = 5): Promise<string> {
  const id = uuidv7()
  const { stayId, nurse } = given
  await addEntry({
    id,
    kind: tubeChange,
    stayId,
    performedAt: daysAgo(ago),
    recordedBy: nurse,
    data: aTube({ lot, expiresOn: '2049-12-31' }),
  })
  return id
}

async function retracted(id: string): Promise<void> {
  const [entry] = await storedEntries('WHERE e.id = :id', { id })
  if (!entry) throw new Error('There is no such entry')
  await retractEntry({ id: uuidv7(), reason: 'Wrong patient', recordedBy: given.nurse }, entry)
}

const argsOf = (request: Request, user: CurrentUser) => ({
  request,
  params: {},
  url: new URL(request.url),
  context: contextOf(user),
})
const asked = (lot: string, user: CurrentUser = specialist) => {
  const request = new Request(`${site}/lots?${new URLSearchParams({ lot })}`)
  return trace({ ...argsOf(request, user), pattern: '/lots' })
}
const sent = (fields: Record<string, string>, user: CurrentUser = specialist) => {
  const request = formRequest('/lots', { id: uuidv7(), line: '', decision: 'recall', reason: 'Leaks', ...fields })
  return answerOf(() => decide({ ...argsOf(request, user), pattern: '/lots' }))
}
async function exported(lot: string): Promise<string> {
  const request = new Request(`${site}/lots/export?${new URLSearchParams({ lot })}`)
  const file = await download({ ...argsOf(request, specialist), pattern: '/lots/export' })
  return file.text()
}

test('a lot finds who had it, latest first, and a retracted entry not at all', async () => {
  const first = await chartedLot('7B', 6)
  const second = await chartedLot('7B', 4)
  await chartedLot('7BX', 3)
  expect((await usesOfLot('7B')).map(({ entryId }) => entryId)).toEqual([second, first])
  await retracted(second)
  expect((await usesOfLot('7B')).map(({ entryId }) => entryId)).toEqual([first])
})

test('patients of other wards are counted and not named', async () => {
  await chartedLot('7B')
  const elsewhere = await aPerson({ name: 'Jo Brand', wardIds: [await aWard('Ward 8')] })
  const { trace: seen } = await asked('7B', elsewhere)
  expect(seen).toMatchObject({ uses: [], elsewhere: [{ patients: 1 }] })
  expect(JSON.stringify(seen)).not.toMatch(/okafor/i)
})

test('a recall is in force until it is lifted, and the same form sent twice is one decision', async () => {
  const id = uuidv7()
  expect(await sent({ lot: '7B', id })).toMatchObject({ status: 302, location: '/lots?lot=7B' })
  await sent({ lot: '7B', id })
  expect(await recalls()).toMatchObject([{ lot: '7B', line: null, reason: 'Leaks', recalledByName: 'Mads Larsen' }])
  expect((await asked('7B')).trace).toMatchObject({ isRecalled: true })
  expect((await asked('7B')).trace?.decisions).toHaveLength(1)
  await sent({ lot: '7B', decision: 'lift', reason: 'Tested' })
  expect(await recalls()).toEqual([])
  expect((await asked('7B')).trace?.decisions).toHaveLength(2)
})

test('a nurse traces lots and recalls none', async () => {
  expect(await sent({ lot: '7B' }, given.nurse)).toMatchObject({ status: 403 })
  expect(await recalls()).toEqual([])
  expect(await asked('7B', given.nurse)).toMatchObject({ error: null, mayRecall: false })
})

test.each([
  { lot: '' },
  { lot: 'x'.repeat(21) },
  { lot: 'a\u0007b' },
  { reason: '' },
  { reason: 'x'.repeat(501) },
  { decision: 'burn' },
  { id: '1' },
  { line: '\u0000' },
])('a decision with %o is refused with words, and nothing is kept', async fields => {
  expect(await sent({ lot: '7B', ...fields })).toMatchObject({ status: 400 })
  expect(await recalls()).toEqual([])
})

test('the file has the rows of the page, and no cell that a program would run', async () => {
  await chartedLot('=1+1')
  const file = await exported('=1+1')
  expect(file).toContain('Lot,Patient,Record no.,Where,Charted,Device,When\r\n')
  const [, row = ''] = file.split('\r\n')
  expect(row).toMatch(/^'=1\+1,.*OKAFOR/)
  expect(row).toContain('Alder 8.0')
})

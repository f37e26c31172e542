import { beforeEach, expect, test } from 'vitest'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { columns } from '#app/catalogue/columns.ts'
import { csvText } from '#app/catalogue/csv-text.ts'
import { headLine } from '#app/catalogue/import-plan.ts'
import { catalogueCells } from '#app/catalogue/known-items.ts'
import { loader as exported } from '#app/routes/catalogue-export.ts'
import { action as importing } from '#app/routes/catalogue-import.tsx'
import { action as editing } from '#app/routes/catalogue-item-edit.tsx'
import { action as adding } from '#app/routes/catalogue-item-new.tsx'
import type { ImportOutcome } from '#app/views/catalogue-import.server.ts'
import { searchTubes } from '#database/catalogue-search.server.ts'
import { demoCatalogue } from '#database/seeders/catalogue.ts'
import { aCatalogueTube } from '#test/catalogue.ts'
import { cleared } from '#test/database.ts'
import { answerOf, aPerson, contextOf, formRequest, site } from '#test/people.ts'

let specialist: CurrentUser
const file = csvText([headLine, ...catalogueCells(demoCatalogue).map(cells => columns.map(column => cells[column]))])

beforeEach(async () => {
  await cleared()
  specialist = await aPerson({ name: 'Elsa Solberg', role: 'tracheostomy specialist' })
})

async function sent(fields: Record<string, string | File>, user = specialist) {
  const body = new FormData()
  for (const [name, value] of Object.entries(fields)) body.append(name, value)
  const request = new Request(`${site}/catalogue/import`, { method: 'POST', body })
  const answer = await answerOf(() => importing({ request, context: contextOf(user), params: {} } as never))
  return { status: answer.status, outcome: answer.says as ImportOutcome }
}

async function digestOf(text: string) {
  const { outcome } = await sent({ text, intent: 'preview' })
  return outcome.is === 'preview' ? outcome.digest : ''
}

async function exportedText() {
  const response = await exported({ context: contextOf(specialist) } as never)
  return Buffer.from(await response.arrayBuffer()).toString('utf8')
}

const tubesNow = async () => (await searchTubes({ page: 1, pageSize: 1, retired: true })).total

test('a file is imported once its preview was seen, and comes out again byte for byte', async () => {
  const seen = await sent({ file: new File([file], 'catalogue.csv'), intent: 'preview' })
  expect(seen.outcome).toMatchObject({ is: 'preview', counts: { new: 82, changed: 0, same: 0, error: 0 } })
  expect(await tubesNow()).toBe(0)
  const digest = seen.outcome.is === 'preview' ? seen.outcome.digest : ''
  const { outcome } = await sent({ text: file, intent: 'import', digest })
  expect(outcome).toEqual({ is: 'imported', says: 'Imported: 82 new, 0 changed, 0 as before.' })
  expect(await exportedText()).toBe(file)
  expect((await sent({ text: file, intent: 'preview' })).outcome).toMatchObject({ counts: { same: 82, new: 0 } })
})

test('with one line wrong nothing is imported, whatever digest comes along', async () => {
  const wrong = file.replace(',11.3,78,air,', ',wide,78,air,')
  const { status, outcome } = await sent({ text: wrong, intent: 'import', digest: await digestOf(wrong) })
  expect(status).toBe(400)
  expect(outcome).toMatchObject({ is: 'preview', counts: { error: 1 }, text: expect.stringContaining(',wide,78,') })
  expect(await tubesNow()).toBe(0)
})

test('a file that does something else than was seen is shown again', async () => {
  const digest = await digestOf(file)
  await aCatalogueTube(specialist.id)
  const one = file.split('\r\n').slice(0, 3).join('\r\n')
  expect((await sent({ text: one, intent: 'import', digest })).outcome).toMatchObject({ is: 'preview' })
  expect(await tubesNow()).toBe(1)
})

test.each([
  ['nothing', {}, 'Choose a file, or paste its lines.'],
  ['an empty file', { file: new File([''], 'x.csv') }, 'Choose a file, or paste its lines.'],
  [
    'a file of another encoding',
    { file: new File([new Uint8Array([0xff, 0xfe, 0x49, 0x00])], 'x.csv') },
    'The file is not text in UTF-8.',
  ],
  [
    'a table program’s own format',
    { file: new File(['PK\u0003\u0004\0\0'], 'x.xlsx') },
    'The file is not text in UTF-8.',
  ],
  ['a file of 3 MB', { file: new File(['x'.repeat(3_000_000)], 'x.csv') }, 'The file is larger than 2 MB'],
  ['an open quote', { text: 'Item,Line,Maker,Size\n"tube' }, 'Line 2: A quotation mark is opened and not closed.'],
  ['other columns', { text: 'a,b\n1,2' }, 'Line 1: The first line names the columns'],
])('%s is answered with what to do', async (_, fields, says) => {
  const { status, outcome } = await sent(fields as Record<string, string | File>)
  expect(status).toBe(400)
  expect(outcome.is === 'unreadable' && outcome.says).toContain(says)
})

test('a formula in a cell stays text on the way in and out', async () => {
  const line = 'tube,"=cmd|\' /C calc\'!A0",@Maker,8.0,ISO 5366,single,8,11,80,air,no,outer,fixed,yes,0'
  const head =
    'Item,Line,Maker,Size,Size system,Construction,ID of outer tube mm,OD mm,Length mm,Cuff,Fenestrated,15 mm connector,Flange,Insertion aid,Reusable inner cannulas'
  const text = `${head}\n${line}`
  expect((await sent({ text, intent: 'import', digest: await digestOf(text) })).outcome).toMatchObject({
    is: 'imported',
  })
  const out = await exportedText()
  expect(out).toContain(`,'=cmd|' /C calc'!A0,'@Maker,8.0,`)
  expect((await sent({ text: out, intent: 'preview' })).outcome).toMatchObject({ counts: { same: 1, error: 0 } })
})

test.each(['nurse', 'charge nurse', 'educator', 'observer'] as const)(
  'a %s imports, adds and edits nothing',
  async role => {
    const user = await aPerson({ name: 'Some Body', role })
    expect((await sent({ text: file, intent: 'preview' }, user)).status).toBe(403)
    const context = contextOf(user)
    const request = () => formRequest('/catalogue/tubes/new', {})
    const added = await answerOf(() => adding({ request: request(), context, params: { items: 'tubes' } } as never))
    const params = { items: 'tubes', itemId: '019acb00-0000-7000-8000-000000000001' }
    const edited = await answerOf(() => editing({ request: request(), context, params } as never))
    expect([added.status, edited.status]).toEqual([403, 403])
  },
)

test('a form that is wrong comes back with what was typed', async () => {
  const itemId = await aCatalogueTube(specialist.id)
  const request = formRequest('/', { version: '1', line: 'Ferrin', od: '11,4', cuff: 'balloon', '__proto__[x]': '1' })
  const params = { items: 'tubes', itemId }
  const answer = await answerOf(() => editing({ request, context: contextOf(specialist), params } as never))
  expect(answer.status).toBe(400)
  expect(answer.says).toMatchObject({
    typed: { od: ['11,4'] },
    errors: { cuff: ['Choose the cuff'], size: ['Enter the size on the label'] },
  })
})

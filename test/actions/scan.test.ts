import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { innerCannula } from '#app/care/inner-cannula/kind.ts'
import { action as scan } from '#app/routes/scan.tsx'
import type { ScanView } from '#app/scanning/scan-view.ts'
import { saveItems } from '#database/catalogue-writes.server.ts'
import { addEntry } from '#database/entries.server.ts'
import { decideLot } from '#database/lot-recalls.server.ts'
import { aCannulaToSave, someInnerCannula } from '#test/catalogue.ts'
import { aCharting, daysAgo } from '#test/charting.ts'
import { cleared } from '#test/database.ts'
import { answerOf, aPerson, contextOf, formRequest } from '#test/people.ts'

const GTIN = '09521234543213'
let given: Awaited<ReturnType<typeof aCharting>>
let specialist: CurrentUser
let path: string

beforeEach(async () => {
  await cleared()
  given = await aCharting()
  specialist = await aPerson({ name: 'Mads Larsen', role: 'tracheostomy specialist', wardIds: [given.ward.id] })
  path = `/patients/${given.patientId}/chart/${innerCannula.slug}`
})

/** What a scan of these codes says, typed with its brackets so that nothing has to be read back. */
function scanned(code: string, user: CurrentUser = given.nurse, target = path): Promise<ScanView> {
  return sent({ for: target, source: 'typed', code }, user)
}

async function sent(fields: Record<string, string>, user: CurrentUser = given.nurse): Promise<ScanView> {
  const request = formRequest('/scan', fields)
  const args = { request, params: {}, url: new URL(request.url), context: contextOf(user) }
  const answer = await answerOf(() => scan({ ...args, pattern: '/scan' }))
  return (answer.says ?? answer) as ScanView
}

async function catalogued(line: string) {
  const cannula = aCannulaToSave(someInnerCannula({ line, gtin: GTIN }))
  await saveItems([cannula], specialist.id)
  return cannula.id
}

test('an inner cannula of the line in place is filled in with its lot and expiry', async () => {
  const item = await catalogued('Alder')
  const view = await scanned(`(01)${GTIN}(17)491231(10)7B`)
  expect(view).toMatchObject({
    findings: [],
    stops: false,
    name: 'Alder 8.0, disposable, box of 10',
    fill: { 'care.item': [item], 'care.lot': ['7B'] },
  })
})

test.each([
  ['one of another line', 'Corvane', '(17)491231(10)7B', ['other-tube']],
  ['one that has expired', 'Alder', '(17)240101(10)7B', ['expired']],
  ['one of a recalled lot', 'Alder', '(17)491231(10)9X', ['recalled']],
  ['one that is all of these', 'Corvane', '(17)240101(10)9X', ['other-tube', 'recalled', 'expired']],
])('%s is said first and stops, and can be recorded where it is found in place', async (_, line, rest, expected) => {
  await catalogued(line)
  const recall = { id: uuidv7(), lot: '9X', line: null, reason: 'Leaks', isRecalled: true, decidedBy: specialist.id }
  await decideLot(recall)
  const view = await scanned(`(01)${GTIN}${rest}`)
  expect(view.findings.map(({ name }) => name)).toEqual(expected)
  expect(view.stops).toBe(true)
  expect(view.fill).not.toBeNull()
})

test('an item that is not in the catalogue is described by a specialist, and by nobody else', async () => {
  const code = `(01)${GTIN}(10)7B`
  expect(await scanned(code)).toMatchObject({ unknown: { gtin: GTIN, mayDescribe: false }, fill: null })
  expect(await scanned(code, specialist)).toMatchObject({ unknown: { gtin: GTIN, mayDescribe: true } })
})

test.each(['', 'x', '(01)09521234543214', '\u0000', '(10)', '%'.repeat(600), '(01)__proto__'])(
  'of %j the page says what is wrong, and keeps nothing of it as a code',
  async code => {
    const view = await scanned(code)
    expect(view.error).toMatch(/\.$/)
    expect(view).toMatchObject({ codes: [], fill: null, name: null })
  },
)

/** The form that corrects an act of so many days ago with an inner cannula of another lot. */
async function correctionOf(ago: number): Promise<string> {
  const [example] = innerCannula.examples
  if (!example) throw new Error('There is no example')
  const id = uuidv7()
  const { stayId, nurse } = given
  await addEntry({ id, kind: innerCannula, stayId, performedAt: daysAgo(ago), recordedBy: nurse, data: example })
  return `/entries/${id}/correct`
}

test('for a correction an item is judged by the day it was used, and fills in what was charted otherwise', async () => {
  const item = await catalogued('Alder')
  const code = `(01)${GTIN}(17)${yesterday()}(10)7B`
  expect(await scanned(code)).toMatchObject({ findings: [{ name: 'expired' }], stops: true, isUsed: false })
  expect(await scanned(code, given.nurse, await correctionOf(3))).toMatchObject({
    findings: [],
    stops: false,
    isUsed: true,
    fill: { 'care.item': [item], 'care.lot': ['7B'] },
  })
})

/** As a label prints it. */
const yesterday = () => daysAgo(1).toISOString().slice(2, 10).replaceAll('-', '')

test('whoever may not correct an entry scans nothing for it', async () => {
  await catalogued('Alder')
  const path = await correctionOf(1)
  const colleague = await aPerson({ name: 'Ada Lund', wardIds: [given.ward.id] })
  const stranger = await aPerson({ name: 'Per Holm' })
  for (const user of [colleague, stranger]) expect((await scanned(`(01)${GTIN}`, user, path)).name).toBeUndefined()
  expect((await scanned(`(01)${GTIN}`, given.nurse, path)).name).toMatch(/^Alder 8\.0/)
})

test('an item scanned for no form leads on to its pages', async () => {
  const item = await catalogued('Alder')
  expect(await scanned(`(01)${GTIN}(10)7B`, given.nurse, '')).toMatchObject({
    fill: null,
    links: [
      { href: `/catalogue/inner-cannulas/${item}` },
      {
        href: `/wards/${given.ward.id}/supplies/receive?item=${item}&to=store`,
        words: expect.stringMatching(/^Receive for /),
      },
      { href: '/lots?lot=7B', words: 'Who had lot 7B' },
    ],
  })
  const observer = await aPerson({ name: 'Ole Berg', role: 'observer' })
  expect((await scanned(`(01)${GTIN}(10)7B`, observer, '')).links).toHaveLength(1)
  expect((await scanned(`(01)${GTIN}(10)7B`)).links).toEqual([])
})

test('a scanner that was never tested has what may have run together read back, before anything is filled in', async () => {
  await catalogued('Alder')
  const code = `]d201${GTIN}10123ABC17491231`
  const doubtful = await sent({ for: path, source: 'scanner', code })
  expect(doubtful.fill).toBeNull()
  expect(doubtful.readBack.map(({ words }) => words)).toEqual([
    'Lot 123ABC, expires 31-Dec-2049',
    'Lot 123ABC17491231, no expiry date',
  ])
  const [before = ''] = doubtful.codes
  const answer = await sent({ for: path, code: '', before, readBack: doubtful.readBack[0]?.value ?? '' })
  expect(answer).toMatchObject({ readBack: [], fill: { 'care.lot': ['123ABC'], 'care.expiresOn': ['2049-12-31'] } })
})

test('for a patient of another ward nothing is said', async () => {
  await catalogued('Alder')
  const stranger = await aPerson({ name: 'Per Holm' })
  const view = await scanned(`(01)${GTIN}(10)7B`, stranger)
  expect(view.findings).toBeUndefined()
})

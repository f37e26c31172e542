import { v7 as uuidv7 } from 'uuid'
import { beforeAll, beforeEach, expect, test } from 'vitest'
import { signIn } from '#app/auth/session.server.ts'
import { addEntry } from '#database/entries.server.ts'
import { application, browserRequest } from '#test/application.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson, site, traceOfTest } from '#test/people.ts'
import { aCuffPressure, aStay } from '#test/stays.ts'

// Whatever comes, the answer is one that was meant, and nothing is written to the error log: the setup of all tests sees to that.

const app = await application()
const writes = app.routes.filter(({ hasAction }) => hasAction)
let cookies: readonly string[]
let params: Readonly<Record<string, string>>

beforeAll(async () => {
  await cleared()
  const { ward, stayId, patientId } = await aStay()
  const nurse = await aPerson({ name: 'Ngozi Adeyemi', wardIds: [ward.id] })
  const admin = await aPerson({ name: 'Signe Holm', role: 'administrator' })
  const entryId = uuidv7()
  await addEntry(aCuffPressure(stayId, nurse, { id: entryId }))
  const signedIn = async (user: typeof nurse) =>
    (await signIn(new Request(site), user, traceOfTest(user))).split(';')[0]
  cookies = [(await signedIn(nurse)) ?? '', (await signedIn(admin)) ?? '']
  params = { wardId: ward.id, patientId, entryId, userId: nurse.id, kind: 'cuff-pressure' }
})

beforeEach(() => owner.query('UPDATE sessions SET ended_at = NULL, ended_because = NULL'))

const pathOf = (pattern: string, given = params) =>
  pattern.replace(/:(\w+)/g, (_, name: string) => given[name] ?? params[name] ?? '')

function posted(path: string, cookie: string, body: BodyInit, type = 'application/x-www-form-urlencoded') {
  return new Request(site + path, {
    method: 'POST',
    body,
    headers: { Origin: site, Cookie: cookie, 'Content-Type': type },
  })
}

async function expectMeant(request: Request) {
  const { status } = await app.answer(request)
  expect(status, `${request.method} ${request.url.slice(0, 200)}`).toBeLessThan(500)
}

const ids = [
  ...[
    'x',
    '0',
    '-1',
    '%00',
    '%ff',
    '__proto__',
    'constructor',
    "'%20OR%201=1--%20",
    '%F0%9F%98%80',
    '..%2f..%2fsign-in',
  ],
  ...['018f0000-0000-7000-8000-000000000000', '018f000000007000800000000000000', '%7B018f%7D', 'a'.repeat(3000)],
]

test.each(app.routes.filter(({ pattern }) => pattern.includes(':')))('$pattern takes any id', async ({ pattern }) => {
  for (const id of ids) {
    for (const name of pattern.match(/(?<=:)\w+/g) ?? []) {
      const path = pathOf(pattern, { [name]: id })
      for (const cookie of cookies) await expectMeant(browserRequest('GET', path, cookie))
    }
  }
})

const foreignNames = [
  ...['wardIds[90000]', 'a[90000].b', '__proto__.x', 'constructor.prototype.x', 'wardIds.__proto__.x', '__proto__'],
  ...['constructor', 'toString', '[', 'a..b', '__intent__', '__state__', '', '\u0000', '\ud800', 'a'.repeat(4000)],
]

test.each(writes)('$pattern looks at no field that is not its own', async ({ pattern }) => {
  for (const cookie of cookies) {
    for (const name of foreignNames) {
      const body = new URLSearchParams([[name, '{"type":"insert","payload":{"name":"poison"}}']])
      // Asked for as data, the answer holds everything that the form is shown again with.
      const answer = await app.answer(posted(`${pathOf(pattern)}.data`, cookie, body))
      expect(answer.status, name).toBeLessThan(500)
      expect(await answer.text()).not.toContain('poison')
    }
  }
  expect(({} as { x?: unknown }).x).toBeUndefined()
})

test.each(writes)(
  '$pattern answers bodies that are no forms, and forms of ten thousand fields',
  async ({ pattern }) => {
    const many = new URLSearchParams(Array.from({ length: 10_000 }, (_, at) => [`f${at % 5000}`, '1']))
    for (const cookie of cookies) {
      await expectMeant(posted(pathOf(pattern), cookie, '{"id":1}', 'application/json'))
      await expectMeant(posted(pathOf(pattern), cookie, 'no boundary', 'multipart/form-data'))
      await expectMeant(posted(pathOf(pattern), cookie, '%', 'application/x-www-form-urlencoded'))
      await expectMeant(posted(pathOf(pattern), cookie, many))
    }
  },
)

test.each([
  '?span=__proto__&kind=constructor&before=x',
  '?before=2026-12-01T00:00:00.000Z_------------------------------------',
  '?before=0000-01-01T00:00:00.000Z_018f0000-0000-7000-8000-000000000000',
  '?before=9999-99-99T99:99:99.999Z_018f0000-0000-7000-8000-000000000000',
  '?charted=%00&ward=%ff&returnTo=%2F%2Felsewhere.example&page=1e9',
])('pages open whatever their address is followed by: %s', async search => {
  for (const { pattern } of app.routes) {
    for (const cookie of cookies) await expectMeant(browserRequest('GET', pathOf(pattern) + search, cookie))
  }
})

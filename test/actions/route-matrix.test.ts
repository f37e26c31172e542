import { v4 as uuidv4, v7 as uuidv7 } from 'uuid'
import { beforeAll, beforeEach, expect, test } from 'vitest'
import { type Role, roles } from '#app/auth/permissions.ts'
import { signIn } from '#app/auth/session.server.ts'
import { grantAccess } from '#database/access-grants.server.ts'
import { catalogueTube } from '#database/catalogue.server.ts'
import { addEntry } from '#database/entries.server.ts'
import { photographsAlongside, writeFiles } from '#database/photographs.server.ts'
import { addPolicy } from '#database/policies.server.ts'
import { application, browserRequest } from '#test/application.ts'
import { aCatalogueTube } from '#test/catalogue.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson, site, traceOfTest } from '#test/people.ts'
import { aCuffPressure, aStay, aWardOf } from '#test/stays.ts'

// Every address, asked by everybody. The patient is on the ward of the first columns, and the entry is by its nurse; an
// empty form is a mistake (400) to whoever may send it. `go`: led on; `in`: to the sign-in page; `why`: to the page that
// asks for a reason; `own`: to the page where a one-time password is replaced.
const table = `
                                       on the ward                   on another ward               + reason  one- no-
                                       nu  rt  ch  sp  ed  ad  ob    nu  rt  ch  sp  ed  ad  ob    nu  ch    time body
GET  /health                           200 200 200 200 200 200 200   200 200 200 200 200 200 200   200 200   200  200
GET  /health/ready                     200 200 200 200 200 200 200   200 200 200 200 200 200 200   200 200   200  200
GET  /sign-in                          go  go  go  go  go  go  go    go  go  go  go  go  go  go    go  go    200  200
POST /sign-in                          go  go  go  go  go  go  go    go  go  go  go  go  go  go    go  go    400  400
GET  /sign-out                         go  go  go  go  go  go  go    go  go  go  go  go  go  go    go  go    go   go
POST /sign-out                         in  in  in  in  in  in  in    in  in  in  in  in  in  in    in  in    in   in
GET  /theme                            go  go  go  go  go  go  go    go  go  go  go  go  go  go    go  go    go   go
POST /theme                            go  go  go  go  go  go  go    go  go  go  go  go  go  go    go  go    go   go
GET  /draft                            400 400 400 400 400 400 400   400 400 400 400 400 400 400   400 400   400  400
POST /draft                            200 200 200 200 200 200 200   200 200 200 200 200 200 200   200 200   200  401
GET  /still-here                       400 400 400 400 400 400 400   400 400 400 400 400 400 400   400 400   400  400
POST /still-here                       204 204 204 204 204 204 204   204 204 204 204 204 204 204   204 204   204  401
GET  /calendar/:secret/tubes.ics       404 404 404 404 404 404 404   404 404 404 404 404 404 404   404 404   404  404
GET  /                                 go  go  go  go  go  go  go    go  go  go  go  go  go  go    go  go    own  in
GET  /round                            200 200 200 200 404 404 200   200 200 200 200 404 404 200   200 200   own  in
GET  /tubes                            403 403 200 200 403 403 403   403 403 200 200 403 403 403   403 200   own  in
POST /tubes                            403 403 400 400 403 403 403   403 403 400 400 403 403 403   403 400   own  in
GET  /wards/:wardId/board              200 200 200 200 404 404 200   404 404 404 404 404 404 404   404 404   own  in
GET  /wards/:wardId/admit              200 403 200 200 404 404 403   404 404 404 404 404 404 404   404 404   own  in
POST /wards/:wardId/admit              400 403 400 400 404 404 403   404 404 404 404 404 404 404   404 404   own  in
GET  /wards/:wardId/supplies           200 200 200 200 404 404 403   404 404 404 404 404 404 404   404 404   own  in
GET  /wards/:wardId/supplies/order.csv 200 200 200 200 404 404 403   404 404 404 404 404 404 404   404 404   own  in
GET  /wards/:wardId/supplies/history   200 200 200 200 404 404 403   404 404 404 404 404 404 404   404 404   own  in
GET  /wards/:wardId/supplies/:act      200 200 200 200 404 404 403   404 404 404 404 404 404 404   404 404   own  in
POST /wards/:wardId/supplies/:act      400 400 400 400 404 404 403   404 404 404 404 404 404 404   404 404   own  in
GET  /wards/:wardId/access             403 403 200 403 404 404 403   404 404 404 404 404 404 404   404 404   own  in
GET  /patients                         200 200 200 200 403 403 200   200 200 200 200 403 403 200   200 200   own  in
POST /patients                         200 200 200 200 403 403 200   200 200 200 200 403 403 200   200 200   own  in
GET  /patients/:patientId              200 200 200 200 404 404 200   why why why why 404 404 404   200 200   own  in
GET  /patients/:patientId/access       go  go  go  go  404 404 404   200 200 200 200 404 404 404   go  go    own  in
POST /patients/:patientId/access       go  go  go  go  404 404 404   400 400 400 400 404 404 404   go  go    own  in
GET  /patients/:patientId/chart/:kind  200 200 200 200 404 404 403   why why why why 404 404 404   200 200   own  in
POST /patients/:patientId/chart/:kind  400 400 400 400 404 404 403   why why why why 404 404 404   400 400   own  in
GET  /patients/:patientId/details      200 403 200 200 404 404 403   why why why why 404 404 404   403 403   own  in
POST /patients/:patientId/details      400 403 400 400 404 404 403   why why why why 404 404 404   403 403   own  in
GET  /patients/:patientId/move         200 403 200 403 404 404 403   why why why why 404 404 404   403 403   own  in
POST /patients/:patientId/move         400 403 400 403 404 404 403   why why why why 404 404 404   403 403   own  in
GET  /patients/:patientId/discharge    200 403 200 403 404 404 403   why why why why 404 404 404   403 403   own  in
POST /patients/:patientId/discharge    400 403 400 403 404 404 403   why why why why 404 404 404   403 403   own  in
GET  /patients/:patientId/emergency    200 200 200 200 404 404 200   why why why why 404 404 404   200 200   own  in
GET  /patients/:patientId/sign         200 200 200 200 404 404 200   why why why why 404 404 404   200 200   own  in
POST /patients/:patientId/sign         400 400 400 400 404 404 403   why why why why 404 404 404   400 400   own  in
GET  /patients/:patientId/sign.pdf     go  go  go  go  404 404 go    why why why why 404 404 404   go  go    own  in
GET  /patients/:patientId/photographs  200 200 200 200 404 404 200   why why why why 404 404 404   200 200   own  in
GET  /patients/:patientId/trends       200 200 200 200 404 404 200   why why why why 404 404 404   200 200   own  in
GET  /patients/:patientId/weaning      200 200 200 200 404 404 200   why why why why 404 404 404   200 200   own  in
GET  /photographs/:photographId        200 200 200 200 404 404 200   404 404 404 404 404 404 404   200 200   own  in
GET  /patients/:patientId/act-now/:entryId 200 200 200 200 404 404 200 why why why why 404 404 404 200 200 own in
GET  /entries/:entryId                 200 200 200 200 404 404 200   why why why why 404 404 404   200 200   own  in
GET  /entries/:entryId/correct         200 403 200 200 404 404 403   why why why why 404 404 404   403 403   own  in
POST /entries/:entryId/correct         400 403 400 400 404 404 403   why why why why 404 404 404   403 403   own  in
GET  /entries/:entryId/retract         200 403 200 200 404 404 403   why why why why 404 404 404   403 403   own  in
POST /entries/:entryId/retract         400 403 400 400 404 404 403   why why why why 404 404 404   403 403   own  in
GET  /catalogue                        200 200 200 200 200 200 200   200 200 200 200 200 200 200   200 200   own  in
GET  /catalogue/import                 403 403 403 200 403 200 403   403 403 403 200 403 200 403   403 403   own  in
POST /catalogue/import                 403 403 403 400 403 400 403   403 403 403 400 403 400 403   403 403   own  in
GET  /catalogue/compare                200 200 200 200 200 200 200   200 200 200 200 200 200 200   200 200   own  in
GET  /catalogue/lines/:lineId          200 200 200 200 200 200 200   200 200 200 200 200 200 200   200 200   own  in
POST /catalogue/lines/:lineId          403 403 403 400 403 400 403   403 403 403 400 403 400 403   403 403   own  in
GET  /catalogue/:items/new             403 403 403 200 403 200 403   403 403 403 200 403 200 403   403 403   own  in
POST /catalogue/:items/new             403 403 403 400 403 400 403   403 403 403 400 403 400 403   403 403   own  in
GET  /catalogue/:items/:itemId         200 200 200 200 200 200 200   200 200 200 200 200 200 200   200 200   own  in
POST /catalogue/:items/:itemId         403 403 403 400 403 400 403   403 403 403 400 403 400 403   403 403   own  in
GET  /catalogue/:items/:itemId/edit    403 403 403 200 403 200 403   403 403 403 200 403 200 403   403 403   own  in
POST /catalogue/:items/:itemId/edit    403 403 403 400 403 400 403   403 403 403 400 403 400 403   403 403   own  in
GET  /catalogue/export                 200 200 200 200 200 200 200   200 200 200 200 200 200 200   200 200   401  401
GET  /scan                             200 200 200 200 200 200 200   200 200 200 200 200 200 200   200 200   own  in
POST /scan                             400 400 400 400 400 400 400   400 400 400 400 400 400 400   400 400   own  in
GET  /scan/set-up                      200 200 200 200 200 200 200   200 200 200 200 200 200 200   200 200   own  in
POST /scan/set-up                      200 200 200 200 200 200 200   200 200 200 200 200 200 200   200 200   own  in
GET  /lots                             200 200 200 200 403 200 403   200 200 200 200 403 200 403   200 200   own  in
POST /lots                             403 403 403 400 403 400 403   403 403 403 400 403 400 403   403 403   own  in
GET  /lots/export                      400 400 400 400 403 400 403   400 400 400 400 403 400 403   400 400   own  in
GET  /account                          200 200 200 200 200 200 200   200 200 200 200 200 200 200   200 200   200  in
POST /account                          400 400 400 400 400 400 400   400 400 400 400 400 400 400   400 400   400  in
GET  /sign-out-everywhere              go  go  go  go  go  go  go    go  go  go  go  go  go  go    go  go    own  in
POST /sign-out-everywhere              in  in  in  in  in  in  in    in  in  in  in  in  in  in    in  in    own  in
GET  /countersign                      200 200 200 200 403 403 403   200 200 200 200 403 403 403   200 200   own  in
POST /countersign                      400 400 400 400 403 403 403   400 400 400 400 403 403 403   400 400   own  in
GET  /competence                       go  go  200 200 200 go  go    go  go  200 200 200 go  go    go  200   own  in
GET  /competence/:userId               200 404 200 200 200 404 404   404 404 404 404 200 404 404   404 404   own  in
POST /competence/:userId               403 404 403 403 400 404 404   404 404 404 404 400 404 404   404 404   own  in
GET  /admin/people                     403 403 403 403 403 200 403   403 403 403 403 403 200 403   403 403   own  in
GET  /admin/people/new                 403 403 403 403 403 200 403   403 403 403 403 403 200 403   403 403   own  in
POST /admin/people/new                 403 403 403 403 403 400 403   403 403 403 403 403 400 403   403 403   own  in
GET  /admin/people/:userId             403 403 403 403 403 200 403   403 403 403 403 403 200 403   403 403   own  in
POST /admin/people/:userId             403 403 403 403 403 400 403   403 403 403 403 403 400 403   403 403   own  in
GET  /admin/wards                      403 403 403 403 403 200 403   403 403 403 403 403 200 403   403 403   own  in
POST /admin/wards                      403 403 403 403 403 400 403   403 403 403 403 403 400 403   403 403   own  in
GET  /admin/wards/:wardId              403 403 403 403 403 200 403   403 403 403 403 403 200 403   403 403   own  in
POST /admin/wards/:wardId              403 403 403 403 403 400 403   403 403 403 403 403 400 403   403 403   own  in
GET  /policy                           200 200 200 200 200 200 200   200 200 200 200 200 200 200   200 200   own  in
GET  /policy/draft                     403 403 200 200 403 403 403   403 403 200 200 403 403 403   403 200   own  in
POST /policy/draft                     403 403 400 400 403 403 403   403 403 400 400 403 403 403   403 400   own  in
GET  /policy/review                    403 403 200 200 403 403 403   403 403 200 200 403 403 403   403 200   own  in
POST /policy/review                    403 403 400 400 403 403 403   403 403 400 400 403 403 403   403 400   own  in
GET  /policy/compare                   404 404 404 404 404 404 404   404 404 404 404 404 404 404   404 404   own  in
GET  /policy/versions/:policyId/withdraw 403 403 200 200 403 403 403   403 403 404 404 403 403 403   403 404   own  in
POST /policy/versions/:policyId/withdraw 403 403 400 400 403 403 403   403 403 404 404 403 403 403   403 404   own  in
GET  /wards/:wardId/care-plans         200 200 200 200 404 404 200   404 404 404 404 404 404 404   404 404   own  in
GET  /api/patients/:patientId/timeline 200 200 200 200 404 404 200   404 404 404 404 404 404 404   200 200   401  401
GET  /api/wards/:wardId/board          200 200 200 200 404 404 200   404 404 404 404 404 404 404   404 404   401  401
`

const rows = [...table.matchAll(/^(GET|POST) +(\S+) +(.+)$/gm)].map(([, method = '', pattern = '', cells = '']) => ({
  address: `${method} ${pattern}`,
  method: method === 'GET' ? ('GET' as const) : ('POST' as const),
  pattern,
  cells: cells.split(/ +/).join(' '),
}))

const app = await application()
let cookies: readonly (string | null)[]
let params: Readonly<Record<string, string>>

beforeAll(async () => {
  await cleared()
  const { ward, stayId, patientId } = await aStay()
  const other = await aWardOf(1, 'Ward 8')
  const here = await everyRole(ward.id, 'Here')
  const away = await everyRole(other.id, 'Away')
  const [author] = here
  if (!author) throw new Error('There is nobody on the ward')
  const entryId = uuidv7()
  await addEntry(aCuffPressure(stayId, author, { id: entryId }))
  const visiting = [await somebody('nurse', other.id, 'Visiting'), await somebody('charge nurse', other.id, 'Visiting')]
  for (const { id } of visiting) {
    const reason = { userId: id, patientId, stayId, wardId: ward.id, reason: 'Covering the ward tonight', minutes: 60 }
    await grantAccess(reason, traceOfTest())
  }
  const fresh = await somebody('nurse', ward.id, 'Fresh')
  await owner.query('UPDATE users SET one_time_until = UTC_TIMESTAMP(3) + INTERVAL 1 HOUR WHERE id = :id', {
    replacements: { id: fresh.id },
  })
  cookies = [...(await Promise.all([...here, ...away, ...visiting, fresh].map(cookieOf))), null]
  const policyId = uuidv7()
  await addPolicy(aComingPolicy(policyId, ward.id), author.id)
  const itemId = await aCatalogueTube(author.id)
  const lineId = (await catalogueTube(itemId))?.lineId ?? ''
  const photographId = await aPhotograph(entryId, stayId)
  const ids = { photographId, policyId, wardId: ward.id, patientId, entryId, userId: author.id, itemId, lineId }
  params = { ...ids, kind: 'cuff-pressure', items: 'tubes', act: 'receive' }
})

// Everybody is signed in again, whatever the row before has done.
beforeEach(() => owner.query('UPDATE sessions SET ended_at = NULL, ended_because = NULL'))

function aComingPolicy(id: string, wardId: string) {
  const review = { reviewedBy: 'Dr E. Osei, clinical lead', reviewedOn: '2026-10-20', reason: 'First policy' }
  return { id, wardId, name: 'Tracheostomy care', ...review, startsAt: new Date(Date.now() + 86_400_000), values: {} }
}

async function aPhotograph(entryId: string, stayId: string) {
  const [id, bytes] = [uuidv4(), Buffer.from('a picture')]
  const added = [{ id, file: id, large: bytes, small: bytes, width: 1, height: 1, sha256: '0'.repeat(64) }]
  await writeFiles(added)
  await owner.transaction(photographsAlongside({ id: entryId, stayId }, added))
  return id
}

async function everyRole(wardId: string, where: string) {
  const people = []
  for (const role of roles) people.push(await somebody(role, wardId, where))
  return people
}

function somebody(role: Role, wardId: string, where: string) {
  return aPerson({ name: `${role} ${where}`, role, wardIds: [wardId] })
}

async function cookieOf(person: Awaited<ReturnType<typeof aPerson>>): Promise<string> {
  const [cookie = ''] = (await signIn(new Request(site), person, traceOfTest(person))).split(';')
  return cookie
}

const pathOf = (pattern: string) => pattern.replace(/:(\w+)/g, (_, name: string) => params[name] ?? '')

function cellOf({ status, headers }: Response): string {
  const to = headers.get('Location')?.split('?')[0] ?? ''
  if (status !== 302) return String(status)
  if (to === '/sign-in') return 'in'
  return /^\/patients\/[^/]+\/access$/.test(to) ? 'why' : 'go'
}

test('every address of the application is in the table, and nothing else', () => {
  const addresses = app.routes.flatMap(({ pattern, hasAction }) =>
    hasAction ? [`GET ${pattern}`, `POST ${pattern}`] : [`GET ${pattern}`],
  )
  expect(rows.map(({ address }) => address).sort()).toEqual(addresses.sort())
})

test.each(rows)('$address is open to whom it should be', async ({ method, pattern, cells }) => {
  const path = pathOf(pattern)
  const answers = await Promise.all(cookies.map(cookie => app.answer(browserRequest(method, path, cookie))))
  const isOwn = (at: number) => at === cookies.length - 2 && answers[at]?.headers.get('Location') === '/account'
  const codes = answers.map((answer, at) => (isOwn(at) ? 'own' : cellOf(answer)))
  expect(codes.join(' ')).toBe(cells)
})

const writes = rows.filter(({ method }) => method === 'POST')

test.each(writes)(
  '$address is refused to a page of another site, and to one that does not say',
  async ({ pattern }) => {
    for (const from of [{ 'Sec-Fetch-Site': 'cross-site' }, { 'Sec-Fetch-Site': 'same-site' }, {}]) {
      for (const cookie of cookies) {
        const headers = { ...from, ...(cookie === null ? {} : { Cookie: cookie }) }
        const request = new Request(site + pathOf(pattern), { method: 'POST', headers, body: new URLSearchParams() })
        expect((await app.answer(request)).status).toBe(403)
      }
    }
  },
)

import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { patientContext } from '#app/auth/patient-access.server.ts'
import { signIn } from '#app/auth/session.server.ts'
import { cuffPressure } from '#app/care/cuff-pressure/kind.ts'
import { loader as trendsLoader } from '#app/routes/patient-trends.tsx'
import { loader as weaningLoader } from '#app/routes/patient-weaning.tsx'
import { hours, later } from '#app/time/duration.ts'
import { addEntry, retractEntry } from '#database/entries.server.ts'
import { addPolicy } from '#database/policies.server.ts'
import { select } from '#database/sequelize.server.ts'
import { discharge, move } from '#database/stay-changes.server.ts'
import { entryWithHistory } from '#database/timeline.server.ts'
import { application, browserRequest } from '#test/application.ts'
import { aCharting, daysAgo } from '#test/charting.ts'
import { cleared } from '#test/database.ts'
import { aPerson, contextOf, site, traceOfTest } from '#test/people.ts'
import { aStay, aWardOf } from '#test/stays.ts'

const app = await application()

beforeEach(cleared)

type Charting = Awaited<ReturnType<typeof aCharting>>
type Opened = Pick<Charting, 'ward' | 'nurse' | 'stayId' | 'patientId'>

function argsOf({ ward, nurse, stayId, patientId }: Opened, path: string, user = nurse) {
  const request = new Request(`${site}/patients/${patientId}/${path}`)
  const context = contextOf(user)
  context.set(patientContext, { patientId, stayId, wardId: ward.id, via: 'ward' })
  return { params: { patientId }, request, url: new URL(request.url), context }
}

function trends(given: Opened, search = '') {
  return trendsLoader({ ...argsOf(given, `trends${search}`), pattern: '/patients/:patientId/trends' })
}

function weaning(given: Opened, user = given.nurse) {
  return weaningLoader({ ...argsOf(given, 'weaning', user), pattern: '/patients/:patientId/weaning' })
}

async function pressureOf(given: Opened, search = '') {
  const { shown } = await trends(given, search)
  const view = shown?.trends.find(({ name }) => name === 'cuff-pressure')
  if (view?.shape !== 'measure') throw new Error('No cuff pressures')
  return view
}

async function charted({ stayId, nurse }: Opened, performedAt: Date, found: number) {
  const id = uuidv7()
  const data = { found, unit: 'cmH2O', method: 'manometer' } as const
  await addEntry({ id, kind: cuffPressure, stayId, performedAt, recordedBy: nurse, data })
  return id
}

/** A version that keeps cuffs at an upper limit from a moment on; of one ward, or of the hospital. */
function keeping(upper: number, startsAt: Date, wardId: string | null = null) {
  const review = { reviewedBy: 'M. Osei', reviewedOn: '2024-01-02', reason: 'Kept lower' }
  const values = { 'cuff-pressure-upper-limit': upper }
  return addPolicy({ id: uuidv7(), name: 'Tracheostomy care', wardId, ...review, startsAt, values }, null)
}

const isOut = ({ readings }: Awaited<ReturnType<typeof pressureOf>>) => readings.map(({ values }) => values[0]?.isOut)

test('each reading is judged by the version of its time, and the band has a step', async () => {
  const given = await aCharting()
  await keeping(25, daysAgo(2))
  await charted(given, daysAgo(3), 28)
  await charted(given, daysAgo(1), 28)
  const view = await pressureOf(given)
  expect(isOut(view)).toEqual([false, true])
  expect(view.bands.map(({ words }) => words)).toEqual(['20 to 30 cmH2O', '20 to 25 cmH2O'])
})

test('a reading is judged by the policy of the ward that the patient was on', async () => {
  const given = await aCharting()
  const other = await aWardOf(1, 'Ward 8')
  await keeping(25, daysAgo(30), other.id)
  await charted(given, daysAgo(3), 28)
  const moved = {
    id: uuidv7(),
    stayId: given.stayId,
    wardId: other.id,
    bedId: other.bedIds[0] ?? '',
    movedAt: daysAgo(2),
  }
  await move(moved, given.nurse.id)
  await charted(given, daysAgo(1), 28)
  expect(isOut(await pressureOf({ ...given, ward: other }))).toEqual([false, true])
})

test('the span is that of the address, or seven days; what it does not know is that', async () => {
  const given = await aCharting()
  for (const count of [20, 5, 2, 0.5]) await charted(given, daysAgo(count), 26)
  const counts = async (search: string) => (await pressureOf(given, search)).readings.length
  expect(await counts('?span=24+h')).toBe(1)
  expect(await counts('?span=3+days')).toBe(2)
  expect(await counts('')).toBe(3)
  expect(await counts('?span=constructor')).toBe(3)
  expect(await counts('?span=Whole+stay')).toBe(4)
})

test('a retracted reading does not count', async () => {
  const given = await aCharting()
  const history = await entryWithHistory(await charted(given, daysAgo(1), 61))
  if (!history) throw new Error('The entry is not there')
  await retractEntry({ id: uuidv7(), recordedBy: given.nurse, reason: 'Other patient' }, history.entry)
  expect((await pressureOf(given)).readings).toEqual([])
})

test('after a discharge the span ends with it, and weaning offers nothing to chart', async () => {
  const given = await aCharting()
  await charted(given, daysAgo(12), 26)
  const dischargedAt = daysAgo(10)
  const left = { stayId: given.stayId, dischargedAt, reason: 'home', note: null, careAfter: false } as const
  await discharge(left, given.nurse.id)
  const { shown } = await trends(given)
  expect(shown?.to).toBe(dischargedAt.getTime())
  expect((await pressureOf(given)).readings).toHaveLength(1)
  expect(await weaning(given)).toMatchObject({ charts: [], weaning: { plan: null, running: [] } })
})

test('without a reviewed policy both pages say so', async () => {
  const given = await aStay()
  const why = 'This ward has no reviewed policy: nothing is computed.'
  expect(await trends(given)).toMatchObject({ shown: null, nothing: why })
  expect(await weaning(given)).toMatchObject({ weaning: null, nothing: why })
})

test('weaning shows the next step with its criteria, and offers to chart what this person may chart', async () => {
  const given = await aCharting(later(daysAgo(1), hours(-1)))
  const shown = await weaning(given)
  expect(shown.weaning).toMatchObject({ path: { next: 'cuff', noPath: null }, next: { title: 'Cuff deflation trial' } })
  expect(shown.charts).toContain('observations')
  expect(shown.charts).not.toContain('weaning-plan')
  const specialist = await aPerson({ name: 'Specialist', role: 'tracheostomy specialist', wardIds: [given.ward.id] })
  expect((await weaning(given, specialist)).charts).toContain('weaning-plan')
  const observer = await aPerson({ name: 'Observer', role: 'observer', wardIds: [given.ward.id] })
  expect((await weaning(given, observer)).charts).toEqual([])
})

test('looks at both pages are logged', async () => {
  const { nurse, patientId } = await aCharting()
  const [cookie = ''] = (await signIn(new Request(site), nurse, traceOfTest(nurse))).split(';')
  const paths = ['trends', 'weaning'].map(page => `/patients/${patientId}/${page}`)
  for (const path of paths) expect((await app.answer(browserRequest('GET', path, cookie))).status).toBe(200)
  const looks = await select<{ path: string }>("SELECT path FROM access_log WHERE action = 'opened patient'")
  expect(looks.map(({ path }) => path).toSorted()).toEqual(paths)
})

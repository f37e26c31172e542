import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import routes from '#app/routes.ts'
import { signedIn, visitor } from './bedside.ts'
import { launchedBrowser, type OpenedPage, rowsOf, type StartedApp, startedApp } from './browser.ts'
import { pageProblems } from './page-problems.ts'
import { type Known, notPages, pages, routesOf } from './pages.ts'

let app: StartedApp
let browser: Browser
let known: Known
const opened = new Map<string | null, Promise<OpenedPage>>()

beforeAll(async () => {
  browser = await launchedBrowser()
  app = await startedApp()
  known = await knownIn(app)
})

afterAll(async () => {
  await browser.close()
  await app.stop()
})

/** One browser for each person, signed in when they are first needed. */
function pageOf(who: string | null): Promise<OpenedPage> {
  const page = opened.get(who) ?? (who === null ? visitor(browser, app) : signedIn(browser, app, who))
  opened.set(who, page)
  return page
}

async function knownIn(on: StartedApp): Promise<Known> {
  const [here] = await rowsOf<Omit<Known, 'elsewhere'>>(
    on,
    `SELECT w.id AS ward, s.patient_id AS patient, e.id AS entry, u.id AS person,
       (SELECT l.lot FROM entries l WHERE l.stay_id = s.id AND l.lot IS NOT NULL LIMIT 1) AS lot,
       (SELECT t.patient_id FROM entries x JOIN stays t ON t.id = x.stay_id
        WHERE x.kind = 'weaning-trial' AND t.discharged_at IS NULL
        GROUP BY t.patient_id ORDER BY COUNT(*) DESC LIMIT 1) AS weaning,
       (SELECT p.id FROM policies p WHERE p.ward_id = w.id AND p.starts_at > UTC_TIMESTAMP() LIMIT 1) AS policy
     FROM wards w JOIN stays s ON s.ward_id = w.id JOIN entries e ON e.stay_id = s.id JOIN users u ON u.id = e.recorded_by
     WHERE w.name = 'Alder ward' AND s.discharged_at IS NULL AND e.kind = 'inner-cannula' AND e.status = 'final'
       AND EXISTS (SELECT 1 FROM entries l WHERE l.stay_id = s.id AND l.lot IS NOT NULL)
       AND NOT EXISTS (SELECT 1 FROM entries n WHERE n.supersedes_id = e.id)
     ORDER BY e.performed_at DESC LIMIT 1`,
  )
  const [there] = await rowsOf<{ elsewhere: string }>(
    on,
    `SELECT s.patient_id AS elsewhere FROM stays s JOIN wards w ON w.id = s.ward_id
     WHERE w.name = 'Cedar ward' AND s.discharged_at IS NULL LIMIT 1`,
  )
  if (!here || !there)
    throw new Error('The demo hospital has no patient with an inner cannula, or nobody on Cedar ward')
  return { ...here, ...there }
}

test('every route is a page that is looked at here, or says why it is none', () => {
  const listed = new Set([...pages.map(({ route }) => route), ...Object.keys(notPages)])
  expect([...listed].toSorted()).toEqual([...new Set(routesOf(routes))].toSorted())
})

const named = {
  ward: ':ward',
  patient: ':patient',
  weaning: ':weaning',
  entry: ':entry',
  elsewhere: ':elsewhere',
  person: ':person',
  policy: ':policy',
  lot: ':lot',
}
const cases = pages.map(page => ({ ...page, says: page.path(named) }))

test.each(cases)('$says is whole by day and by night, for $as', async ({ as, path }) => {
  const { page, problems } = await pageOf(as)
  const answer = await page.goto(path(known), { waitUntil: 'networkidle' })
  expect(answer?.status()).toBe(200)
  expect(await page.title()).toMatch(/^.+ \| Cannulary$/)
  expect(await pageProblems(page)).toEqual([])
  expect(problems.splice(0)).toEqual([])
})

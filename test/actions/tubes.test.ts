import ICAL from 'ical.js'
import { beforeEach, expect, test } from 'vitest'
import { signIn } from '#app/auth/session.server.ts'
import { routinePlan } from '#app/care/tube-change-plan/examples.ts'
import { tubeChangePlan } from '#app/care/tube-change-plan/kind.ts'
import { localDay } from '#app/time/zone.ts'
import { application, browserRequest } from '#test/application.ts'
import { aCharting, changed, chart, daysAgo, refusalOf, wholeForm } from '#test/charting.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson, site, traceOfTest } from '#test/people.ts'

const app = await application()
let given: Awaited<ReturnType<typeof aCharting>>
let specialist: Awaited<ReturnType<typeof aPerson>>
let cookie: string

beforeEach(async () => {
  await cleared()
  given = await aCharting(daysAgo(26))
  specialist = await aPerson({ name: 'Mads Larsen', role: 'tracheostomy specialist', wardIds: [given.ward.id] })
  cookie = ((await signIn(new Request(site), specialist, traceOfTest(specialist))).split(';')[0] ?? '').trim()
})

const today = () => localDay(new Date(), 'Europe/London')
const planOf = (changes: Readonly<Record<string, string | undefined>> = {}) =>
  changed(wholeForm(tubeChangePlan, given.nurse, { ...routinePlan, plannedOn: today() }), changes)
const sendPlan = (changes?: Readonly<Record<string, string | undefined>>) =>
  chart(given.nurse, given.patientId, tubeChangePlan.slug, planOf(changes))

async function page(method: 'GET' | 'POST', step?: string): Promise<string> {
  const request = browserRequest(method, '/tubes', cookie)
  const sent = step ? new Request(request, { body: new URLSearchParams({ step }) }) : request
  return (await app.answer(sent)).text()
}

const addressIn = (html: string): string => /\/calendar\/[\w-]+\/tubes\.ics/.exec(html)?.[0] ?? ''
const calendarAt = (path: string) => app.answer(browserRequest('GET', path, null))

test('tubes of one’s wards are listed with their change-by day and plan', async () => {
  await sendPlan()
  const html = await page('GET')
  expect(html).toContain('2 d left')
  expect(html).toContain('Okafor')
  expect(html).toContain('E. Solberg')
})

test('the calendar has the days of tubes under bed and initials, and no name', async () => {
  await sendPlan()
  const path = addressIn(await page('POST', 'make'))
  const answer = await calendarAt(path)
  expect(answer.headers.get('Content-Type')).toBe('text/calendar; charset=utf-8')
  const file = await answer.text()
  expect(file).not.toMatch(/Okafor|Ada\b/)
  const events = new ICAL.Component(ICAL.parse(file)).getAllSubcomponents('vevent').map(one => new ICAL.Event(one))
  expect(events.map(({ summary }) => summary)).toEqual(['1 A. O.: tube change planned', '1 A. O.: tube change by'])
  expect(events[0]?.startDate.toString()).toBe(today())
  const again = await (await calendarAt(path)).text()
  expect(again.match(/^UID:.*$/gm)).toEqual(file.match(/^UID:.*$/gm))
})

test('an address is ended by its owner, by a new one, and by the end of the account', async () => {
  const first = addressIn(await page('POST', 'make'))
  const second = addressIn(await page('POST', 'make'))
  expect((await calendarAt(first)).status).toBe(404)
  expect((await calendarAt(second)).status).toBe(200)
  await owner.query('UPDATE users SET disabled_at = UTC_TIMESTAMP(3) WHERE id = :id', {
    replacements: { id: specialist.id },
  })
  expect((await calendarAt(second)).status).toBe(404)
  await owner.query('UPDATE users SET disabled_at = NULL WHERE id = :id', { replacements: { id: specialist.id } })
  await page('POST', 'end')
  expect((await calendarAt(second)).status).toBe(404)
})

test('neither the table nor the access log can open a calendar', async () => {
  const path = addressIn(await page('POST', 'make'))
  await calendarAt(path)
  const secret = path.split('/')[2] ?? ''
  const [rows] = await owner.query('SELECT path, resource_id, session_hash FROM access_log')
  const [feeds] = await owner.query('SELECT * FROM calendar_feeds')
  expect(JSON.stringify([rows, feeds])).not.toContain(secret)
  expect(JSON.stringify(rows)).toContain('/calendar')
})

test('a contraindicated plan is refused at its field and keeps what was typed, until a senior decides', async () => {
  const against = { 'care.contraindications': 'support', 'care.ifItFails': 'Airway team at the bed' }
  const refused = await sendPlan(against)
  expect(refused.status).toBe(400)
  const { errors, typed } = refusalOf(refused)
  expect(Object.keys(errors)).toEqual(['care.contraindications'])
  expect(typed['care.ifItFails']).toEqual(['Airway team at the bed'])
  const decided = { ...against, 'care.senior': 'Dr N. Abara', 'care.seniorReason': 'Cuff torn' }
  expect((await sendPlan(decided)).status).toBe(302)
})

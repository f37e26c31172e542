import ICAL from 'ical.js'
import { QueryTypes } from 'sequelize'
import { beforeEach, expect, test } from 'vitest'
import { routinePlan } from '#app/care/tube-change-plan/examples.ts'
import { tubeChangePlan } from '#app/care/tube-change-plan/kind.ts'
import { loader as readCalendar } from '#app/routes/calendar.ts'
import { action as changeCalendar, loader as listTubes } from '#app/routes/tubes.tsx'
import { localDay } from '#app/time/zone.ts'
import { aCharting, changed, chart, daysAgo, refusalOf, wholeForm } from '#test/charting.ts'
import { cleared, owner } from '#test/database.ts'
import { answerOf, aPerson, contextOf, formRequest, site } from '#test/people.ts'

let given: Awaited<ReturnType<typeof aCharting>>
let specialist: Awaited<ReturnType<typeof aPerson>>

beforeEach(async () => {
  await cleared()
  given = await aCharting(daysAgo(26))
  specialist = await aPerson({ name: 'Mads Larsen', role: 'tracheostomy specialist', wardIds: [given.ward.id] })
})

const today = () => localDay(new Date(), 'Europe/London')
const planOf = (changes: Readonly<Record<string, string | undefined>> = {}) =>
  changed(wholeForm(tubeChangePlan, given.nurse, { ...routinePlan, plannedOn: today() }), changes)
const sendPlan = (changes?: Readonly<Record<string, string | undefined>>) =>
  chart(given.nurse, given.patientId, tubeChangePlan.slug, planOf(changes))

const argsOf = (request: Request) => ({
  request,
  params: {},
  url: new URL(request.url),
  context: contextOf(specialist),
  pattern: '/tubes' as const,
})
const listed = () => listTubes(argsOf(new Request(`${site}/tubes`)))
const tell = (step: string) => answerOf(() => changeCalendar(argsOf(formRequest('/tubes', { step }))))

async function newAddress(): Promise<string> {
  const answer = await changeCalendar(argsOf(formRequest('/tubes', { step: 'make' })))
  if (answer instanceof Response) throw new Error(`No address was made: ${answer.status}`)
  return new URL(answer.address).pathname
}

async function calendarAt(path: string) {
  const request = new Request(`${site}${path}`)
  const params = { secret: path.split('/')[2] ?? '' }
  const pattern = '/calendar/:secret/tubes.ics' as const
  return answerOf(async () => {
    const file = await readCalendar({ request, params, url: new URL(request.url), context: contextOf(), pattern })
    return { status: file.status, type: file.headers.get('Content-Type'), text: await file.text() }
  })
}

test('tubes of one’s wards are listed with their change-by day and plan', async () => {
  await sendPlan()
  const { tubes } = await listed()
  expect(tubes).toMatchObject([
    { bed: '1', familyName: 'Okafor', daysLeft: 2, stage: 'strong', plannedOn: today(), operator: 'E. Solberg' },
  ])
})

test('the calendar has the days of tubes under bed and initials, and no name', async () => {
  await sendPlan()
  const path = await newAddress()
  const { type, text: file = '' } = await calendarAt(path)
  expect(type).toBe('text/calendar; charset=utf-8')
  expect(file).not.toMatch(/Okafor|Ada\b/)
  const events = new ICAL.Component(ICAL.parse(file)).getAllSubcomponents('vevent').map(one => new ICAL.Event(one))
  expect(events.map(({ summary }) => summary)).toEqual(['1 A. O.: tube change planned', '1 A. O.: tube change by'])
  expect(events[0]?.startDate.toString()).toBe(today())
  const { text: again = '' } = await calendarAt(path)
  expect(again.match(/^UID:.*$/gm)).toEqual(file.match(/^UID:.*$/gm))
})

test('an address is ended by its owner, by a new one, and by the end of the account', async () => {
  const first = await newAddress()
  const second = await newAddress()
  expect((await calendarAt(first)).status).toBe(404)
  expect((await calendarAt(second)).status).toBe(200)
  await owner.query('UPDATE users SET disabled_at = UTC_TIMESTAMP(3) WHERE id = :id', {
    replacements: { id: specialist.id },
  })
  expect((await calendarAt(second)).status).toBe(404)
  await owner.query('UPDATE users SET disabled_at = NULL WHERE id = :id', { replacements: { id: specialist.id } })
  await tell('end')
  expect((await calendarAt(second)).status).toBe(404)
})

test('neither the table nor the access log can open a calendar', async () => {
  const path = await newAddress()
  await calendarAt(path)
  const secret = path.split('/')[2] ?? ''
  const select = { type: QueryTypes.SELECT } as const
  const rows = await owner.query('SELECT path, resource_id, session_hash FROM access_log', select)
  const feeds = await owner.query('SELECT * FROM calendar_feeds', select)
  expect(secret).not.toBe('')
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

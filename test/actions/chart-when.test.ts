import { QueryTypes } from 'sequelize'
import { beforeEach, expect, test } from 'vitest'
import { cuffPressure } from '#app/care/cuff-pressure/kind.ts'
import { later, minutes } from '#app/time/duration.ts'
import { localDay, localTime } from '#app/time/zone.ts'
import { discharge } from '#database/stay-changes.server.ts'
import { aCharting, changed, chart, daysAgo, openedForm, refusalOf, type Sent, wholeForm } from '#test/charting.ts'
import { cleared, owner } from '#test/database.ts'

const zone = 'Europe/London'
let given: Awaited<ReturnType<typeof aCharting>>

beforeEach(cleared)

async function opened(admittedAt?: Date) {
  given = await aCharting(admittedAt)
}

const form = (changes: Readonly<Record<string, string>>): Sent =>
  changed(wholeForm(cuffPressure, given.nurse, { found: 26, unit: 'cmH2O', method: 'manometer' }), changes)
const send = (changes: Readonly<Record<string, string>>) =>
  chart(given.nurse, given.patientId, cuffPressure.slug, form(changes))

const at = (moment: Date) => ({ when: 'other', day: localDay(moment, zone), time: localTime(moment, zone) })

async function performedAt() {
  const rows = await owner.query<{ at: Date; reason: string | null }>(
    `SELECT performed_at AS at, reason FROM entries WHERE kind = '${cuffPressure.slug}' ORDER BY number DESC LIMIT 1`,
    { type: QueryTypes.SELECT },
  )
  return rows[0]
}

test('"now" is the moment that the form showed, and "10 min ago" is ten minutes before it', async () => {
  await opened()
  const shown = new Date(Math.floor(Date.now() / 60_000) * 60_000)
  await send({ at: shown.toISOString() })
  expect((await performedAt())?.at).toEqual(shown)
  await send({ at: shown.toISOString(), when: '10 min ago' })
  expect((await performedAt())?.at).toEqual(later(shown, minutes(-10)))
})

test('what is written more than a day late needs a reason, and keeps it', async () => {
  await opened()
  const answer = await send(at(daysAgo(2)))
  expect(answer.status).toBe(400)
  expect(refusalOf(answer).errors).toEqual({ reason: ['Enter why this is written more than 24 h late'] })
  expect(await send({ ...at(daysAgo(2)), reason: 'Was kept on paper while the network was away' })).toMatchObject({
    status: 302,
  })
  expect(await performedAt()).toMatchObject({ reason: 'Was kept on paper while the network was away' })
})

test('a time to come and a time before the stay are refused at the field', async () => {
  await opened()
  const ahead = await send({ at: later(new Date(), minutes(5)).toISOString() })
  expect(ahead.status).toBe(400)
  expect(refusalOf(ahead).errors).toEqual({ when: [expect.stringMatching(/has not come yet/)] })
  const before = await send({ ...at(daysAgo(41)), reason: 'Late' })
  expect(refusalOf(before).errors).toEqual({ time: [expect.stringMatching(/^The stay began on/)] })
})

test('a time that the clocks showed twice is asked about, and then kept as it was answered', async () => {
  await opened(new Date('2024-10-20T08:00:00.000Z'))
  const twice = { when: 'other', day: '2024-10-27', time: '01:30', reason: 'Found in the paper chart' }
  const asked = await send(twice)
  expect(asked.status).toBe(400)
  expect(refusalOf(asked)).toMatchObject({ asks: true, errors: { occurrence: [expect.stringMatching(/twice/)] } })
  await send({ ...twice, occurrence: 'first' })
  expect((await performedAt())?.at).toEqual(new Date('2024-10-27T00:30:00.000Z'))
  await send({ ...twice, occurrence: 'second' })
  expect((await performedAt())?.at).toEqual(new Date('2024-10-27T01:30:00.000Z'))
})

test('a time that the clocks never showed is refused in words', async () => {
  await opened(new Date('2024-03-01T08:00:00.000Z'))
  const answer = await send({ when: 'other', day: '2024-03-31', time: '01:30', reason: 'Late' })
  expect(refusalOf(answer).errors).toEqual({
    time: ['Clocks went forward on 31-Mar-2024 and never showed 01:30. It may have been 00:30 or 02:30.'],
  })
})

test('after discharge only care of before is taken, and the form says when that was', async () => {
  await opened()
  const dischargedAt = later(daysAgo(1), minutes(90))
  const end = { stayId: given.stayId, dischargedAt, reason: 'home', note: null, careAfter: false }
  await discharge(end, given.nurse.id)
  expect(await openedForm(given.nurse, given.patientId, cuffPressure.slug)).toMatchObject({
    typed: { when: ['other'], day: [localDay(dischargedAt, zone)] },
  })
  expect(refusalOf(await send({})).errors).toEqual({ when: [expect.stringMatching(/^The stay ended on/)] })
  expect(await send(at(later(dischargedAt, minutes(-5))))).toMatchObject({ status: 302 })
})

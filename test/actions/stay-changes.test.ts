import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import type { CurrentUser } from '#app/auth/permissions.ts'
import * as discharging from '#app/routes/discharge.tsx'
import * as moving from '#app/routes/move.tsx'
import * as details from '#app/routes/patient-details.tsx'
import { addEntry } from '#database/entries.server.ts'
import { patientSummary } from '#database/patients.server.ts'
import { bedMovesOf } from '#database/stays.server.ts'
import { cleared } from '#test/database.ts'
import { answerOf, aPerson, contextOf, formRequest } from '#test/people.ts'
import { aCuffPressure, admitted, aStay, aWardOf, on } from '#test/stays.ts'

let bedside: Awaited<ReturnType<typeof aStay>>

beforeEach(async () => {
  await cleared()
  bedside = await aStay()
})

type Fields = Record<string, string>
type Page = 'move' | 'discharge' | 'details'

async function send(page: Page, fields: Fields, user: CurrentUser = bedside.nurse, patientId = bedside.patientId) {
  const path = `/patients/${patientId}/${page}`
  const request = formRequest(path, fields)
  const args = { request, url: new URL(request.url), context: contextOf(user), params: { patientId } }
  switch (page) {
    case 'move':
      return answerOf(async () => moving.action({ ...args, pattern: '/patients/:patientId/move' }))
    case 'discharge':
      return answerOf(async () => discharging.action({ ...args, pattern: '/patients/:patientId/discharge' }))
    case 'details':
      return answerOf(async () => details.action({ ...args, pattern: '/patients/:patientId/details' }))
  }
}

async function open(page: Page, user: CurrentUser) {
  const { patientId } = bedside
  const request = new Request(`http://127.0.0.1:3000/patients/${patientId}/${page}`)
  const args = { request, url: new URL(request.url), context: contextOf(user), params: { patientId } }
  switch (page) {
    case 'move':
      return answerOf(async () => moving.loader({ ...args, pattern: '/patients/:patientId/move' }))
    case 'discharge':
      return answerOf(async () => discharging.loader({ ...args, pattern: '/patients/:patientId/discharge' }))
    case 'details':
      return answerOf(async () => details.loader({ ...args, pattern: '/patients/:patientId/details' }))
  }
}

const errorsOf = ({ says }: Awaited<ReturnType<typeof send>>) =>
  (says as { reply: { error?: Record<string, string[]> } }).reply.error ?? {}

const moment = (day: string, time: string): Fields => ({
  ...{ id: uuidv7(), openedBy: bedside.nurse.id, at: '2026-12-01T14:06:40.000Z' },
  ...{ when: 'other', day: `2026-11-${day}`, time },
})

const toBed = (label: number, more: Fields = {}): Fields => ({
  ...moment('03', '09:00'),
  bedId: bedside.ward.bedIds[label - 1] ?? '',
  ...more,
})

const home = (more: Fields = {}): Fields => ({ ...moment('05', '12:00'), reason: 'home', ...more })

const known = (more: Fields = {}): Fields => ({
  ...{ version: '1', 'person.recordNumber': 'AB-12', 'person.bornOn': '1961-03-14', 'person.familyName': 'Okafor' },
  ...{ 'person.givenName': 'Ada', 'person.sex': 'female', 'person.upperAirway': 'open', 'person.ventilated': 'no' },
  ...more,
})

test('a move leads back to the board, and twice is once', async () => {
  const form = toBed(2)
  const board = { status: 302, location: `/wards/${bedside.ward.id}/board` }
  expect(await send('move', form)).toMatchObject(board)
  expect(await send('move', form)).toMatchObject(board)
  expect((await bedMovesOf(bedside.stayId)).map(({ bedLabel }) => bedLabel)).toEqual(['2', '1'])
})

test('a patient can be moved to a free bed of another ward', async () => {
  const other = await aWardOf(1, 'Ward 8')
  expect(await send('move', toBed(1, { bedId: other.bedIds[0] ?? '' }))).toMatchObject({ status: 302 })
  expect((await patientSummary(bedside.patientId))?.stay.wardName).toBe('Ward 8')
  expect((await send('move', toBed(2))).status).toBe(302)
  expect((await patientSummary(bedside.patientId))?.stay.wardName).toBe('Ward 8')
})

test.each<[string, Fields, string, RegExp]>([
  ['no bed', { bedId: '' }, 'bedId', /Choose a free bed/],
  ['a bed of nowhere', { bedId: '018f0000-0000-7000-8000-000000000000' }, 'bedId', /not free any more/],
  ['a time before the admission', { day: '2026-11-01', time: '07:00' }, 'time', /began on 01-Nov-2026 08:00/],
  ['a time to come', { day: '2126-11-01' }, 'time', /not come yet/],
  ['no time', { time: '' }, 'time', /Enter the time/],
])('a move with %s is put right at its field', async (_, wrong, field, words) => {
  const answer = await send('move', toBed(2, wrong))
  expect(answer.status).toBe(400)
  expect(errorsOf(answer)[field]?.join()).toMatch(words)
})

test('a move to a bed that is taken is put right at its field', async () => {
  await admitted(bedside.ward.id, bedside.ward.bedIds[1] ?? '', bedside.nurse.id)
  expect(errorsOf(await send('move', toBed(2))).bedId?.[0]).toMatch(/not free any more/)
  expect(errorsOf(await send('move', toBed(1))).bedId?.[0]).toMatch(/not free any more|in this bed already/)
})

test('a discharge leads back to the board, and twice is once', async () => {
  const form = home({ note: 'With her daughter' })
  const board = { status: 302, location: `/wards/${bedside.ward.id}/board` }
  expect(await send('discharge', form)).toMatchObject(board)
  expect(await send('discharge', form)).toMatchObject(board)
  const summary = await patientSummary(bedside.patientId)
  expect(summary?.stay).toMatchObject({ dischargedAt: on('05', '12:00'), dischargeNote: 'With her daughter' })
  expect((await send('discharge', home({ reason: 'died' }))).status).toBe(409)
})

test('a discharge of before the last care asks, and takes the answer', async () => {
  const { stayId, nurse } = bedside
  await addEntry(aCuffPressure(stayId, nurse, { performedAt: on('05', '14:00') }))
  expect(errorsOf(await send('discharge', home())).careAfter?.[0]).toMatch(/charted for 05-Nov-2026 14:00/)
  expect(await send('discharge', home({ careAfter: 'yes' }))).toMatchObject({ status: 302 })
})

test.each<[string, Fields, string, RegExp]>([
  ['no answer', { reason: '' }, 'reason', /Choose the destination/],
  ['an answer that is none', { reason: 'space' }, 'reason', /Choose the destination/],
  ['a note of 5000 letters', { note: 'x'.repeat(5000) }, 'note', /at most 500/],
])('a discharge with %s is put right at its field', async (_, wrong, field, words) => {
  const answer = await send('discharge', home(wrong))
  expect(answer.status).toBe(400)
  expect(errorsOf(answer)[field]?.join()).toMatch(words)
})

test('details are changed, and who changed what is shown', async () => {
  const edited = known({ 'person.allergies': 'Latex', 'person.upperAirway': 'not open' })
  expect(await send('details', edited)).toMatchObject({
    status: 302,
    location: `/patients/${bedside.patientId}/details?saved`,
  })
  expect((await patientSummary(bedside.patientId))?.patient).toMatchObject({ allergies: 'Latex', version: 2 })
  const page = (await open('details', bedside.nurse)) as Awaited<ReturnType<typeof details.loader>>
  expect(page.history.changes[0]).toMatchObject({
    who: 'Nurse of Ward 7',
    details: expect.arrayContaining(['Allergies: not recorded, now Latex', 'Upper airway: open, now not open']),
  })
})

test('details that somebody changed meanwhile are not overwritten', async () => {
  await send('details', known({ 'person.allergies': 'Latex' }))
  expect((await send('details', known({ 'person.allergies': 'Iodine' }))).status).toBe(409)
  expect((await patientSummary(bedside.patientId))?.patient.allergies).toBe('Latex')
})

test.each<[string, Fields, string]>([
  ['no version', { version: '' }, 'version'],
  ['no family name', { 'person.familyName': ' ' }, 'person.familyName'],
  ['a birth to come', { 'person.bornOn': '2126-01-01' }, 'person.bornOn'],
])('details with %s are put right at the field', async (_, wrong, field) => {
  const answer = await send('details', known(wrong))
  expect(answer.status).toBe(400)
  expect(errorsOf(answer)[field]).toHaveLength(1)
})

test.each<[CurrentUser['role'], Page, number]>([
  ['nurse', 'move', 302],
  ['charge nurse', 'discharge', 302],
  ['tracheostomy specialist', 'details', 302],
  ['tracheostomy specialist', 'move', 403],
  ['respiratory therapist', 'move', 403],
  ['respiratory therapist', 'discharge', 403],
  ['observer', 'details', 403],
  ['administrator', 'discharge', 404],
])('%s who would %s is answered %i', async (role, page, status) => {
  const user = await aPerson({ role, wardIds: [bedside.ward.id] })
  const forms = { move: toBed(2), discharge: home(), details: known() }
  expect((await send(page, { ...forms[page], openedBy: user.id }, user)).status).toBe(status)
  if (status !== 302) expect((await open(page, user)).status).toBe(status)
})

test.each<Page>(['move', 'discharge', 'details'])(
  'the page to %s of another ward asks for a reason first',
  async page => {
    const user = await aPerson({ role: 'charge nurse', wardIds: [(await aWardOf(1, 'Ward 8')).id] })
    expect(await open(page, user)).toMatchObject({
      status: 302,
      location: expect.stringContaining('/access?returnTo='),
    })
    expect((await send(page, home(), user, uuidv7())).status).toBe(404)
  },
)

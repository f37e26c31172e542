import { QueryTypes } from 'sequelize'
import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { signIn } from '#app/auth/session.server.ts'
import { addEntry, retractEntry } from '#database/entries.server.ts'
import { entryWithHistory } from '#database/timeline.server.ts'
import { application, browserRequest } from '#test/application.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson, site, traceOfTest } from '#test/people.ts'
import { aCuffPressure, aStay } from '#test/stays.ts'

const app = await application()

beforeEach(cleared)

async function browserOf(user: CurrentUser) {
  const [cookie = ''] = (await signIn(new Request(site), user, traceOfTest(user))).split(';')
  return async (method: 'GET' | 'POST', path: string) => (await app.answer(browserRequest(method, path, cookie))).status
}

const looks = () =>
  owner.query<{ action: string; path: string }>(
    `SELECT action, path FROM access_log WHERE action IN ('opened patient', 'saw board') ORDER BY at, chain, seq`,
    { type: QueryTypes.SELECT },
  )

test('a patient whose data alone is asked for is looked at, once a session', async () => {
  const { nurse, patientId } = await aStay()
  const ask = await browserOf(nurse)
  await ask('GET', `/api/patients/${patientId}/timeline`)
  await ask('GET', `/api/patients/${patientId}/timeline?span=12%20h`)
  expect(await looks()).toEqual([{ action: 'opened patient', path: `/patients/${patientId}` }])
})

test('a page that keeps itself up to date is one look', async () => {
  const { nurse, ward, patientId } = await aStay()
  const ask = await browserOf(nurse)
  await ask('GET', `/patients/${patientId}`)
  await ask('GET', `/api/patients/${patientId}/timeline`)
  await ask('GET', `/wards/${ward.id}/board`)
  await ask('GET', `/api/wards/${ward.id}/board`)
  expect(await looks()).toEqual([
    { action: 'opened patient', path: `/patients/${patientId}` },
    { action: 'saw board', path: `/wards/${ward.id}/board` },
  ])
})

test('a retraction can be read, and neither corrected nor retracted', async () => {
  const { stayId, ward } = await aStay()
  const author = await aPerson({ role: 'charge nurse', wardIds: [ward.id] })
  const entryId = uuidv7()
  await addEntry(aCuffPressure(stayId, author, { id: entryId }))
  const history = await entryWithHistory(entryId)
  if (!history) throw new Error('The entry is not there')
  const retractionId = uuidv7()
  await retractEntry({ id: retractionId, recordedBy: author, reason: 'Other patient' }, history.entry)
  const ask = await browserOf(author)
  expect(await ask('GET', `/entries/${retractionId}`)).toBe(200)
  for (const act of ['correct', 'retract']) {
    expect(await ask('GET', `/entries/${retractionId}/${act}`)).toBe(403)
    expect(await ask('POST', `/entries/${retractionId}/${act}`)).toBe(403)
  }
})

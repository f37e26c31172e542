import { beforeEach, expect, test } from 'vitest'
import { timelineTag } from '#app/views/patient-timeline.server.ts'
import { stayRecord } from '#database/records.server.ts'
import { discharge } from '#database/stay-changes.server.ts'
import { cleared } from '#test/database.ts'
import { site } from '#test/people.ts'
import { aStay, on } from '#test/stays.ts'

beforeEach(cleared)

test('a page that is open notices a discharge, though nothing was charted', async () => {
  const { stayId, nurse } = await aStay()
  const tag = async () => {
    const record = await stayRecord(stayId)
    if (!record) throw new Error('The stay is not there')
    return timelineTag(record, new URL(site), on('02', '10:00'))
  }
  const before = await tag()
  expect(await tag()).toBe(before)
  await discharge({ stayId, dischargedAt: on('02', '09:00'), reason: 'home', note: null, careAfter: false }, nurse.id)
  expect(await tag()).not.toBe(before)
})

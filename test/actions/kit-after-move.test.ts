import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { wholeKit } from '#app/care/bedside-kit/examples.ts'
import { kitChecks } from '#app/care/bedside-kit/schema.ts'
import { minutes } from '#app/time/duration.ts'
import { patientCare } from '#app/views/patient-context.server.ts'
import { patientTimeline, timelineTag } from '#app/views/patient-timeline.server.ts'
import { wardBoard } from '#app/views/ward-board.server.ts'
import { addEntry } from '#database/entries.server.ts'
import { move } from '#database/stay-changes.server.ts'
import { aCharting } from '#test/charting.ts'
import { cleared } from '#test/database.ts'
import { aWardOf } from '#test/stays.ts'

let given: Awaited<ReturnType<typeof aCharting>>
const url = new URL('http://127.0.0.1:3000/')
const ago = (count: number) => new Date(Date.now() - minutes(count))

beforeEach(async () => {
  await cleared()
  given = await aCharting()
  const { stayId, nurse } = given
  const checked = { id: uuidv7(), kind: kitChecks, stayId, recordedBy: nurse, data: wholeKit }
  await addEntry({ ...checked, performedAt: ago(50) })
})

async function moveTo(bedId: string, at: Date, wardId = given.ward.id) {
  const moved = await move({ id: uuidv7(), stayId: given.stayId, wardId, bedId, movedAt: at }, given.nurse.id)
  expect(moved.outcome).toBe('moved')
}

/** When the kit is due by the patient's page, and why; and when by the board of the ward. */
async function kitDue(wardId = given.ward.id) {
  const now = new Date()
  const care = await patientCare(given.stayId, now)
  const { data } = await patientTimeline(care, url, now)
  const isKit = ({ name }: { readonly name: string }) => name === 'bedside-kit-check'
  const board = await wardBoard(wardId, now)
  return {
    because: data.care.tasks.find(isKit)?.because,
    dueAt: data.care.tasks.find(isKit)?.window?.dueAt,
    onBoard: board?.data.patients[0]?.care.tasks.find(isKit)?.window?.dueAt,
    tag: timelineTag(care.record, url, now),
  }
}

test('a move asks for a kit check at once, on the page and on the board, and a move back does so again', async () => {
  const [first = '', second = ''] = given.ward.bedIds
  const before = await kitDue()
  expect(before.because).toBeUndefined()
  const [there, back] = [ago(20), ago(10)]
  await moveTo(second, there)
  const moved = await kitDue()
  const dueAt = there.getTime() + minutes(30)
  expect(moved).toMatchObject({ because: 'the patient was moved to bed 2', dueAt, onBoard: dueAt })
  await addEntry({
    ...{ id: uuidv7(), kind: kitChecks, stayId: given.stayId, recordedBy: given.nurse, data: wholeKit },
    performedAt: ago(15),
  })
  expect((await kitDue()).because).toBeUndefined()
  await moveTo(first, back)
  const again = await kitDue()
  expect(again).toMatchObject({ because: 'the patient was moved to bed 1', onBoard: back.getTime() + minutes(30) })
  expect(new Set([before.tag, moved.tag, again.tag]).size).toBe(3)
})

test('a move to another ward names it, and is due on the board of that ward', async () => {
  const other = await aWardOf(1, 'Ward 8')
  const at = ago(5)
  await moveTo(other.bedIds[0] ?? '', at, other.id)
  expect(await kitDue(other.id)).toMatchObject({
    because: 'the patient was moved to Ward 8, bed 1',
    onBoard: at.getTime() + minutes(30),
  })
})

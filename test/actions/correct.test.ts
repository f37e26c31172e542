import { QueryTypes } from 'sequelize'
import { beforeEach, expect, test } from 'vitest'
import type { NotRetracted } from '#app/views/retraction.server.ts'
import { aCharting, refusalOf } from '#test/charting.ts'
import { cleared, owner } from '#test/database.ts'
import { aChartedPressure, aCorrectionForm, aRetractionForm, entryPages } from '#test/entries.ts'
import { aPerson } from '#test/people.ts'

const { see, correct, retract, openCorrect, openRetract } = entryPages
let given: Awaited<ReturnType<typeof aCharting>>
let entryId: string

beforeEach(async () => {
  await cleared()
  given = await aCharting()
  entryId = await aChartedPressure(given.stayId, given.nurse)
})

const idOf = (form: readonly (readonly [string, string])[]) => form.find(([name]) => name === 'id')?.[1] ?? ''
const chargeNurse = () => aPerson({ name: 'Odalys Verstraeten', role: 'charge nurse', wardIds: [given.ward.id] })

const pressures = () =>
  owner.query<{ id: string; status: string; reason: string | null; supersedes: string | null }>(
    `SELECT id, status, reason, supersedes_id AS supersedes FROM entries WHERE kind = 'cuff-pressure' ORDER BY number`,
    { type: QueryTypes.SELECT },
  )

test('the form of a correction opens with the entry, at the time it was done', async () => {
  const { form, entry } = await openCorrect(given.nurse, entryId)
  expect(form?.typed).toMatchObject({ 'care.found': ['26'], 'care.method': ['manometer'], when: ['other'] })
  expect(form?.typed.day?.[0]).toMatch(/^\d{4}-\d\d-\d\d$/)
  expect(entry).toMatchObject({ standing: 'final', mayCorrect: true, mayRetract: true })
})

test('a correction is a new entry with its reason, and the old words stay', async () => {
  const form = aCorrectionForm(given.nurse)
  expect(await correct(given.nurse, entryId, form)).toMatchObject({
    status: 302,
    location: `/patients/${given.patientId}?charted=${idOf(form)}`,
  })
  expect(await pressures()).toMatchObject([
    { id: entryId, supersedes: null },
    { id: idOf(form), supersedes: entryId, reason: 'Read the wrong line of the gauge' },
  ])
  expect(await see(given.nurse, entryId)).toMatchObject({
    standing: 'corrected',
    sentence: 'Cuff pressure 26 cmH2O by manometer, not adjusted.',
    replacedBy: { href: `/entries/${idOf(form)}` },
    history: [{ isShown: true }, { isShown: false, reason: 'Read the wrong line of the gauge' }],
    mayCorrect: false,
    mayRetract: false,
  })
})

test('the same correction sent again is one', async () => {
  const form = aCorrectionForm(given.nurse)
  await Promise.all([correct(given.nurse, entryId, form), correct(given.nurse, entryId, form)])
  expect(await correct(given.nurse, entryId, form)).toMatchObject({ status: 302 })
  expect(await pressures()).toHaveLength(2)
})

test('a correction needs a reason', async () => {
  const answer = await correct(given.nurse, entryId, aCorrectionForm(given.nurse, { reason: ' ' }))
  expect(answer.status).toBe(400)
  expect(refusalOf(answer).errors).toEqual({ reason: ['Enter why the entry is corrected'] })
  expect(await pressures()).toHaveLength(1)
})

test('the second of two corrections is told who was faster, and keeps what was typed', async () => {
  const other = await chargeNurse()
  await correct(other, entryId, aCorrectionForm(other))
  const answer = await correct(given.nurse, entryId, aCorrectionForm(given.nurse, { 'care.found': '25' }))
  expect(answer.status).toBe(409)
  const { errors, typed, see: latest } = refusalOf(answer)
  expect(errors['']?.[0]).toMatch(/^Odalys Verstraeten corrected or retracted this entry on/)
  expect(typed['care.found']).toEqual(['25'])
  expect(latest?.href).toMatch(/^\/entries\//)
  expect(await pressures()).toHaveLength(2)
})

test('an entry that was corrected leads to its latest version', async () => {
  const form = aCorrectionForm(given.nurse)
  await correct(given.nurse, entryId, form)
  const { entry } = await openCorrect(given.nurse, entryId)
  expect(entry?.replacedBy?.href).toBe(`/entries/${idOf(form)}`)
})

test('a retraction is read back first, strikes the entry through, and counts once', async () => {
  const page = await openRetract(given.nurse, entryId)
  expect(page.entry?.sentence).toBe('Cuff pressure 26 cmH2O by manometer, not adjusted.')
  const form = aRetractionForm(given.nurse)
  const answers = await Promise.all([retract(given.nurse, entryId, form), retract(given.nurse, entryId, form)])
  for (const answer of answers) expect(answer).toMatchObject({ status: 302, location: `/entries/${entryId}` })
  expect(await pressures()).toMatchObject([{ id: entryId }, { status: 'retracted', supersedes: entryId }])
  expect(await see(given.nurse, entryId)).toMatchObject({ standing: 'retracted', mayCorrect: false, mayRetract: false })
})

test('a retraction needs a reason, its own person and an entry that still counts', async () => {
  const problemsOf = (answer: { says?: unknown }) => (answer.says as NotRetracted).problems
  const empty = await retract(given.nurse, entryId, aRetractionForm(given.nurse, '  '))
  expect(empty.status).toBe(400)
  expect(problemsOf(empty)).toEqual([{ fieldId: 'reason', says: 'Enter why this entry is in error' }])
  const other = await chargeNurse()
  const foreign = await retract(other, entryId, aRetractionForm(given.nurse))
  expect(foreign.status).toBe(409)
  expect(problemsOf(foreign)[0]?.says).toMatch(
    /signed in as Odalys Verstraeten; this form was opened by Nurse of Ward 7/,
  )
  await correct(other, entryId, aCorrectionForm(other))
  const late = await retract(other, entryId, aRetractionForm(other))
  expect(late.status).toBe(409)
  expect(problemsOf(late)[0]?.says).toMatch(/^Odalys Verstraeten corrected or retracted/)
  expect(await pressures()).toHaveLength(2)
})

test('an entry shows what it warned of when it was charted, under the policy of that day', async () => {
  const form = aCorrectionForm(given.nurse, { 'care.found': '34' })
  await correct(given.nurse, entryId, form)
  expect(await see(given.nurse, idOf(form))).toMatchObject({
    warnings: [{ name: 'cuff-high' }],
    policy: 'Tracheostomy care, version 1, reviewed by M. Osei on 02-Jan-2024.',
    details: expect.arrayContaining([{ label: 'Pressure found', value: '34 cmH2O' }]),
  })
})

test('an entry that cannot be read is shown as it is stored, and can be retracted', async () => {
  await owner.query(
    `INSERT INTO entries (id, stay_id, kind, version, performed_at, recorded_by, recorded_role, data)
    VALUES ('018f0000-0000-7000-8000-00000000000a', :stayId, 'cuff-pressure', 9, UTC_TIMESTAMP(3), :by, 'nurse', '{"strange":1}')`,
    {
      replacements: { stayId: given.stayId, by: given.nurse.id },
    },
  )
  const id = '018f0000-0000-7000-8000-00000000000a'
  expect(await see(given.nurse, id)).toMatchObject({ raw: '{\n  "strange": 1\n}', details: [], mayRetract: true })
  expect(await openCorrect(given.nurse, id)).toMatchObject({ form: { isReadable: false } })
  expect(await retract(given.nurse, id, aRetractionForm(given.nurse))).toMatchObject({ status: 302 })
})

import { QueryTypes } from 'sequelize'
import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { cuffPressure } from '#app/care/cuff-pressure/kind.ts'
import { innerCannula } from '#app/care/inner-cannula/kind.ts'
import { saveDraft } from '#database/drafts.server.ts'
import { aCharting, changed, chart, openedForm, refusalOf, type Sent, wholeForm } from '#test/charting.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson } from '#test/people.ts'

type Given = Awaited<ReturnType<typeof aCharting>>
let given: Given

beforeEach(async () => {
  await cleared()
  given = await aCharting()
})

const slug = cuffPressure.slug
const form = (changes: Readonly<Record<string, string | undefined>> = {}): Sent =>
  changed(wholeForm(cuffPressure, given.nurse, { found: 26, unit: 'cmH2O', method: 'manometer' }), changes)
const send = (sent: Sent, user = given.nurse) => chart(user, given.patientId, slug, sent)
const fieldOf = (sent: Sent, name: string) => sent.find(([field]) => field === name)?.[1] ?? ''

const stored = () =>
  owner.query<{ id: string; reason: string | null; data: { found?: number }; witness: string | null }>(
    'SELECT id, reason, data, witness_id AS witness FROM entries WHERE kind = :slug ORDER BY number',
    { replacements: { slug }, type: QueryTypes.SELECT },
  )

test('a whole form is charted and leads to the timeline', async () => {
  const sent = form()
  const answer = await send(sent)
  expect(answer).toMatchObject({ status: 302, location: `/patients/${given.patientId}?charted=${fieldOf(sent, 'id')}` })
  expect(await stored()).toMatchObject([{ data: { found: 26 } }])
})

test('the same form sent again is one act, and is answered as the first was', async () => {
  const sent = form()
  const answers = await Promise.all([send(sent), send(sent), send(sent)])
  expect(new Set(answers.map(({ location }) => location)).size).toBe(1)
  expect(await stored()).toHaveLength(1)
})

test('other answers under a used id are refused with a fresh id, and everything typed is kept', async () => {
  const sent = form()
  await send(sent)
  const second = await send(changed(sent, { 'care.found': '34' }))
  expect(second.status).toBe(422)
  const { id, typed, see } = refusalOf(second)
  expect(id).not.toBe(fieldOf(sent, 'id'))
  expect(typed['care.found']).toEqual(['34'])
  expect(see?.href).toBe(`/entries/${fieldOf(sent, 'id')}`)
  expect(await stored()).toMatchObject([{ data: { found: 26 } }])
  expect(await send(changed(sent, { id, 'care.found': '34' }))).toMatchObject({ status: 302 })
})

test('mistakes are said at their fields, and what was typed stays', async () => {
  const answer = await send(form({ 'care.found': '340', 'care.method': undefined }))
  expect(answer.status).toBe(400)
  const { errors, typed } = refusalOf(answer)
  expect(errors).toEqual({
    'care.found': ['Pressure found must be from 0 to 120'],
    'care.method': [expect.stringMatching(/^Choose/)],
  })
  expect(typed['care.found']).toEqual(['340'])
  expect(await stored()).toEqual([])
})

test('a preview and a look before charting store nothing', async () => {
  const high = form({ 'care.found': '34' })
  expect(await send([...high, ['intent', 'preview']])).toMatchObject({
    status: 200,
    says: { is: 'previewed', warnings: [{ name: 'cuff-high', level: 'amber' }] },
  })
  const look = await send([...high, ['intent', 'review']])
  expect(look).toMatchObject({
    status: 200,
    says: { is: 'reviewed', warnings: [{ name: 'cuff-high' }], typed: { 'care.found': ['34'] } },
  })
  expect((look.says as { sentence: string }).sentence).toMatch(
    /^\d\d:\d\d Cuff pressure 34 cmH2O by manometer, not adjusted\. Nurse of Ward 7, nurse\.$/,
  )
  expect(await send([...form({ 'care.method': undefined }), ['intent', 'preview']])).toMatchObject({
    status: 200,
    says: { is: 'previewed', warnings: [] },
  })
  expect(await stored()).toEqual([])
})

test('a form that somebody else opened is refused with both names, and signed by who is there the next time', async () => {
  const other = await aPerson({ name: 'Kofi Lindstrand', role: 'respiratory therapist', wardIds: [given.ward.id] })
  const sent = form()
  const answer = await send(sent, other)
  expect(answer.status).toBe(409)
  const { errors, signer, typed } = refusalOf(answer)
  expect(errors['']?.[0]).toMatch(/You are signed in as Kofi Lindstrand; this form was opened by Nurse of Ward 7/)
  expect(typed['care.found']).toEqual(['26'])
  expect(await stored()).toEqual([])
  expect(await send(changed(sent, { openedBy: signer.id }), other)).toMatchObject({ status: 302 })
})

test('a second person is somebody else of this ward', async () => {
  const other = await aPerson({ name: 'Kofi Lindstrand', wardIds: [given.ward.id] })
  expect(await send(form({ witness: other.id }))).toMatchObject({ status: 302 })
  expect(await stored()).toMatchObject([{ witness: other.id }])
  for (const witness of [given.nurse.id, uuidv7(), given.ward.admin.id]) {
    const answer = await send(form({ witness }))
    expect(answer.status).toBe(400)
    expect(refusalOf(answer).errors).toEqual({ witness: ['Choose the second person from the list'] })
  }
})

test('a body that is no form is a 400 in words', async () => {
  const request = new Request(`http://127.0.0.1:3000/patients/${given.patientId}/chart/${slug}`, {
    method: 'POST',
    body: '{"care":',
    headers: { 'Content-Type': 'application/json', Origin: 'http://127.0.0.1:3000' },
  })
  expect(await chart(given.nurse, given.patientId, slug, request)).toMatchObject({
    status: 400,
    says: 'This is not a form. Nothing was charted.',
  })
})

test('a form opens with the facts of the record, what the task says, and the usual act when asked', async () => {
  const plain = await openedForm(given.nurse, given.patientId, slug)
  expect(plain).toMatchObject({
    typed: { 'care.unit': ['cmH2O'] },
    recently: null,
    due: { status: 'seriously overdue' },
  })
  const usual = await openedForm(given.nurse, given.patientId, innerCannula.slug, '?usual=1&task=no-such-task')
  expect(usual.usual).not.toBeNull()
  expect(usual.typed).toMatchObject(usual.usual?.answers ?? {})
  expect(usual.typed?.['care.condition']).toBeUndefined()
})

test('a form says who charted the same a moment ago', async () => {
  await send(form())
  const other = await aPerson({ name: 'Kofi Lindstrand', wardIds: [given.ward.id] })
  expect((await openedForm(other, given.patientId, slug)).recently).toMatch(
    /^Nurse of Ward 7 charted this (less than 1 min|\d min) ago: Cuff pressure 26 cmH2O/,
  )
  expect((await openedForm(given.nurse, given.patientId, slug)).recently).toMatch(/^You charted this/)
})

test('what was typed when a session ended comes back once, to its author alone, at the time it was meant for', async () => {
  const path = `/patients/${given.patientId}/chart/${slug}`
  const draft = Object.fromEntries(form({ at: '2026-11-30T14:06:30.000Z' }).map(([name, value]) => [name, [value]]))
  await saveDraft(given.nurse.id, path, draft, 24)
  const other = await aPerson({ name: 'Kofi Lindstrand', wardIds: [given.ward.id] })
  expect(await openedForm(other, given.patientId, slug)).toMatchObject({ isRestored: false })
  const back = await openedForm(given.nurse, given.patientId, slug)
  expect(back).toMatchObject({
    isRestored: true,
    typed: { 'care.found': ['26'], when: ['other'], day: ['2026-11-30'], time: ['14:06'] },
  })
  expect(back.id).not.toBe(draft.id?.[0])
  expect(await openedForm(given.nurse, given.patientId, slug)).toMatchObject({ isRestored: false })
})

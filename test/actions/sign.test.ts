import { QueryTypes } from 'sequelize'
import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { patientContext, patientGate } from '#app/auth/patient-access.server.ts'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { bedHeadSigns } from '#app/care/bed-head-sign/schema.ts'
import { aTube } from '#app/care/make.ts'
import { tubeChange } from '#app/care/tube-change/kind.ts'
import { action, loader } from '#app/routes/sign.tsx'
import { loader as pdfLoader } from '#app/routes/sign-pdf.ts'
import { addEntry } from '#database/entries.server.ts'
import { discharge } from '#database/stay-changes.server.ts'
import { aCharting } from '#test/charting.ts'
import { cleared, owner } from '#test/database.ts'
import { answerOf, aPerson, aWard, contextOf, formRequest, site } from '#test/people.ts'
import { readPdf } from '#test/read-pdf.ts'

let given: Awaited<ReturnType<typeof aCharting>>
let page: string

beforeEach(async () => {
  await cleared()
  given = await aCharting()
  page = `/patients/${given.patientId}/sign`
})

const argsOf = (request: Request, user: CurrentUser) => ({
  request,
  url: new URL(request.url),
  context: contextOf(user),
  params: { patientId: given.patientId },
})

async function open(user: CurrentUser = given.nurse) {
  const args = argsOf(new Request(`${site}${page}`), user)
  args.context.set(patientContext, await patientGate(user, given.patientId, { path: page, act: 'see patients' }))
  return loader({ ...args, pattern: '/patients/:patientId/sign' })
}

type Fields = Record<string, string>
const press = (fields: Fields, user: CurrentUser = given.nurse) => {
  const args = argsOf(formRequest(page, fields), user)
  return answerOf(() => action({ ...args, pattern: '/patients/:patientId/sign' }))
}
const download = (user: CurrentUser = given.nurse) => {
  const args = argsOf(new Request(`${site}${page}.pdf`), user)
  return answerOf(async () => {
    const file = await pdfLoader({ ...args, pattern: '/patients/:patientId/sign.pdf' })
    return { type: file.headers.get('Content-Type'), pdf: await readPdf(new Uint8Array(await file.arrayBuffer())) }
  })
}

/** The form of the page as it was opened, with one of its buttons. */
async function aForm(act = 'printed', more: Fields = {}): Promise<Fields> {
  const { form } = await open()
  if (!form) throw new Error('The page has no form')
  return { id: form.id, shows: form.shows, act, ...more }
}

const noted = () =>
  owner.query<{ role: string }>('SELECT recorded_role AS role FROM entries WHERE kind = :slug', {
    replacements: { slug: bedHeadSigns.slug },
    type: QueryTypes.SELECT,
  })

const changeTube = () => {
  const { stayId, nurse } = given
  return addEntry({
    ...{ id: uuidv7(), kind: tubeChange, stayId, recordedBy: nurse },
    ...{ performedAt: new Date(Date.now() - 60_000), data: aTube({ size: '7.0' }) },
  })
}

test('a printed sign is noted and hangs until the tube is changed', async () => {
  const form = await aForm()
  expect(await press(form)).toMatchObject({ status: 302, location: `${page}?printed=${form.id}` })
  expect((await open()).hanging).toMatchObject({ entryId: form.id, changed: [] })
  expect((await download()).pdf?.pages).toHaveLength(1)
  await changeTube()
  expect((await open()).hanging).toMatchObject({ changed: ['the tube or what is charted of it'] })
  expect(await download()).toMatchObject({ status: 302, location: page })
})

test('the PDF is there once it is noted, and says whose sign it is', async () => {
  expect(await download()).toMatchObject({ status: 302, location: page })
  expect(await press(await aForm('downloaded'))).toMatchObject({ status: 302, location: `${page}.pdf` })
  const { type, pdf } = await download()
  expect([type, pdf?.title]).toEqual(['application/pdf', 'Bed-head sign, bed 1'])
  expect(pdf?.pages[0]?.words).toContain('OKAFOR,Ada')
})

test('the same form three times at once is one sign; its id with another button, or by somebody else, is refused', async () => {
  const form = await aForm()
  const answers = await Promise.all([press(form), press(form), press(form)])
  expect(answers.map(({ status }) => status)).toEqual([302, 302, 302])
  const says = { problem: 'This was noted before. Open the page again to print once more.' }
  expect(await press({ ...form, act: 'downloaded' })).toEqual({ status: 422, says })
  const other = await aPerson({ name: 'Ngozi Adeyemi', wardIds: [given.ward.id] })
  expect(await press(form, other)).toEqual({ status: 422, says })
  expect(await noted()).toHaveLength(1)
})

test('a sign that is no longer true when its button is pressed is not noted', async () => {
  const form = await aForm()
  await changeTube()
  expect(await press(form)).toMatchObject({ status: 409, says: { problem: expect.stringMatching(/charted anew/) } })
  expect(await noted()).toEqual([])
  expect(await press(await aForm())).toMatchObject({ status: 302 })
})

test('a sign that was taken down hangs no more', async () => {
  await press(await aForm())
  expect(await press(await aForm('taken down'))).toMatchObject({ status: 302, location: page })
  expect((await open()).hanging).toBeNull()
  expect(await download()).toMatchObject({ status: 302, location: page })
})

test('once the patient has left there is nothing to print', async () => {
  const form = await aForm()
  const end = { stayId: given.stayId, dischargedAt: new Date(), reason: 'home', note: null, careAfter: true }
  await discharge(end, given.nurse.id)
  expect(await press(form)).toEqual({ status: 409, says: { problem: 'The patient is not here any more.' } })
  expect((await open()).form).toBeNull()
})

test.each<[string, Fields]>([
  ['no id', { id: '' }],
  ['an id that is none', { id: 'x' }],
  ['another button', { act: 'burnt' }],
  ['no button', { act: '' }],
  ['nothing that it shows', { shows: '' }],
])('a form with %s has lost a part of itself', async (_, change) => {
  expect(await press(await aForm('printed', change))).toMatchObject({ status: 400 })
  expect(await noted()).toEqual([])
})

test.each(['{"form":"not open"}', '[]', '"', 'x'.repeat(200_000), '{"__proto__":1}'])(
  'what the page did not show is not noted',
  async shows => {
    expect(await press(await aForm('printed', { shows }))).toMatchObject({ status: 409 })
    expect(await noted()).toEqual([])
  },
)

test('an observer sees the sign and notes nothing', async () => {
  const form = await aForm()
  await press(await aForm())
  const observer = await aPerson({ name: 'Ola Berg', role: 'observer', wardIds: [given.ward.id] })
  expect((await open(observer)).form).toBeNull()
  expect((await download(observer)).type).toBe('application/pdf')
  expect(await press(form, observer)).toMatchObject({ status: 403 })
  expect(await noted()).toHaveLength(1)
})

test('a student prints under supervision, and the entry says so', async () => {
  const student = await aPerson({ name: 'Kit Vale', wardIds: [given.ward.id], isSupervised: true })
  await press(await aForm(), student)
  expect(await noted()).toMatchObject([{ role: 'nurse under supervision' }])
})

test('somebody of another ward is asked for a reason first', async () => {
  const form = await aForm()
  const elsewhere = await aPerson({ name: 'Jo Brand', wardIds: [await aWard('Ward 8')] })
  const asked = { status: 302, location: expect.stringContaining(`/patients/${given.patientId}/access`) }
  expect(await press(form, elsewhere)).toMatchObject(asked)
  expect(await download(elsewhere)).toMatchObject(asked)
  expect(await noted()).toEqual([])
})

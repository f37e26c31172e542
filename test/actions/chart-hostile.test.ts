import { QueryTypes } from 'sequelize'
import { beforeAll, expect, test } from 'vitest'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { fieldsOf } from '#app/care/field.ts'
import type { FieldMeta } from '#app/care/field-meta.ts'
import type { AnyCareKind } from '#app/care/kind.ts'
import { careKinds } from '#app/care/kinds.ts'
import { aCharting, changed, chart, openedForm, type Sent, wholeForm } from '#test/charting.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson } from '#test/people.ts'

// Whatever a form holds, the answer is a page with words: an error that is thrown would fail the test. Nothing is stored.

let patientId: string
let user: CurrentUser

beforeAll(async () => {
  await cleared()
  const given = await aCharting()
  patientId = given.patientId
  user = await aPerson({ name: 'Ingrid Adeyemi', role: 'tracheostomy specialist', wardIds: [given.ward.id] })
})

// Those that have a page of their own are sent there.
const kinds = careKinds.filter((kind: AnyCareKind) => kind.page === undefined) as readonly AnyCareKind[]
const rows = kinds.map(kind => [kind.slug, kind] as const)
const LONG = 'x'.repeat(20_000)

const count = async () => {
  const [row] = await owner.query<{ n: number }>('SELECT COUNT(*) AS n FROM entries', { type: QueryTypes.SELECT })
  return row?.n
}

/** Sends every form, and expects of each that it is answered with what is wrong. */
async function refused(kind: AnyCareKind, ...forms: readonly Sent[]) {
  const before = await count()
  const answers = await Promise.all(forms.map(form => chart(user, patientId, kind.slug, form)))
  for (const answer of answers) {
    expect([400, 409]).toContain(answer.status)
    expect(Object.values((answer.says as { errors: object }).errors).flat()).not.toEqual([])
  }
  expect(await count()).toBe(before)
}

const ofControl: Readonly<Record<FieldMeta['control'], readonly string[]>> = {
  quantity: ['', 'abc', '1e999', '-1e999', 'NaN', '99999999999999999999', '0x', '1;2', '\u0000', '٣'],
  choice: ['', 'no such option', 'constructor', '__proto__', LONG],
  choices: ['', 'no such option', 'toString'],
  text: [LONG, '\u0000', 'a\u0007b'],
  note: [LONG, '\u0000', '\u001b[31m'],
  date: ['2026-02-30', '0000-00-00', 'yesterday', '2026-13-01', LONG],
  task: ['', 'no-such-task', '../x', '__proto__', LONG],
  item: ['x', '1', '__proto__', LONG],
  codes: ['x', 'barcode', 'barcode \u0000', 'voice ]d2', 'barcode a\n', LONG],
  decided: ['019aa7c2-0000-7000-8000-000000000001'],
  photographs: ['x', '../x', '018f0000-0000-7000-8000-000000000001', LONG],
  setting: ['', 'no-such-setting', 'constructor', LONG],
  // Any name is taken: the warning may have gone by the time that its answer is charted.
  warning: ['', '../x', '__proto__', 'Not A Name', LONG],
}

test.each(rows)('%s takes the whole form that the others are made from', async (_slug, kind) => {
  const answer = await chart(user, patientId, kind.slug, [...wholeForm(kind, user), ['intent', 'review']])
  expect(answer).toMatchObject({ status: 200, says: { is: 'reviewed' } })
})

test.each(rows)('%s refuses wrong values of every field', async (_slug, kind) => {
  const whole = wholeForm(kind, user)
  for (const { name, meta, required } of fieldsOf(kind.schema)) {
    const wrong = ofControl[meta.control].filter(value => value !== '' || (required && !meta.when))
    await refused(kind, ...wrong.map(value => changed(whole, { [`care.${name}`]: value })))
  }
})

test.each(rows)('%s refuses each field sent three times', async (_slug, kind) => {
  const forms = fieldsOf(kind.schema).map(({ name, meta }): Sent => {
    const full = `care.${name}`
    const whole = wholeForm(kind, user).filter(([other]) => other !== full)
    const value = 'options' in meta ? (Object.keys(meta.options)[0] ?? '') : '5'
    return [...whole, [full, value], [full, value], [full, value]]
  })
  await refused(kind, ...forms)
})

test.each(rows)('%s refuses fields that it does not have', async (_slug, kind) => {
  const whole = wholeForm(kind, user)
  const names = [
    'care',
    'care.',
    'care.nothing',
    'care.__proto__',
    'care.constructor.prototype.x',
    '__proto__.x',
    'stayId',
  ]
  const paths = ['care[0]', 'care[4294967295]', 'care.[', '__intent__', '__state__', 'performedAt', 'recordedBy', LONG]
  const value = '{"type":"reset","payload":{}}'
  await refused(kind, ...[...names, ...paths].map((name): Sent => [...whole, [name, value]]))
  expect(({} as { x?: unknown }).x).toBeUndefined()
})

test.each(rows)('%s refuses a form without its parts, or with wrong ones', async (_slug, kind) => {
  const whole = wholeForm(kind, user)
  await refused(kind, [])
  for (const name of ['id', 'openedBy', 'at', 'when']) {
    const values = [undefined, '', 'x', LONG, '\u0000', '0', '[object Object]']
    await refused(kind, ...values.map(value => changed(whole, { [name]: value })), [...whole, [name, 'now']])
  }
  const moments = [
    { day: '2026-02-30', time: '10:00' },
    { day: '2026-11-30', time: '24:00' },
    { day: '9999-12-31', time: '23:59' },
    { day: '0001-01-01', time: '00:00' },
  ]
  await refused(kind, ...moments.map(moment => changed(whole, { when: 'other', ...moment })))
  await refused(kind, changed(whole, { witness: 'x' }))
  await refused(kind, changed(whole, { reason: LONG }))
  await refused(kind, [...whole, ['intent', 'destroy']])
})

test.each(rows)('%s keeps words in every script as they were typed', async (_slug, kind) => {
  const [free] = fieldsOf(kind.schema).filter(({ meta }) => meta.control === 'text' || meta.control === 'note')
  if (!free || free.meta.when) return
  const words = 'Åse 😀 مريض \u202eabc <b>&amp;</b> "it’s" \\ %_'
  const preview = await chart(user, patientId, kind.slug, [
    ...changed(wholeForm(kind, user), { [`care.${free.name}`]: words }),
    ['intent', 'review'],
  ])
  expect((preview.says as { typed: Record<string, string[]> }).typed[`care.${free.name}`]).toEqual([words])
})

test.each([
  '?task=__proto__',
  '?task=a&task=b',
  `?task=${LONG}`,
  '?usual=1&usual=2',
  '?usual[]=1&task[]=x',
  '?task=%00%ff%F0%9F%98%80',
])('a form opens whatever its address holds: %.40s', async search => {
  for (const kind of kinds) {
    expect(await openedForm(user, patientId, kind.slug, search)).toMatchObject({ kind: kind.slug, isRestored: false })
  }
})

test.each(['__proto__', 'constructor', 'no-such-kind', 'Cuff-Pressure', '%00'])('there is no kind %s', async slug => {
  expect(await openedForm(user, patientId, slug)).toMatchObject({ status: 404 })
  expect(await chart(user, patientId, slug, [])).toMatchObject({ status: 404 })
})

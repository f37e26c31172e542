import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { days, earlier } from '#app/time/duration.ts'
import { cleared } from '#test/database.ts'
import { aPerson, aWard } from '#test/people.ts'
import { aStay, aWardOf } from '#test/stays.ts'
import { stockWords } from '#test/stock.ts'
import { aStockForm, type StockForm, suppliesPages } from '#test/supplies.ts'

let given: Awaited<ReturnType<typeof aStay>>

beforeEach(async () => {
  await cleared()
  given = await aStay()
})

const form = (changes: StockForm = {}) => aStockForm(given.nurse, changes)
const send = (act: string, changes: StockForm = {}, user = given.nurse) =>
  suppliesPages.send(user, given.ward.id, act, aStockForm(user, changes))
const bed = (label: number) => given.ward.bedIds[label - 1] ?? ''
const words = (wardId = given.ward.id) => stockWords(wardId)

/** What a refused form was answered with. */
function refused(answer: Awaited<ReturnType<typeof send>>) {
  const { reply } = answer.says as {
    reply: { error?: Record<string, string[]>; initialValue?: Record<string, unknown> }
  }
  return { status: answer.status, errors: reply.error, typed: reply.initialValue }
}

test('what is received, moved, counted and thrown away adds up', async () => {
  expect(await send('receive', { quantity: '10' })).toMatchObject({
    status: 302,
    location: `/wards/${given.ward.id}/supplies`,
  })
  await send('move', { to: bed(1), quantity: '4' })
  expect(await words()).toEqual(['1 catheter-12-fr 4', 'store catheter-12-fr 6'])
  await send('waste', { from: bed(1), quantity: '5', reason: 'Pack torn' })
  await send('count', { quantity: '7' })
  expect(await words()).toEqual(['1 catheter-12-fr -1', 'store catheter-12-fr 7'])
})

test('what goes to another ward leaves this one and is there', async () => {
  const other = await aWard('Ward 8')
  await send('move', { to: `ward:${other}`, quantity: '2' })
  expect(await words()).toEqual(['store catheter-12-fr -2'])
  expect(await words(other)).toEqual(['store catheter-12-fr 2'])
})

test.each<[string, string, string, string | readonly string[]]>([
  ['receive', 'quantity', 'Enter the pieces received as a whole number', ''],
  ['receive', 'quantity', 'Enter the pieces received as a whole number', 'ten'],
  ['receive', 'quantity', 'Enter the pieces received as a whole number', '2.5'],
  ['receive', 'quantity', 'Enter the pieces received as a whole number', ['2', '3']],
  ['receive', 'quantity', 'Enter at least 1', '0'],
  ['receive', 'quantity', 'Enter at most 9999', '99999999999999999999'],
  ['count', 'quantity', 'It cannot be less than none', '-1'],
  ['receive', 'item', 'Choose an item', ''],
  ['receive', 'item', 'Choose an item from the list', 'toString'],
  ['receive', 'item', 'Choose an item from the list', "x' OR '1'='1"],
  ['receive', 'item', 'Choose an item from the list', uuidv7()],
  ['receive', 'to', 'Choose a place', ''],
  ['receive', 'to', 'Choose a place from the list', uuidv7()],
  ['receive', 'to', 'Choose a place from the list', '__proto__'],
  ['move', 'to', 'Choose another place than the one it was taken from', 'store'],
  ['waste', 'reason', 'Enter the reason', ''],
  ['waste', 'reason', 'Reason has characters that cannot be stored', 'a\u0000b'],
  ['receive', 'when', 'Choose when it was done', 'soon'],
])(
  '%s with a wrong %s is refused there ("%s") for %j, and what else was typed stays',
  async (act, field, says, value) => {
    const answer = refused(await send(act, { [field]: value, ...(field === 'to' ? {} : { to: bed(1) }) }))
    expect(answer).toMatchObject({ status: 400, errors: { [field]: [says] } })
    const other = field === 'reason' ? ['quantity', '3'] : ['reason', 'Weekly round']
    expect(answer.typed).toMatchObject({ [other[0] ?? '']: other[1] })
    expect(await words()).toEqual([])
  },
)

test('stock comes to places of this ward alone, and no bed of another one is named', async () => {
  const ward = await aWardOf(1, 'Ward 8')
  const other = { wardId: ward.id, bedId: ward.bedIds[0] ?? '' }
  for (const to of [`ward:${other.wardId}`, other.bedId]) {
    expect(refused(await send('receive', { to }))).toMatchObject({ errors: { to: ['Choose a place from the list'] } })
    expect(refused(await send('count', { from: to }))).toMatchObject({
      errors: { from: ['Choose a place from the list'] },
    })
  }
  expect(refused(await send('move', { to: other.bedId }))).toMatchObject({ status: 400 })
  expect([...(await words()), ...(await words(other.wardId))]).toEqual([])
})

const daysAgo = (count: number) => earlier(new Date(), days(count)).toISOString()

test.each<[string, StockForm, string, string]>([
  ['later than now', { at: new Date(Date.now() + 3_600_000).toISOString() }, 'when', ''],
  ['more than 30 days ago', { at: daysAgo(31) }, 'when', 'Enter a day within the last 30'],
  [
    'more than 30 days ago by its day',
    { when: 'other', day: daysAgo(40).slice(0, 10), time: '10:00' },
    'day',
    'Enter a day within the last 30',
  ],
])('a form of %s is refused at its time', async (_, changes, field, says) => {
  const { status, errors } = refused(await send('receive', changes))
  expect([status, Object.keys(errors ?? {})]).toEqual([400, [field]])
  if (says !== '') expect(errors?.[field]).toEqual([says])
  expect(await words()).toEqual([])
})

test('the same form sent three times at once is one act; with other answers it is refused', async () => {
  const sent = form({ quantity: '5' })
  const sendIt = (changes: StockForm = {}) =>
    suppliesPages.send(given.nurse, given.ward.id, 'receive', { ...sent, ...changes })
  const answers = await Promise.all([sendIt(), sendIt(), sendIt()])
  expect(answers.map(({ status }) => status)).toEqual([302, 302, 302])
  expect(refused(await sendIt({ quantity: '6' }))).toMatchObject({
    status: 422,
    errors: { '': ['This form was used before, with other answers. Open it again.'] },
    typed: { quantity: '6' },
  })
  expect(await words()).toEqual(['store catheter-12-fr 5'])
})

test('a form that somebody else opened is refused', async () => {
  const other = await aPerson({ name: 'Ngozi Adeyemi', wardIds: [given.ward.id] })
  expect(refused(await send('receive', { openedBy: other.id }))).toMatchObject({ status: 409 })
  expect(await words()).toEqual([])
})

test.each<[string, Parameters<typeof aPerson>[0], number]>([
  ['an observer of the ward', { role: 'observer' }, 403],
  ['a student of the ward', { isSupervised: true }, 403],
  ['an administrator', { role: 'administrator' }, 404],
])('%s neither opens nor sends a form, and reads no order list', async (_, somebody, status) => {
  const user = await aPerson({ ...somebody, wardIds: [given.ward.id] })
  expect(await send('receive', {}, user)).toMatchObject({ status })
  expect(await suppliesPages.open(user, given.ward.id, 'receive')).toMatchObject({ status })
  expect(await suppliesPages.order(user, given.ward.id)).toMatchObject({ status })
  expect(await words()).toEqual([])
})

test('another ward’s supplies, and an act that there is not, are not there', async () => {
  const other = await aWard('Ward 8')
  expect(await suppliesPages.send(given.nurse, other, 'receive', form())).toMatchObject({ status: 404 })
  expect(await suppliesPages.order(given.nurse, other)).toMatchObject({ status: 404 })
  expect(await suppliesPages.history(given.nurse, other)).toMatchObject({ status: 404 })
  expect(await send('toString')).toMatchObject({ status: 404 })
  expect([...(await words()), ...(await words(other))]).toEqual([])
})

test('names that a form does not have are not looked at', async () => {
  const hostile = { 'quantity[9999999]': '1', '__proto__.act': 'counted', wardId: uuidv7(), recordedBy: uuidv7() }
  expect(await send('receive', hostile)).toMatchObject({ status: 302 })
  expect(await words()).toEqual(['store catheter-12-fr 3'])
})

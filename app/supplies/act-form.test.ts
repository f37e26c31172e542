import { parseWithZod } from '@conform-to/zod/v4'
import { v7 as uuidv7 } from 'uuid'
import { expect, test } from 'vitest'
import { type StockActName, stockActOf, stockActSchema, stockActs } from './act-form.ts'

const whole = {
  ...{ id: uuidv7(), openedBy: uuidv7(), at: '2026-12-01T14:06:40.000Z', when: 'now' },
  ...{ item: 'exchanger', quantity: '3', from: 'store', to: 'store', reason: 'Dropped' },
}

/** What is wrong with a form of this act, by field; `changes` with undefined leave a field out. */
function errorsOf(act: StockActName, changes: Readonly<Record<string, string | readonly string[] | undefined>> = {}) {
  const form = new FormData()
  for (const [name, value] of Object.entries({ ...whole, ...changes })) {
    for (const one of [value ?? []].flat()) form.append(name, one)
  }
  const submission = parseWithZod(form, { schema: stockActSchema(act) })
  return submission.status === 'success' ? {} : submission.error
}

test.each(Object.keys(stockActs) as readonly StockActName[])('a whole form of %s is taken', act => {
  expect(errorsOf(act)).toEqual({})
})

test.each<[StockActName, string, string]>([
  ['receive', 'to', 'from'],
  ['count', 'from', 'to'],
  ['waste', 'from', 'to'],
])('%s needs the place %s alone', (act, needed, other) => {
  expect(errorsOf(act, { [needed]: undefined })).toEqual({ [needed]: ['Choose a place'] })
  expect(errorsOf(act, { [other]: undefined })).toEqual({})
})

test('a move needs both places', () => {
  expect(errorsOf('move', { from: undefined, to: undefined })).toEqual({
    from: ['Choose a place'],
    to: ['Choose a place'],
  })
})

const wholeNumber = (what: string) => `Enter the ${what} as a whole number`

test.each<[StockActName, string | readonly string[] | undefined, string | undefined]>([
  ['receive', undefined, wholeNumber('pieces received')],
  ['receive', 'ten', wholeNumber('pieces received')],
  ['receive', '1.5', wholeNumber('pieces received')],
  ['receive', '1e3000', wholeNumber('pieces received')],
  ['receive', ['1', '2'], wholeNumber('pieces received')],
  ['receive', '0', 'Enter at least 1'],
  ['move', '-1', 'Enter at least 1'],
  ['waste', '10000', 'Enter at most 9999'],
  ['waste', '99999999999999999999', 'Enter at most 9999'],
  ['waste', '9999', undefined],
  ['count', '0', undefined],
  ['count', '-1', 'It cannot be less than none'],
])('%s of %s: %s', (act, quantity, message) => {
  expect(errorsOf(act, { quantity })).toEqual(message === undefined ? {} : { quantity: [message] })
})

test('what is thrown away needs a reason, and nothing else does', () => {
  expect(errorsOf('waste', { reason: undefined })).toEqual({ reason: ['Enter the reason'] })
  expect(errorsOf('count', { reason: undefined })).toEqual({})
  expect(errorsOf('count', { reason: 'x'.repeat(501) })).toHaveProperty('reason')
})

test.each(['item', 'from'])('a word of any length is no %s', field => {
  const message = field === 'item' ? 'Choose an item from the list' : 'Choose a place from the list'
  expect(errorsOf('count', { [field]: 'x'.repeat(65) })).toEqual({ [field]: [message] })
})

test.each([
  ['receive', 'receive'],
  ['history', undefined],
  ['toString', undefined],
  ['__proto__', undefined],
])('the address ending in %s is the act %s', (name, act) => {
  expect(stockActOf(name)).toBe(act)
})

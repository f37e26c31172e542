import { expect, test } from 'vitest'
import { type Gs1Item, itemOf } from '#app/clinical/gs1-scan.ts'
import { readBackChoices, readBackOf } from './read-back.ts'

const today = '2026-12-01'

function scanned(raw: string): Gs1Item {
  const reading = itemOf([{ raw, entry: 'barcode', sendsSeparator: false }], today)
  if (!reading.ok) throw new Error(reading.says)
  return reading.item
}

const swallowed = scanned(']d2010952123454321310123ABC17271231')

test('a lot that may have swallowed its expiry date is read back before either is believed', () => {
  expect(readBackOf(swallowed, null, today)).toBeUndefined()
  expect(readBackChoices(swallowed, today)[0]).toEqual({ value: '1', words: 'Lot 123ABC, expires 31-Dec-2027' })
  expect(readBackChoices(swallowed, today).at(-1)).toEqual({
    value: 'as scanned',
    words: 'Lot 123ABC17271231, no expiry date',
  })
})

test('what was read back counts', () => {
  expect(readBackOf(swallowed, '1', today)).toMatchObject({ lot: '123ABC', expiresOn: '2027-12-31' })
  expect(readBackOf(swallowed, 'as scanned', today)).toMatchObject({ lot: '123ABC17271231', expiresOn: null })
})

test.each(['0', '9', '-1', '1.5', '__proto__', ''])('"%s" is no choice', choice => {
  expect(readBackOf(swallowed, choice, today)).toBeUndefined()
})

test('a month is the last day of it, and said to be a month', () => {
  const month = scanned(']d2010952123454321310AB17271100')
  expect(readBackChoices(month, today)[0]?.words).toBe('Lot AB, expires 30-Nov-2027 (label gives month only)')
})

test('nothing is asked where nothing is in doubt', () => {
  const clear = scanned(']d201095212345432131727123110123ABC')
  expect(readBackChoices(clear, today)).toEqual([])
  expect(readBackOf(clear, null, today)).toMatchObject({ lot: '123ABC', expiresOn: '2027-12-31' })
})

import { expect, test } from 'vitest'
import { readSymbol } from './gs1.ts'
import { separatorMissing } from './gs1-separator.ts'

const today = '2026-12-01'
const gtin = '0109521234543213'

function suspicion(raw: string) {
  const reading = readSymbol(raw, 'barcode', today)
  if (!reading.ok) throw new Error(reading.says)
  const missing = separatorMissing(reading.symbol, today)
  return missing?.readings.map(parts => parts.map(({ ai, value }) => `${ai}=${value}`).join(' '))
}

test.each([
  ['a lot with an expiry date behind', `]d2${gtin}10123ABC17271231`, ['10=123ABC 17=271231']],
  ['a lot with a production date behind', `]d2${gtin}10123ABC11261031`, ['10=123ABC 11=261031']],
  ['a lot with a serial number behind', `]d2${gtin}1727123110AB21X7`, ['10=AB 21=X7']],
  ['a serial number with a lot behind', `${gtin}21X710AB`, ['21=X7 10=AB']],
  ['a code of lot and expiry alone', ']C110AB17271200', ['10=AB 17=271200']],
  ['a part that we step over', `${gtin}240REF17271231`, ['240=REF 17=271231']],
])('%s may lack a separator', (_, raw, readings) => {
  expect(suspicion(raw)).toEqual(readings)
})

test('a reading with a date comes first, then the one with fewer parts', () => {
  expect(suspicion(`]d2${gtin}10AB21X717271231`)).toEqual([
    '10=AB21X7 17=271231',
    '10=AB 21=X7 17=271231',
    '10=AB 21=X717271231',
  ])
})

test.each([
  ['a separator came through', `]d2${gtin}240R\u001d10123ABC17271231`],
  ['a separator came through at the end', `]d2${gtin}10123ABC17271231\u001d`],
  ['the tail is no date', `]d2${gtin}10123ABC17271331`],
  ['the expiry date was read before', `]d2${gtin}1727123110ABC17271231`],
  ['nothing is left of the lot', `]d2${gtin}1017271231`],
  ['the code ends with a fixed length', `]d2${gtin}17271231`],
  ['the lot is plain', `]d2${gtin}10ABC`],
  ['the code is printed', `(01)09521234543213(10)123ABC17271231`],
  ['the code is a bare number', ']E09521234543213'],
])('nothing is suspected when %s', (_, raw) => {
  expect(suspicion(raw)).toBeUndefined()
})

test('a part points to its place in the raw text', () => {
  const raw = `]d2${gtin}10123ABC17271231`
  const reading = readSymbol(raw, 'barcode', today)
  if (!reading.ok) throw new Error(reading.says)
  expect(separatorMissing(reading.symbol, today)).toEqual({
    ai: '10',
    readings: [
      [
        { ai: '10', value: '123ABC', at: 21 },
        { ai: '17', value: '271231', at: 29 },
      ],
    ],
  })
})

test('a long value full of identifiers yields few readings', () => {
  expect(suspicion(`]d291${'1021'.repeat(22)}`)).toHaveLength(5)
})

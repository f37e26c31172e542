import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, at } from '../make.ts'
import { personalValues } from './personal-values.ts'
import { type CarePlanData, carePlans } from './schema.ts'

const own: CarePlanData = {
  setting: 'check-interval',
  step: 'set own value',
  value: 6,
  reviewOn: '2026-03-12',
  reason: 'Copious secretions',
}
const set = (when: string, overrides: Partial<CarePlanData> = {}) => anEntry(carePlans, when, { ...own, ...overrides })
const back = (when: string) =>
  anEntry(carePlans, when, { setting: 'check-interval', step: 'back to ward policy', reason: 'Dry again' })

const valuesOf = (...entries: readonly StoredEntry[]) => personalValues(aContext(entries, '12:00').record)
const shortOf = (...entries: readonly StoredEntry[]) =>
  valuesOf(...entries).map(({ setting, value }) => `${setting} ${value}`)

test('an own value carries its reason, its review date, and who set it when', () => {
  expect(valuesOf(set('09:00'))).toEqual([
    {
      setting: 'check-interval',
      value: 6,
      reason: 'Copious secretions',
      reviewOn: '2026-03-12',
      since: at('09:00'),
      by: 'Ama Mensah',
    },
  ])
})

test.each<[string, readonly StoredEntry[], readonly string[]]>([
  ['none without a care plan', [], []],
  ['the later of two', [set('10:00', { value: 4 }), set('09:00')], ['check-interval 4']],
  [
    'one for each setting',
    [set('09:00'), set('08:00', { setting: 'limit', value: 21 })],
    ['check-interval 6', 'limit 21'],
  ],
  ['none once back to ward policy', [set('09:00'), back('10:00')], []],
  ['a new one after going back', [set('08:00'), back('09:00'), set('10:00', { value: 5 })], ['check-interval 5']],
  [
    'the other setting stays',
    [set('08:00'), set('08:30', { setting: 'limit', value: 21 }), back('09:00')],
    ['limit 21'],
  ],
])('own values: %s', (_, entries, expected) => {
  expect(shortOf(...entries)).toEqual(expected)
})

test('a corrected value takes the place of the mistaken one, and a retracted one is gone', () => {
  const mistaken = set('09:00', { value: 60 })
  expect(shortOf(mistaken, aCorrection(mistaken, carePlans, '09:00', own))).toEqual(['check-interval 6'])
  expect(shortOf(mistaken, aCorrection(mistaken, carePlans, '09:00', own, { status: 'retracted' }))).toEqual([])
})

test('retracting the way back brings the own value back', () => {
  const returned = back('10:00')
  const retraction = aCorrection(returned, carePlans, '10:00', own, { status: 'retracted' })
  expect(shortOf(set('09:00'), returned, retraction)).toEqual(['check-interval 6'])
})

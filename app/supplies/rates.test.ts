import { expect, test } from 'vitest'
import { at } from '../care/make.ts'
import { unidentified } from '../care/supply.ts'
import { type Planned, patientRates, type Use, wardRates } from './rates.ts'

const counting = { from: at('2026-03-01 12:00'), now: at('2026-03-10 12:00'), leastDays: 3 }
const cannula = (more: Partial<Planned> = {}): Planned => ({ item: 'c-1', perDay: 2, isCannula: true, ...more })
const each = (item: string, days: number, used: number): readonly Use[] =>
  Array.from({ length: days }, (_, day) => ({ item, day, used }))

const rateOf = (planned: readonly Planned[], uses: readonly Use[], item = 'c-1', from = counting.from) =>
  patientRates(planned, uses, { ...counting, from }).get(item)

test('the counted use takes the place of the interval once there are enough whole days of it', () => {
  const uses = each('c-1', 9, 3)
  expect(rateOf([cannula()], uses)).toEqual({ perDay: 3, daysOfData: 9 })
  expect(rateOf([cannula()], uses, 'c-1', at('2026-03-07 12:00'))).toEqual({ perDay: 3, daysOfData: 3 })
  expect(rateOf([cannula()], uses, 'c-1', at('2026-03-07 12:01'))).toEqual({ perDay: 2, daysOfData: 0 })
})

test('no use in enough days counts as none, not as no data', () => {
  expect(rateOf([cannula()], [])).toEqual({ perDay: 0, daysOfData: 9 })
})

test('of a need that began later only its own days count', () => {
  const since = at('2026-03-06 12:00')
  expect(rateOf([cannula({ since })], each('c-1', 9, 3))).toEqual({ perDay: 3, daysOfData: 4 })
  expect(rateOf([cannula({ since: at('2026-03-09 12:00') })], each('c-1', 9, 3))).toEqual({ perDay: 2, daysOfData: 0 })
})

test('what is needed once in weeks is planned until its interval has passed', () => {
  const tube: Planned = { item: 't-1', perDay: 1 / 28, isCannula: false }
  expect(rateOf([tube], each('t-1', 1, 1), 't-1')).toEqual({ perDay: 1 / 28, daysOfData: 0 })
})

test('a cannula that could not be told counts to the one that the patient has', () => {
  const uses = [...each('c-1', 9, 1), ...each(unidentified.innerCannula, 9, 1)]
  expect(rateOf([cannula()], uses)).toEqual({ perDay: 2, daysOfData: 9 })
  expect(rateOf([cannula({ isCannula: false })], uses)).toEqual({ perDay: 1, daysOfData: 9 })
})

test('what is kept by name has a rate without a plan; items of an earlier tube, and what could not be told, have none', () => {
  const uses = [...each('exchanger', 9, 1), ...each('c-old', 9, 2), ...each(unidentified.tube, 9, 1)]
  expect([...patientRates([], uses, counting)]).toEqual([['exchanger', { perDay: 1, daysOfData: 9 }]])
  const tooShort = patientRates([], uses, { ...counting, from: at('2026-03-09 12:00') })
  expect([...tooShort]).toEqual([['exchanger', { perDay: 0, daysOfData: 0 }]])
})

test('planned by two kinds of care, the larger need counts', () => {
  const least = at('2026-03-10 11:00')
  const planned = [cannula({ item: 'h', perDay: 1 }), cannula({ item: 'h', perDay: 3 }), cannula({ item: 'h' })]
  expect(rateOf(planned, [], 'h', least)).toEqual({ perDay: 3, daysOfData: 0 })
})

test('the rates of a ward are those of its patients together', () => {
  const rates = wardRates([
    new Map([['c-1', { perDay: 2, daysOfData: 9 }]]),
    new Map([
      ['c-1', { perDay: 3, daysOfData: 4 }],
      ['gel', { perDay: 1, daysOfData: 0 }],
    ]),
    new Map([['c-1', { perDay: 2, daysOfData: 0 }]]),
  ])
  expect([...rates]).toEqual([
    ['c-1', { perDay: 7, counted: 2, planned: 1, fewestDays: 4 }],
    ['gel', { perDay: 1, counted: 0, planned: 1, fewestDays: Number.POSITIVE_INFINITY }],
  ])
})

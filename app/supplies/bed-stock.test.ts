import { expect, test } from 'vitest'
import type { Rate } from '../clinical/supply.ts'
import { bedItems } from './bed-stock.ts'

const about = { wordsOf: (item: string) => item.toUpperCase(), belongsAtBed: (item: string) => item === 'cannula' }
const counted = (perDay: number): Rate => ({ perDay, daysOfData: 14 })

const items = (stock: readonly (readonly [string, number])[], rates: readonly (readonly [string, Rate])[]) =>
  bedItems(new Map(stock), new Map(rates), about)

test('what lies there is shown with its use and how long it lasts', () => {
  expect(items([['cannula', 3]], [['cannula', counted(2)]])).toEqual([
    {
      ...{ item: 'cannula', words: 'CANNULA', stock: 3, isLow: false },
      ...{ use: '2 a day, 14 days of data', lasts: 'about 1 d 12 h' },
    },
  ])
})

test.each<[number, number, boolean]>([
  [2, 2, false],
  [1, 2, true],
  [0, 1, true],
  [0, 0.5, false],
  [-1, 0, true],
  [-1, 0.5, true],
])('%i pieces at %f a day are short: %s', (stock, perDay, isLow) => {
  expect(items([['cannula', stock]], [['cannula', counted(perDay)]])[0]?.isLow).toBe(isLow)
})

test('an item that belongs at the bed is shown when none lies there, another only when it is there', () => {
  const shown = items(
    [['gel', 0]],
    [
      ['cannula', counted(2)],
      ['gel', counted(2)],
    ],
  )
  expect(shown).toMatchObject([{ item: 'cannula', stock: 0, lasts: 'nothing left', isLow: true }])
  expect(items([['gel', 1]], [])).toMatchObject([{ item: 'gel', use: '', lasts: 'not used now' }])
})

test('what the patient needs is shown where none lies there, though none was counted as used', () => {
  expect(items([], [['cannula', counted(0)]])).toMatchObject([{ stock: 0, use: '', lasts: 'not used now' }])
})

test('below nothing is shown, and what is short stands first, then by name', () => {
  const shown = items(
    [
      ['b', 9],
      ['a', 9],
      ['c', -2],
    ],
    [],
  )
  expect(shown.map(({ item, stock }) => `${item} ${stock}`)).toEqual(['c -2', 'a 9', 'b 9'])
})

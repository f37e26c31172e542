import { expect, test } from 'vitest'
import { days, hours, minutes } from '../time/duration.ts'
import { basisWords, lastingWords, showRate, wardBasisWords } from './words.ts'

test.each([
  [0, '0'],
  [0.0357, '0.04'],
  [0.1, '0.1'],
  [0.25, '0.3'],
  [2, '2'],
  [2.04, '2'],
  [9.96, '10'],
  [12.6, '13'],
])('a use of %f a day is shown as %s', (perDay, words) => {
  expect(showRate(perDay)).toBe(words)
})

test.each([
  [null, 'not used now'],
  [minutes(59), 'nothing left'],
  [hours(1), 'about 1 h'],
  [minutes(119), 'about 1 h'],
  [hours(36), 'about 1 d 12 h'],
  [days(9.99), 'about 9 d 23 h'],
  [days(10.9), 'about 10 d'],
])('a stock that lasts %s: %s', (time, words) => {
  expect(lastingWords(time)).toBe(words)
})

test.each([
  [{ perDay: 2, daysOfData: 14 }, '14 days of data'],
  [{ perDay: 0, daysOfData: 14 }, '14 days of data'],
  [{ perDay: 2, daysOfData: 0 }, 'too little data: by the interval in force'],
  [{ perDay: 0, daysOfData: 0 }, 'too little data'],
])('the rate %j comes from %s', (rate, words) => {
  expect(basisWords(rate)).toBe(words)
})

test.each([
  [{ counted: 0, planned: 0, fewestDays: Number.POSITIVE_INFINITY }, ''],
  [{ counted: 1, planned: 0, fewestDays: 3 }, '1 patient counted over at least 3 days'],
  [{ counted: 0, planned: 2, fewestDays: Number.POSITIVE_INFINITY }, '2 patients by interval, too little data'],
  [
    { counted: 2, planned: 1, fewestDays: 5 },
    '2 patients counted over at least 5 days; 1 patient by interval, too little data',
  ],
])('the rate of a ward %j comes from "%s"', (rate, words) => {
  expect(wardBasisWords({ perDay: 1, ...rate })).toBe(words)
})

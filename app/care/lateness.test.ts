import { expect, test } from 'vitest'
import { type Duration, hours, minutes } from '../time/duration.ts'
import { lateness, seriousWithin } from './lateness.ts'
import { aContext } from './make.ts'

const valuesWith = (policy: Readonly<Record<string, number>>) => aContext([], '12:00', { policy }).values

const own = {
  'lateness-short-tolerance': 10,
  'lateness-short-soon': 50,
  'lateness-short-serious': 200,
  'lateness-middle-tolerance': 30,
  'lateness-middle-soon': 90,
  'lateness-middle-serious': 360,
  'lateness-long-tolerance': 3,
  'lateness-long-soon': 6,
  'lateness-long-serious': 24,
}

test.each<[Duration, Readonly<Record<string, number>>, Duration, Duration, Duration]>([
  // interval, policy, tolerance, soon before, serious after
  [hours(2), {}, minutes(30), minutes(30), hours(2)],
  [minutes(239), {}, minutes(59.75), minutes(59.75), minutes(239)],
  [hours(4), {}, hours(1), hours(1), hours(4)],
  [hours(8), {}, hours(1), hours(1), hours(4)],
  [hours(24), {}, hours(2), hours(4), hours(12)],
  [hours(2), own, minutes(12), hours(1), hours(4)],
  [hours(8), own, minutes(30), minutes(90), hours(6)],
  // never later than the next one is due
  [hours(4), own, minutes(30), minutes(90), hours(4)],
  [hours(48), own, hours(3), hours(6), hours(24)],
])('of an interval of %i ms under %o', (interval, policy, tolerance, soonBefore, seriousAfter) => {
  expect(lateness(interval, valuesWith(policy))).toEqual({ tolerance, soonBefore, seriousAfter })
})

test.each([
  [hours(8), {}, hours(4)],
  [hours(12), own, hours(6)],
  [hours(3), {}, hours(3)],
])('a shift of %i ms under %o is serious so long after its end', (length, policy, expected) => {
  expect(seriousWithin(length, valuesWith(policy))).toBe(expected)
})

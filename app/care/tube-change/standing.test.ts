import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { type AboutContext, aContext, anEntry, aRemoval, aTube } from '../make.ts'
import { type TubeData, tubeChanges } from './schema.ts'
import { standingTubeWarnings } from './standing.ts'

const tube = (when: string, overrides: Partial<TubeData> = {}) => anEntry(tubeChanges, when, aTube(overrides))
const inMarch = tube('2026-03-02 10:00')

const standing = (entries: readonly StoredEntry[], now: string, about?: AboutContext) =>
  standingTubeWarnings(aContext(entries, now, about))

test.each([
  ['2026-03-22 23:59', undefined, undefined, undefined],
  ['2026-03-23 00:00', 'blue', 'Plan the tube change.', 'Day 21 of 28; 7 days left.'],
  ['2026-03-27 12:00', 'blue', 'Plan the tube change.', 'Day 25 of 28; 3 days left.'],
  ['2026-03-28 00:00', 'amber', 'Plan the tube change.', 'Day 26 of 28; 2 days left.'],
  ['2026-03-29 12:00', 'amber', 'Plan the tube change.', 'Day 27 of 28; 1 day left.'],
  ['2026-03-30 12:00', 'amber', 'The tube change is due today.', 'Day 28 of 28; today is the limit day.'],
  ['2026-03-31 00:00', 'amber', 'Tell the tracheostomy team today.', 'Tube is 29 days in; limit is 28.'],
])('a tube of 02-Mar on %s', (now, level, action, cause) => {
  const [warning] = standing([inMarch], now)
  expect([warning?.level, warning?.action, warning?.cause]).toEqual([level, action, cause])
})

test('a tube past its limit presses no more than amber: it is for the team, not an emergency', () => {
  expect(standing([inMarch], '2026-05-01 12:00')).toMatchObject([{ name: 'tube-past-limit', level: 'amber' }])
})

test.each([
  ['2026-03-09 23:59', []],
  ['2026-03-10 00:00', ['sutures-past-day']],
])('sutures of 02-Mar on %s', (now, expected) => {
  const sutured = tube('2026-03-02 10:00', { sutures: 'in place' })
  expect(standing([sutured], now).map(({ name }) => name)).toEqual(expected)
})

test('without a charted tube it asks for one, but not of a laryngectomy or after removal for good', () => {
  expect(standing([], '12:00')).toMatchObject([{ name: 'tube-not-charted', level: 'blue' }])
  expect(standing([], '12:00', { patient: { upperAirway: 'not open' } })).toEqual([])
  expect(standing([inMarch, aRemoval('09:00')], '12:00')).toEqual([])
})

test('a first tube that did not go in is said before the missing one', () => {
  const failed = tube('09:00', { reason: 'first insertion', technique: 'surgical', difficulty: 'failed' })
  expect(standing([failed], '12:00').map(({ name }) => name)).toEqual(['tube-out', 'tube-not-charted'])
})

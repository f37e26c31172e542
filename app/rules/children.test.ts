import { expect, test } from 'vitest'
import { aContext, anEntry, aPolicy, aTube, at } from '../care/make.ts'
import type { Policy } from '../care/policy.ts'
import { vacuumWarn } from '../care/suction/settings.ts'
import { dwellDual } from '../care/tube-change/dwell-settings.ts'
import { tubeChanges } from '../care/tube-change/schema.ts'
import { careContext } from './context.ts'
import { dueTasks } from './due-tasks.ts'
import { careView } from './views.ts'
import { standingWarnings } from './warnings.ts'

const forChildren: Policy = { ...aPolicy({ 'suction-vacuum-warn.infant': 90 }), id: 'children-1', ruleSet: 'children' }
const tube = anEntry(tubeChanges, '2026-03-01 09:00', aTube())

function context(bornOn: string, now: string, children?: Policy) {
  const { record, ward } = aContext([tube], now, { patient: { bornOn } })
  const policy: Policy = { ...aPolicy(), ...(children ? { children } : {}) }
  return careContext({ record, policy, ward, now: at(now) })
}

test.each([
  // the 16th birthday begins at midnight in the zone of the ward
  ['2010-03-10', '2026-03-09 23:59', false],
  ['2010-03-10', '2026-03-10 00:00', true],
  // born on a leap day: a year older on 1 March of a common year
  ['2008-02-29', '2024-02-28 23:59', false],
  ['2008-02-29', '2024-02-29 00:00', true],
  ['2010-02-28', '2026-02-28 00:00', true],
  // British summer time: midnight in London is 23:00 UTC the day before
  ['2010-07-10', '2026-07-10 00:00', true],
  ['2010-07-10', '2026-07-09 23:59', false],
])('born on %s, at %s rules for adults apply: %s', (bornOn, now, applies) => {
  expect(dueTasks(context(bornOn, now)).length > 0).toBe(applies)
})

test('without a rule set for children nothing is due, no limit is drawn, and the page says so', () => {
  const child = context('2015-06-01', '2026-03-10 12:00')
  const care = careView(child, at('2026-03-10 04:00'))
  expect(care.tasks).toEqual([])
  expect(care.tube).toMatchObject({ limit: null, daysLeft: null })
  expect(standingWarnings(child).map(({ action }) => action)).toEqual([
    'No rule set for children here: follow the written plan of the tracheostomy team.',
  ])
})

test.each([
  ['2026-02-20', 'neonate', 80],
  ['2025-06-01', 'infant', 90],
  ['2015-06-01', 'child', 100],
  ['2013-06-01', 'adolescent', 120],
])('with one, somebody born on %s (%s) is judged by the vacuum of that age', (bornOn, _, warn) => {
  const { values } = context(bornOn, '2026-03-10 12:00', forChildren)
  expect(values.policy.id).toBe('children-1')
  expect(values.of(vacuumWarn)).toBe(warn)
  expect(values.of(dwellDual)).toBe(7)
})

test('with one, care of a child is due, and an adult is judged as before', () => {
  expect(dueTasks(context('2015-06-01', '2026-03-10 12:00', forChildren)).length).toBeGreaterThan(0)
  expect(context('1958-04-17', '2026-03-10 12:00', forChildren).values.of(dwellDual)).toBe(28)
})

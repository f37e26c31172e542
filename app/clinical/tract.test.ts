import { expect, test } from 'vitest'
import { isNewStoma, tractState } from './tract.ts'

const change = (on: string, uncomplicated = true) => ({ on, uncomplicated })
const tract = { madeOn: '2026-03-01', laryngectomy: false, establishedAfterDays: 14, blindDays: 7 }

test.each([
  ['no change', '2026-03-30', 'fresh', []],
  ['only a change with complications', '2026-03-30', 'fresh', [change('2026-03-08', false)]],
  ['one change', '2026-03-08', 'non-established', [change('2026-03-08')]],
  ['one change, and old', '2026-04-30', 'non-established', [change('2026-03-08')]],
  ['two changes, 14 days old', '2026-03-15', 'non-established', [change('2026-03-08'), change('2026-03-12')]],
  ['two changes, 15 days old', '2026-03-16', 'established', [change('2026-03-08'), change('2026-03-12')]],
  ['one good change and one bad', '2026-03-30', 'non-established', [change('2026-03-08'), change('2026-03-12', false)]],
  ['a change still to come', '2026-03-30', 'non-established', [change('2026-03-08'), change('2026-04-02')]],
  ['changes of an earlier opening', '2026-03-30', 'fresh', [change('2026-01-08'), change('2026-02-08')]],
] as const)('a tract with %s is, on %s, %s', (_, today, state, changes) => {
  expect(tractState({ ...tract, changes, today })).toBe(state)
})

test('a laryngectomy stoma is its own state, whatever its age', () => {
  expect(tractState({ ...tract, changes: [], today: '2026-03-01', laryngectomy: true })).toBe('laryngectomy stoma')
})

test.each([
  ['fresh', '2026-04-30', true, []],
  ['changed once, 6 days old', '2026-03-07', true, [change('2026-03-05')]],
  ['changed once, 7 days old', '2026-03-08', false, [change('2026-03-05')]],
] as const)('of a stoma that is %s on %s, blind re-insertion is warned of: %s', (_, today, isNew, changes) => {
  expect(isNewStoma({ ...tract, changes, today })).toBe(isNew)
})

test('a laryngectomy is never called a new stoma', () => {
  expect(isNewStoma({ ...tract, changes: [], today: '2026-03-01', laryngectomy: true })).toBe(false)
})

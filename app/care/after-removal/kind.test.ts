import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, anEntry, aRemoval, aTube, at, clockOf } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { afterRemoval } from './kind.ts'
import { type AfterRemovalData, afterRemovals } from './schema.ts'

const well: AfterRemovalData = {
  respiratoryRate: 16,
  spo2: 97,
  effort: 'easy',
  stridor: 'no',
  voice: 'clear',
  monitored: 'yes',
  spareThere: 'yes',
}
const out = [anEntry(tubeChanges, '2026-03-02 10:00', aTube()), aRemoval('2026-03-08 08:00')]
const set = (when: string, more: Partial<AfterRemovalData> = {}) => anEntry(afterRemovals, when, { ...well, ...more })

function dueOf(entries: readonly StoredEntry[], now = '2026-03-08 12:00') {
  const clock = clockOf(afterRemoval, 'observations-after-removal', aContext([...out, ...entries], now))
  return clock.state === 'running' ? clock.window.dueAt : clock.state
}

test.each<[string, string | undefined, string]>([
  ['none yet', undefined, '2026-03-08 08:15'],
  ['the first, on time', '2026-03-08 08:15', '2026-03-08 08:30'],
  ['the first, a little early', '2026-03-08 08:12', '2026-03-08 08:30'],
  ['much too early', '2026-03-08 08:05', '2026-03-08 08:15'],
  ['the first, late', '2026-03-08 08:25', '2026-03-08 08:30'],
  ['four of them', '2026-03-08 09:00', '2026-03-08 09:30'],
  ['after two half hours', '2026-03-08 10:00', '2026-03-08 11:00'],
  ['after four hours of hourly ones', '2026-03-08 14:00', '2026-03-08 18:00'],
  ['the next morning', '2026-03-09 06:00', '2026-03-09 10:00'],
  ['near the end', '2026-03-10 02:00', '2026-03-10 06:00'],
])('with the last set: %s', (_, last, due) => {
  expect(dueOf(last ? [set(last)] : [])).toEqual(at(due))
})

test('it ends with the last set of the two days, when they are over, and once a tube is back', () => {
  expect(dueOf([set('2026-03-10 06:00')], '2026-03-10 07:00')).toBe('none')
  expect(dueOf([], '2026-03-10 09:01')).toBe('none')
  expect(dueOf([anEntry(tubeChanges, '2026-03-08 11:00', aTube())])).toBe('none')
})

const warned = (more: Partial<AfterRemovalData>, now = '2026-03-08 12:00') =>
  afterRemoval.warnings?.({ ...well, ...more }, aContext(out, now)).map(({ name, level }) => `${name} ${level}`)

test.each<[Partial<AfterRemovalData>, readonly string[]]>([
  [{}, []],
  [{ stridor: 'yes' }, ['after-removal-breathing red']],
  [{ effort: 'distress' }, ['after-removal-breathing red']],
  [{ spo2: 91 }, ['after-removal-breathing red']],
  [{ effort: 'increased' }, ['after-removal-review amber']],
  [{ respiratoryRate: 25 }, ['after-removal-review amber']],
  [{ voice: 'wet' }, ['after-removal-voice amber']],
  [{ spareThere: 'no' }, ['after-removal-no-spare amber']],
  [{ monitored: 'no' }, ['after-removal-not-monitored amber']],
])('a set with %j', (more, expected) => {
  expect(warned(more)).toEqual(expected)
})

test('the monitor is asked for on the first day, the spare on two', () => {
  expect(warned({ monitored: 'no', spareThere: 'no' }, '2026-03-09 09:00')).toEqual(['after-removal-no-spare amber'])
  expect(warned({ monitored: 'no', spareThere: 'no' }, '2026-03-10 08:01')).toEqual([])
})

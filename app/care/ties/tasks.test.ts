import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, aRemoval, aTube, at, clockOf } from '../make.ts'
import { usualCheck } from '../stoma-and-skin/examples.ts'
import { type StomaData, stomaChecks } from '../stoma-and-skin/schema.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { usualLook } from './examples.ts'
import { ties } from './kind.ts'
import { type TieData, tieChecks } from './schema.ts'

const tube = (when = '2026-03-02 10:00') => anEntry(tubeChanges, when, aTube())
const look = (when: string, overrides: Partial<TieData> = {}) =>
  anEntry(tieChecks, when, { ...usualLook, ...overrides })
const stoma = (when: string, overrides: Partial<StomaData> = {}) =>
  anEntry(stomaChecks, when, { ...usualCheck, ...overrides })
const changed = { changed: 'yes', secondPerson: 'T. Okafor' } as const
const withStoma = { holderChanged: 'yes', secondPerson: 'T. Okafor' } as const

type About = Parameters<typeof aContext>[2]

function dueOf(task: string, entries: readonly StoredEntry[], now = '12:00', about: About = {}) {
  const clock = clockOf(ties, task, aContext(entries, now, about))
  return clock.state === 'running' ? clock.window.dueAt : clock
}

test.each<[string, readonly StoredEntry[], string]>([
  ['never looked at: the shift in which the tube went in', [tube()], '2026-03-02 15:00'],
  ['looked at this morning', [tube(), look('09:00')], '23:00'],
  ['looked at one minute before this shift', [tube(), look('06:59')], '15:00'],
  ['looked at as this shift began', [tube(), look('07:00')], '23:00'],
  ['looked at with stoma and skin', [tube(), look('2026-03-09 20:00'), stoma('09:00')], '23:00'],
  ['changed with the tube: the shift still has its look', [tube(), look('2026-03-09 20:00'), tube('09:00')], '07:00'],
  ['the look of this shift retracted', [tube(), look('2026-03-09 20:00'), ...retracted('09:00')], '07:00'],
  ['a look of yesterday written today', [tube(), look('09:00'), late('2026-03-09 20:00', '11:00')], '23:00'],
])('the ties are due, %s', (_, entries, due) => {
  expect(dueOf('ties-check', entries)).toEqual(at(due))
})

function retracted(when: string): readonly StoredEntry[] {
  const mistaken = look(when)
  return [mistaken, aCorrection(mistaken, tieChecks, when, usualLook, { status: 'retracted' })]
}

function late(when: string, writtenAt: string): StoredEntry {
  return anEntry(tieChecks, when, usualLook, { recordedAt: at(writtenAt) })
}

test.each<[string, readonly StoredEntry[], string]>([
  ['never: a day after the tube went in', [tube()], '2026-03-03 10:00'],
  ['yesterday', [tube(), look('2026-03-09 20:00', changed)], '20:00'],
  ['then looked at, not changed', [tube(), look('2026-03-09 20:00', changed), look('09:00')], '20:00'],
  ['as needed, ahead of time', [tube(), look('2026-03-09 20:00', changed), look('11:20', changed)], '2026-03-11 11:20'],
  ['with stoma and skin', [tube(), look('2026-03-09 20:00', changed), stoma('09:00', withStoma)], '2026-03-11 09:00'],
  ['with the tube', [tube(), look('2026-03-09 20:00', changed), tube('09:00')], '2026-03-11 09:00'],
])('a change is due, ties last changed %s', (_, entries, due) => {
  expect(dueOf('ties-change', entries)).toEqual(at(due))
})

test('a day between changes stays 24 hours over the change of clocks', () => {
  const entries = [tube(), look('2026-03-28 20:00', changed)]
  expect(dueOf('ties-change', entries, '2026-03-29 12:00')).toEqual(at('2026-03-29 21:00'))
})

test('a tube in place on arrival brings no fresh ties: they are due a day after admission', () => {
  const data = {
    reason: 'on arrival',
    insertedOn: '2026-02-20',
    stomaMadeOn: '2026-02-10',
    technique: 'surgical',
  } as const
  const entries = [anEntry(tubeChanges, '2026-03-01 09:00', aTube(data))]
  expect(dueOf('ties-change', entries)).toEqual(at('2026-03-02 08:00'))
})

test('policy and care plan set the interval', () => {
  const entries = [tube(), look('2026-03-09 20:00', changed)]
  expect(dueOf('ties-change', entries, '12:00', { policy: { 'ties-change-interval': 48 } })).toEqual(
    at('2026-03-11 20:00'),
  )
  expect(dueOf('ties-change', entries, '12:00', { personal: { 'ties-change-interval': 72 } })).toEqual(
    at('2026-03-12 20:00'),
  )
})

test.each(['ties-check', 'ties-change'])('%s does not concern somebody without a tube', task => {
  expect(dueOf(task, [])).toEqual({ state: 'none' })
})

test.each(['ties-check', 'ties-change'])('%s stands still after removal for good', task => {
  expect(dueOf(task, [tube(), look('09:00'), aRemoval('10:00')])).toEqual({
    state: 'suspended',
    because: 'tube out for good since 10-Mar-2026',
  })
})

test.each(['ties-check', 'ties-change'])('%s stands still where no ties are in use, until the next tube', task => {
  const without = [tube(), stoma('09:00', { ties: 'no ties' })]
  expect(dueOf(task, without)).toEqual({ state: 'suspended', because: 'no ties in use at the last look' })
  expect(dueOf(task, [...without, look('10:00')])).toBeInstanceOf(Date)
  expect(dueOf(task, [...without, tube('10:00')])).toBeInstanceOf(Date)
})

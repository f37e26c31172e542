import { expect, test } from 'vitest'
import { cuffChecks } from '../cuff-pressure/schema.ts'
import type { StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, aRemoval, aTube, at, clockOf } from '../make.ts'
import { suctions } from '../suction/schema.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { plainVolume } from './examples.ts'
import { aboveCuffSuction } from './kind.ts'
import { type AboveCuffData, aboveCuffSuctions } from './schema.ts'

const tube = (when = '2026-03-02 10:00', overrides: Parameters<typeof aTube>[0] = {}) =>
  anEntry(tubeChanges, when, aTube(overrides))
const drawn = (when: string, overrides: Partial<AboveCuffData> = {}) =>
  anEntry(aboveCuffSuctions, when, { ...plainVolume, ...overrides })
const bySuction = (when: string, route: 'above cuff' | 'oral' = 'above cuff') =>
  anEntry(suctions, when, {
    act: 'episode',
    indication: ['cuff down'],
    route,
    amount: 'none',
    blood: 'none',
    tolerance: 'well',
  })
const cuff = (when: string, cuffNow: 'deflated' | 'inflated') =>
  anEntry(cuffChecks, when, { unit: 'cmH2O', method: 'not measured', whyNot: 'trial', cuffNow })

type About = Parameters<typeof aContext>[2]

function dueOf(entries: readonly StoredEntry[], now = '12:00', about: About = {}) {
  const clock = clockOf(aboveCuffSuction, 'above-cuff-suction', aContext(entries, now, about))
  return clock.state === 'running' ? clock.window.dueAt : clock
}

test.each<[string, readonly StoredEntry[], string]>([
  ['a volume', [drawn('09:00')], '13:00'],
  ['the later of two volumes', [drawn('06:00'), drawn('09:00')], '13:00'],
  ['a volume ahead of time', [drawn('09:00'), drawn('10:10')], '14:10'],
  ['suction by that route', [bySuction('09:00')], '13:00'],
  ['suction by that route after a volume', [drawn('06:00'), bySuction('09:00')], '13:00'],
  ['a volume after suction by that route', [bySuction('06:00'), drawn('09:00')], '13:00'],
  ['a port that was cleared', [drawn('06:00'), drawn('09:00', { port: 'cleared' })], '13:00'],
  ['a volume, not a blocked port after it', [drawn('06:00'), drawn('09:00', { port: 'blocked' })], '10:00'],
  ['a volume, not one retracted after it', [drawn('06:00'), ...retracted('09:00')], '10:00'],
])('it is due four hours after %s', (_, entries, due) => {
  expect(dueOf([tube(), ...entries])).toEqual(at(due))
})

function retracted(when: string): readonly StoredEntry[] {
  const mistaken = drawn(when)
  return [mistaken, aCorrection(mistaken, aboveCuffSuctions, when, plainVolume, { status: 'retracted' })]
}

test('four hours stay four hours over the change of clocks', () => {
  expect(dueOf([tube(), drawn('2026-03-28 23:00')], '2026-03-29 02:30')).toEqual(at('2026-03-29 04:00'))
})

test.each<[string, readonly StoredEntry[]]>([
  ['no port is known of', [tube()]],
  ['only the mouth was suctioned', [tube(), bySuction('09:00', 'oral')]],
  ['the port was that of an earlier tube', [tube(), drawn('08:00'), tube('09:00')]],
  ['the tube has no cuff', [tube('2026-03-02 10:00', { cuff: 'none' }), drawn('09:00')]],
  ['there is no tube', [drawn('09:00')]],
])('it does not concern somebody where %s', (_, entries) => {
  expect(dueOf(entries)).toEqual({ state: 'none' })
})

test('the care plan starts it before the first volume, and sets its hours', () => {
  const personal = { 'above-cuff-suction-interval': 2 }
  expect(dueOf([tube('10:00')], '12:00', { personal })).toEqual(at('12:00'))
  expect(dueOf([tube(), drawn('09:00')], '12:00', { personal })).toEqual(at('11:00'))
  expect(dueOf([tube(), drawn('09:00')], '12:00', { policy: { 'above-cuff-suction-interval': 6 } })).toEqual(
    at('15:00'),
  )
})

test('it stands still while the cuff is down, and after removal for good', () => {
  const entries = [tube(), drawn('08:00'), cuff('09:00', 'deflated')]
  expect(dueOf(entries)).toEqual({ state: 'suspended', because: 'cuff is down' })
  expect(dueOf([...entries, cuff('10:00', 'inflated')])).toEqual(at('12:00'))
  const because = 'tube out for good since 10-Mar-2026'
  expect(dueOf([tube(), drawn('08:00'), aRemoval('10:00')])).toEqual({ state: 'suspended', because })
})

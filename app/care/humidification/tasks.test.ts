import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, aRemoval, aTube, at, clockOf } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { humidification } from './kind.ts'
import { type HumidificationData, humidifications } from './schema.ts'

const tube = (when = '2026-03-02 10:00') => anEntry(tubeChanges, when, aTube())
const look = (when: string, data: HumidificationData) => anEntry(humidifications, when, data)
const hme = (when: string, hmeChanged: 'yes' | 'no') => look(when, { method: 'hme', hmeChanged })
const heated = (when: string, waterLevel: 'ok' | 'filled' | 'low') => look(when, { method: 'heated', waterLevel })
const nebuliser = (when: string) => look(when, { method: 'nebuliser' })

type About = Parameters<typeof aContext>[2]

function dueOf(task: string, entries: readonly StoredEntry[], now = '12:00', about: About = {}) {
  const clock = clockOf(humidification, task, aContext(entries, now, about))
  return clock.state === 'running' ? clock.window.dueAt : clock
}

test.each<[string, readonly StoredEntry[], string]>([
  ['never looked at: the shift in which the tube went in', [tube()], '2026-03-02 15:00'],
  ['looked at this morning', [tube(), hme('09:00', 'no')], '23:00'],
  ['looked at last evening', [tube(), hme('2026-03-09 22:00', 'no')], '07:00'],
  ['found with none: it was looked at', [tube(), look('09:00', { method: 'none' })], '23:00'],
  ['looked at, then the tube was changed', [tube(), hme('09:00', 'no'), tube('10:00')], '23:00'],
  ['retracted', [tube(), hme('2026-03-09 22:00', 'no'), ...retracted('09:00')], '07:00'],
])('humidification is due, %s', (_, entries, due) => {
  expect(dueOf('humidification-check', entries)).toEqual(at(due))
})

function retracted(when: string): readonly StoredEntry[] {
  const mistaken = hme(when, 'no')
  const taken = { method: 'hme', hmeChanged: 'no' } as const
  return [mistaken, aCorrection(mistaken, humidifications, when, taken, { status: 'retracted' })]
}

test.each<[string, readonly StoredEntry[], string]>([
  ['found on at the first look', [hme('08:00', 'no')], '2026-03-11 08:00'],
  ['changed yesterday', [hme('2026-03-09 20:00', 'yes')], '20:00'],
  ['changed yesterday, looked at since', [hme('2026-03-09 20:00', 'yes'), hme('09:00', 'no')], '20:00'],
  ['changed as needed', [hme('2026-03-09 20:00', 'yes'), hme('11:20', 'yes')], '2026-03-11 11:20'],
  ['a nebuliser given in between', [hme('2026-03-09 20:00', 'yes'), nebuliser('09:00')], '20:00'],
  [
    'put on again after a heated humidifier',
    [hme('2026-03-08 20:00', 'yes'), heated('2026-03-09 20:00', 'ok'), hme('10:00', 'no')],
    '2026-03-11 10:00',
  ],
])('a change of exchanger is due, %s', (_, entries, due) => {
  expect(dueOf('hme-change', [tube(), ...entries])).toEqual(at(due))
})

test('a day between changes stays 24 hours over the change of clocks', () => {
  const entries = [tube(), hme('2026-03-28 20:00', 'yes')]
  expect(dueOf('hme-change', entries, '2026-03-29 12:00')).toEqual(at('2026-03-29 21:00'))
})

test('policy and care plan set the interval of the exchanger', () => {
  const entries = [tube(), hme('2026-03-09 20:00', 'yes')]
  const ofPolicy = { policy: { 'hme-change-interval': 12 } }
  expect(dueOf('hme-change', entries, '12:00', ofPolicy)).toEqual(at('08:00'))
  const own = { ...ofPolicy, personal: { 'hme-change-interval': 48 } }
  expect(dueOf('hme-change', entries, '12:00', own)).toEqual(at('2026-03-11 20:00'))
})

test('a change of exchanger stands still on a heated humidifier', () => {
  expect(dueOf('hme-change', [tube(), hme('08:00', 'yes'), heated('09:00', 'ok')])).toEqual({
    state: 'suspended',
    because: 'heated humidifier in use',
  })
})

test.each<HumidificationData['method']>(['cold aerosol', 'bib', 'none', 'nebuliser'])(
  'with %s there is no exchanger to change and no water to look at',
  method => {
    const entries = [tube(), look('09:00', { method })]
    expect(dueOf('hme-change', entries)).toEqual({ state: 'none' })
    expect(dueOf('heated-water-check', entries)).toEqual({ state: 'none' })
  },
)

test.each<[string, readonly StoredEntry[], string]>([
  ['put on', [heated('09:00', 'ok')], '13:00'],
  ['looked at', [heated('07:00', 'ok'), heated('09:30', 'filled')], '13:30'],
  ['left low: still due from the look before', [heated('07:00', 'ok'), heated('10:00', 'low')], '11:00'],
  ['put on with little water', [heated('09:00', 'low')], '13:00'],
  ['a nebuliser given in between', [heated('09:00', 'ok'), nebuliser('10:00')], '13:00'],
])('the water is due, %s', (_, entries, due) => {
  expect(dueOf('heated-water-check', [tube(), ...entries])).toEqual(at(due))
})

test('the interval of the water is set by policy', () => {
  const about = { policy: { 'humidifier-water-interval': 2 } }
  expect(dueOf('heated-water-check', [tube(), heated('09:00', 'ok')], '12:00', about)).toEqual(at('11:00'))
})

const tasks = ['humidification-check', 'hme-change', 'heated-water-check']

test.each(tasks)('%s does not concern somebody without an opening', task => {
  expect(dueOf(task, [])).toEqual({ state: 'none' })
})

test('all of it stands still after removal for good', () => {
  const because = 'tube out for good since 10-Mar-2026'
  for (const [task, last] of [
    ['humidification-check', hme('09:00', 'yes')],
    ['hme-change', hme('09:00', 'yes')],
    ['heated-water-check', heated('09:00', 'ok')],
  ] as const) {
    expect(dueOf(task, [tube(), last, aRemoval('10:00')])).toEqual({ state: 'suspended', because })
  }
})

test('a laryngectomy stoma needs moist air with a tube or without', () => {
  const about = { patient: { upperAirway: 'not open' } } as const
  expect(dueOf('humidification-check', [], '12:00', about)).toEqual(at('2026-03-01 15:00'))
  expect(dueOf('hme-change', [hme('09:00', 'yes')], '12:00', about)).toEqual(at('2026-03-11 09:00'))
})

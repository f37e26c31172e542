import { expect, test } from 'vitest'
import { hours } from '../../time/duration.ts'
import type { Clock } from '../clock.ts'
import { decannulations } from '../decannulation/schema.ts'
import type { StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, aTube, at } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { usualCheck } from './examples.ts'
import { type StomaData, stomaChecks } from './schema.ts'
import { stomaTasks } from './tasks.ts'

const [inspection, dressingChange] = stomaTasks as [(typeof stomaTasks)[0], (typeof stomaTasks)[0]]
const changed = { dressing: 'changed', secondPerson: 'T. Okafor' } as const
const none = { dressing: 'none' } as const

const tube = (when = '2026-03-02 10:00') => anEntry(tubeChanges, when, aTube())
const check = (when: string, overrides: Partial<StomaData> = {}) =>
  anEntry(stomaChecks, when, { ...usualCheck, ...overrides })
const removal = (when: string) =>
  anEntry(decannulations, when, {
    agreed: 'yes',
    operator: 'A. Haddad',
    helper: 'T. Okafor',
    kit: 'complete',
    breathing: 'comfortable',
    dressing: 'yes',
  })
const laryngectomy = { patient: { upperAirway: 'not open' } } as const

type About = Parameters<typeof aContext>[2]
const inspectionOf = (entries: readonly StoredEntry[], now = '12:00', about: About = {}) =>
  inspection.clock(aContext(entries, now, about))
const dressingOf = (entries: readonly StoredEntry[], about: About = {}) =>
  dressingChange.clock(aContext(entries, '12:00', about))

const dueAt = (clock: Clock) => (clock.state === 'running' ? clock.window.dueAt : clock.state)

test('the stoma tasks are inspection, dressing and sutures', () => {
  expect(stomaTasks.map(task => task.name)).toEqual(['stoma-inspection', 'dressing-change', 'suture-removal'])
})

test.each<[string, readonly StoredEntry[], string]>([
  ['never looked at: the shift in which the tube went in', [tube()], '2026-03-02 15:00'],
  ['looked at this morning: by the end of the afternoon', [tube(), check('09:00')], '23:00'],
  ['looked at last evening: by the end of the night', [tube(), check('2026-03-09 22:59')], '07:00'],
  [
    'only part of the skin looked at',
    [tube(), check('2026-03-09 20:00'), check('09:00', { sites: ['back of neck'] })],
    '07:00',
  ],
  [
    'not under the sutures that are in',
    [tube(), check('2026-03-09 20:00'), check('09:00', { sutures: 'in place' })],
    '07:00',
  ],
  ['a tube change is not a look', [tube(), check('2026-03-09 20:00'), tube('09:00')], '07:00'],
])('inspection is due, %s', (_, entries, due) => {
  expect(dueAt(inspectionOf(entries))).toEqual(at(due))
})

test('a check charted late for an earlier shift does not move the inspection', () => {
  const late = anEntry(stomaChecks, '2026-03-09 20:00', usualCheck, { recordedAt: at('11:00') })
  expect(dueAt(inspectionOf([tube(), check('09:00'), late]))).toEqual(at('23:00'))
})

test('a retracted check does not count', () => {
  const mistaken = check('09:00')
  const retraction = aCorrection(mistaken, stomaChecks, '09:00', usualCheck, { status: 'retracted' })
  expect(dueAt(inspectionOf([tube(), check('2026-03-09 20:00'), mistaken, retraction]))).toEqual(at('07:00'))
})

test('a patient without a tube or a laryngectomy owes no inspection', () => {
  expect(inspectionOf([])).toEqual({ state: 'none' })
  expect(dressingOf([])).toEqual({ state: 'none' })
})

test('after removal for good the opening is looked at daily until it has closed', () => {
  const out = [tube(), check('2026-03-09 08:00'), removal('2026-03-09 10:00')]
  expect(dueAt(inspectionOf(out))).toEqual(at('10:00'))
  const closed = anEntry(stomaChecks, '09:00', { ...usualCheck, appearance: ['closed'] })
  expect(dueAt(inspectionOf([...out, check('08:30')]))).toEqual(at('2026-03-11 08:30'))
  expect(inspectionOf([...out, closed])).toEqual({ state: 'suspended', because: 'opening closed on 10-Mar-2026' })
  expect(dressingOf(out)).toMatchObject({ state: 'suspended' })
})

test('a tube put back after removal starts the shift of its insertion', () => {
  const entries = [tube(), check('2026-03-04 09:00'), removal('2026-03-05 10:00'), tube('2026-03-09 16:00')]
  expect(dueAt(inspectionOf(entries))).toEqual(at('2026-03-09 23:00'))
})

test('a laryngectomy stoma stays due without a tube, and after one was taken out', () => {
  const entries = [tube(), check('2026-03-09 20:00', { sites: ['around opening'], ties: 'no ties' }), removal('10:00')]
  expect(dueAt(inspectionOf(entries, '12:00', laryngectomy))).toEqual(at('07:00'))
  expect(dueAt(inspectionOf([], '12:00', laryngectomy))).toEqual(at('2026-03-01 15:00'))
})

test.each<[string, readonly StoredEntry[], string]>([
  ['a day after the tube went in', [tube('2026-03-09 10:00')], '10:00'],
  ['a day after the last change of dressing', [tube(), check('09:00', changed)], '2026-03-11 09:00'],
  [
    'not put off by a look that left it in place',
    [tube(), check('08:00', changed), check('11:00')],
    '2026-03-11 08:00',
  ],
  [
    'a day after a tube change, which brings a fresh dressing',
    [tube(), check('08:00', changed), tube('11:00')],
    '2026-03-11 11:00',
  ],
  ['counted from the later of two changes', [tube('11:00'), check('11:30', changed)], '2026-03-11 11:30'],
  [
    'a day after admission for a tube in place on arrival',
    [
      anEntry(
        tubeChanges,
        '2026-03-01 07:30',
        aTube({ reason: 'on arrival', insertedOn: '2026-02-20', stomaMadeOn: '2026-02-20', technique: 'surgical' }),
      ),
    ],
    '2026-03-02 08:00',
  ],
  [
    'not counted from a change of tube that failed',
    [tube(), check('08:00', changed), anEntry(tubeChanges, '11:00', aTube({ difficulty: 'failed' }))],
    '2026-03-11 08:00',
  ],
])('the dressing is due %s', (_, entries, due) => {
  expect(dueAt(dressingOf(entries))).toEqual(at(due))
})

test('the dressing has two hours either side, as every daily task', () => {
  expect(dressingOf([tube(), check('09:00', changed)])).toMatchObject({
    window: { opensAt: at('2026-03-11 07:00'), closesAt: at('2026-03-11 11:00') },
  })
})

test("the interval of the dressing is the ward's, or the patient's own", () => {
  const entries = [tube(), check('09:00', changed)]
  expect(dueAt(dressingOf(entries, { policy: { 'dressing-change-interval': 12 } }))).toEqual(at('21:00'))
  expect(dueAt(dressingOf(entries, { personal: { 'dressing-change-interval': 48 } }))).toEqual(at('2026-03-12 09:00'))
})

test('a day of dressing is 24 elapsed hours across the change of clocks', () => {
  const clock = dressingOf([tube(), check('2026-03-28 12:00', changed)])
  expect(dueAt(clock)).toEqual(new Date(at('2026-03-28 12:00').getTime() + hours(24)))
})

test('without a dressing there is none to change, until a new tube brings one', () => {
  const because = 'no dressing used at the last check'
  expect(dressingOf([tube(), check('09:00', none)])).toEqual({ state: 'suspended', because })
  expect(dueAt(dressingOf([tube(), check('09:00', none), tube('10:00')]))).toEqual(at('2026-03-11 10:00'))
})

test('a laryngectomy without a tube owes a dressing only once one is in use', () => {
  expect(dressingOf([], laryngectomy)).toEqual({ state: 'none' })
  expect(dueAt(dressingOf([check('09:00', changed)], laryngectomy))).toEqual(at('2026-03-11 09:00'))
})

test('the rules are said with the numbers in force', () => {
  const context = aContext([], '12:00', { policy: { 'dressing-change-interval': 12 } })
  expect(dressingChange.says(context)).toContain('Every 12 hours')
  expect(inspection.says(context)).toContain('Once in each shift')
})

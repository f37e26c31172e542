import { expect, test } from 'vitest'
import { cuffChecks } from '../cuff-pressure/schema.ts'
import type { StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, aRemoval, aTube, at, clockOf } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { wholeKit } from './examples.ts'
import { bedsideKit } from './kind.ts'
import { kitChecks } from './schema.ts'

const tube = (when = '2026-03-02 10:00') => anEntry(tubeChanges, when, aTube())
const onArrival = (when: string) => {
  const known = {
    reason: 'on arrival',
    insertedOn: '2026-02-20',
    stomaMadeOn: '2026-02-10',
    technique: 'surgical',
  } as const
  return anEntry(tubeChanges, when, aTube(known))
}
const whole = (when: string) => anEntry(kitChecks, when, wholeKit)
const lacking = (when: string) =>
  anEntry(kitChecks, when, { ...wholeKit, complete: 'no', missing: ['obturator'], owner: 'T. Okafor' })
const transfer = (when: string) =>
  anEntry(cuffChecks, when, { found: 25, unit: 'cmH2O', method: 'manometer', reason: 'transfer' })

type About = Parameters<typeof aContext>[2]

const clockAt = (entries: readonly StoredEntry[], about: About = {}) =>
  clockOf(bedsideKit, 'bedside-kit-check', aContext(entries, '12:00', about))

function dueOf(entries: readonly StoredEntry[], about: About = {}) {
  const clock = clockAt(entries, about)
  return clock.state === 'running' ? [clock.window.dueAt, clock.because] : clock
}

test.each<[string, readonly StoredEntry[], string]>([
  ['checked in this shift', [whole('09:00')], '23:00'],
  ['checked one minute before this shift', [whole('06:59')], '15:00'],
  ['checked as this shift began', [whole('07:00')], '23:00'],
  ['the check of this shift retracted', [whole('2026-03-09 23:30'), ...retracted('09:00')], '15:00'],
  ['something missing, then complete', [lacking('09:00'), whole('09:10')], '23:00'],
])('the kit is due once in each shift: %s', (_, entries, due) => {
  expect(dueOf([tube(), ...entries])).toEqual([at(due), undefined])
})

function retracted(when: string): readonly StoredEntry[] {
  const mistaken = whole(when)
  return [mistaken, aCorrection(mistaken, kitChecks, when, wholeKit, { status: 'retracted' })]
}

test.each<[string, readonly StoredEntry[], string, string]>([
  ['a tube put in', [tube('11:00')], '11:30', 'the tube was put in'],
  ['a tube changed', [tube(), whole('09:00'), tube('11:00')], '11:30', 'the tube was changed'],
  [
    'checked, then a tube changed twice',
    [tube(), whole('09:00'), tube('10:00'), tube('11:00')],
    '10:30',
    'the tube was changed',
  ],
  ['a cuff checked for a transfer', [tube(), whole('09:00'), transfer('11:00')], '11:30', 'the patient was moved'],
  [
    'something missing',
    [tube(), lacking('11:00')].concat(whole('09:00')),
    '11:15',
    'something was missing at the last check',
  ],
  [
    'something missing twice: from the first on',
    [tube(), whole('09:00'), lacking('11:00'), lacking('11:20')],
    '11:15',
    'something was missing at the last check',
  ],
])('the kit is due soon after %s', (_, entries, due, because) => {
  expect(dueOf(entries)).toEqual([at(due), because])
})

test('somebody who comes with a tube has the kit checked within half an hour of admission', () => {
  const about = { admittedAt: '2026-03-10 09:00' }
  expect(dueOf([onArrival('09:20')], about)).toEqual([at('09:30'), 'the patient came to the ward'])
  expect(dueOf([onArrival('09:20'), whole('09:10')], about)).toEqual([at('23:00'), undefined])
})

test.each<[string, readonly StoredEntry[]]>([
  ['a tube changed', [tube('11:00'), whole('11:00')]],
  ['a transfer', [tube(), transfer('11:00'), whole('11:10')]],
])('a check after %s settles it', (_, entries) => {
  expect(dueOf(entries)).toEqual([at('23:00'), undefined])
})

test('a late prompt is seriously overdue an hour after', () => {
  const clock = clockAt([tube(), whole('09:00'), lacking('11:00')])
  expect(clock.state === 'running' && [clock.window.closesAt, clock.window.seriousAt]).toEqual([
    at('11:15'),
    at('12:15'),
  ])
})

test('policy sets both times', () => {
  const policy = { 'bedside-kit-after-event': 60, 'bedside-kit-missing-within': 5 }
  expect(dueOf([tube('11:00')], { policy })).toEqual([at('12:00'), 'the tube was put in'])
  expect(dueOf([tube(), whole('09:00'), lacking('11:00')], { policy })).toEqual([
    at('11:05'),
    'something was missing at the last check',
  ])
})

test('it does not concern somebody without a tube, and stands still after removal for good', () => {
  expect(dueOf([])).toEqual({ state: 'none' })
  const because = 'tube out for good since 10-Mar-2026'
  expect(dueOf([tube(), whole('09:00'), aRemoval('10:00')])).toEqual({ state: 'suspended', because })
})

test('it is airway care, so that it comes first when seriously late', () => {
  expect(bedsideKit.tasks?.map(({ airway }) => airway)).toEqual([true])
})

import { expect, test } from 'vitest'
import { clearedBlock } from '../adverse-event/examples.ts'
import { adverseEvents } from '../adverse-event/schema.ts'
import { cuffState } from '../cuff-pressure/cuff.ts'
import type { StoredEntry } from '../kind.ts'
import { aContext, anEntry, aRemoval, aTube, at, windowOf } from '../make.ts'
import { calm } from '../observations/examples.ts'
import { observations } from '../observations/kind.ts'
import { observationSets } from '../observations/schema.ts'
import { observationWarnings } from '../observations/warnings.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { valveEnd, valveStart } from './examples.ts'
import { weaningTrial } from './kind.ts'
import { type StopReason, type WeaningTrialData, weaningTrials } from './schema.ts'
import { runningTrials, trialsOf } from './trials.ts'
import { passedTrial, trialVerdict } from './verdict.ts'

const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())
const start = (when: string, more: Partial<WeaningTrialData> = {}) =>
  anEntry(weaningTrials, when, { ...valveStart, ...more })
const end = (when: string, more: Partial<WeaningTrialData> = {}) =>
  anEntry(weaningTrials, when, { ...valveEnd, ...more })
const lengths = (entries: readonly StoredEntry[]) =>
  trialsOf(aContext(entries, '18:00').record).map(({ name, startedAt, endedAt }) => [name, startedAt, endedAt])
const event = { ...clearedBlock, event: 'unplanned removal', tubeNow: 'out' } as const

test.each<[string, readonly StoredEntry[], ReturnType<typeof lengths>]>([
  ['none', [tube], []],
  ['one that runs', [tube, start('09:00')], [['valve', at('09:00'), undefined]]],
  ['one that ended', [tube, start('09:00'), end('10:00')], [['valve', at('09:00'), at('10:00')]]],
  ['started twice', [tube, start('09:00'), start('09:30'), end('10:00')], [['valve', at('09:00'), at('10:00')]]],
  ['an end alone', [tube, end('10:00')], []],
  [
    'two of a sort',
    [tube, start('09:00'), end('10:00'), start('12:00')],
    [
      ['valve', at('12:00'), undefined],
      ['valve', at('09:00'), at('10:00')],
    ],
  ],
  [
    'a cap beside it',
    [tube, start('09:00'), start('11:00', { trial: 'cap' })],
    [
      ['cap', at('11:00'), undefined],
      ['valve', at('09:00'), undefined],
    ],
  ],
  [
    'ended by a tube change',
    [tube, start('09:00'), anEntry(tubeChanges, '11:00', aTube())],
    [['valve', at('09:00'), at('11:00')]],
  ],
  ['ended by removal', [tube, start('09:00'), aRemoval('11:00')], [['valve', at('09:00'), at('11:00')]]],
  [
    'ended as the tube came out',
    [tube, start('09:00'), anEntry(adverseEvents, '11:00', event)],
    [['valve', at('09:00'), at('11:00')]],
  ],
])('trials: %s', (_, entries, expected) => {
  expect(lengths(entries)).toEqual(expected)
})

test.each<[string, readonly StopReason[], string]>([
  ['20:00', ['planned'], 'stopped early'],
  ['20:00', ['tired'], 'failed'],
  ['20:00', ['stridor'], 'failed'],
  ['21:00', ['planned'], 'passed'],
  ['21:00', ['asked'], 'passed'],
  ['21:00', ['planned', 'saturation'], 'failed'],
  ['20:00', ['other'], 'stopped early'],
])('a valve trial from 09:00 to %s, stopped for %j, is %s', (when, reasons, verdict) => {
  const context = aContext([tube, start('09:00'), end(when, { reasons: [...reasons] })], '23:00')
  expect(trialsOf(context.record).map(trial => trialVerdict(trial, context))).toEqual([verdict])
})

test('a trial passed and then failed counts as failed, one stopped early leaves it passed', () => {
  const passed = [tube, start('2026-03-08 08:00'), end('2026-03-08 20:00')]
  const again = (reasons: StopReason[]) => [start('2026-03-09 08:00'), end('2026-03-09 09:00', { reasons })]
  expect(passedTrial('valve', aContext(passed, '12:00'))).toMatchObject({ startedAt: at('2026-03-08 08:00') })
  expect(passedTrial('valve', aContext([...passed, ...again(['planned'])], '12:00'))).toBeDefined()
  expect(passedTrial('valve', aContext([...passed, ...again(['distress'])], '12:00'))).toBeUndefined()
})

test('the cuff is as the trial says, at its start and at its end', () => {
  const state = (entries: readonly StoredEntry[]) => cuffState(aContext(entries, '12:00').record)
  expect(state([tube])).toBe('inflated')
  expect(state([tube, start('09:00')])).toBe('deflated')
  expect(state([tube, start('09:00'), end('10:00', { cuffNow: 'up' })])).toBe('inflated')
})

test('it shows itself while it runs, with its target and the answers that stop it', () => {
  expect(weaningTrial.running?.(aContext([tube, start('09:00')], '12:00'))).toEqual([
    {
      name: 'valve',
      title: 'Valve trial',
      since: at('09:00'),
      until: at('21:00'),
      watchedBy: 'observations',
      stopWords: 'Stop the trial',
      stopsWith: { step: 'end', trial: 'valve' },
      says: 'Cuff down, valve on.',
    },
  ])
  expect(runningTrials(aContext([tube, start('09:00'), end('10:00')], '12:00').record)).toEqual([])
})

test.each<[string, readonly string[], string]>([
  ['one: 15 minutes later', ['09:14'], '09:29'],
  ['the last of the first hour', ['09:50'], '10:05'],
  ['later on: hourly', ['10:05'], '11:05'],
  ['none yet: after 15 minutes; one before the trial does not count', ['08:50'], '09:15'],
])('observations in a trial from 09:00: %s', (_, sets, due) => {
  const taken = sets.map(when => anEntry(observationSets, when, calm))
  expect(windowOf(observations, 'observations', aContext([tube, start('09:00'), ...taken], '12:00')).dueAt).toEqual(
    at(due),
  )
})

// Before: respiratory rate 18, SpO2 97, heart rate 80.
test.each([
  [{}, false],
  [{ respiratoryRate: 26, spo2: 97, heartRate: 95 }, false],
  [{ respiratoryRate: 27, spo2: 97 }, true],
  [{ spo2: 95, heartRate: 80 }, false],
  [{ spo2: 94, heartRate: 80 }, true],
  [{ spo2: 97, heartRate: 96 }, true],
  [{ spo2: 97, effort: 'distress' }, true],
] as const)('observations in a trial: %j reach a stop limit: %s', (seen, stops) => {
  const names = (trial: 'valve' | 'cap') =>
    observationWarnings({ ...calm, ...seen }, aContext([tube, start('09:00', { trial })], '12:00'))
      .filter(({ name }) => name.startsWith('trial-stop'))
      .map(({ name, level }) => `${name} ${level}`)
  expect(names('valve')).toEqual(stops ? ['trial-stop-valve amber'] : [])
  expect(names('cap')).toEqual(stops ? ['trial-stop-cap red'] : [])
})

const standing = (entries: readonly StoredEntry[]) =>
  weaningTrial.standing?.(aContext(entries, '12:00')).map(({ name, level }) => `${name} ${level}`)

test.each<[string, readonly StoredEntry[], readonly string[]]>([
  ['a trial as it should be', [tube, start('09:00')], []],
  ['a valve with the cuff up', [tube, start('09:00', { cuffNow: 'up' })], ['valve-with-cuff-up red']],
  ['valve and cap', [tube, start('09:00'), start('10:00', { trial: 'cap' })], ['trials-at-once amber']],
  ['cuff up in a cuff trial', [tube, start('09:00', { trial: 'cuff', cuffNow: 'up' })], ['trial-cuff-up amber']],
  ['not settled', [tube, start('09:00'), end('10:00', { afterwards: 'not settled' })], ['trial-not-settled red']],
  [
    'settled since',
    [tube, start('09:00'), end('10:00', { afterwards: 'not settled' }), anEntry(observationSets, '10:20', calm)],
    [],
  ],
])('what stands: %s', (_, entries, expected) => {
  expect(standing(entries)).toEqual(expected)
})

test('steps read as short sentences', () => {
  expect(weaningTrial.summary(valveStart)).toBe(
    'One-way valve trial started. Cuff fully down. Airflow felt, suctioned first, somebody stays. Before: respiratory rate 18 a min, SpO2 97%, heart rate 80 a min.',
  )
  expect(weaningTrial.summary({ ...valveEnd, reasons: ['stridor', 'saturation'] })).toBe(
    'One-way valve trial stopped: stridor, SpO2. Cuff fully down. Breathing settled afterwards.',
  )
})

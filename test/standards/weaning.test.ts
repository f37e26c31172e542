import { expect, test } from 'vitest'
import { mlPerHour } from '#app/care/above-cuff-suction/rate.ts'
import { aboveCuffSuctions } from '#app/care/above-cuff-suction/schema.ts'
import { coughChecks } from '#app/care/cough-strength/schema.ts'
import { coughVerdict } from '#app/care/cough-strength/verdict.ts'
import { cuffPressure } from '#app/care/cuff-pressure/kind.ts'
import { cuffStates } from '#app/care/cuff-state/schema.ts'
import { tubesBack } from '#app/care/decannulation/failed.ts'
import { coreCriteria, furtherCriteria } from '#app/care/decannulation-readiness/schema.ts'
import { aContext, anEntry, aRemoval, aTube, at, clockOf, windowOf } from '#app/care/make.ts'
import { calm } from '#app/care/observations/examples.ts'
import { observationSets } from '#app/care/observations/schema.ts'
import { observationWarnings } from '#app/care/observations/warnings.ts'
import { type Graded, secretionScore } from '#app/care/secretion-grade/score.ts'
import { tubeChanges } from '#app/care/tube-change/schema.ts'
import { criteriaOf, unmetCriteria } from '#app/care/weaning-plan/criteria.ts'
import { weaningPlan } from '#app/care/weaning-plan/kind.ts'
import { valveEnd, valveStart } from '#app/care/weaning-trial/examples.ts'
import { weaningTrial } from '#app/care/weaning-trial/kind.ts'
import { type TrialName, weaningTrials } from '#app/care/weaning-trial/schema.ts'
import { trialsOf } from '#app/care/weaning-trial/trials.ts'
import { trialVerdict } from '#app/care/weaning-trial/verdict.ts'
import { hours } from '#app/time/duration.ts'

/* Weaning, cough, secretions and removal against published values and the check rows of the clinical reference (9). */

const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())
const { values } = aContext([], '12:00')

// NTSP, speaking valve trials: never with an inflated cuff (asphyxia, arrest, death).
test('C-30 a valve with the cuff inflated is refused as a plan, and charted and red as found', () => {
  const plan = { step: 'valve', plannedOn: '2026-03-11', cuffThen: 'up', agreedWith: 'Team' } as const
  const context = aContext([tube], '12:00')
  expect(weaningPlan.problems?.(plan, context, { settings: [], tasks: [] })).toEqual([
    { field: 'cuffThen', message: 'The cuff must be fully down before and during this' },
  ])
  const found = { step: 'found', trial: 'valve', cuffNow: 'up' } as const
  expect(weaningTrials.schema.safeParse(found).success).toBe(true)
  expect(weaningTrial.warnings?.(found, context)).toMatchObject([
    {
      level: 'red',
      action:
        'Take the valve off now. The patient may not be able to breathe out. Check the patient, then call for help. Follow your local emergency plan.',
    },
  ])
})

test('C-29 the same by the kind of its own: down at 10:00 suspends, up at 15:00 is due at 15:15', () => {
  const done = anEntry(cuffPressure, '04:00', { found: 26, unit: 'cmH2O', method: 'manometer' })
  const down = anEntry(cuffStates, '10:00', {
    act: 'down',
    why: 'trial',
    agreedBy: 'Team',
    suctionFirst: 'both',
    tolerance: 'well',
  })
  const up = anEntry(cuffStates, '15:00', { act: 'up', why: 'end of trial', leak: 'no', tolerance: 'well' })
  expect(clockOf(cuffPressure, 'cuff-pressure-check', aContext([tube, done, down], '12:00'))).toEqual({
    state: 'suspended',
    because: 'cuff is down',
  })
  const { dueAt } = windowOf(cuffPressure, 'cuff-pressure-check', aContext([tube, done, down, up], '15:00'))
  expect(dueAt).toEqual(at('15:15'))
})

// Winck 2015 (160 at the mouth; 60 at the tube is expiratory flow); study of 2024 (100 through tube and valve).
test.each([
  ['mouth', 160, 'not met'],
  ['mouth', 161, 'met'],
  ['tube', 61, 'met'],
  ['valve', 100, 'not met'],
  ['valve', 101, 'met'],
] as const)('C-43 cough flow at %s of %i L/min is %s', (route, peakFlow, verdict) => {
  const data = coughChecks.schema.parse({ route, peakFlow, assisted: 'no' })
  expect(coughVerdict(data, values)?.verdict).toBe(verdict)
})

// Pryor 2016: at most 1 mL an hour above the cuff speaks for letting it down.
test.each([
  [6, 1.0, 'met', []],
  [9, 1.5, 'not met', ['1.5 mL an hour above the cuff']],
])('C-44 above the cuff %d mL in 6 h is %d mL an hour: %s', (volumeMl, rate, state, unmet) => {
  const drawn = (when: string, ml: number) =>
    anEntry(aboveCuffSuctions, when, { volumeMl: ml, port: 'open', blood: 'none' })
  const context = aContext([tube, drawn('04:00', 3), drawn('10:00', volumeMl)], '12:00')
  expect(mlPerHour(volumeMl, hours(6))).toBe(rate)
  expect(criteriaOf('cuff', context).find(({ name }) => name === 'above cuff')).toMatchObject({ state })
  expect(unmetCriteria('cuff', context)).toEqual(unmet)
})

// Airway Care Score, Critical Care 2008, table 1: rows are grades 0 to 3.
const rows: readonly Graded[] = [
  { cough: 'vigorous', passes: 'none', colour: 'clear', viscosity: 'watery', interval: 'rare' },
  { cough: 'moderate', passes: 'one', colour: 'tan', viscosity: 'frothy', interval: 'two to three' },
  { cough: 'weak', passes: 'two', colour: 'yellow', viscosity: 'thick', interval: 'one to two' },
  { cough: 'none', passes: 'three', colour: 'green', viscosity: 'tenacious', interval: 'often' },
]

test('each row of the Airway Care Score sums to five times its grade', () => {
  expect(rows.map(secretionScore)).toEqual([0, 5, 10, 15])
})

test('C-45 vigorous, 1 pass, tan, thick, every 1 to 2 hours is 6', () => {
  const seen: Graded = {
    cough: 'vigorous',
    passes: 'one',
    colour: 'tan',
    viscosity: 'thick',
    interval: 'one to two',
  }
  expect(secretionScore(seen)).toBe(6)
})

// BTS oxygen guideline 2017: below target, or a fall of 3% or more, is assessed.
test.each([
  ['below the target of 94 to 98', 93, 95, ['observations-spo2-below-target']],
  ['fallen from 97 within it', 94, 97, ['observations-spo2-fallen']],
  ['fallen by 2', 95, 97, []],
] as const)('C-47 SpO2 %s', (_, spo2, before, expected) => {
  const set = anEntry(observationSets, '08:00', { ...calm, spo2: before })
  const context = aContext([tube, set], '12:00', { patient: { spo2Low: 94, spo2High: 98 } })
  expect(observationWarnings({ ...calm, spo2 }, context).map(({ name }) => name)).toEqual(expected)
})

// Stelfox 2008: a removal has failed when an artificial airway is back within 48 hours.
test.each([
  ['2026-03-07 09:59', true],
  ['2026-03-07 10:00', true],
  ['2026-03-07 10:01', false],
])('C-48 taken out at 10:00 on 05-Mar-2026, a tube back at %s is a failure: %s', (when, isFailure) => {
  const { record } = aContext([tube, aRemoval('2026-03-05 10:00'), anEntry(tubeChanges, when, aTube())], '12:00')
  expect(tubesBack(record, values).map(back => back.isFailure)).toEqual([isFailure])
})

// St George's: 24 h cuff, 12 h valve, 4 h cap; NEJM 2020: 24 h cap; training texts: 4 h or 30 min of a valve.
test.each<[TrialName, number, string, Record<string, number>]>([
  ['cuff', 24, 'passed', {}],
  ['cuff', 23.9, 'stopped early', {}],
  ['valve', 12, 'passed', {}],
  ['valve', 4, 'stopped early', {}],
  ['valve', 4, 'passed', { 'trial-target-valve': 4 }],
  ['valve', 0.5, 'passed', { 'trial-target-valve': 0.5 }],
  ['cap', 24, 'passed', {}],
  ['cap', 12, 'passed', { 'trial-target-cap': 12 }],
  ['cap', 4, 'passed', { 'trial-target-cap': 4 }],
])('a %s trial of %d hours as planned is %s', (trial, length, verdict, policy) => {
  const start = at('2026-03-08 08:00')
  const end = new Date(start.getTime() + length * 3_600_000)
  const context = aContext(
    [
      tube,
      anEntry(weaningTrials, start, { ...valveStart, trial }),
      anEntry(weaningTrials, end, { ...valveEnd, trial }),
    ],
    '12:00',
    { policy },
  )
  expect(trialsOf(context.record).map(one => trialVerdict(one, context))).toEqual([verdict])
})

// Royal Marsden Manual, procedure 12.13, and St George's: ten criteria; Ceriana adds four with their numbers.
test('the readiness checklist is the published core set, with what Ceriana adds', () => {
  expect(Object.keys(coreCriteria)).toHaveLength(10)
  expect(Object.values(furtherCriteria)).toEqual([
    'PaCO2 below 60 mmHg',
    'Narrowing of the windpipe below 30%',
    'Expiratory pressure above 40 cmH2O, or cough flow above 160 L/min',
    'No infection',
  ])
})

/** Shares as the studies print them, to as many decimals. */
const share = (part: number, whole: number, decimals: number) => ((part / whole) * 100).toFixed(decimals)

test.each([
  ["C-39 O'Toole 2017, before", 20, 183, 2, '10.93'],
  ["C-39 O'Toole 2017, after", 2, 155, 2, '1.29'],
  ['C-40 Lizy 2014', 78, 192, 1, '40.6'],
  ['C-40 Alcan 2017, printed 47.3', 189, 400, 2, '47.25'],
  ['C-41 failed removals, study of 2024', 2, 105, 1, '1.9'],
])('%s: %d of %d', (_, part, whole, decimals, expected) => {
  expect(share(part, whole, decimals)).toBe(expected)
})

// Physics: laminar resistance grows with the fourth power as the tube narrows.
test('C-46 from 8 mm to 6 mm resistance grows 3.16 times', () => {
  expect(((8 / 6) ** 4).toFixed(2)).toBe('3.16')
})

// NEWS2, Royal College of Physicians: single values that score 3.
test.each([
  [{ respiratoryRate: 8 }, true],
  [{ respiratoryRate: 9 }, false],
  [{ respiratoryRate: 24 }, false],
  [{ respiratoryRate: 25 }, true],
  [{ heartRate: 40 }, true],
  [{ heartRate: 41 }, false],
  [{ heartRate: 130 }, false],
  [{ heartRate: 131 }, true],
  [{ systolic: 90 }, true],
  [{ systolic: 91 }, false],
  [{ systolic: 219 }, false],
  [{ systolic: 220 }, true],
  [{ awareness: 'confused' }, true],
] as const)('NEWS2: %j alone asks for an urgent review: %s', (seen, expected) => {
  const names = observationWarnings({ ...calm, ...seen }, aContext([tube], '12:00')).map(({ name }) => name)
  expect(names.includes('observations-extreme')).toBe(expected)
})

import { expect, test } from 'vitest'
import { coughChecks } from '../cough-strength/schema.ts'
import { cuffStates } from '../cuff-state/schema.ts'
import { decannulationReadiness } from '../decannulation-readiness/kind.ts'
import { readinessChecks } from '../decannulation-readiness/schema.ts'
import type { StoredEntry } from '../kind.ts'
import { type AboutContext, aContext, anEntry, aTube } from '../make.ts'
import { calm } from '../observations/examples.ts'
import { observationSets } from '../observations/schema.ts'
import { type SecretionGradeData, secretionGrades } from '../secretion-grade/schema.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { valveEnd, valveStart } from '../weaning-trial/examples.ts'
import { type WeaningTrialData, weaningTrials } from '../weaning-trial/schema.ts'
import { criteriaOf, type WeaningStep } from './criteria.ts'

const tube = (cuff: TubeData['cuff'] = 'air') => anEntry(tubeChanges, '2026-03-02 10:00', aTube({ cuff }))
const seen = (more: object) => anEntry(observationSets, '09:00', { ...calm, ...more })
const thin: SecretionGradeData = {
  ...{ cough: 'vigorous', passes: 'one', colour: 'clear', viscosity: 'watery', interval: 'rare' },
  flags: ['none'],
}
const graded = (more: Partial<SecretionGradeData>) => anEntry(secretionGrades, '09:00', { ...thin, ...more })
const began = (more: Partial<WeaningTrialData>) => anEntry(weaningTrials, '08:00', { ...valveStart, ...more })
const valve = (hoursLong: string, more: Partial<WeaningTrialData> = {}) => [
  anEntry(weaningTrials, '2026-03-09 08:00', valveStart),
  anEntry(weaningTrials, hoursLong, { ...valveEnd, ...more }),
]
const [, partly] = decannulationReadiness.examples
if (!partly) throw new Error('Two examples are needed')

function criterion(step: WeaningStep, name: string, entries: readonly StoredEntry[], about: AboutContext = {}) {
  const found = criteriaOf(step, aContext([tube(), ...entries], '12:00', about)).find(one => one.name === name)
  return found && [found.state, found.value ?? '']
}

test.each<[WeaningStep, string, readonly StoredEntry[], AboutContext, string, string]>([
  ['cuff', 'own breathing', [], {}, 'met', "Not ventilated, by the patient's details"],
  ['cuff', 'own breathing', [], { patient: { ventilated: true } }, 'not met', "Ventilated, by the patient's details"],
  ['cuff', 'oxygen', [], {}, 'not assessed', ''],
  ['cuff', 'oxygen', [seen({ oxygen: 'air', fio2: undefined })], {}, 'met', 'Air'],
  ['cuff', 'oxygen', [seen({ fio2: 40 })], {}, 'met', 'FiO2 40%'],
  ['cuff', 'oxygen', [seen({ fio2: 41 })], {}, 'not met', 'FiO2 41%'],
  ['cuff', 'oxygen', [seen({ fio2: 41 })], { policy: { 'weaning-fio2-at-most': 45 } }, 'met', 'FiO2 41%'],
  ['cuff', 'oxygen', [seen({ fio2: undefined, flow: 3 })], {}, 'not assessed', '3 L/min, FiO2 not charted'],
  ['cuff', 'above cuff', [], {}, 'not assessed', ''],
  ['cuff', 'suction interval', [], {}, 'not assessed', ''],
  ['cuff', 'suction interval', [graded({ interval: 'one to two' })], {}, 'met', 'Every 1 to 2 hours'],
  ['cuff', 'suction interval', [graded({ interval: 'often' })], {}, 'not met', 'More often than hourly'],
  ['cuff', 'secretions', [graded({})], {}, 'met', 'Clear, watery'],
  ['cuff', 'secretions', [graded({ colour: 'tan' })], {}, 'not met', 'Tan, watery'],
  ['cuff', 'secretions', [graded({ viscosity: 'thick' })], {}, 'not met', 'Clear, thick'],
  ['cuff', 'cough', [graded({ cough: 'moderate' })], {}, 'met', 'Moderate'],
  ['cuff', 'cough', [graded({ cough: 'weak' })], {}, 'not met', 'Weak'],
  ['cuff', 'awake', [seen({ awareness: 'voice' })], {}, 'met', 'Responds to voice'],
  ['cuff', 'awake', [seen({ awareness: 'sedated' })], {}, 'not met', 'Sedated on purpose'],
  ['valve', 'upper airway', [], {}, 'met', "Open, by the patient's details"],
  [
    'valve',
    'upper airway',
    [],
    { patient: { upperAirway: 'not known' } },
    'not assessed',
    "Not known, by the patient's details",
  ],
  ['valve', 'cuff down', [], {}, 'not met', 'Up'],
  ['valve', 'cuff down', [anEntry(cuffStates, '09:00', { act: 'seen down' })], {}, 'met', 'Down'],
  ['valve', 'airflow', [], {}, 'not assessed', ''],
  ['valve', 'airflow', [began({ airflow: 'no' })], {}, 'not met', 'Not felt'],
  ['valve', 'airflow', [began({ airflow: 'not checked' })], {}, 'not assessed', ''],
  ['cap', 'valve passed', [], {}, 'not assessed', ''],
  ['cap', 'valve passed', [began({})], {}, 'not met', 'Running, 4 h'],
  ['cap', 'valve passed', valve('2026-03-09 20:00'), {}, 'met', 'Passed, 12 h'],
  ['cap', 'valve passed', valve('2026-03-09 19:00'), {}, 'not met', 'Stopped early, 11 h'],
  ['cap', 'valve passed', valve('2026-03-09 20:00', { reasons: ['stridor'] }), {}, 'not met', 'Failed, 12 h'],
  ['removal', 'cough flow', [], {}, 'not assessed', ''],
  [
    'removal',
    'cough flow',
    [anEntry(coughChecks, '09:00', { route: 'valve', peakFlow: 101, assisted: 'no' })],
    {},
    'met',
    '101 L/min through tube and valve, more than 100 needed',
  ],
  ['removal', 'ready team', [], {}, 'not assessed', ''],
  ['removal', 'ready team', [anEntry(readinessChecks, '09:00', partly)], {}, 'not met', 'No'],
  [
    'removal',
    'ready swallow',
    [anEntry(readinessChecks, '09:00', partly)],
    {},
    'not assessed',
    'Scope booked for Thursday',
  ],
])('for %s, %s: %j', (step, name, entries, about, state, value) => {
  expect(criterion(step, name, entries, about)).toEqual([state, value])
})

test('without a cuff nothing is asked of what lies above it', () => {
  const context = aContext([tube('none')], '12:00')
  expect(criteriaOf('valve', context).some(({ name }) => name === 'above cuff')).toBe(false)
})

test('what a plan is held against comes first, and every criterion has a rule and a source', () => {
  for (const step of ['cuff', 'valve', 'cap', 'removal'] as const) {
    const criteria = criteriaOf(step, aContext([tube()], '12:00'))
    const asked = criteria.map(({ isAsked }) => isAsked)
    expect(asked).toEqual(asked.toSorted((a, b) => Number(b) - Number(a)))
    expect(new Set(criteria.map(({ name }) => name)).size).toBe(criteria.length)
    expect(criteria.filter(({ rule, source }) => !/^[A-Z].*\.$/.test(rule) || source === '')).toEqual([])
  }
})

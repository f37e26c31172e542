import { expect, test } from 'vitest'
import { coughChecks } from '../cough-strength/schema.ts'
import { cuffStates } from '../cuff-state/schema.ts'
import { type ReadinessData, readinessChecks } from '../decannulation-readiness/schema.ts'
import type { StoredEntry } from '../kind.ts'
import { type AboutContext, aContext, anEntry, aTube, clockOf } from '../make.ts'
import { calm } from '../observations/examples.ts'
import { observationSets } from '../observations/schema.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { valveEnd, valveStart } from '../weaning-trial/examples.ts'
import { weaningTrial } from '../weaning-trial/kind.ts'
import { type TrialName, weaningTrials } from '../weaning-trial/schema.ts'
import { weaningPlan } from './kind.ts'
import { type WeaningPlanData, weaningPlans } from './schema.ts'

const withCuff = (cuff: 'air' | 'foam' | 'none') => anEntry(tubeChanges, '2026-03-02 10:00', aTube({ cuff }))
const down = anEntry(cuffStates, '2026-03-05 09:00', {
  act: 'down',
  why: 'trial',
  agreedBy: 'Team',
  suctionFirst: 'both',
  tolerance: 'well',
})
const passed = (trial: TrialName) => [
  anEntry(weaningTrials, '2026-03-07 08:00', { ...valveStart, trial }),
  anEntry(weaningTrials, '2026-03-08 08:00', { ...valveEnd, trial }),
]
const yes: ReadinessData = {
  cause: 'yes',
  airway: 'yes',
  commands: 'yes',
  cuffDown: 'yes',
  secretions: 'yes',
  cough: 'yes',
  swallow: 'yes',
  heart: 'yes',
  chest: 'yes',
  team: 'yes',
}
const ready = (more: Partial<ReadinessData> = {}) => anEntry(readinessChecks, '2026-03-09 09:00', { ...yes, ...more })
const all = [withCuff('air'), down, ...passed('valve'), ...passed('cap'), ready()]

const plan = (more: Partial<WeaningPlanData>): WeaningPlanData => ({
  step: 'valve',
  plannedOn: '2026-03-11',
  cuffThen: 'down',
  agreedWith: 'Team',
  ...more,
})

function refusals(more: Partial<WeaningPlanData>, entries: readonly StoredEntry[], about: AboutContext = {}) {
  return weaningPlan
    .problems?.(plan(more), aContext(entries, '12:00', about), { settings: [], tasks: [] })
    .map(({ field, message }) => `${field}: ${message}`)
}

const laryngectomy: AboutContext = { patient: { upperAirway: 'not open' } }
const NEVER = 'step: Never after a laryngectomy: the mouth does not connect to the lungs'
const FOAM = 'step: Not with a foam cuff: it cannot be fully emptied. Plan another tube first'
const CUFF = 'cuffThen: The cuff must be fully down before and during this'
const senior = { seniorName: 'Dr N. Abara', seniorReason: 'Seen by scope' } as const

test.each<[string, Partial<WeaningPlanData>, readonly StoredEntry[], readonly string[], AboutContext?]>([
  ['a valve, cuff down', {}, [withCuff('air')], []],
  ['a valve, cuff up', { cuffThen: 'up' }, [withCuff('air')], [CUFF]],
  ['a cap, cuff up', { step: 'cap', cuffThen: 'up' }, all, [CUFF]],
  ['a valve, foam cuff', {}, [withCuff('foam')], [FOAM]],
  ['a valve after laryngectomy', {}, [withCuff('air')], [NEVER], laryngectomy],
  ['a removal after laryngectomy', { step: 'removal' }, all, [NEVER], laryngectomy],
  ['a cuff trial without a cuff', { step: 'cuff' }, [withCuff('none')], ['step: This tube has no cuff to let down']],
  [
    'no cuff where there is one',
    { cuffThen: 'none' },
    [withCuff('air')],
    ['cuffThen: The record shows a tube with a cuff'],
  ],
  ['without a tube', {}, [], ['step: No tube is charted']],
  [
    'a day gone by',
    { plannedOn: '2026-03-09' },
    [withCuff('air')],
    ['plannedOn: The planned day must not be in the past'],
  ],
  [
    'a cap today while a valve trial runs',
    { step: 'cap', plannedOn: '2026-03-10' },
    [...all, anEntry(weaningTrials, '11:00', valveStart)],
    ['step: One-way valve trial runs: stop it first, or plan this for another day'],
  ],
  ['a cap tomorrow', { step: 'cap' }, [...all, anEntry(weaningTrials, '11:00', valveStart)], []],
  [
    'a cap before any valve',
    { step: 'cap' },
    [withCuff('air'), down],
    ['seniorName: Not met: no one-way valve trial was passed. To plan it all the same, name the senior'],
  ],
  [
    'a removal with the cuff up',
    { step: 'removal' },
    [withCuff('air'), ready()],
    [
      'step: The cuff is up: removal follows after time with the cuff down',
      'seniorName: Not met: no cap trial was passed. To plan it all the same, name the senior',
    ],
  ],
  ['a removal with all met', { step: 'removal' }, all, []],
  [
    'a removal, swallow not assessed',
    { step: 'removal' },
    [...all.slice(0, -1), ready({ swallow: 'not assessed', whyNotSwallow: 'Booked' })],
    ['seniorName: Not met: not assessed: effective swallow. To plan it all the same, name the senior'],
  ],
  [
    'a removal, weak cough',
    { step: 'removal' },
    [...all, anEntry(coughChecks, '09:00', { route: 'mouth', peakFlow: 160, assisted: 'no' })],
    ['seniorName: Not met: the cough is too weak by peak flow. To plan it all the same, name the senior'],
  ],
  [
    'much oxygen',
    {},
    [withCuff('air'), anEntry(observationSets, '09:00', { ...calm, fio2: 50 })],
    ['seniorName: Not met: FiO2 50%, at most 40. To plan it all the same, name the senior'],
  ],
])('planned: %s', (_, more, entries, expected, about = {}) => {
  expect(refusals(more, entries, about)).toEqual(expected)
})

test('a senior may decide against a criterion by name and with a reason, and it is said', () => {
  const record = [withCuff('air'), down]
  expect(refusals({ step: 'cap', ...senior }, record)).toEqual([])
  expect(refusals({ step: 'cap', seniorName: senior.seniorName }, record)).toEqual([
    'seniorReason: Enter why the senior decides against the criterion',
  ])
  const warnings = weaningPlan.warnings?.(plan({ step: 'cap', ...senior }), aContext(record, '12:00'))
  expect(warnings).toMatchObject([{ name: 'planned-against-criterion', level: 'amber' }])
})

test.each([
  ['cuff up', { cuffThen: 'up' as const }, withCuff('air'), [CUFF]],
  ['a foam cuff', {}, withCuff('foam'), [FOAM]],
])('nobody may decide for a valve with %s', (_, more, tube, expected) => {
  expect(refusals({ ...more, ...senior }, [tube])).toEqual(expected)
})

test('a planned trial is due on its day until it has started or the plan is taken back', () => {
  const planned = anEntry(weaningPlans, '09:00', plan({}))
  const clock = (entries: readonly StoredEntry[]) =>
    clockOf(weaningTrial, 'planned-trial', aContext([withCuff('air'), planned, ...entries], '2026-03-11 12:00'))
  expect(clock([])).toMatchObject({ state: 'running', byDay: '2026-03-11' })
  expect(clock([anEntry(weaningTrials, '11:00', valveStart)])).toEqual({ state: 'none' })
  expect(clock([anEntry(weaningTrials, '11:00', { ...valveStart, trial: 'cuff' })])).toMatchObject({ state: 'running' })
  expect(clock([anEntry(weaningPlans, '11:00', { step: 'none' })])).toEqual({ state: 'none' })
})

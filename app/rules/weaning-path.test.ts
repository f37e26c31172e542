import { expect, test } from 'vitest'
import { adverseEvents } from '../care/adverse-event/schema.ts'
import { cuffStates } from '../care/cuff-state/schema.ts'
import { decannulationReadiness } from '../care/decannulation-readiness/kind.ts'
import { readinessChecks } from '../care/decannulation-readiness/schema.ts'
import type { StoredEntry } from '../care/kind.ts'
import { type AboutContext, aContext, anEntry, aRemoval, aTube } from '../care/make.ts'
import { type TubeData, tubeChanges } from '../care/tube-change/schema.ts'
import { weaningPlans } from '../care/weaning-plan/schema.ts'
import { valveEnd, valveStart } from '../care/weaning-trial/examples.ts'
import { type TrialName, weaningTrials } from '../care/weaning-trial/schema.ts'
import { weaningPath } from './weaning-path.ts'
import { criterionViews, planView, trialViews } from './weaning-views.ts'

const tube = (cuff: TubeData['cuff'] = 'air', when = '2026-03-02 10:00') => anEntry(tubeChanges, when, aTube({ cuff }))
const start = (trial: TrialName, when: string) => anEntry(weaningTrials, when, { ...valveStart, trial })
const passed = (trial: TrialName, day = 7) => [
  start(trial, `2026-03-0${day} 08:00`),
  anEntry(weaningTrials, `2026-03-0${day + 1} 08:00`, { ...valveEnd, trial }),
]
const failed = (trial: TrialName, from: string, to: string) => [
  start(trial, from),
  anEntry(weaningTrials, to, { ...valveEnd, trial, reasons: ['distress'] }),
]
const [allReady] = decannulationReadiness.examples
if (!allReady) throw new Error('An example is needed')
const ready = anEntry(readinessChecks, '2026-03-09 09:00', allReady)
const up = anEntry(cuffStates, '09:00', { act: 'up', why: 'night', leak: 'no', tolerance: 'well' })

const pathOf = (entries: readonly StoredEntry[], about: AboutContext = {}) =>
  weaningPath(aContext(entries, '12:00', about))
const states = (entries: readonly StoredEntry[]) =>
  pathOf(entries)
    .steps.map(({ name, state }) => `${name} ${state}`)
    .join(', ')

test.each<[string, readonly StoredEntry[], string]>([
  ['nobody weans', [tube()], 'cuff here, valve ahead, cap ahead, ready ahead, removal ahead'],
  ['a tube without a cuff', [tube('none')], 'cuff not needed, valve here, cap ahead, ready ahead, removal ahead'],
  ['a cuff trial passed', [tube(), ...passed('cuff')], 'cuff done, valve here, cap ahead, ready ahead, removal ahead'],
  [
    'the same, failed since',
    [tube(), ...passed('cuff'), ...failed('cuff', '08:00', '08:30')],
    'cuff here, valve ahead, cap ahead, ready ahead, removal ahead',
  ],
  [
    'a valve runs before a cuff trial was passed',
    [tube(), start('valve', '11:00')],
    'cuff open, valve here, cap ahead, ready ahead, removal ahead',
  ],
  [
    'a cap passed without a valve: overtaken',
    [tube(), ...passed('cap')],
    'cuff done, valve done, cap done, ready here, removal ahead',
  ],
  [
    'all met',
    [tube('none'), ...passed('cap'), ready],
    'cuff not needed, valve done, cap done, ready done, removal here',
  ],
  [
    'all met and the cuff up again',
    [tube(), ...passed('cap'), ready, up],
    'cuff done, valve done, cap done, ready here, removal ahead',
  ],
  ['a foam cuff', [tube('foam')], 'cuff here, valve ahead, cap ahead, ready ahead, removal ahead'],
])('where on the path: %s', (_, entries, expected) => {
  expect(states(entries)).toBe(expected)
})

test.each<[string, readonly StoredEntry[], AboutContext, string]>([
  ['a laryngectomy', [tube()], { patient: { upperAirway: 'not open' } }, 'No weaning after a laryngectomy'],
  ['no tube charted', [], {}, 'No tube is charted'],
  ['a tube that was removed', [tube(), aRemoval('09:00')], {}, 'The tube was removed for good'],
  [
    'a tube that came out',
    [
      tube(),
      anEntry(adverseEvents, '11:00', {
        event: 'unplanned removal',
        tubeNow: 'out',
        done: ['help called'],
        outcome: 'recovered',
        told: ['doctor'],
      }),
    ],
    {},
    'The tube came out and is not charted as back',
  ],
  ['a child without rules', [tube()], { patient: { bornOn: '2020-05-05' } }, 'No rules for this age on this ward'],
])('there is no path to judge: %s', (_, entries, about, title) => {
  const path = pathOf(entries, about)
  expect(path.noPath?.title).toBe(title)
  expect(path.next).toBeNull()
  expect(path.steps.every(({ state }) => state === 'done')).toBe(true)
})

test('a removal says when, and until when a tube back in counts as its failure', () => {
  expect(pathOf([tube(), aRemoval('09:00')]).noPath?.says).toBe(
    'On 10-Mar-2026 09:00, 3 h ago. A tube back in by 12-Mar-2026 09:00 would count as a failed removal.',
  )
})

test('a tube that went back in is said, with what was met before', () => {
  const [note] = pathOf([tube(), aRemoval('08:00'), tube('air', '11:00')]).notes
  expect(note).toContain('A tube went back in on 10-Mar-2026 11:00, 3 h after a removal, which counts as failed.')
})

test('a foam cuff is said to stand in the way', () => {
  expect(pathOf([tube('foam')]).notes).toEqual([
    'This tube has a foam cuff, which cannot be fully emptied: valve, cap and removal need another tube first.',
  ])
})

test('after readiness the criteria are those of removal', () => {
  expect(pathOf([tube('none'), ...passed('cap')]).next).toBe('removal')
  expect(pathOf([tube('none')]).next).toBe('valve')
})

test('a criterion leads to its act, to what charts it, and to its number with source', () => {
  const context = aContext([tube('none'), ...passed('cap')], '12:00')
  const cap = criterionViews('removal', context).find(({ name }) => name === 'cap passed')
  expect(cap).toMatchObject({
    label: 'Cap trial passed',
    state: 'met',
    isAsked: true,
    value: 'Passed, 1 d',
    chart: { kind: 'weaning-trial', words: 'Chart trial' },
    values: [{ label: 'A cap trial is passed after', value: '24 h', standing: 'published' }],
  })
  expect(cap?.entry?.at).toBe(
    context.record.latest(weaningTrials, ({ step }) => step === 'start')?.performedAt.getTime(),
  )
})

test('trials come latest first with the verdict of now; of a child without rules, with none', () => {
  const entries = [tube(), ...passed('valve'), ...failed('valve', '08:00', '08:30'), start('valve', '11:00')]
  const views = trialViews(aContext(entries, '12:00'))
  expect(views.map(({ verdict, because }) => [verdict, because])).toEqual([
    ['running', ''],
    ['failed', 'Distress'],
    ['passed', 'As planned'],
  ])
  const child = trialViews(aContext(entries, '12:00', { patient: { bornOn: '2020-05-05' } }))
  expect(child.map(({ verdict, target }) => [verdict, target])).toEqual([
    ['running', null],
    [null, null],
    [null, null],
  ])
})

test('the plan in force is the one that has not begun', () => {
  const plan = { step: 'valve', plannedOn: '2026-03-11', cuffThen: 'down', agreedWith: 'Team' } as const
  const planned = anEntry(weaningPlans, '09:00', plan)
  expect(planView(aContext([tube(), planned], '12:00'))).toMatchObject({
    sentence: 'Planned: one-way valve trial on 11-Mar-2026, cuff fully down. Agreed with Team.',
    by: 'Ama Mensah',
  })
  expect(planView(aContext([tube(), planned, start('valve', '11:00')], '12:00'))).toBeNull()
})

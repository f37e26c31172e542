import { expect, test } from 'vitest'
import { clearedBlock } from '../adverse-event/examples.ts'
import { adverseEvents } from '../adverse-event/schema.ts'
import type { StoredEntry } from '../kind.ts'
import { type AboutContext, aContext, anEntry, aRemoval, aTube, at, windowOf } from '../make.ts'
import { tubeChange } from '../tube-change/kind.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { routinePlan } from './examples.ts'
import { tractWords } from './gate.ts'
import { tubeChangePlan } from './kind.ts'
import { openPlan } from './open-plan.ts'
import { type TubePlanData, tubePlanSchema, tubePlans } from './schema.ts'
import { standingPlanWarnings } from './warnings.ts'

const tube = (when: string, overrides: Partial<TubeData> = {}) => anEntry(tubeChanges, when, aTube(overrides))
/** Put in on 02-Mar-2026: 10-Mar is its day 8. */
const first = (technique: TubeData['technique']) => tube('2026-03-02 10:00', { reason: 'first insertion', technique })
const later = tube('2026-03-02 10:00')
const plan = (when: string, overrides: Partial<TubePlanData> = {}) =>
  anEntry(tubePlans, when, { ...routinePlan, plannedOn: '2026-03-12', ...overrides })

const problemsOf = (overrides: Partial<TubePlanData>, entries: readonly StoredEntry[], now = '12:00') =>
  tubeChangePlan
    .problems?.({ ...routinePlan, plannedOn: '2026-03-12', ...overrides }, aContext(entries, now), NONE)
    .map(({ field, message }) => `${field}: ${message.split('.')[0]}`)

const NONE = { settings: [], tasks: [] }
const ON_THE_DAY = '2026-03-02 12:00'

test.each<[TubeData['technique'], string, string | undefined]>([
  ['surgical', '2026-03-05', 'The opening is only 3 days old on that day; the first change is from day 4 on'],
  ['surgical', '2026-03-06', undefined],
  ['percutaneous', '2026-03-05', 'The opening is only 3 days old on that day; the first change is from day 7 on'],
  ['percutaneous', '2026-03-08', 'The opening is only 6 days old on that day; the first change is from day 7 on'],
  ['percutaneous', '2026-03-09', undefined],
  [
    'not known',
    '2026-03-08',
    'The opening is only 6 days old on that day; the first change is from day 7 on, as it is not known how it was made',
  ],
])('a first change, %s, planned for %s', (technique, plannedOn, says) => {
  const found = problemsOf({ plannedOn }, [first(technique)], ON_THE_DAY)
  expect(found).toEqual(says === undefined ? [] : [`plannedOn: ${says}`])
})

test('a later change may be planned for any day', () => {
  expect(problemsOf({ plannedOn: '2026-03-02' }, [later], ON_THE_DAY)).toEqual([])
})

const early: Partial<TubePlanData> = { plannedOn: '2026-03-05' }
test.each<[string, Partial<TubePlanData>, readonly string[]]>([
  ['with a named senior and a reason', { senior: 'Dr N. Abara', seniorReason: 'Cuff torn' }, []],
  ['with a senior alone', { senior: 'Dr N. Abara' }, ['seniorReason: Enter why Dr N']],
  ['with a reason alone', { seniorReason: 'Cuff torn' }, ['senior: Enter the senior who decided to go ahead']],
])('an early change %s', (_, decision, expected) => {
  expect(problemsOf({ ...early, ...decision }, [first('percutaneous')], ON_THE_DAY)).toEqual(expected)
})

test.each<[Partial<TubePlanData>, readonly string[]]>([
  [{ contraindications: ['none'] }, []],
  [
    { contraindications: ['view', 'support'] },
    ['contraindications: Contraindicated: poor view or light; high ventilator or oxygen need'],
  ],
  [{ consent: 'refused' }, ['contraindications: Contraindicated: patient refuses']],
  [{ consent: 'refused', contraindications: ['refusal'] }, ['contraindications: Contraindicated: patient refuses']],
  [{ contraindications: ['end of life'], senior: 'Dr N. Abara', seniorReason: 'Comfort' }, []],
])('what speaks against it refuses a plan, unless a senior decides: %j', (overrides, expected) => {
  expect(problemsOf(overrides, [later])).toEqual(expected)
})

test('a plan needs a tube to change and a day to come', () => {
  expect(problemsOf({}, [])).toEqual(['step: No tube is charted as in place: chart it before its change is planned'])
  expect(problemsOf({ plannedOn: '2026-03-09' }, [later])).toEqual(['plannedOn: Planned date must not be in the past'])
  expect(problemsOf({ plannedOn: '2026-03-10' }, [later])).toEqual([])
})

test('only a plan that stands can be called off', () => {
  const off: TubePlanData = { step: 'call off', calledOffBecause: 'Fever' }
  const problems = (...entries: readonly StoredEntry[]) =>
    tubeChangePlan.problems?.(off, aContext(entries, '12:00'), NONE)
  expect(problems(later)).toHaveLength(1)
  expect(problems(later, plan('11:00'))).toEqual([])
})

test('every question of the gate is asked of a plan, and none of one that is called off', () => {
  const issues = (data: object) => tubePlanSchema.safeParse(data).error?.issues.map(({ path }) => path.join('.'))
  expect(issues({ step: 'plan' })).toEqual([
    'plannedOn',
    'indication',
    'newTube',
    'contraindications',
    'operator',
    'helper',
    'equipment',
    'spareSame',
    'spareSmaller',
    'fasted',
    'capnography',
    'consent',
    'ifItFails',
  ])
  expect(issues({ step: 'call off', calledOffBecause: 'Fever' })).toBeUndefined()
  expect(issues({ ...routinePlan, contraindications: ['none', 'kit'] })).toEqual(['contraindications'])
})

const planOf = (...entries: readonly StoredEntry[]) => openPlan(aContext(entries, '14:00').record)?.plannedOn
const out = anEntry(adverseEvents, '12:00', { ...clearedBlock, event: 'unplanned removal', tubeNow: 'out' })

test.each<[string, readonly StoredEntry[], string | undefined]>([
  ['none', [later], undefined],
  ['the latest', [later, plan('09:00'), plan('10:00', { plannedOn: '2026-03-14' })], '2026-03-14'],
  [
    'called off',
    [later, plan('09:00'), anEntry(tubePlans, '10:00', { step: 'call off', calledOffBecause: 'x' })],
    undefined,
  ],
  ['the tube was changed', [later, plan('09:00'), tube('11:00')], undefined],
  ['the change failed', [later, plan('09:00'), tube('11:00', { difficulty: 'failed' })], undefined],
  ['the tube was removed for good', [later, plan('09:00'), aRemoval('11:00')], undefined],
  ['the tube came out', [later, plan('09:00'), out], undefined],
  ['made for the tube after the change', [later, tube('08:00'), plan('09:00')], '2026-03-12'],
])('the plan that stands: %s', (_, entries, expected) => {
  expect(planOf(...entries)).toBe(expected)
})

test('the opening is shown as the record has it', () => {
  const words = (...entries: readonly StoredEntry[]) => tractWords(aContext(entries, '12:00'))
  expect(words(first('surgical'))).toBe('Opening made 02-Mar-2026, 8 days old, fresh; tube in for 8 days')
  expect(words(later)).toBe('When the opening was made is not charted; tube in for 8 days')
  expect(words()).toBeUndefined()
})

test('a planned change is due on its day, and opens the tube change with what the plan knows', () => {
  const entries = [later, plan('09:00')]
  expect(windowOf(tubeChange, 'planned-tube-change', aContext(entries, '12:00')).dueAt).toEqual(at('2026-03-12 00:00'))
  expect(tubeChange.startsWith?.(aContext(entries, '2026-03-11 23:59'))).toEqual({})
  expect(tubeChange.startsWith?.(aContext(entries, '2026-03-12 08:00'))).toEqual({
    reason: 'routine',
    operator: 'E. Solberg',
    helper: 'R. Osei',
  })
})

const standing = (now: string, ...entries: readonly StoredEntry[]) =>
  standingPlanWarnings(aContext([later, ...entries], now)).map(({ name, level }) => `${name} ${level}`)

test.each<[string, Partial<TubePlanData>, readonly string[]]>([
  ['2026-03-11 12:00', { fasted: 'yes' }, []],
  ['2026-03-11 12:00', { fasted: 'arranged' }, ['tube-plan-not-ready blue']],
  ['2026-03-12 08:00', { spareSmaller: 'no' }, ['tube-plan-not-ready amber']],
  ['2026-03-13 00:00', { fasted: 'yes' }, ['tube-plan-passed amber']],
])('at %s, with %j, a plan says', (now, overrides, expected) => {
  expect(standing(now, plan('09:00', overrides))).toEqual(expected)
})

test('a plan past the limit of the tube warns, and is not refused', () => {
  const data = { ...routinePlan, plannedOn: '2026-03-31' }
  const context = (about?: AboutContext) => aContext([later], '12:00', about)
  expect(tubeChangePlan.warnings?.(data, context()).map(({ name }) => name)).toEqual(['tube-plan-past-limit'])
  expect(tubeChangePlan.warnings?.({ ...data, plannedOn: '2026-03-30' }, context())).toEqual([])
})

test('where no first change is routine, a plan of one asks for its indication', () => {
  const policy = { 'routine-first-change': false }
  const data: TubePlanData = { ...routinePlan, plannedOn: '2026-03-12', indication: 'first change' }
  expect(tubeChangePlan.warnings?.(data, aContext([first('surgical')], '12:00', { policy }))).toMatchObject([
    { name: 'tube-plan-no-indication', level: 'blue' },
  ])
})

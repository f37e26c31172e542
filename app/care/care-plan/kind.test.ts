import { expect, test } from 'vitest'
import type { KnownNames } from '../form-problem.ts'
import { aContext, anEntry } from '../make.ts'
import { numberSetting, switchSetting, valuesFor } from '../policy.ts'
import { carePlan } from './kind.ts'
import { type CarePlanData, carePlans } from './schema.ts'

const source = { says: 'No published number', standing: 'product proposal' } as const
const about = { unit: 'h', default: 8, min: 4, max: 12, affects: 'Checks', source }
const known: KnownNames = {
  settings: [
    numberSetting({ ...about, name: 'check-interval', label: 'Check every', personal: true }),
    numberSetting({ ...about, name: 'ward-interval', label: 'Ward check every' }),
    switchSetting({ name: 'strict', label: 'Strict', unit: 'on or off', default: false, affects: 'Checks', source }),
  ],
  tasks: [],
}

const own: CarePlanData = {
  setting: 'check-interval',
  step: 'set own value',
  value: 6,
  reviewOn: '2026-03-12',
  reason: 'Copious secretions',
}
const back: CarePlanData = { setting: 'check-interval', step: 'back to ward policy', reason: 'Dry again.' }

test('a care plan reads as setting, value, review date and reason', () => {
  expect(carePlan.summary(own)).toBe('Check interval: own value 6, review by 12-Mar-2026. Copious secretions.')
  expect(carePlan.summary(back)).toBe('Check interval: back to ward policy. Dry again.')
})

const issuesOf = (data: Readonly<Record<string, unknown>>) =>
  carePlans.schema.safeParse(data).error?.issues.map(({ path, message }) => `${path.join('.')}: ${message}`)

test('an own value needs its value, its review date and a reason', () => {
  expect(issuesOf({ setting: 'check-interval', step: 'set own value' })).toEqual(['reason: Enter the reason'])
  expect(issuesOf({ setting: 'check-interval', step: 'set own value', reason: 'Dry' })).toEqual([
    'value: Enter the own value',
    'reviewOn: Enter the review date',
  ])
})

test('going back to ward policy carries neither value nor review date', () => {
  expect(issuesOf({ ...own, step: 'back to ward policy' })).toEqual([
    'value: Leave out the own value here',
    'reviewOn: Leave out the review date here',
  ])
})

const problemsOf = (data: CarePlanData, ...before: readonly CarePlanData[]) =>
  carePlan
    .problems?.(
      data,
      aContext(
        before.map(plan => anEntry(carePlans, '09:00', plan)),
        '12:00',
      ),
      known,
    )
    .map(({ field, message }) => `${field}: ${message}`)

test.each([
  [3.5, ['value: Check every: from 4 to 12 h']],
  [4, []],
  [12, []],
  [12.5, ['value: Check every: from 4 to 12 h']],
])('a value of %s is held against the range of its setting', (value, expected) => {
  expect(problemsOf({ ...own, value })).toEqual(expected)
})

test.each([
  ['2026-03-09', ['reviewOn: Review date must not be in the past']],
  ['2026-03-10', []],
  ['2026-03-11', []],
])('on 10-Mar-2026 a review date of %s', (reviewOn, expected) => {
  expect(problemsOf({ ...own, reviewOn })).toEqual(expected)
})

const band: KnownNames = {
  settings: [
    numberSetting({ ...about, name: 'band-low', label: 'Lower', personal: true, notAbove: 'band-high' }),
    numberSetting({ ...about, name: 'band-high', label: 'Upper', personal: true, notBelow: 'band-low', default: 10 }),
  ],
  tasks: [],
}

test.each<[string, CarePlanData, readonly CarePlanData[], readonly string[]]>([
  ['a lower end at the upper one', { ...own, setting: 'band-low', value: 10 }, [], []],
  [
    'a lower end above the upper one',
    { ...own, setting: 'band-low', value: 10.5 },
    [],
    ['value: Lower: at most 10 h, the upper of this patient'],
  ],
  [
    'an upper end below the lower one',
    { ...own, setting: 'band-high', value: 7.5 },
    [],
    ['value: Upper: at least 8 h, the lower of this patient'],
  ],
  [
    'an upper end given back below an own lower one',
    { ...back, setting: 'band-high' },
    [
      { ...own, setting: 'band-high', value: 12 },
      { ...own, setting: 'band-low', value: 11 },
    ],
    ['step: Upper: at least 11 h, the lower of this patient'],
  ],
])('a band keeps its order: %s', (_, plan, before, expected) => {
  const entries = before.map((data, i) => anEntry(carePlans, `09:0${i}`, data))
  const personal = Object.fromEntries(before.map(({ setting, value = 0 }) => [setting, value]))
  const found = carePlan.problems?.(plan, aContext(entries, '12:00', { personal }), band)
  expect(found?.map(({ field, message }) => `${field}: ${message}`)).toEqual(expected)
})

const ofAge: KnownNames = {
  settings: [
    numberSetting({
      ...{ ...about, name: 'cannula-days', label: 'Longest use', min: 7, max: 90, default: 28, personal: true },
      children: { byAge: { neonate: 7, infant: 7, child: 14, adolescent: 28 }, min: 3, max: 30, source },
    }),
  ],
  tasks: [],
}

test.each<[string, number, readonly string[]]>([
  ['adults', 5, ['value: Longest use: from 7 to 90 h']],
  ['adults', 60, []],
  ['children', 5, []],
  ['children', 60, ['value: Longest use, from 1 to 11 years: from 3 to 30 h']],
])('a value for %s of %i is held against the range for them', (ruleSet, value, expected) => {
  const { values, ...rest } = aContext([], '12:00')
  const children = valuesFor({ ...values.policy, ruleSet: 'children' }, [], 'child')
  const context = { ...rest, values: ruleSet === 'children' ? children : values }
  const found = carePlan.problems?.({ ...own, setting: 'cannula-days', value }, context, ofAge)
  expect(found?.map(({ field, message }) => `${field}: ${message}`)).toEqual(expected)
})

test.each(['ward-interval', 'strict', 'not-a-setting'])('%s cannot be set for one patient', setting => {
  expect(problemsOf({ ...own, setting })).toEqual(['setting: Choose a setting that may be set for one patient'])
})

test('only a patient with an own value can go back to ward policy', () => {
  expect(problemsOf(back)).toEqual(['step: This patient has no own value for check interval'])
  expect(problemsOf(back, own)).toEqual([])
})

const standingOn = (now: string, ...plans: readonly CarePlanData[]) =>
  carePlan.standing?.(
    aContext(
      plans.map((plan, i) => anEntry(carePlans, `09:0${i}`, plan)),
      now,
    ),
  )

test.each([
  ['2026-03-09 23:59', 2, []],
  ['2026-03-10 00:00', 2, ['blue']],
  ['2026-03-12 23:59', 2, ['blue']],
  ['2026-03-13 00:00', 2, ['amber']],
  ['2026-03-11 23:59', 0, []],
  ['2026-03-12 00:00', 0, ['blue']],
  ['2026-03-13 00:00', 0, ['amber']],
  ['2026-03-05 00:00', 7, ['blue']],
])('a plan to be reviewed by 12-Mar-2026, at %s with a notice of %i days: %j', (now, notice, levels) => {
  const context = aContext([anEntry(carePlans, '2026-03-02 09:00', own)], now, {
    policy: { 'care-plan-review-notice': notice },
  })
  expect(carePlan.standing?.(context).map(({ level }) => level)).toEqual(levels)
})

test('a passed review says whose value it is and what to do', () => {
  expect(standingOn('2026-03-13 08:00', own)).toEqual([
    {
      name: 'care-plan-review-check-interval',
      level: 'amber',
      action: 'Review the care plan today: confirm the own value, or go back to ward policy.',
      cause: 'Check interval: own value 6, set by Ama Mensah, was to be reviewed by 12-Mar-2026.',
      source: 'Product proposal: an own value needs a review date',
    },
  ])
})

test('a review is no longer asked for once the value was confirmed or taken back', () => {
  expect(standingOn('2026-03-13 08:00', own, { ...own, reviewOn: '2026-03-19' })).toEqual([])
  expect(standingOn('2026-03-13 08:00', own, back)).toEqual([])
})

test('care plans are set by those who may set them', () => {
  expect(carePlan.act).toBe('set care plans')
})

import { expect, test } from 'vitest'
import { aPolicy, at } from './make.ts'
import {
  listSetting,
  numberSetting,
  type PersonalValue,
  type Policy,
  policyInForce,
  switchSetting,
  valuesFor,
} from './policy.ts'

const source = { says: 'No published number', standing: 'product proposal' } as const
const everyHours = {
  name: 'check-interval',
  label: 'Check every',
  unit: 'h',
  default: 8,
  min: 4,
  max: 12,
  personal: true,
  affects: 'Checks',
  source,
}
const interval = numberSetting(everyHours)
const limit = numberSetting({ ...everyHours, name: 'limit', label: 'Limit', personal: false })
const strict = switchSetting({
  name: 'strict',
  label: 'Strict',
  unit: 'on or off',
  default: false,
  affects: 'Checks',
  source,
})
const sizes = listSetting({ name: 'sizes', label: 'Stocked', unit: 'Fr', default: [8, 10], affects: 'Checks', source })

const own = (setting: string, value: number): PersonalValue => ({
  setting,
  value,
  reason: 'Copious secretions',
  reviewOn: '2026-03-20',
  since: at('2026-03-01 09:00'),
  by: 'M. Osei',
})

test('without a policy value and an own value the default of the product counts', () => {
  const values = valuesFor(aPolicy())
  expect([values.of(interval), values.of(strict), values.of(sizes)]).toEqual([8, false, [8, 10]])
  expect(values.originOf(interval)).toBe('product default')
})

test('the value of the policy takes the place of the default', () => {
  const values = valuesFor(aPolicy({ 'check-interval': 6, strict: true, sizes: [12] }))
  expect([values.of(interval), values.of(strict), values.of(sizes)]).toEqual([6, true, [12]])
  expect(values.originOf(interval)).toBe('policy')
})

test('a policy may switch something off that is on by default', () => {
  expect(valuesFor(aPolicy({ strict: false })).of(switchSetting({ ...strict, default: true }))).toBe(false)
})

test("a patient's own value takes the place of the policy's", () => {
  const values = valuesFor(aPolicy({ 'check-interval': 6 }), [own('check-interval', 4)])
  expect(values.of(interval)).toBe(4)
  expect(values.originOf(interval)).toBe('care plan')
  expect(values.personal(interval)?.reason).toBe('Copious secretions')
})

test('an own value does not count for a setting that is for the whole ward', () => {
  const values = valuesFor(aPolicy({ limit: 6 }), [own('limit', 4)])
  expect(values.of(limit)).toBe(6)
  expect(values.originOf(limit)).toBe('policy')
  expect(values.personal(limit)).toBeUndefined()
})

test('a value of the wrong type gives way to the default', () => {
  expect(valuesFor(aPolicy({ 'check-interval': true })).of(interval)).toBe(8)
})

const hospital: Policy = { ...aPolicy(), id: 'hospital-1', startsAt: at('2026-01-05 00:00') }
const hospital2: Policy = { ...hospital, id: 'hospital-2', version: 2, startsAt: at('2026-02-05 00:00') }
const ward: Policy = { ...aPolicy(), id: 'ward-1', wardId: 'ward-a', startsAt: at('2026-02-01 00:00') }

test.each([
  ['2026-01-04 23:59', undefined],
  ['2026-01-05 00:00', 'hospital-1'],
  ['2026-01-31 23:59', 'hospital-1'],
  ['2026-02-01 00:00', 'ward-1'],
  ['2026-02-05 00:00', 'ward-1'],
])('at %s the policy of a ward with its own from February is %s', (when, id) => {
  expect(policyInForce([ward, hospital2, hospital], 'ward-a', at(when))?.id).toBe(id)
})

test.each([
  ['2026-02-04 23:59', 'hospital-1'],
  ['2026-02-05 00:00', 'hospital-2'],
])('at %s a ward without its own policy has %s', (when, id) => {
  expect(policyInForce([ward, hospital2, hospital], 'ward-b', at(when))?.id).toBe(id)
})

test('of two versions from the same moment the higher one counts, in any order', () => {
  const second = { ...hospital, id: 'hospital-1b', version: 2 }
  expect(policyInForce([hospital, second], 'ward-b', at('2026-03-01 00:00'))?.id).toBe('hospital-1b')
  expect(policyInForce([second, hospital], 'ward-b', at('2026-03-01 00:00'))?.id).toBe('hospital-1b')
})

test('where no policy has been reviewed, none is in force', () => {
  expect(policyInForce([], 'ward-a', at('2026-03-01 00:00'))).toBeUndefined()
})

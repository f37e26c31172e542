import { expect, test } from 'vitest'
import { cuffChecks } from '../care/cuff-pressure/schema.ts'
import { cuffInterval } from '../care/cuff-pressure/settings.ts'
import { aContext, anEntry, aPolicy, aTube, at } from '../care/make.ts'
import { policyInForce } from '../care/policy.ts'
import { tubeChanges } from '../care/tube-change/schema.ts'
import { careContext } from './context.ts'
import { dueTasks } from './due-tasks.ts'

const entries = [
  anEntry(tubeChanges, '2026-03-09 20:00', aTube()),
  anEntry(cuffChecks, '07:00', { found: 26, unit: 'cmH2O', method: 'manometer' }),
]

const version = (number: number, startsAt: string, hoursEach: number) => ({
  ...aPolicy({ [cuffInterval.name]: hoursEach }),
  ...{ id: `policy-${number}`, version: number, startsAt: at(startsAt) },
})
const every8 = version(1, '2026-01-05 00:00', 8)
const every4 = version(2, '13:30', 4)

function dueAt(when: string, versions = [every8, every4]) {
  const { record, ward } = aContext(entries, when)
  const policy = policyInForce(versions, 'ward-1', at(when))
  if (!policy) throw new Error('No policy is in force')
  const task = dueTasks(careContext({ record, policy, ward, now: at(when) })).find(
    ({ rule }) => rule.name === 'cuff-pressure-check',
  )
  return { status: task?.status, dueAt: task?.window?.dueAt }
}

// Checked at 07:00; every 8 hours until 13:30, every 4 hours from then on.
test.each([
  ['13:00', '15:00', 'upcoming'],
  ['13:29', '15:00', 'upcoming'],
  ['13:30', '11:00', 'overdue'],
])('what was due at %s is judged by the version of that time: due at %s, %s', (when, dueTime, status) => {
  expect(dueAt(when)).toEqual({ dueAt: at(dueTime), status })
})

test('a version that was withdrawn before it started judges nothing', () => {
  expect(dueAt('13:30', [every8, { ...every4, withdrawn: true }])).toEqual(dueAt('13:30', [every8]))
})

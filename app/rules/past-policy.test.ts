import { expect, test } from 'vitest'
import { cuffChecks } from '../care/cuff-pressure/schema.ts'
import { cuffInterval, cuffUpper } from '../care/cuff-pressure/settings.ts'
import { aContext, anEntry, aPolicy, aTube, at } from '../care/make.ts'
import { policyInForce, policyOverTime } from '../care/policy.ts'
import { tubeChanges } from '../care/tube-change/schema.ts'
import { careContext } from './context.ts'
import { dueTasks } from './due-tasks.ts'
import { marksSince } from './views.ts'
import { warningLives } from './warning-lives.ts'

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

// Up to 30 cmH2O until 13:30, up to 25 from then on.
const upTo25 = { ...version(3, '13:30', 8), values: { [cuffUpper.name]: 25 } }

/** 28 cmH2O read at 07:00, and again at `again`, looked at later in the day. */
function after28(again: string) {
  const readings = ['07:00', again].map(when =>
    anEntry(cuffChecks, when, { found: 28, unit: 'cmH2O', method: 'manometer' }),
  )
  const { record, ward } = aContext([anEntry(tubeChanges, '2026-03-09 20:00', aTube()), ...readings], '16:00')
  const policyAt = policyOverTime([every8, upTo25], 'ward-1')
  const policy = policyAt(at('16:00'))
  if (!policy) throw new Error('No policy is in force')
  return careContext({ record, policy, ward, now: at('16:00'), policyAt })
}

test.each([
  ['13:29', ['done', 'done'], null],
  ['13:30', ['done', 'out of range'], at('13:30')],
])(
  '28 at %s is marked, and warned of as raised by it, as the version of that time has it',
  (again, shapes, raisedAt) => {
    const context = after28(again)
    expect(marksSince(context, at('00:00')).map(({ shape }) => shape)).toEqual(shapes)
    const [life] = warningLives(context).filter(({ warning }) => warning.name === 'cuff-high')
    expect(life?.raised?.at ?? null).toEqual(raisedAt)
  },
)

test('what was in force is the same asked for over time and at one moment, before the first version as well', () => {
  const versions = [every8, every4, { ...every4, id: 'withdrawn', startsAt: at('12:00'), withdrawn: true }]
  const policyAt = policyOverTime(versions, 'ward-1')
  for (const when of ['2026-01-04 23:59', '2026-01-05 00:00', '12:00', '13:29', '13:30', '16:00']) {
    expect(policyAt(at(when))).toEqual(policyInForce(versions, 'ward-1', at(when)))
  }
})

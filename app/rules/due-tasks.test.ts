import { expect, test } from 'vitest'
import { cuffChecks } from '../care/cuff-pressure/schema.ts'
import { decannulations } from '../care/decannulation/schema.ts'
import { deferrals } from '../care/deferral/schema.ts'
import type { StoredEntry } from '../care/kind.ts'
import { aContext, anEntry, aTube, at } from '../care/make.ts'
import { tubeChanges } from '../care/tube-change/schema.ts'
import { dueTasks, pressOf } from './due-tasks.ts'

const tube = (when: string, overrides = {}) => anEntry(tubeChanges, when, aTube(overrides))
const cuff = (when: string, found = 26) => anEntry(cuffChecks, when, { found, unit: 'cmH2O', method: 'manometer' })
const deferral = (when: string, minutes: '30' | '60' | '120') =>
  anEntry(deferrals, when, { task: 'cuff-pressure-check', minutes, reason: 'off ward', agreedWith: 'M. Larsen' })

const taskAt = (entries: readonly StoredEntry[], now: string, name: string, about = {}) =>
  dueTasks(aContext(entries, now, about)).find(task => task.rule.name === name)

test.each([
  ['15:59', 'upcoming'],
  ['16:00', 'due'],
  ['17:00', 'due'],
  ['18:00', 'due'],
  ['18:01', 'overdue'],
  ['21:00', 'overdue'],
  ['21:01', 'seriously overdue'],
])('a cuff checked at 09:00 every 8 hours is at %s %s', (now, status) => {
  expect(taskAt([tube('07:00'), cuff('09:00')], now, 'cuff-pressure-check')?.status).toBe(status)
})

test('a deferral moves the due time and keeps the care in sight', () => {
  const entries = [tube('2026-03-09 07:00'), cuff('2026-03-09 23:00'), deferral('08:10', '60')]
  expect(taskAt(entries, '08:30', 'cuff-pressure-check')).toMatchObject({
    status: 'deferred',
    deferral: { until: at('09:10') },
  })
  expect(taskAt(entries, '09:10', 'cuff-pressure-check')?.status).toBe('due')
  expect(taskAt(entries, '10:11', 'cuff-pressure-check')?.status).toBe('overdue')
})

test('care done after a deferral ends it', () => {
  const entries = [tube('2026-03-09 07:00'), cuff('2026-03-09 23:00'), deferral('08:10', '60'), cuff('08:40')]
  expect(taskAt(entries, '09:00', 'cuff-pressure-check')).toMatchObject({
    status: 'upcoming',
    window: { dueAt: at('16:40') },
  })
})

test('a deferral does not count as done', () => {
  const entries = [tube('2026-03-09 07:00'), cuff('2026-03-09 23:00'), deferral('08:10', '30')]
  expect(taskAt(entries, '12:00', 'cuff-pressure-check')?.last?.performedAt).toEqual(at('2026-03-09 23:00'))
})

test('a deferral to before the due time moves nothing', () => {
  const entries = [tube('2026-03-09 07:00'), cuff('06:00'), deferral('12:00', '30')]
  expect(taskAt(entries, '12:10', 'cuff-pressure-check')).toMatchObject({
    status: 'deferred',
    window: { dueAt: at('14:00'), closesAt: at('15:00') },
  })
  expect(taskAt(entries, '12:31', 'cuff-pressure-check')?.status).toBe('upcoming')
})

const turned = anEntry(cuffChecks, '11:00', {
  unit: 'cmH2O',
  method: 'not measured',
  whyNot: 'Gauge in use',
  reason: 'turned',
})

test('what was put off before an event is not the check that the event asks for', () => {
  const calm = [tube('2026-03-09 07:00'), cuff('09:00'), deferral('10:00', '120')]
  expect(taskAt([...calm, turned], '11:10', 'cuff-pressure-check')).toMatchObject({
    status: 'due',
    window: { dueAt: at('11:15') },
  })
  const late = [tube('2026-03-09 07:00'), cuff('01:00'), deferral('10:00', '120')]
  expect(taskAt([...late, turned], '11:10', 'cuff-pressure-check')?.status).toBe('overdue')
  expect(taskAt([...late, turned, deferral('11:05', '30')], '11:10', 'cuff-pressure-check')?.status).toBe('deferred')
})

test('what was put off before a tube change is not owed by the new tube', () => {
  const entries = [tube('2026-03-09 07:00'), cuff('2026-03-09 23:00'), deferral('08:00', '120'), tube('09:00')]
  expect(taskAt(entries, '09:05', 'cuff-pressure-check')).toMatchObject({
    status: 'due',
    window: { dueAt: at('09:15') },
  })
})

test('a tube change put off on its limit day is overdue from the new time, without a day of grace', () => {
  const change = { task: 'tube-change', reason: 'procedure', agreedWith: 'M. Larsen' } as const
  const entries = [tube('2026-02-10 10:00'), anEntry(deferrals, '2026-03-10 22:00', { ...change, minutes: '240' })]
  expect(taskAt(entries, '2026-03-11 01:00', 'tube-change')?.status).toBe('deferred')
  expect(taskAt(entries, '2026-03-11 02:00', 'tube-change')?.status).toBe('due')
  expect(taskAt(entries, '2026-03-11 02:01', 'tube-change')?.status).toBe('overdue')
  expect(taskAt(entries, '2026-03-12 00:01', 'tube-change')?.status).toBe('seriously overdue')
})

test('after the tube is out for good all tube care is suspended, but for the look at what follows', () => {
  const removal = anEntry(decannulations, '10:00', {
    agreed: 'yes',
    operator: 'A',
    helper: 'B',
    kit: 'complete',
    breathing: 'comfortable',
    dressing: 'yes',
  })
  const statuses = dueTasks(aContext([tube('2026-03-01 10:00'), removal], '11:00'))
    .filter(task => task.rule.airway && task.rule.name !== 'observations-after-removal')
    .map(({ status }) => status)
  expect(new Set(statuses)).toEqual(new Set(['suspended']))
})

test('without a charted tube no tube care is due', () => {
  expect(dueTasks(aContext([], '11:00')).filter(task => task.rule.airway)).toEqual([])
})

test('rules for adults are not applied to a child', () => {
  expect(dueTasks(aContext([tube('07:00')], '12:00', { patient: { bornOn: '2015-05-01' } }))).toEqual([])
})

test('a patient whose birthday makes them sixteen today is under the rules for adults', () => {
  const tasks = dueTasks(aContext([tube('07:00')], '12:00', { patient: { bornOn: '2010-03-10' } }))
  expect(tasks.length).toBeGreaterThan(0)
})

test('seriously overdue airway care presses more than any other', () => {
  expect(pressOf('seriously overdue', true)).toBeLessThan(pressOf('seriously overdue', false))
  expect(pressOf('seriously overdue', false)).toBeLessThan(pressOf('overdue', true))
})

test('tasks come most pressing first', () => {
  const tasks = dueTasks(aContext([tube('2026-03-09 07:00'), cuff('2026-03-09 09:00')], '12:00'))
  const presses = tasks.map(task => pressOf(task.status, task.rule.airway))
  expect(presses).toEqual(presses.toSorted((a, b) => a - b))
})

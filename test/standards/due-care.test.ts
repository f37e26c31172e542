import { expect, test } from 'vitest'
import { cuffBand, foundClass } from '#app/care/cuff-pressure/cuff.ts'
import { cuffPressure } from '#app/care/cuff-pressure/kind.ts'
import { type CuffData, cuffChecks } from '#app/care/cuff-pressure/schema.ts'
import { replacedWithNew } from '#app/care/inner-cannula/examples.ts'
import { innerCannulaActs } from '#app/care/inner-cannula/schema.ts'
import type { StoredEntry } from '#app/care/kind.ts'
import { aContext, anEntry, aTube, at, clockOf, windowOf } from '#app/care/make.ts'
import { knownAt } from '#app/care/record.ts'
import { tubeChange } from '#app/care/tube-change/kind.ts'
import { tubeChanges } from '#app/care/tube-change/schema.ts'
import { dueTasks } from '#app/rules/due-tasks.ts'
import { lateWords } from '#app/rules/entry-words.ts'

/*
 * Check rows of the clinical reference that need a whole record. The rules behind them (15 minutes after re-inflation, a
 * deflated cuff is not classed) are product proposals and common practice without a published number; the bands are those
 * of Seegobin & van Hasselt, BMJ 1984 (upper limit 30 cmH2O) and of UK practice (upper limit 25).
 */

const tube = anEntry(tubeChanges, '2026-03-05 02:00', aTube())
const measured = (when: string, data: Partial<CuffData>) =>
  anEntry(cuffChecks, when, { unit: 'cmH2O', method: 'manometer', ...data })

test('C-08 26 cmH2O is high where the upper limit is 25', () => {
  const context = aContext([tube], '12:00', { policy: { 'cuff-pressure-upper-limit': 25 } })
  expect(foundClass({ found: 26, unit: 'cmH2O', method: 'manometer' }, context)).toBe('high')
  expect(foundClass({ found: 26, unit: 'cmH2O', method: 'manometer' }, aContext([tube], '12:00'))).toBe('in range')
})

test('C-09 25 read on a gauge in mmHg is high', () => {
  expect(foundClass({ found: 25, unit: 'mmHg', method: 'manometer' }, aContext([tube], '12:00'))).toBe('high')
})

test('C-29 a cuff let down at 10:00 suspends the check due at 12:00; inflated at 15:00 it is due at 15:15', () => {
  const done = measured('04:00', { found: 26 })
  const down = measured('10:00', { method: 'not measured', whyNot: 'trial', cuffNow: 'deflated' })
  const up = measured('15:00', { method: 'not measured', whyNot: 'to be measured', cuffNow: 'inflated' })
  const dueAt = (context: ReturnType<typeof aContext>) => windowOf(cuffPressure, 'cuff-pressure-check', context).dueAt
  expect(dueAt(aContext([tube, done], '09:59'))).toEqual(at('12:00'))
  expect(clockOf(cuffPressure, 'cuff-pressure-check', aContext([tube, done, down], '12:00'))).toEqual({
    state: 'suspended',
    because: 'cuff is down',
  })
  expect(dueAt(aContext([tube, done, down, up], '15:00'))).toEqual(at('15:15'))
})

test('C-52 a reading of 0 with the cuff let down is not held against the band', () => {
  const data: CuffData = { found: 0, unit: 'cmH2O', method: 'manometer', cuffNow: 'deflated' }
  const context = aContext([tube, anEntry(cuffChecks, '10:00', data)], '10:05')
  expect(foundClass(data, context)).toBeUndefined()
  expect(cuffPressure.warnings?.(data, context)).toEqual([])
})

test('the default band is the 20 to 30 cmH2O of Lizy 2014 and BMJ 1984', () => {
  expect(cuffBand(aContext([], '12:00').values)).toMatchObject({ lower: 20, upper: 30 })
})

// St George's and NTSP texts differ between 28, 29 and 30 days; the strictest of policy and label counts.
test.each([
  [undefined, '2026-03-30'],
  [29, '2026-03-30'],
  [27, '2026-03-29'],
])('a dual tube of 02-Mar-2026 labelled %s days is to be changed by %s', (longestUseDays, changeBy) => {
  const entry = anEntry(tubeChanges, '2026-03-02 10:00', aTube({ longestUseDays }))
  expect(clockOf(tubeChange, 'tube-change', aContext([entry], '12:00'))).toMatchObject({ byDay: changeBy })
})

test('a single-cannula tube is to be changed by day 14 (Intensive Care Society, read second-hand)', () => {
  const single = aTube({ construction: 'single', innerCannula: undefined, idWithInner: undefined })
  const entry = anEntry(tubeChanges, '2026-03-02 10:00', single)
  expect(clockOf(tubeChange, 'tube-change', aContext([entry], '12:00'))).toMatchObject({ byDay: '2026-03-16' })
})

// Inner cannula looked at every 8 hours (UK Intensive Care Society and NTSP, read second-hand); what counts as late is ISMP 2011.
const inspected = (when: string, more: Partial<StoredEntry> = {}) =>
  anEntry(innerCannulaActs, when, { ...replacedWithNew, act: 'inspected', condition: 'clear' }, more)
const inspection = (now: string, ...entries: readonly StoredEntry[]) =>
  dueTasks(aContext([tube, ...entries], now)).find(({ rule }) => rule.name === 'inner-cannula-inspection')
const old = inspected('06:00')

test.each([
  ['12:59', 'upcoming'],
  ['13:00', 'due'],
  ['15:00', 'due'],
  ['15:01', 'overdue'],
  ['18:00', 'overdue'],
  ['18:01', 'seriously overdue'],
])('C-23 an inner cannula looked at at 06:00 every 8 h is due at 14:00, and at %s %s', (now, status) => {
  expect(inspection(now, old)).toMatchObject({ status, window: { dueAt: at('14:00') } })
})

test('C-24 a complete look as needed at 11:20 moves the due time to 19:20', () => {
  expect(inspection('11:30', old, inspected('11:20'))?.window?.dueAt).toEqual(at('19:20'))
})

test('C-25 the same written down at 16:00 is marked as late, and the time without it stays overdue', () => {
  const late = inspected('11:20', { recordedAt: at('16:00') })
  expect(inspection('16:00', old, late)?.window?.dueAt).toEqual(at('19:20'))
  expect(lateWords(late, aContext([], '16:00').values)).toBe('late entry, charted 4 h 40 min later')
  const known = knownAt([tube, old, late], at('15:30'))
  expect(inspection('15:30', ...known.filter(entry => entry !== tube))?.status).toBe('overdue')
})

test('C-26 a late entry of 09:00 moves nothing once one of 11:20 is there', () => {
  const late = inspected('09:00', { recordedAt: at('16:00') })
  expect(inspection('16:00', old, inspected('11:20'), late)?.window?.dueAt).toEqual(at('19:20'))
})

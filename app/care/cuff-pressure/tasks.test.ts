import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { type AboutContext, aContext, aCorrection, anEntry, aRemoval, aTube, at, clockOf, windowOf } from '../make.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { cuffPressure } from './kind.ts'
import { type CuffData, cuffChecks } from './schema.ts'

const tube = (when = '2026-03-09 02:00', overrides: Partial<TubeData> = {}) =>
  anEntry(tubeChanges, when, aTube(overrides))
const read = (when: string, found: number, more: Partial<CuffData> = {}) =>
  anEntry(cuffChecks, when, { found, unit: 'cmH2O', method: 'manometer', ...more })
const unread = (when: string, more: Partial<CuffData> = {}) =>
  anEntry(cuffChecks, when, { unit: 'cmH2O', method: 'not measured', whyNot: 'No gauge', ...more })

const clock = (entries: readonly StoredEntry[], now = '12:00', about: AboutContext = {}) =>
  clockOf(cuffPressure, 'cuff-pressure-check', aContext(entries, now, about))
const dueAt = (entries: readonly StoredEntry[], now = '12:00', about: AboutContext = {}) =>
  windowOf(cuffPressure, 'cuff-pressure-check', aContext(entries, now, about)).dueAt
const because = (entries: readonly StoredEntry[]) => {
  const found = clock(entries)
  return found.state === 'running' ? found.because : found.state
}

test('never read, it is due 15 minutes after the tube went in', () => {
  const window = windowOf(cuffPressure, 'cuff-pressure-check', aContext([tube('09:00')], '09:05'))
  expect(window).toEqual({
    soonAt: at('09:00'),
    opensAt: at('09:00'),
    dueAt: at('09:15'),
    closesAt: at('09:15'),
    seriousAt: at('10:15'),
  })
  expect(because([tube('09:00')])).toBe('the tube was changed')
})

test('a patient who arrives with a tube owes a reading as after a transfer', () => {
  const came = {
    reason: 'on arrival',
    insertedOn: '2026-03-01',
    stomaMadeOn: '2026-02-01',
    technique: 'surgical',
  } as const
  expect(dueAt([tube('09:00', came)])).toEqual(at('09:15'))
  expect(because([tube('09:00', came)])).toBe('the patient arrived with this tube')
  expect(dueAt([tube('09:00', came), read('09:10', 26)])).toEqual(at('17:10'))
})

test('read at 06:00 it is due at 14:00, on time from 13:00 to 15:00, seriously overdue after 18:00', () => {
  const window = windowOf(cuffPressure, 'cuff-pressure-check', aContext([tube(), read('06:00', 26)], '12:00'))
  expect(window).toEqual({
    soonAt: at('13:00'),
    opensAt: at('13:00'),
    dueAt: at('14:00'),
    closesAt: at('15:00'),
    seriousAt: at('18:00'),
  })
})

test.each(['06:00', '13:59', '14:00', '14:01', '2026-03-11 06:00'])('asked at %s the due time is the same', now => {
  expect(dueAt([tube(), read('06:00', 26)], now)).toEqual(at('14:00'))
})

test.each<[string, StoredEntry, string]>([
  ['read in between', read('10:20', 26), '18:20'],
  ['corrected into the band', read('10:20', 34, { leftAt: 26 }), '18:20'],
  ['read by a controller', read('10:20', 26, { method: 'controller' }), '18:20'],
  ['at the lower limit', read('10:20', 20), '18:20'],
  ['at the upper limit', read('10:20', 30), '18:20'],
  ['just above the upper limit', read('10:20', 30.1), '10:50'],
  ['left low', read('10:20', 26, { leftAt: 19 }), '10:50'],
  ['22 mmHg, which is in the band', read('10:20', 22, { unit: 'mmHg' }), '18:20'],
  ['25 mmHg, which is 34 cmH2O', read('10:20', 25, { unit: 'mmHg' }), '10:50'],
  ['set by volume', read('10:20', 26, { method: 'occlusive volume' }), '10:35'],
  ['not measured, nothing happened', unread('10:20'), '14:00'],
])('after 06:00, %s at 10:20: due at %s', (_, entry, due) => {
  expect(dueAt([tube(), read('06:00', 26), entry])).toEqual(at(due))
})

test.each<[Partial<CuffData>, string]>([
  [{ cuffNow: 'inflated' }, 'the cuff was inflated'],
  [{ reason: 'inflation' }, 'the cuff was inflated'],
  [{ reason: 'turned' }, 'the patient was turned'],
  [{ reason: 'transfer' }, 'the patient was moved'],
  [{ reason: 'leak' }, 'a leak was heard'],
  [{ leak: 'yes' }, 'a leak was heard'],
  [{ airMl: 1 }, 'air was added'],
  [{ airMl: -1 }, 'air was removed'],
])('without a reading, %j asks for one within 15 minutes', (event, words) => {
  const entries = [tube(), read('06:00', 26), unread('10:20', event)]
  expect(dueAt(entries)).toEqual(at('10:35'))
  expect(because(entries)).toBe(words)
  expect(dueAt([...entries, read('10:30', 26)])).toEqual(at('18:30'))
})

test('a reading out of the band answers the event, and is itself measured again', () => {
  const entries = [tube('09:00'), read('09:10', 34)]
  expect(dueAt(entries)).toEqual(at('09:40'))
  expect(because(entries)).toBe('the last reading was left out of the band')
  expect(dueAt([...entries, read('09:40', 33)])).toEqual(at('10:10'))
})

test('a reading that a later policy puts out of the band is due again from that policy on', () => {
  const context = aContext([tube('2026-01-04 10:00'), read('2026-01-04 20:00', 26)], '12:00', {
    policy: { 'cuff-pressure-upper-limit': 25 },
  })
  expect(windowOf(cuffPressure, 'cuff-pressure-check', context).dueAt).toEqual(at('2026-01-05 00:30'))
})

test('an event that was read at once needs no further check', () => {
  expect(dueAt([tube(), read('06:00', 26), read('10:20', 26, { reason: 'turned' })])).toEqual(at('18:20'))
})

test('an event charted late, before a good reading, asks for nothing', () => {
  const late = anEntry(
    cuffChecks,
    '08:00',
    { unit: 'cmH2O', method: 'not measured', whyNot: 'Busy', reason: 'turned' },
    { recordedAt: at('11:00') },
  )
  expect(dueAt([tube(), read('10:20', 26), late])).toEqual(at('18:20'))
})

test('a reading of 08:00 written down later does not move the clock back past one of 10:20', () => {
  expect(dueAt([tube(), read('10:20', 26), read('08:00', 26, {})])).toEqual(at('18:20'))
})

test('a superseded reading takes no part, nor does a retracted one', () => {
  const wrong = read('10:20', 26)
  const data: CuffData = { found: 26, unit: 'cmH2O', method: 'manometer' }
  const corrected = aCorrection(wrong, cuffChecks, '09:20', data)
  const retracted = aCorrection(corrected, cuffChecks, '09:20', data, { status: 'retracted' })
  expect(dueAt([tube(), read('06:00', 26), wrong, corrected])).toEqual(at('17:20'))
  expect(dueAt([tube(), read('06:00', 26), wrong, corrected, retracted])).toEqual(at('14:00'))
})

test.each<[string, readonly StoredEntry[], string]>([
  ['no cuff', [tube(undefined, { cuff: 'none' })], 'tube without a cuff'],
  ['a foam cuff', [tube(undefined, { cuff: 'foam' })], 'foam cuff: no air is added'],
  ['a water cuff', [tube(undefined, { cuff: 'water' })], 'water cuff: measured in mL, not cmH2O'],
  ['a cuff let down', [tube(), read('06:00', 26), unread('08:00', { cuffNow: 'deflated' })], 'cuff is down'],
  ['no tube any more', [tube(), aRemoval('08:00')], 'tube out for good since 10-Mar-2026'],
])('suspended with %s', (_, entries, words) => {
  expect(clock(entries)).toEqual({ state: 'suspended', because: words })
})

test('none without a tube', () => {
  expect(clock([])).toEqual({ state: 'none' })
})

test('a cuff let down runs again once inflated, or once a reading shows pressure in it', () => {
  const down = [tube(), read('04:00', 26), unread('08:00', { cuffNow: 'deflated' })]
  expect(dueAt([...down, unread('10:00', { cuffNow: 'inflated' })])).toEqual(at('10:15'))
  expect(dueAt([...down, read('10:00', 0, { cuffNow: 'inflated', leftAt: 26 })])).toEqual(at('18:00'))
  expect(dueAt([...down, read('10:00', 26)])).toEqual(at('18:00'))
  expect(clock([...down, read('10:00', 0)])).toMatchObject({ state: 'suspended' })
})

test('a change of tube asks for a reading, whatever was read before it', () => {
  expect(dueAt([tube(), read('06:00', 26), tube('10:00')])).toEqual(at('10:15'))
})

test.each([
  ['2026-03-28 22:00', '2026-03-29 07:00'],
  ['2026-10-24 22:00', '2026-10-25 05:00'],
])('across a change of clocks, read %s, it is due eight elapsed hours later at %s', (done, due) => {
  expect(dueAt([tube(), read(done, 26)], due)).toEqual(at(due))
})

test('care plan and policy set interval, band and minutes', () => {
  const entries = [tube(), read('06:00', 26)]
  expect(dueAt(entries, '12:00', { personal: { 'cuff-pressure-interval': 4 } })).toEqual(at('10:00'))
  expect(dueAt(entries, '12:00', { personal: { 'cuff-pressure-upper-limit': 25 } })).toEqual(at('06:30'))
  expect(dueAt([tube('09:00')], '12:00', { policy: { 'cuff-pressure-event-check': 30 } })).toEqual(at('09:30'))
  expect(dueAt([tube(), read('09:00', 40)], '12:00', { policy: { 'cuff-pressure-recheck': 60 } })).toEqual(at('10:00'))
})

test('the rule is said with the numbers in force', () => {
  expect(cuffPressure.tasks?.[0]?.says(aContext([], '12:00'))).toBe(
    'Every 8 hours, 20 to 30 cmH2O; within 15 minutes of inflation, tube change, arrival, turn or transfer, and 30 minutes of a reading left out of that. Only a gauge reading left in the band counts.',
  )
})

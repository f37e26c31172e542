import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { type AboutContext, aContext, aCorrection, anEntry, aRemoval, aTube, at, clockOf, windowOf } from '../make.ts'
import { usualCheck } from '../stoma-and-skin/examples.ts'
import { stomaAndSkin } from '../stoma-and-skin/kind.ts'
import { type StomaData, stomaChecks } from '../stoma-and-skin/schema.ts'
import { plainSuction } from '../suction/examples.ts'
import { suctions } from '../suction/schema.ts'
import { tubeChange } from './kind.ts'
import { type TubeData, tubeChanges } from './schema.ts'

const tube = (when = '2026-03-02 10:00', overrides: Parameters<typeof aTube>[0] = {}) =>
  anEntry(tubeChanges, when, aTube(overrides))
const first = (technique: TubeData['technique'], when?: string) => tube(when, { reason: 'first insertion', technique })
const single = { construction: 'single', innerCannula: undefined, idWithInner: undefined } as const
const onArrival = (insertedOn: string, stomaMadeOn: string, when = '2026-03-02 10:00') =>
  tube(when, { reason: 'on arrival', insertedOn, stomaMadeOn, technique: 'surgical' })

const clock = (task: string, entries: readonly StoredEntry[], about?: AboutContext) =>
  clockOf(tubeChange, task, aContext(entries, '12:00', about))
const dayOf = (task: string, entries: readonly StoredEntry[], about?: AboutContext) => {
  const found = clock(task, entries, about)
  return found.state === 'running' ? found.byDay : found.state
}

test('a dual tube of 02-Mar is due on 30-Mar, soon from a week before, late from midnight, seriously a day later', () => {
  expect(windowOf(tubeChange, 'tube-change', aContext([tube()], '12:00'))).toEqual({
    dueAt: at('2026-03-30 00:00'),
    soonAt: at('2026-03-23 00:00'),
    opensAt: at('2026-03-30 00:00'),
    closesAt: at('2026-03-31 00:00'),
    seriousAt: at('2026-04-01 00:00'),
  })
})

test('the limit day on which the clocks change is an hour shorter', () => {
  const window = windowOf(tubeChange, 'tube-change', aContext([tube('2026-03-01 10:00')], '12:00'))
  expect([window.opensAt, window.closesAt]).toEqual([at('2026-03-29 00:00'), at('2026-03-30 00:00')])
  expect(window.closesAt.getTime() - window.opensAt.getTime()).toBe(23 * 3_600_000)
})

test.each<[string, readonly StoredEntry[], string]>([
  ['none without a tube', [], 'none'],
  ['suspended after removal for good', [tube(), aRemoval('2026-03-08 09:00')], 'suspended'],
  ['running again once a tube is back', [tube(), aRemoval('2026-03-08 09:00'), tube('2026-03-09 09:00')], '2026-04-06'],
  ['from the day that a tube went in, not from arrival', [onArrival('2026-02-20', '2026-02-01')], '2026-03-20'],
  ['moved on by a change', [tube(), tube('2026-03-10 09:00')], '2026-04-07'],
  ['not moved by a change that failed', [tube(), tube('2026-03-10 09:00', { difficulty: 'failed' })], '2026-03-30'],
  ['not moved back by a change written down late', [tube('2026-03-09 09:00'), tube('2026-03-05 09:00')], '2026-04-06'],
  ['of the label where it allows less', [tube(undefined, { longestUseDays: 14 })], '2026-03-16'],
  ['of the policy where the label allows more', [tube(undefined, { longestUseDays: 30 })], '2026-03-30'],
  ['14 days for a single cannula', [tube(undefined, single)], '2026-03-16'],
])('change by date: %s', (_, entries, expected) => {
  expect(dayOf('tube-change', entries)).toBe(expected)
})

test('a superseded change counts no more, nor does a retracted one', () => {
  const wrong = tube('2026-03-09 09:00')
  const corrected = aCorrection(wrong, tubeChanges, '2026-03-08 09:00', aTube())
  const retracted = aCorrection(corrected, tubeChanges, '2026-03-08 09:00', aTube(), { status: 'retracted' })
  expect(dayOf('tube-change', [tube(), wrong, corrected])).toBe('2026-04-05')
  expect(dayOf('tube-change', [tube(), wrong, corrected, retracted])).toBe('2026-03-30')
})

test('policy and care plan set the limit', () => {
  expect(dayOf('tube-change', [tube()], { policy: { 'dwell-limit-dual-cannula': 29 } })).toBe('2026-03-31')
  expect(dayOf('tube-change', [tube()], { personal: { 'dwell-limit-dual-cannula': 20 } })).toBe('2026-03-22')
})

const copious = (when: string, route: 'tube open' | 'oral' = 'tube open') =>
  anEntry(
    suctions,
    when,
    route === 'oral'
      ? {
          act: 'episode',
          indication: ['asked'],
          route,
          amount: 'copious',
          colour: 'clear',
          consistency: 'thin',
          blood: 'none',
          tolerance: 'well',
        }
      : { ...plainSuction, amount: 'copious' },
  )
const heavy = [copious('2026-03-03 08:00'), copious('2026-03-03 12:00'), copious('2026-03-04 08:00')]

test.each<[string, readonly StoredEntry[], AboutContext, string]>([
  ['copious twice is not heavy yet', [tube(undefined, single), ...heavy.slice(1)], {}, '2026-03-16'],
  ['copious three times', [tube(undefined, single), ...heavy], {}, '2026-03-09'],
  ['copious with an earlier tube', [...heavy, tube('2026-03-05 10:00', single)], {}, '2026-03-19'],
  [
    'copious in the mouth',
    [tube(undefined, single), ...heavy.slice(1), copious('2026-03-04 09:00', 'oral')],
    {},
    '2026-03-16',
  ],
  ['a dual tube', [tube(), ...heavy], {}, '2026-03-30'],
  [
    'an own limit',
    [tube(undefined, single), ...heavy],
    { personal: { 'dwell-limit-single-cannula': 10 } },
    '2026-03-12',
  ],
])('heavy secretions shorten a single cannula to 7 days: %s', (_, entries, about, expected) => {
  expect(dayOf('tube-change', entries, about)).toBe(expected)
})

test.each<[string, readonly StoredEntry[], string]>([
  ['surgical by day 7', [first('surgical')], '2026-03-09'],
  ['percutaneous by day 10', [first('percutaneous')], '2026-03-12'],
  ['technique not known as percutaneous', [first('not known')], '2026-03-12'],
  ['in place on arrival since the opening was made', [onArrival('2026-02-28', '2026-02-28')], '2026-03-07'],
  ['none where an earlier tube was changed', [onArrival('2026-02-28', '2026-02-10')], 'none'],
  ['none once changed', [first('surgical'), tube('2026-03-08 10:00', { reason: 'first change' })], 'none'],
  [
    'still due after a change that failed',
    [first('surgical'), tube('2026-03-08 10:00', { difficulty: 'failed' })],
    '2026-03-09',
  ],
  ['none after removal for good', [first('surgical'), aRemoval('2026-03-08 10:00')], 'none'],
])('first change: %s', (_, entries, expected) => {
  expect(dayOf('first-tube-change', entries)).toBe(expected)
})

test('a first change is due soon from its earliest day, and off where changes need an indication', () => {
  const window = windowOf(tubeChange, 'first-tube-change', aContext([first('surgical')], '12:00'))
  expect(window).toMatchObject({ soonAt: at('2026-03-06 00:00'), closesAt: at('2026-03-10 00:00') })
  expect(dayOf('first-tube-change', [first('surgical')], { policy: { 'routine-first-change': false } })).toBe('none')
  expect(dayOf('first-tube-change', [first('surgical')], { personal: { 'first-change-surgical-target': 6 } })).toBe(
    '2026-03-08',
  )
})

const sutured = tube(undefined, { sutures: 'in place' })
const seen = (when: string, sutures: StomaData['sutures']) => anEntry(stomaChecks, when, { ...usualCheck, sutures })
const sutureDay = (entries: readonly StoredEntry[], about?: AboutContext) => {
  const found = clockOf(stomaAndSkin, 'suture-removal', aContext(entries, '12:00', about))
  return found.state === 'running' ? found.byDay : found.state
}

test.each<[string, readonly StoredEntry[], string]>([
  ['by day 7 after insertion', [sutured], '2026-03-09'],
  ['none without sutures', [tube()], 'none'],
  ['not put off by a look', [sutured, seen('2026-03-05 09:00', 'loose')], '2026-03-09'],
  ['none once removed', [sutured, seen('2026-03-05 09:00', 'removed now')], 'none'],
  ['none once none are seen', [sutured, seen('2026-03-05 09:00', 'none')], 'none'],
  [
    'due when seen in, though charted as none with the tube',
    [tube(), seen('2026-03-05 09:00', 'in place')],
    '2026-03-09',
  ],
  [
    'due again when seen in after a slip',
    [sutured, seen('2026-03-05 09:00', 'none'), seen('2026-03-06 09:00', 'in place')],
    '2026-03-09',
  ],
  ['none after a change to a tube without', [sutured, tube('2026-03-05 09:00')], 'none'],
  ['none after removal of the tube', [sutured, aRemoval('2026-03-05 09:00')], 'none'],
])('sutures out: %s', (_, entries, expected) => {
  expect(sutureDay(entries)).toBe(expected)
})

test('the care plan may give the sutures longer', () => {
  expect(sutureDay([sutured], { personal: { 'sutures-out-by': 10 } })).toBe('2026-03-12')
})

test('the rules are said with the numbers in force', () => {
  const says = (entries: readonly StoredEntry[]) => tubeChange.tasks?.map(task => task.says(aContext(entries, '12:00')))
  expect(says([first('surgical')])).toEqual([
    'First change from day 4, by day 7 after insertion. An experienced operator, with airway help at hand.',
    'On the day that the plan names, once its gate of questions was gone through.',
    'The strictest limit counts: longest use of a dual-cannula tube: 28 days. The day of insertion is day 0.',
  ])
  expect(says([first('not known')])?.[0]).toContain(
    'from day 7, by day 10 after insertion. How the opening was made is not known',
  )
  expect(says([tube(undefined, single), ...heavy])?.[2]).toContain('with heavy secretions: 7 days')
})

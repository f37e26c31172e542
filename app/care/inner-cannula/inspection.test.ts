import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, aRemoval, aTube, at, clockOf, windowOf } from '../make.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { replacedWithNew } from './examples.ts'
import { innerCannula } from './kind.ts'
import { type InnerCannulaData, innerCannulaActs } from './schema.ts'

const OLD_TUBE = '2026-03-02 10:00'

function aTubeIn(when = OLD_TUBE, overrides: Partial<TubeData> = {}): StoredEntry {
  return anEntry(tubeChanges, when, aTube(overrides))
}

function anAct(when: string, overrides: Partial<InnerCannulaData> = {}, more: Partial<StoredEntry> = {}): StoredEntry {
  return anEntry(innerCannulaActs, when, { ...replacedWithNew, ...overrides }, more)
}

const unable: InnerCannulaData = {
  act: 'unable',
  whyUnable: 'stuck',
  condition: 'not seen',
  spare: 'yes',
  tolerance: 'well',
}

const inspectionDue = (entries: readonly StoredEntry[], now = '14:00', about = {}) =>
  windowOf(innerCannula, 'inner-cannula-inspection', aContext(entries, now, about)).dueAt

const inspectionClock = (entries: readonly StoredEntry[]) =>
  clockOf(innerCannula, 'inner-cannula-inspection', aContext(entries, '14:00'))

test('never looked at, it is due four hours after the tube went in', () => {
  expect(inspectionDue([aTubeIn('2026-03-10 07:30')])).toEqual(at('11:30'))
})

test('never looked at in a tube that came along, it counts from admission', () => {
  const tube = aTubeIn('2026-02-20 10:00', { reason: 'on arrival', insertedOn: '2026-02-20', ...onArrival })
  expect(inspectionDue([tube], '14:00', { admittedAt: '2026-03-10 09:00' })).toEqual(at('17:00'))
})

test('C-23: done at 06:00 it is due at 14:00, on time from 13:00 to 15:00, seriously overdue after 18:00', () => {
  const window = windowOf(innerCannula, 'inner-cannula-inspection', aContext([aTubeIn(), anAct('06:00')], '14:00'))
  expect(window).toMatchObject({
    dueAt: at('14:00'),
    opensAt: at('13:00'),
    closesAt: at('15:00'),
    seriousAt: at('18:00'),
  })
})

test.each(['06:00', '13:59', '14:00', '14:01', '2026-03-11 06:00'])('asked at %s the due time is the same', now => {
  expect(inspectionDue([aTubeIn(), anAct('06:00')], now)).toEqual(at('14:00'))
})

test('C-24: a complete act in between moves it to eight hours later', () => {
  expect(inspectionDue([aTubeIn(), anAct('06:00'), anAct('11:20')])).toEqual(at('19:20'))
})

test('C-25: an act of 11:20 written down at 16:00 counts from 11:20', () => {
  const late = anAct('11:20', {}, { recordedAt: at('16:00') })
  expect(inspectionDue([aTubeIn(), anAct('06:00'), late], '16:00')).toEqual(at('19:20'))
})

test('C-26: an act of 09:00 written down later does not move the clock back past the one of 11:20', () => {
  const late = anAct('09:00', {}, { recordedAt: at('16:00') })
  expect(inspectionDue([aTubeIn(), anAct('06:00'), anAct('11:20'), late], '16:00')).toEqual(at('19:20'))
})

test.each<[string, Partial<InnerCannulaData>, string]>([
  ['put back clear', { act: 'inspected', condition: 'clear' }, '19:20'],
  ['cleaned', { act: 'cleaned', condition: 'moderate' }, '19:20'],
  ['replaced', { act: 'replaced' }, '19:20'],
  ['swapped', { act: 'swapped' }, '19:20'],
  ['fitted where none was', { condition: 'none' }, '19:20'],
  ['replaced without a look at the old one', { condition: 'not seen' }, '14:00'],
])('%s at 11:20 it is due at the right time', (_, overrides, due) => {
  expect(inspectionDue([aTubeIn(), anAct('06:00'), anAct('11:20', overrides)])).toEqual(at(due))
})

test('an act that could not be done never sets the clock back', () => {
  expect(inspectionDue([aTubeIn(), anAct('06:00'), anEntry(innerCannulaActs, '11:20', unable)])).toEqual(at('14:00'))
})

test('a superseded act takes no part, nor does a retracted one', () => {
  const wrong = anAct('11:20')
  const corrected = aCorrection(wrong, innerCannulaActs, '10:20', replacedWithNew)
  const retracted = aCorrection(corrected, innerCannulaActs, '10:20', replacedWithNew, { status: 'retracted' })
  expect(inspectionDue([aTubeIn(), anAct('06:00'), wrong, corrected])).toEqual(at('18:20'))
  expect(inspectionDue([aTubeIn(), anAct('06:00'), wrong, corrected, retracted])).toEqual(at('14:00'))
})

test('a change of the whole tube sets the clock back', () => {
  expect(inspectionDue([aTubeIn(), anAct('06:00'), aTubeIn('12:00')])).toEqual(at('16:00'))
})

test.each([
  ['2026-03-12 09:59', '2026-03-12 13:59'],
  ['2026-03-12 10:00', '2026-03-12 18:00'],
  ['2026-03-12 10:01', '2026-03-12 18:01'],
])('of a tube of 10-Mar 10:00, looked at on %s, it is due at %s', (done, due) => {
  expect(inspectionDue([aTubeIn('10:00'), anAct(done)], due)).toEqual(at(due))
})

const onArrival = { stomaMadeOn: '2026-02-20', technique: 'surgical' } as const

test.each([
  ['2026-03-10', '14:00', '18:00'],
  ['2026-03-08', '14:00', '18:00'],
  ['2026-03-07', '14:00', '22:00'],
])('in place on arrival since %s, looked at at %s, it is due at %s', (insertedOn, done, due) => {
  const tube = aTubeIn('12:00', { reason: 'on arrival', insertedOn, ...onArrival })
  expect(inspectionDue([tube, anAct(done)])).toEqual(at(due))
})

test('a care plan overrides the interval, also where it is shorter than that of a new tube', () => {
  const every2h = { personal: { 'inner-cannula-inspection-interval': 2 } }
  expect(inspectionDue([aTubeIn(), anAct('06:00')], '14:00', every2h)).toEqual(at('08:00'))
  expect(inspectionDue([aTubeIn('05:00'), anAct('06:00')], '14:00', every2h)).toEqual(at('08:00'))
})

test('the policy sets the interval of a new tube, and how long it counts as new', () => {
  const policy = { 'inner-cannula-early-interval': 3, 'inner-cannula-early-period': 1 }
  expect(inspectionDue([aTubeIn('05:30'), anAct('06:00')], '14:00', { policy })).toEqual(at('09:00'))
  expect(inspectionDue([aTubeIn('05:00'), anAct('06:00')], '14:00', { policy })).toEqual(at('14:00'))
})

test.each([
  ['2026-03-28 22:00', '2026-03-29 07:00'],
  ['2026-10-24 22:00', '2026-10-25 05:00'],
])('across a change of clocks, done %s, it is due eight elapsed hours later at %s', (done, due) => {
  expect(inspectionDue([aTubeIn(), anAct(done)], due)).toEqual(at(due))
})

test.each(['heavy', 'blocked'] as const)(
  'after a cannula found %s the next look is due within two hours',
  condition => {
    const entries = [aTubeIn(), anAct('11:20', { condition })]
    const window = windowOf(innerCannula, 'inner-cannula-inspection', aContext(entries, '12:00'))
    expect(window).toMatchObject({ soonAt: at('11:20'), dueAt: at('13:20'), closesAt: at('13:20') })
  },
)

test('the recheck names its cause, and a later look ends it', () => {
  expect(inspectionClock([aTubeIn(), anAct('11:20', { condition: 'blocked' })])).toMatchObject({
    because: 'it was blocked at the last check',
  })
  expect(inspectionDue([aTubeIn(), anAct('11:20', { condition: 'blocked' }), anAct('13:00')])).toEqual(at('21:00'))
})

test('a narrowed cannula put back as it was keeps the old clock, and asks for a recheck', () => {
  const entries = [aTubeIn(), anAct('06:00'), anAct('13:30', { act: 'inspected', condition: 'heavy' })]
  expect(inspectionDue(entries)).toEqual(at('14:00'))
  expect(inspectionDue([aTubeIn(), anAct('08:00'), ...entries.slice(2)])).toEqual(at('15:30'))
})

test('an act that could not be done leaves the recheck standing', () => {
  const entries = [aTubeIn(), anAct('11:20', { condition: 'heavy' }), anEntry(innerCannulaActs, '13:00', unable)]
  expect(inspectionDue(entries)).toEqual(at('13:20'))
})

test('it is suspended for a single-cannula tube', () => {
  const single = aTube({ construction: 'single', innerCannula: undefined, idWithInner: undefined })
  expect(inspectionClock([anEntry(tubeChanges, OLD_TUBE, single)])).toEqual({
    state: 'suspended',
    because: 'single-cannula tube',
  })
})

test('it is suspended once the tube is out for good, and absent where there never was one', () => {
  expect(inspectionClock([aTubeIn(), aRemoval('12:00')])).toMatchObject({ state: 'suspended' })
  expect(inspectionClock([])).toEqual({ state: 'none' })
})

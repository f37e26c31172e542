import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { type AboutContext, aContext, aCorrection, anEntry, aRemoval, aTube, at, clockOf, windowOf } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { plainSuction } from './examples.ts'
import { suction } from './kind.ts'
import { type SuctionData, suctions } from './schema.ts'

const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())

const anEpisode = (when: string, overrides: Partial<SuctionData> = {}, more: Partial<StoredEntry> = {}) =>
  anEntry(suctions, when, { ...plainSuction, ...overrides }, more)

const aLook = (when: string) => anEntry(suctions, when, { act: 'need only' })

const due = (entries: readonly StoredEntry[], now = '10:00', about: AboutContext = {}) =>
  windowOf(suction, 'suction-need', aContext(entries, now, about)).dueAt

const throughMouth: Partial<SuctionData> = {
  route: 'oral',
  catheter: undefined,
  vacuum: undefined,
  vacuumUnit: undefined,
  passes: undefined,
  passed: undefined,
  longestPassS: undefined,
}

test('never looked at, the need is due four hours after the tube went in', () => {
  expect(due([anEntry(tubeChanges, '07:30', aTube())])).toEqual(at('11:30'))
})

test('never looked at in a tube from before the stay, it counts from admission', () => {
  expect(due([tube], '10:00', { admittedAt: '2026-03-10 09:00' })).toEqual(at('13:00'))
})

test('looked at at 06:00 it is due at 10:00, on time from 09:00 to 11:00, seriously overdue after 14:00', () => {
  expect(windowOf(suction, 'suction-need', aContext([tube, aLook('06:00')], '10:00'))).toMatchObject({
    dueAt: at('10:00'),
    opensAt: at('09:00'),
    closesAt: at('11:00'),
    seriousAt: at('14:00'),
  })
})

test.each(['06:00', '09:59', '10:00', '10:01', '2026-03-12 06:00'])('asked at %s the due time is the same', now => {
  expect(due([tube, aLook('06:00')], now)).toEqual(at('10:00'))
})

test('an episode counts as a look', () => {
  expect(due([tube, aLook('06:00'), anEpisode('08:30')])).toEqual(at('12:30'))
})

test.each<[string, Partial<SuctionData>]>([
  ['of the mouth', throughMouth],
  ['by the above-cuff port', { ...throughMouth, route: 'above cuff' }],
  ['with a catheter that would not pass', { passed: 'no' }],
])('an episode %s does not', (_, overrides) => {
  expect(due([tube, aLook('06:00'), anEpisode('08:30', overrides)])).toEqual(at('10:00'))
})

test('after copious secretions it is due in two hours, on time within half an hour', () => {
  const window = windowOf(suction, 'suction-need', aContext([tube, anEpisode('08:30', { amount: 'copious' })], '10:00'))
  expect(window).toMatchObject({ dueAt: at('10:30'), opensAt: at('10:00'), closesAt: at('11:00') })
})

test('a later look without copious secretions brings the longer interval back', () => {
  expect(due([tube, anEpisode('08:30', { amount: 'copious' }), aLook('09:00')])).toEqual(at('13:00'))
})

test('the shorter interval names its cause', () => {
  const context = aContext([tube, anEpisode('08:30', { amount: 'copious' })], '10:00')
  expect(clockOf(suction, 'suction-need', context)).toMatchObject({ because: 'secretions were copious' })
})

test('a late entry does not move the clock back past a later act', () => {
  const late = anEpisode('07:00', {}, { recordedAt: at('11:00') })
  expect(due([tube, anEpisode('08:30'), late])).toEqual(at('12:30'))
})

test('a superseded look takes no part, nor does a retracted one', () => {
  const wrong = aLook('08:30')
  const corrected = aCorrection(wrong, suctions, '07:30', { act: 'need only' })
  const retracted = aCorrection(corrected, suctions, '07:30', { act: 'need only' }, { status: 'retracted' })
  expect(due([tube, aLook('06:00'), wrong, corrected])).toEqual(at('11:30'))
  expect(due([tube, aLook('06:00'), wrong, corrected, retracted])).toEqual(at('10:00'))
})

test('a change of the whole tube sets the clock back', () => {
  expect(due([tube, aLook('06:00'), anEntry(tubeChanges, '07:00', aTube())])).toEqual(at('11:00'))
})

test.each([
  ['2026-03-28 22:00', '2026-03-29 03:00'],
  ['2026-10-24 23:30', '2026-10-25 02:30'],
])('across a change of clocks, done %s, it is due four elapsed hours later at %s', (done, wall) => {
  expect(due([tube, aLook(done)], wall)).toEqual(at(wall))
})

test('a care plan overrides the interval, also where it is shorter than that after copious secretions', () => {
  const everyHour = { personal: { 'suction-need-interval': 1 } }
  expect(due([tube, aLook('06:00')], '10:00', everyHour)).toEqual(at('07:00'))
  expect(due([tube, anEpisode('08:30', { amount: 'copious' })], '10:00', everyHour)).toEqual(at('09:30'))
})

test('it is suspended once the tube is out for good, and absent where there never was one', () => {
  const clock = (entries: readonly StoredEntry[]) => clockOf(suction, 'suction-need', aContext(entries, '12:00'))
  expect(clock([tube, aRemoval('11:00')])).toEqual({
    state: 'suspended',
    because: 'tube out for good since 10-Mar-2026',
  })
  expect(clock([])).toEqual({ state: 'none' })
})

test('a single-cannula tube needs it too', () => {
  const single = aTube({ construction: 'single', innerCannula: undefined, idWithInner: undefined })
  expect(due([anEntry(tubeChanges, '07:30', single)])).toEqual(at('11:30'))
})

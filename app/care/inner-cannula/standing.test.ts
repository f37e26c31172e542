import { expect, test } from 'vitest'
import { wholeKit } from '../bedside-kit/examples.ts'
import { type KitData, kitChecks } from '../bedside-kit/schema.ts'
import type { StoredEntry } from '../kind.ts'
import { aContext, anEntry, aRemoval, aTube } from '../make.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { replacedWithNew } from './examples.ts'
import { type InnerCannulaData, innerCannulaActs } from './schema.ts'
import { standingInnerCannulaWarnings } from './warnings.ts'

function aTubeIn(overrides: Partial<TubeData> = {}, when = '2026-03-02 10:00'): StoredEntry {
  return anEntry(tubeChanges, when, aTube(overrides))
}

function anAct(when: string, overrides: Partial<InnerCannulaData> = {}): StoredEntry {
  return anEntry(innerCannulaActs, when, { ...replacedWithNew, line: 'Alder', size: '8.0', ...overrides })
}

const unable = (when: string, whyUnable: NonNullable<InnerCannulaData['whyUnable']>) =>
  anEntry(innerCannulaActs, when, { act: 'unable', whyUnable, condition: 'not seen', spare: 'yes', tolerance: 'well' })

const standing = (entries: readonly StoredEntry[], about = {}) =>
  standingInnerCannulaWarnings(aContext(entries, '14:00', about))

const names = (entries: readonly StoredEntry[], about = {}) => standing(entries, about).map(({ name }) => name)

test('nothing stands after an ordinary act, nor before the first', () => {
  expect(standing([aTubeIn()])).toEqual([])
  expect(standing([aTubeIn(), anAct('11:20')])).toEqual([])
})

test('a narrowed cannula that was changed says when to look again', () => {
  expect(standing([aTubeIn(), anAct('11:20', { condition: 'heavy' })])).toMatchObject([
    { level: 'amber', action: 'Check the inner cannula again by 13:20. Review humidity.' },
  ])
})

test('a narrowed cannula that was put back asks for a clean one', () => {
  const entries = [aTubeIn(), anAct('11:20', { act: 'inspected', condition: 'blocked' })]
  expect(standing(entries)).toMatchObject([
    { action: 'Fit a clean inner cannula. Check again in 2 hours. Review humidity.' },
  ])
})

test('it stands until a later look finds it clearer', () => {
  const narrowed = [aTubeIn(), anAct('11:20', { condition: 'blocked' })]
  expect(names([...narrowed, unable('12:00', 'stuck')])).toContain('inner-cannula-narrowed')
  expect(names([...narrowed, anAct('13:00', { condition: 'light' })])).toEqual([])
})

test('a new tube ends it', () => {
  expect(standing([aTubeIn(), anAct('11:20', { condition: 'blocked' }), aTubeIn({}, '12:00')])).toEqual([])
})

test('two partly blocked checks in a row suggest half the interval', () => {
  const partly = ['03:00', '11:00'].map(when => anAct(when, { condition: 'moderate' }))
  expect(standing([aTubeIn(), ...partly])).toMatchObject([
    {
      name: 'inner-cannula-shorter-interval',
      level: 'blue',
      action: 'Think about looking at the inner cannula every 4 hours, in the care plan.',
    },
  ])
  expect(standing([aTubeIn(), ...partly, anAct('13:00')])).toEqual([])
  expect(standing([aTubeIn(), ...partly, anAct('07:00')])).toEqual([])
})

test('half an interval below the shortest allowed is not suggested', () => {
  const entries = [aTubeIn(), anAct('03:00', { condition: 'moderate' }), anAct('11:00', { condition: 'moderate' })]
  expect(standing(entries, { policy: { 'inner-cannula-inspection-interval': 1 } })).toEqual([])
})

test('an interval set for the patient since then is not suggested again', () => {
  const entries = [
    aTubeIn({}, '2026-02-20 10:00'),
    anAct('2026-02-27 03:00', { condition: 'moderate' }),
    anAct('2026-02-27 11:00', { condition: 'moderate' }),
  ]
  const about = { admittedAt: '2026-02-20 08:00' }
  expect(names(entries, about)).toEqual(['inner-cannula-shorter-interval'])
  expect(names(entries, { ...about, personal: { 'inner-cannula-inspection-interval': 4 } })).toEqual([])
})

test('two blocks within a day call the specialist, also across a change of tube', () => {
  const first = anAct('2026-03-09 14:00', { condition: 'blocked' })
  const second = anAct('13:00', { condition: 'blocked' })
  expect(names([aTubeIn(), first, second])).toContain('inner-cannula-repeat-block')
  expect(names([aTubeIn(), first, aTubeIn({}, '02:00'), second])).toContain('inner-cannula-repeat-block')
  expect(names([aTubeIn(), anAct('2026-03-09 12:59', { condition: 'blocked' }), second])).not.toContain(
    'inner-cannula-repeat-block',
  )
})

test('no spare at the last check stands, with when it was charted', () => {
  expect(standing([aTubeIn(), anAct('11:20', { spare: 'no' })])).toMatchObject([
    { name: 'inner-cannula-no-spare', cause: 'No matching spare at the bedside. Charted 10-Mar-2026 11:20.' },
  ])
  expect(standing([aTubeIn(), anAct('11:20', { spare: 'no' }), anAct('13:00')])).toEqual([])
})

test('no spare is settled by a later check of the kit that found everything, not by one that did not', () => {
  const noSpare = [aTubeIn(), anAct('11:20', { spare: 'no' })]
  const lacking: KitData = { ...wholeKit, complete: 'no', missing: ['gel'], owner: 'T. Okafor' }
  expect(names([...noSpare, anEntry(kitChecks, '11:40', wholeKit)])).toEqual([])
  expect(names([...noSpare, anEntry(kitChecks, '11:40', lacking)])).toEqual(['inner-cannula-no-spare'])
  expect(names([...noSpare, anEntry(kitChecks, '11:00', wholeKit)])).toEqual(['inner-cannula-no-spare'])
})

test('a cannula of another tube stands until one is charted that matches', () => {
  const wrong = [aTubeIn(), anAct('11:20', { line: 'Corvane' })]
  expect(names(wrong)).toEqual(['inner-cannula-other-tube'])
  expect(names([...wrong, unable('12:00', 'other')])).toEqual(['inner-cannula-other-tube', 'inner-cannula-not-checked'])
  expect(names([...wrong, anAct('12:00')])).toEqual([])
})

test('a dual tube that went in without one warns until one is fitted', () => {
  const bare = aTubeIn({ innerCannula: 'none', connector: 'inner' })
  expect(standing([bare])).toMatchObject([{ name: 'inner-cannula-absent', level: 'red' }])
  expect(names([bare, unable('12:00', 'none to fit')])).toEqual(['inner-cannula-absent'])
  expect(names([bare, anAct('13:00', { condition: 'none' })])).toEqual([])
})

test('a cannula left out stands until one is back in', () => {
  const out = [aTubeIn({ connector: 'outer' }), anAct('06:00'), unable('12:00', 'not back')]
  expect(standing(out)).toMatchObject([{ name: 'inner-cannula-absent', level: 'amber' }])
  expect(standing([...out, anAct('13:00')])).toEqual([])
})

test('blood on the cannula stands until the next look', () => {
  expect(names([aTubeIn(), anAct('11:20', { blood: 'fresh' })])).toEqual(['inner-cannula-blood'])
  expect(names([aTubeIn(), anAct('11:20', { blood: 'fresh' }), anAct('13:00')])).toEqual([])
})

test('nothing stands once the tube is out for good', () => {
  expect(standing([aTubeIn(), anAct('11:20', { spare: 'no', condition: 'blocked' }), aRemoval('13:00')])).toEqual([])
})

test('distress and a deep fall of SpO2 stand until the next act', () => {
  expect(names([aTubeIn(), anAct('11:20', { tolerance: 'distress' })])).toEqual(['inner-cannula-distress'])
  expect(names([aTubeIn(), anAct('11:20', { tolerance: 'desaturation', spo2Low: 86 })])).toEqual([
    'inner-cannula-spo2-low',
  ])
  expect(names([aTubeIn(), anAct('11:20', { tolerance: 'desaturation', spo2Low: 93 })])).toEqual([])
  expect(names([aTubeIn(), anAct('11:20', { tolerance: 'distress' }), anAct('11:30')])).toEqual([])
})

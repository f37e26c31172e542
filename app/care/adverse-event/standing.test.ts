import { expect, test } from 'vitest'
import { replacedWithNew } from '../inner-cannula/examples.ts'
import { innerCannulaActs } from '../inner-cannula/schema.ts'
import type { StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, aRemoval, aTube } from '../make.ts'
import { calm } from '../observations/examples.ts'
import { observationSets } from '../observations/schema.ts'
import { usualCheck } from '../stoma-and-skin/examples.ts'
import { stomaChecks } from '../stoma-and-skin/schema.ts'
import { plainSuction } from '../suction/examples.ts'
import { suctions } from '../suction/schema.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { clearedBlock } from './examples.ts'
import { type AdverseEventData, adverseEvents } from './schema.ts'
import { standingAdverseEventWarnings } from './warnings.ts'

const tube = (when = '2026-03-02 10:00', difficulty: 'easy' | 'failed' = 'easy') =>
  anEntry(tubeChanges, when, aTube({ difficulty }))
const event = (when: string, overrides: Partial<AdverseEventData>) =>
  anEntry(adverseEvents, when, { ...clearedBlock, ...overrides })
const set = (when: string, effort: 'easy' | 'distress') => anEntry(observationSets, when, { ...calm, effort })

const standingOf = (...entries: readonly StoredEntry[]) =>
  standingAdverseEventWarnings(aContext([tube(), ...entries], '12:00')).map(({ name }) => name)

const out = event('09:00', { event: 'unplanned removal', tubeNow: 'out', outcome: 'recovered' })

test.each<[string, readonly StoredEntry[], readonly string[]]>([
  ['nothing else', [], ['event-tube-out']],
  ['calm observations: the tube is still out', [set('10:00', 'easy')], ['event-tube-out']],
  ['a tube that did not go in', [tube('09:10', 'failed')], ['event-tube-out']],
  ['a tube that went in', [tube('09:10')], []],
  ['removal for good', [aRemoval('09:10')], []],
  ['the tube charted as back', [event('09:10', { event: 'displaced', tubeNow: 'in' })], []],
])('a tube that came out, then %s', (_, entries, expected) => {
  expect(standingOf(out, ...entries)).toEqual(expected)
})

const unsettled = event('09:00', { outcome: 'not settled' })

test.each<[string, readonly StoredEntry[], readonly string[]]>([
  ['nothing else', [], ['event-not-settled']],
  ['distress', [set('09:10', 'distress')], ['event-not-settled']],
  ['calm observations of before', [set('08:50', 'easy')], ['event-not-settled']],
  ['calm observations', [set('09:10', 'easy')], []],
  ['the same charted as over', [event('09:10', { outcome: 'recovered' })], []],
  ['another sort of event that is over', [event('09:10', { event: 'pressure injury' })], ['event-not-settled']],
])('a block that has not settled, then %s', (_, entries, expected) => {
  expect(standingOf(unsettled, ...entries)).toEqual(expected)
})

const bleeding = (outcome: AdverseEventData['outcome']) => event('09:00', { event: 'bleeding', outcome })

test.each<[string, readonly StoredEntry[], readonly string[]]>([
  ['nothing else', [], ['event-bleeding']],
  ['calm observations, which do not see blood', [set('09:10', 'easy')], ['event-bleeding']],
  ['suction with blood', [anEntry(suctions, '09:10', { ...plainSuction, blood: 'fresh' })], ['event-bleeding']],
  ['suction without blood', [anEntry(suctions, '09:10', plainSuction)], []],
  ['an opening without blood', [anEntry(stomaChecks, '09:10', usualCheck)], []],
])('a bleed that has not settled, then %s', (_, entries, expected) => {
  expect(standingOf(bleeding('not settled'), ...entries)).toEqual(expected)
})

test('a bleed that has settled does not stand here', () => {
  expect(standingOf(bleeding('recovered'))).toEqual([])
})

test('a wrong cannula stands until another went in, whatever the breathing', () => {
  const wrong = event('09:00', { event: 'wrong cannula', done: ['nothing'] })
  expect(standingOf(wrong)).toEqual(['event-wrong-cannula'])
  expect(standingOf(wrong, set('09:10', 'easy'))).toEqual(['event-wrong-cannula'])
  expect(standingOf(wrong, anEntry(innerCannulaActs, '09:10', replacedWithNew))).toEqual([])
  expect(standingOf(wrong, tube('09:10'))).toEqual([])
})

test('a retracted event does not stand', () => {
  expect(
    standingOf(unsettled, aCorrection(unsettled, adverseEvents, '09:00', clearedBlock, { status: 'retracted' })),
  ).toEqual([])
})

test('a second tube that came out stands for its days, each event counted once', () => {
  const back = (when: string) => event(when, { event: 'unplanned removal', tubeNow: 'in' })
  expect(standingOf(back('2026-03-09 12:00'))).toEqual([])
  expect(standingOf(back('2026-03-04 12:00'), back('2026-03-09 12:00'))).toEqual(['tube-out-again'])
  expect(standingOf(back('2026-03-02 11:59'), back('2026-03-09 12:00'))).toEqual([])
})

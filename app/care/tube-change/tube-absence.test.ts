import { expect, test } from 'vitest'
import { clearedBlock } from '../adverse-event/examples.ts'
import { type AdverseEventData, adverseEvents } from '../adverse-event/schema.ts'
import { cuffPressure } from '../cuff-pressure/kind.ts'
import type { StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, aRemoval, aTube, at, clockOf } from '../make.ts'
import { type TubeData, tubeChanges } from './schema.ts'
import { standingTubeWarnings } from './standing.ts'
import { tubeInPlace } from './tube.ts'
import { lastTube, tubeAbsence, tubeOutSince } from './tube-absence.ts'
import { sameTubeAgain } from './warnings.ts'

const tube = (when: string, overrides: Partial<TubeData> = {}) => anEntry(tubeChanges, when, aTube(overrides))
const event = (when: string, overrides: Partial<AdverseEventData>) =>
  anEntry(adverseEvents, when, { ...clearedBlock, event: 'unplanned removal', ...overrides })
const first = tube('2026-03-02 10:00')
const out = event('09:00', { tubeNow: 'out', outcome: 'not settled' })

const recordOf = (...entries: readonly StoredEntry[]) => aContext(entries, '14:00').record

test.each<[string, readonly StoredEntry[], string | undefined]>([
  ['none was charted', [], undefined],
  ['the tube is in', [first], undefined],
  ['it was removed for good', [first, aRemoval('09:00')], 'removed for good 09:00'],
  ['one went in after it was removed', [first, aRemoval('09:00'), tube('10:00')], undefined],
  ['it came out', [first, out], 'came out 09:00'],
  ['it came out and the patient recovered without it', [first, event('09:00', { tubeNow: 'out' })], 'came out 09:00'],
  ['it came out and was put back', [first, out, event('09:20', { tubeNow: 'in' })], undefined],
  ['it came out and a tube went in', [first, out, tube('09:20', { reason: 'displaced' })], undefined],
  ['both forms have one time', [first, out, tube('09:00', { reason: 'displaced' })], undefined],
  ['the new one did not go in', [first, out, tube('09:20', { difficulty: 'failed' })], 'came out 09:00'],
  ['it came out again', [first, out, tube('09:20'), event('10:00', { tubeNow: 'out' })], 'came out 10:00'],
  ['it came out, then was given up', [first, out, aRemoval('11:00')], 'removed for good 11:00'],
  ['it moved but is in', [first, event('09:00', { event: 'displaced', tubeNow: 'in' })], undefined],
  ['the patient died of it', [first, event('09:00', { tubeNow: 'out', outcome: 'died' })], undefined],
  [
    'charted in error',
    [first, out, aCorrection(out, adverseEvents, '09:00', clearedBlock, { status: 'retracted' })],
    undefined,
  ],
])('why no tube is in: %s', (_, entries, expected) => {
  const absence = tubeAbsence(recordOf(...entries))
  const [why, when] = expected === undefined ? [] : [expected.slice(0, -6), expected.slice(-5)]
  expect(absence).toEqual(when === undefined ? undefined : { why, since: at(when) })
})

test('a tube that came out is in place no more, and still known as the last one', () => {
  expect(tubeInPlace(recordOf(first, out))).toBeUndefined()
  expect(lastTube(recordOf(first, out))?.performedAt).toEqual(at('2026-03-02 10:00'))
  expect(lastTube(recordOf(first, aRemoval('09:00')))).toBeUndefined()
})

test('a tube is out for good since its removal only', () => {
  expect(tubeOutSince(recordOf(first, out))).toBeUndefined()
  expect(tubeOutSince(recordOf(first, aRemoval('09:00')))).toEqual(at('09:00'))
})

test.each([
  ['came out', out, 'tube came out 10-Mar-2026 09:00, not back'],
  ['removed for good', aRemoval('09:00'), 'tube out for good since 10-Mar-2026'],
])('the clocks of a tube that was %s stand still and say so', (_, entry, because) => {
  const context = aContext([first, entry], '14:00')
  expect(clockOf(cuffPressure, 'cuff-pressure-check', context)).toEqual({ state: 'suspended', because })
})

test('a tube that came out is not asked to be charted as if none had been, and goes back in by one tap', () => {
  const context = aContext([first, out], '14:00')
  expect(standingTubeWarnings(context)).toEqual([])
  expect(sameTubeAgain(context)?.words).toBe('Same tube as the one that came out: 8.0 ISO 5366, cuffed, dual')
})

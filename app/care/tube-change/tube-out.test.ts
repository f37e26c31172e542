import { expect, test } from 'vitest'
import type { PatientFacts, StoredEntry } from '../kind.ts'
import { type AboutContext, aContext, aCorrection, anEntry, aRemoval, aTube } from '../make.ts'
import { type TubeData, tubeChanges } from './schema.ts'
import { displacedAgain, standingDisplacements, standingTubeOut, tubeOut } from './tube-out.ts'

const tube = (when: string, overrides: Partial<TubeData> = {}) => anEntry(tubeChanges, when, aTube(overrides))
/** The opening was made on 02-Mar-2026: 10-Mar is its day 8. */
const first = tube('2026-03-02 10:00', { reason: 'first insertion', technique: 'surgical' })
const changed = tube('2026-03-06 10:00', { reason: 'first change' })

function outOf(overrides: Partial<TubeData>, before: readonly StoredEntry[], now = '12:00', about: AboutContext = {}) {
  return tubeOut(aTube(overrides), aContext(before, now, about))
}

const BLIND = ' Do not push the tube back blindly.'

test.each<[string, Partial<TubeData>, readonly StoredEntry[], string, boolean | undefined]>([
  ['nothing of a change that went in', {}, [first, changed], '12:00', undefined],
  ['failed in a new opening', { difficulty: 'failed' }, [first], '12:00', true],
  ['failed on day 6 after a change', { difficulty: 'failed' }, [first, changed], '2026-03-08 23:59', true],
  ['failed on day 7 after a change', { difficulty: 'failed' }, [first, changed], '2026-03-09 00:00', false],
  ['failed in an opening of unknown age', { difficulty: 'failed' }, [tube('09:00')], '12:00', true],
  ['a first insertion that failed', { reason: 'first insertion', difficulty: 'failed' }, [], '12:00', true],
  ['displaced on day 8, never changed', { reason: 'displaced' }, [first], '12:00', true],
  ['displaced on day 6 after a change', { reason: 'displaced' }, [first, changed], '2026-03-08 12:00', true],
  ['displaced on day 7 after a change', { reason: 'displaced' }, [first, changed], '2026-03-09 12:00', undefined],
  ['displaced where the age is not known', { reason: 'displaced' }, [tube('09:00')], '12:00', undefined],
])('a tube that is out, %s', (_, overrides, before, now, warnsOfBlind) => {
  const [warning] = outOf(overrides, before, now)
  expect(warning?.level).toBe(warnsOfBlind === undefined ? undefined : 'red')
  expect(warning?.action.includes(BLIND)).toBe(warnsOfBlind)
})

test.each<[PatientFacts['upperAirway'], string]>([
  ['open', `Call for help now. Oxygen to face and stoma.${BLIND} Follow your local emergency plan.`],
  ['not known', `Call for help now. Oxygen to face and stoma.${BLIND} Follow your local emergency plan.`],
  [
    'not open',
    'Call for help now. Oxygen to the stoma. The mouth does not connect to the lungs. Follow your local emergency plan.',
  ],
])('with the upper airway %s: %s', (upperAirway, action) => {
  expect(outOf({ difficulty: 'failed' }, [first], '12:00', { patient: { upperAirway } })[0]?.action).toBe(action)
})

test('of a laryngectomy only the age of the stoma counts', () => {
  const patient = { upperAirway: 'not open' } as const
  expect(outOf({ reason: 'displaced' }, [first], '2026-03-08 12:00', { patient })).toHaveLength(1)
  expect(outOf({ reason: 'displaced' }, [first], '2026-03-09 12:00', { patient })).toEqual([])
})

test('the cause says what happened and how old the opening is', () => {
  const cause = (overrides: Partial<TubeData>, before: readonly StoredEntry[]) => outOf(overrides, before)[0]?.cause
  expect(cause({ difficulty: 'failed' }, [first])).toBe(
    'The tube did not go in. The opening is 8 days old; no change of its tube has gone well yet.',
  )
  expect(cause({ difficulty: 'failed' }, [first, changed])).toBe('The tube did not go in. The opening is 8 days old.')
  expect(cause({ difficulty: 'failed' }, [])).toBe('The tube did not go in. When the opening was made is not charted.')
  expect(cause({ reason: 'displaced' }, [first])).toMatch(/^The tube came out\. The opening is 8 days old;/)
})

const standing = (...entries: readonly StoredEntry[]) =>
  standingTubeOut(aContext([first, changed, ...entries], '14:00'))
const failed = tube('09:00', { difficulty: 'failed' })

test('a tube that did not go in stands until one that did is charted, or that there is none', () => {
  expect(standing()).toEqual([])
  expect(standing(failed)).toMatchObject([
    {
      level: 'red',
      cause:
        'The tube did not go in. The opening is 8 days old. Charted 10-Mar-2026 09:00. Chart the tube that is in now.',
    },
  ])
  expect(standing(failed, tube('09:10'))).toEqual([])
  expect(standing(failed, aRemoval('09:10'))).toEqual([])
  expect(standing(tube('08:50'), failed)).toHaveLength(1)
})

test('a failed change that was charted in error no longer stands', () => {
  expect(standing(failed, aCorrection(failed, tubeChanges, '09:00', aTube()))).toEqual([])
})

const displaced = (when: string) => tube(when, { reason: 'displaced' })

test.each([
  ['2026-03-03 12:00', 1],
  ['2026-03-03 11:59', 0],
])('displaced on 10-Mar 12:00 after once on %s', (before, warnings) => {
  const context = aContext([displaced(before)], '12:00')
  expect(displacedAgain(aTube({ reason: 'displaced' }), context)).toHaveLength(warnings)
})

test('a second displacement asks for the specialist, also after it was charted', () => {
  const twice = aContext([displaced('2026-03-08 12:00'), displaced('2026-03-09 12:00')], '12:00')
  expect(standingDisplacements(twice)).toMatchObject([
    {
      level: 'amber',
      action: 'Ask the tracheostomy specialist to review tube, length and ties today.',
      cause: 'Displaced 2 times within 7 days.',
    },
  ])
  expect(displacedAgain(aTube({ reason: 'routine' }), twice)).toEqual([])
  expect(standingDisplacements(aContext([displaced('2026-03-09 12:00')], '12:00'))).toEqual([])
})

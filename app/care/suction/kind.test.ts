import { expect, test } from 'vitest'
import { aContext } from '../make.ts'
import { plainSuction, suctionExamples } from './examples.ts'
import { suction } from './kind.ts'
import { catheterFr, type SuctionData, suctionSchema } from './schema.ts'
import { suctionSentence } from './sentence.ts'

const problemsOf = (data: object) => suctionSchema.safeParse(data).error?.issues.map(issue => issue.message)

test('a look at the need is complete by itself', () => {
  expect(problemsOf({ act: 'need only' })).toBeUndefined()
})

test('a look at the need has no answers of an episode', () => {
  expect(problemsOf({ act: 'need only', blood: 'none' })).toEqual(['Leave out the blood here'])
})

test('an episode asks why, by which route, what came and how it was borne', () => {
  expect(problemsOf({ act: 'episode' })).toEqual([
    'Choose the reason',
    'Choose the route',
    'Choose the amount',
    'Choose the blood',
    'Choose the tolerance',
  ])
})

test('through the tube it asks for catheter, vacuum with its unit, passes and passage', () => {
  const { catheter, vacuum, vacuumUnit, passes, passed, longestPassS, ...rest } = plainSuction
  expect(problemsOf(rest)).toEqual([
    'Choose the catheter',
    'Enter the vacuum',
    'Choose the unit on the vacuum gauge',
    'Enter the passes',
    'Choose the catheter passage',
  ])
  expect([catheter, vacuum, vacuumUnit, passes, passed, longestPassS]).toEqual(['12 Fr', 120, 'mmHg', 2, 'easily', 8])
})

test('colour and consistency are asked for when something came', () => {
  const { colour: _colour, consistency: _consistency, ...rest } = plainSuction
  expect(problemsOf(rest)).toEqual(['Choose the colour', 'Choose the consistency'])
  expect(problemsOf({ ...rest, amount: 'none' })).toBeUndefined()
})

test('the size of a catheter is a number', () => {
  expect(catheterFr(plainSuction)).toBe(12)
  expect(catheterFr({ act: 'need only' })).toBeUndefined()
})

test('it has no usual answers and starts with none', () => {
  expect(suction).not.toHaveProperty('usual')
  expect(suction).not.toHaveProperty('startsWith')
})

test.each<[Partial<SuctionData>, boolean]>([
  [{}, false],
  [{ blood: 'streaks' }, false],
  [{ blood: 'fresh' }, true],
  [{ passed: 'no' }, true],
  [{ tolerance: 'distress' }, true],
  [{ tolerance: 'desaturation', spo2Low: 84 }, false],
  [{ tolerance: 'desaturation', spo2Low: 84, spo2After: 86 }, true],
])('%o is drawn out of range: %s', (overrides, out) => {
  expect(suction.outOfRange?.({ ...plainSuction, ...overrides }, aContext([], '12:00'))).toBe(out)
})

test('the sentence says why, how, what came and how it was borne', () => {
  expect(suctionExamples.map(suctionSentence)).toEqual([
    'Suction through the tube, open (secretions seen or heard): 12 Fr, 120 mmHg, 2 passes, longest 8 s. Catheter passed easily. Secretions moderate, clear, moderately thick. Tolerated well.',
    'Looked and listened: no suction needed.',
    'Suction through the tube, closed (coarse sounds, saw-tooth trace): 10 Fr, 17.5 kPa, 3 passes, longest 10 s, depth 12.5 cm. Catheter passed with difficulty. Secretions copious, yellow, thick. Streaks of blood. SpO2 fell. Lowest SpO2 89%. SpO2 after recovery 95%. Plain inner cannula in. Oxygen given before. Heart rate faster. Physiotherapist present.',
    'Suction by the above-cuff port (before the cuff is let down). Secretions small, clear, thin. Tolerated well.',
    'Suction of the mouth (patency check). No secretions. Coughed.',
  ])
})

test('the task says its rule with the values in force', () => {
  expect(suction.tasks?.[0]?.says(aContext([], '12:00'))).toBe(
    'Look and listen every 4 h; every 2 h after copious secretions. Suction only when it is needed.',
  )
})

import { expect, test } from 'vitest'
import { needsReferral, pressureInjuryStages, pressureInjuryTexts } from './pressure-injury.ts'

test.each(pressureInjuryStages.map(stage => [stage, stage !== 'stage-1'] as const))(
  'a %s injury goes to a specialist: %s',
  (stage, referred) => {
    expect(needsReferral(stage)).toBe(referred)
  },
)

test('every stage has a title and a description of its own', () => {
  const texts = pressureInjuryStages.map(stage => pressureInjuryTexts[stage])
  expect(new Set(texts.map(text => text.title)).size).toBe(6)
  expect(new Set(texts.map(text => text.says)).size).toBe(6)
})

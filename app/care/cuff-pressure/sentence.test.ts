import { expect, test } from 'vitest'
import { cuffPressure } from './kind.ts'
import type { CuffData } from './schema.ts'
import { cuffSentence } from './sentence.ts'

test('the sentence says what was found, what it was left at and how, in the unit of the gauge', () => {
  expect(cuffPressure.examples.map(cuffSentence)).toEqual([
    'Cuff pressure 26 cmH2O by manometer, not adjusted, head up.',
    'Cuff pressure 34, lowered to 26 cmH2O, by manometer, head up. After turning. 1 mL of air removed.',
    'Cuff pressure 14, raised to 18 mmHg, by continuous controller. 1.5 mL of air added.',
    'Cuff pressure not measured: let down for a trial. Cuff let down.',
  ])
})

test.each<[Partial<CuffData>, string]>([
  [{ leftAt: 26 }, 'Cuff pressure 26 cmH2O by manometer, not adjusted.'],
  [{ method: 'minimal leak' }, 'Cuff pressure 26 cmH2O by minimal leak, not adjusted.'],
  [{ cuffNow: 'inflated' }, 'Cuff pressure 26 cmH2O by manometer, not adjusted. Cuff inflated.'],
  [{ leak: 'yes' }, 'Cuff pressure 26 cmH2O by manometer, not adjusted. Leak or voice with the cuff up.'],
  [{ airMl: 0, leak: 'no' }, 'Cuff pressure 26 cmH2O by manometer, not adjusted.'],
  [{ note: 'Gauge 4' }, 'Cuff pressure 26 cmH2O by manometer, not adjusted. Gauge 4.'],
  [{ note: 'Gauge right?' }, 'Cuff pressure 26 cmH2O by manometer, not adjusted. Gauge right?'],
])('of %j it says: %s', (more, expected) => {
  expect(cuffSentence({ found: 26, unit: 'cmH2O', method: 'manometer', ...more })).toBe(expected)
})

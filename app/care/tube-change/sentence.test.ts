import { expect, test } from 'vitest'
import { aTube } from '../make.ts'
import { tubeExamples } from './examples.ts'
import type { TubeData } from './schema.ts'
import { tubeSentence } from './sentence.ts'

test('the sentence says why, which tube, and how it went', () => {
  expect(tubeExamples.map(tubeSentence)).toEqual([
    'First tube put in, percutaneous: Corvane Dual 8.0 ISO 5366, air cuff, dual cannula (disposable inner cannula), ID 8 in 9, OD 11.3, length 78 mm. Went easily, position confirmed by capnography. Operator Dr N. Abara, helper R. Osei. Flange sutures in place.',
    'Changed to a smaller tube: Halden 6 Jackson, no cuff, dual cannula (reusable inner cannula), ID 6.4 in 8.1, OD 10.8, length 76 mm, 15 mm connector on the inner cannula, fenestrated, lot H26-0417, expires 31-May-2028. Some difficulty, position confirmed by airflow. Operator E. Solberg, no helper named. Bleeding: spotting. Lowest SpO2 93%. Coughed well through the change.',
    'Tube in place on arrival since 12-Nov-2026, surgical: Marrow Long 7.5 ISO 5366, water cuff, single cannula, ID 7.5, OD 10.4, length 110 mm, mark 9.5 cm at the flange. How it went is not known, position not confirmed. Operator Not known.',
  ])
})

test.each<[Partial<TubeData>, string]>([
  [{ difficulty: 'failed' }, 'Failed: this tube did not go in, position confirmed by capnography.'],
  [{ innerCannula: 'none' }, 'dual cannula (no inner cannula in place)'],
  [{ connector: 'none' }, 'no 15 mm connector'],
  [{ reason: 'displaced' }, 'Changed because it was displaced:'],
  [{ bleeding: 'active' }, 'Bleeding: active.'],
  [{ note: 'Was it tight?' }, 'Was it tight?'],
])('of %j it says: %s', (overrides, expected) => {
  expect(tubeSentence(aTube(overrides))).toContain(expected)
})

test('no bleeding and a technique not known are left out', () => {
  const sentence = tubeSentence(aTube({ reason: 'first insertion', technique: 'not known', bleeding: 'none' }))
  expect(sentence).toMatch(/^First tube put in: /)
  expect(sentence).not.toContain('leeding')
})

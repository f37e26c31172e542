import { expect, test } from 'vitest'
import { stomaExamples, usualCheck } from './examples.ts'
import type { StomaData } from './schema.ts'
import { stomaSentence } from './sentence.ts'

const sentenceOf = (overrides: Partial<StomaData>) => stomaSentence({ ...usualCheck, ...overrides })

test('checks read as short sentences: opening, skin, dressing, sutures, ties, people', () => {
  expect(stomaExamples.map(stomaSentence)).toEqual([
    'Stoma: clean and healthy; no exudate; no bleeding; pain 0 of 10. Skin intact, 5 places looked at. Dressing left in place. Ties: two fingers fit.',
    'Stoma: redness, bad odour; moderate yellow or green exudate; no bleeding; pain 3 of 10. Moisture damage, under flange, bottom; 5 places looked at. Cleaned, dressing changed: absorbent pad. Ties changed: one finger fits. With T. Okafor. Swab sent. Dressing was wet through.',
    'Stoma: crusting; scant bloody exudate; spotting of blood. Stage 2 pressure injury, under sutures, 8 mm; 6 places looked at. Cleaned, dressing changed: foam. Flange sutures removed. Ties: two fingers fit. Done alone.',
  ])
})

test.each<[Partial<StomaData>, string]>([
  [{ appearance: ['redness'], fever: 'yes' }, 'redness; no exudate; no bleeding; pain 0 of 10; fever.'],
  [{ appearance: ['redness'], bleeding: 'active' }, 'active bleeding'],
  [{ appearance: ['redness'], bleeding: 'fresh ooze' }, 'fresh ooze of blood'],
  [{ sites: ['back of neck'] }, 'Skin intact, 1 place looked at.'],
  [
    { skin: 'pressure injury', stage: 'deep-tissue', findingSite: 'back of neck' },
    'Deep tissue injury, back of neck, under ties; 5 places looked at.',
  ],
  [{ dressing: 'none' }, 'No dressing.'],
  [{ dressing: 'changed', dressingType: 'other', secondPerson: 'alone' }, 'Cleaned, dressing changed. Ties'],
  [{ sutures: 'loose' }, 'Flange sutures loose.'],
  [{ sutures: 'in place' }, 'Flange sutures intact.'],
  [{ ties: 'none' }, 'Ties: no finger fits under them.'],
  [{ ties: 'no ties' }, 'Ties: none in use.'],
])('%j is said', (overrides, words) => {
  expect(sentenceOf(overrides)).toContain(words)
})

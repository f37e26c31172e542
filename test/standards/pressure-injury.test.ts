// Edsberg et al. 2016 (J Wound Ostomy Continence Nurs 43:585), the revised staging of the NPUAP, now NPIAP. Our texts are our own words;
// what is checked is that each names what the published definition turns on, and not what it excludes.
import { expect, test } from 'vitest'
import { needsReferral, pressureInjuryStages, pressureInjuryTexts } from '#app/clinical/pressure-injury.ts'

test('the classification has stages 1 to 4, unstageable and deep tissue, in Arabic numerals', () => {
  expect(pressureInjuryStages.map(stage => pressureInjuryTexts[stage].title)).toEqual([
    'Stage 1',
    'Stage 2',
    'Stage 3',
    'Stage 4',
    'Unstageable',
    'Deep tissue injury',
  ])
})

test.each([
  ['stage-1', /whole.*redness stays.*dark skin/i],
  ['stage-2', /part of the skin.*(pink|red).*blister.*no fat/i],
  ['stage-3', /whole skin is lost.*fat/i],
  ['stage-4', /whole skin is lost.*fascia.*muscle.*tendon.*cartilage.*bone/i],
  ['unstageable', /whole skin is lost.*hides/i],
  ['deep-tissue', /deep red, maroon or purple/i],
] as const)('the text of %s names what the definition turns on', (stage, turnsOn) => {
  expect(pressureInjuryTexts[stage].says).toMatch(turnsOn)
})

// Product proposal, for local sign-off: the publication stages, it does not refer.
test('every injury with lost or dying tissue is referred', () => {
  expect(pressureInjuryStages.filter(needsReferral)).toEqual([
    'stage-2',
    'stage-3',
    'stage-4',
    'unstageable',
    'deep-tissue',
  ])
})

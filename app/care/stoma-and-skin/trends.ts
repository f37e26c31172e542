import type { FindingsTrend, SeenFinding } from '../trend.ts'
import { bleedings, exudateAmounts, openingFindings, type StomaData, skinFindings } from './schema.ts'
import { siteWords, stageWords } from './sentence.ts'

/** Findings of opening and skin by day. */
export const stomaTrends: readonly FindingsTrend<StomaData>[] = [
  {
    shape: 'findings',
    name: 'stoma-and-skin',
    title: 'Stoma and skin',
    says: 'The worst of each day, where the stoma was looked at. The taller the bar, the more of it.',
    rows: {
      redness: 'Redness',
      swelling: 'Swelling',
      warmth: 'Warmth',
      pus: 'Pus',
      odour: 'Bad odour',
      crusting: 'Crusting',
      granulation: 'Granulation',
      maceration: 'Macerated edge',
      breakdown: 'Breakdown',
      'air leak': 'Air leak',
      'neck swelling': 'Neck swelling',
      'surgical emphysema': 'Air under skin',
      closed: 'Closed',
      exudate: 'Exudate',
      bleeding: 'Bleeding',
      injury: 'Pressure injury',
      skin: 'Other skin finding',
    },
    seen,
  },
]

function seen(data: StomaData): readonly SeenFinding[] {
  return [...opening(data), ...exudate(data), ...bleeding(data), ...skin(data)]
}

function opening({ appearance }: StomaData): readonly SeenFinding[] {
  return appearance
    .filter(finding => finding !== 'clean')
    .map(finding => ({ row: finding, level: 1, words: openingFindings[finding] }))
}

const amounts = { scant: 1, moderate: 2, copious: 3 } as const

function exudate({ exudate: amount }: StomaData): readonly SeenFinding[] {
  if (amount === 'none') return []
  return [{ row: 'exudate', level: amounts[amount], words: `Exudate ${exudateAmounts[amount].toLowerCase()}` }]
}

const bleeds = { spotting: 1, 'fresh ooze': 2, active: 3 } as const

function bleeding({ bleeding: seen }: StomaData): readonly SeenFinding[] {
  if (seen === 'none') return []
  return [{ row: 'bleeding', level: bleeds[seen], words: `Bleeding: ${bleedings[seen].toLowerCase()}` }]
}

/** Depth by stage; what hides its depth, or lies deep, is drawn as the deepest. */
const depths = { 'stage-1': 1, 'stage-2': 2, 'stage-3': 3, 'stage-4': 3, unstageable: 3, 'deep-tissue': 3 } as const

function skin({ skin: found, stage, findingSite }: StomaData): readonly SeenFinding[] {
  if (found === 'intact') return []
  const where = findingSite ? `, ${siteWords(findingSite)}` : ''
  return stage === undefined
    ? [{ row: 'skin', level: found === 'blanching redness' ? 1 : 2, words: `${skinFindings[found]}${where}` }]
    : [{ row: 'injury', level: depths[stage], words: `${stageWords(stage)}${where}` }]
}

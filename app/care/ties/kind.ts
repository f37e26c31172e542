import { careKind } from '../kind.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { tieExamples } from './examples.ts'
import { tieChecks } from './schema.ts'
import { tieSentence } from './sentence.ts'
import { tieSettings } from './settings.ts'
import { plannedTies, tieUse } from './supplies.ts'
import { tieTasks } from './tasks.ts'
import { standingTieWarnings, tieWarnings } from './warnings.ts'

/** The ties or the holder: their fit, their change, and the skin under them. */
export const ties = careKind({
  ...tieChecks,
  title: 'Ties',
  chartWords: 'Chart ties',
  lane: 'Stoma and skin',
  chapter: 'At the bed',
  twoPeople: ({ changed }) => changed === 'yes',
  cautions: [
    'Two people: one holds the tube. If you are alone, fasten the new holder before the old one comes off.',
    'A check of stoma and skin holds the ties as well: chart them on one form.',
  ],
  examples: tieExamples,
  summary: tieSentence,
  settings: tieSettings,
  tasks: tieTasks,
  startsWith: ({ record }) => {
    const holder = record.latest(tieChecks)?.data.holder
    return holder ? { holder } : {}
  },
  usual: ({ record }) => tubeInPlace(record) && { words: 'Ties left as they are', answers: { changed: 'no' } },
  uses: tieUse,
  plannedUse: plannedTies,
  warnings: tieWarnings,
  standing: standingTieWarnings,
  outOfRange: (data, context) => tieWarnings(data, context).length > 0,
})

import { type CareContext, careKind } from '../kind.ts'
import { suturesIn } from '../tube-change/tasks.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { stomaExamples } from './examples.ts'
import { stomaChecks } from './schema.ts'
import { stomaSentence } from './sentence.ts'
import { stomaSettings } from './settings.ts'
import { plannedDressings, stomaUse } from './supplies.ts'
import { stomaTasks } from './tasks.ts'
import { stomaTrends } from './trends.ts'
import { isOutOfRange, standingStomaWarnings, stomaWarnings } from './warnings.ts'

/** That there are no sutures is a fact where a tube is charted; where none is, nobody has said so. */
function stomaStart(context: CareContext): Readonly<Record<string, unknown>> {
  return tubeInPlace(context.record) && !suturesIn(context) ? { sutures: 'none' } : {}
}

/** The opening, the skin under flange and ties, the dressing, and what holds the tube. */
export const stomaAndSkin = careKind({
  ...stomaChecks,
  title: 'Stoma and skin',
  chartWords: 'Chart stoma',
  lane: 'Stoma and skin',
  chapter: 'At the bed',
  twoPeople: ({ dressing, holderChanged }) => dressing === 'changed' || holderChanged === 'yes',
  examples: stomaExamples,
  summary: stomaSentence,
  settings: stomaSettings,
  tasks: stomaTasks,
  startsWith: stomaStart,
  usual: ({ record }) =>
    tubeInPlace(record) && {
      words: 'Dressing and ties left as they are',
      answers: { dressing: 'left in place', holderChanged: 'no' },
    },
  uses: stomaUse,
  plannedUse: plannedDressings,
  trends: stomaTrends,
  warnings: stomaWarnings,
  standing: standingStomaWarnings,
  outOfRange: isOutOfRange,
})

import { careKind } from '../kind.ts'
import { suturesIn } from '../tube-change/tasks.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { stomaExamples } from './examples.ts'
import { stomaChecks } from './schema.ts'
import { stomaSentence } from './sentence.ts'
import { stomaSettings } from './settings.ts'
import { stomaTasks } from './tasks.ts'
import { isOutOfRange, standingStomaWarnings, stomaWarnings } from './warnings.ts'

/** The opening, the skin under flange and ties, the dressing, and what holds the tube. */
export const stomaAndSkin = careKind({
  ...stomaChecks,
  title: 'Stoma and skin',
  chartWords: 'Chart stoma',
  lane: 'Stoma and skin',
  examples: stomaExamples,
  summary: stomaSentence,
  settings: stomaSettings,
  tasks: stomaTasks,
  startsWith: context => (suturesIn(context) ? {} : { sutures: 'none' }),
  usual: ({ record }) =>
    tubeInPlace(record) && {
      words: 'Dressing and ties left as they are',
      answers: { dressing: 'left in place', holderChanged: 'no' },
    },
  warnings: stomaWarnings,
  standing: standingStomaWarnings,
  outOfRange: isOutOfRange,
})

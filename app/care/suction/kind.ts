import { careKind } from '../kind.ts'
import { suctionChecks } from './checks.ts'
import { suctionExamples } from './examples.ts'
import { suctions } from './schema.ts'
import { suctionSentence } from './sentence.ts'
import { suctionSettings } from './settings.ts'
import { suctionUse } from './supplies.ts'
import { suctionTasks } from './tasks.ts'
import { isOutOfRange, standingSuctionWarnings, suctionWarnings } from './warnings.ts'

/** The need for suction looked at, and episodes of suction. There is no usual answer: everything in it is a finding. */
export const suction = careKind({
  ...suctions,
  title: 'Suction',
  chartWords: 'Chart suction',
  lane: 'Suction',
  chapter: 'At the bed',
  examples: suctionExamples,
  summary: suctionSentence,
  settings: suctionSettings,
  checks: suctionChecks,
  tasks: suctionTasks,
  uses: suctionUse,
  warnings: suctionWarnings,
  standing: standingSuctionWarnings,
  outOfRange: isOutOfRange,
})

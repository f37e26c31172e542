import { careKind } from '../kind.ts'
import { tubeCautions } from './cautions.ts'
import { tubeChangeChecks } from './checks.ts'
import { tubeExamples } from './examples.ts'
import { plannedAnswers } from './planned.ts'
import { tubeChanges } from './schema.ts'
import { tubeSentence } from './sentence.ts'
import { tubeChangeSettings } from './settings.ts'
import { standingTubeWarnings } from './standing.ts'
import { plannedTubes, tubeUse } from './supplies.ts'
import { tubeTasks } from './tasks.ts'
import { sameTubeAgain, tubeWarnings } from './warnings.ts'

/** First insertion and every later change of the whole tube. The latest one is the tube in place. */
export const tubeChange = careKind({
  ...tubeChanges,
  title: 'Tube change',
  chartWords: 'Chart tube change',
  lane: 'Tube',
  chapter: 'Tube',
  needsFreshSignIn: true,
  needsCompetence: 'tube change, performing',
  twoPeople: () => true,
  cautions: tubeCautions,
  examples: tubeExamples,
  summary: tubeSentence,
  settings: tubeChangeSettings,
  checks: tubeChangeChecks,
  tasks: tubeTasks,
  startsWith: plannedAnswers,
  usual: sameTubeAgain,
  uses: tubeUse,
  plannedUse: plannedTubes,
  warnings: tubeWarnings,
  standing: standingTubeWarnings,
})

import { careKind } from '../kind.ts'
import { observationChecks } from './checks.ts'
import { observationExamples } from './examples.ts'
import { observationSets } from './schema.ts'
import { observationSentence } from './sentence.ts'
import { observationSettings } from './settings.ts'
import { observationTasks } from './tasks.ts'
import { observationTrends } from './trends.ts'
import { observationWarnings, standingObservationWarnings } from './warnings.ts'

/** Breathing, oxygen, heart and consciousness. There is no usual answer: everything in it is measured. */
export const observations = careKind({
  ...observationSets,
  title: 'Observations',
  chartWords: 'Chart observations',
  lane: 'Tube',
  chapter: 'At the bed',
  cautions: ['This adds up no score: use the early-warning chart of your hospital.'],
  examples: observationExamples,
  summary: observationSentence,
  settings: observationSettings,
  checks: observationChecks,
  tasks: observationTasks,
  trends: observationTrends,
  warnings: observationWarnings,
  standing: standingObservationWarnings,
  outOfRange: (data, context) => observationWarnings(data, context).length > 0,
})

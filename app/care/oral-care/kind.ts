import { careKind } from '../kind.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { oralCareExamples } from './examples.ts'
import { oralCares } from './schema.ts'
import { oralCareSentence } from './sentence.ts'
import { oralCareSettings } from './settings.ts'
import { oralCareTasks } from './tasks.ts'
import { oralCareWarnings } from './warnings.ts'

/** Care of the mouth: looked at, moistened, brushed. */
export const oralCare = careKind({
  ...oralCares,
  title: 'Oral care',
  chartWords: 'Chart mouth care',
  lane: 'Suction',
  chapter: 'At the bed',
  examples: oralCareExamples,
  summary: oralCareSentence,
  settings: oralCareSettings,
  tasks: oralCareTasks,
  usual: ({ record }) =>
    tubeInPlace(record) && { words: 'Looked at and moistened', answers: { care: ['looked', 'moistened'] } },
  warnings: oralCareWarnings,
  outOfRange: ({ seen }) => seen.includes('bleeding'),
})

import { careKind } from '../kind.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { waterCuffExamples } from './examples.ts'
import { waterCuffs } from './schema.ts'
import { waterCuffSentence } from './sentence.ts'
import { waterCuffSettings } from './settings.ts'
import { waterCuffUse } from './supplies.ts'
import { waterCuffTasks } from './tasks.ts'
import { standingWaterCuffWarnings, waterCuffWarnings } from './warnings.ts'

/** A tight-to-shaft cuff, emptied and filled with sterile water by volume. */
export const waterCuff = careKind({
  ...waterCuffs,
  title: 'Water cuff',
  chartWords: 'Chart water',
  lane: 'Cuff',
  chapter: 'At the bed',
  cautions: ['Sterile water, not air. Measure mL, not cmH2O.', 'Suction mouth and throat before the cuff is emptied.'],
  examples: waterCuffExamples,
  summary: waterCuffSentence,
  settings: waterCuffSettings,
  tasks: waterCuffTasks,
  startsWith({ record }) {
    const tube = tubeInPlace(record)
    const last = tube && record.since(waterCuffs, tube.performedAt)[0]
    return last ? { prescribedMl: last.data.prescribedMl } : {}
  },
  uses: waterCuffUse,
  warnings: waterCuffWarnings,
  standing: standingWaterCuffWarnings,
  outOfRange: (data, context) => waterCuffWarnings(data, context).length > 0,
})

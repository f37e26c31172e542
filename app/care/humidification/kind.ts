import { type CareContext, careKind } from '../kind.ts'
import { humidificationExamples } from './examples.ts'
import { currentRun } from './runs.ts'
import { humidifications, methods } from './schema.ts'
import { humidificationSentence } from './sentence.ts'
import { humidificationSettings } from './settings.ts'
import { humidificationUse, plannedExchangers } from './supplies.ts'
import { humidificationTasks } from './tasks.ts'
import { humidificationWarnings, standingHumidificationWarnings } from './warnings.ts'

/** What warms and moistens the air, now that it does not pass the nose. */
export const humidification = careKind({
  ...humidifications,
  title: 'Humidification',
  chartWords: 'Chart humidification',
  lane: 'Suction',
  chapter: 'At the bed',
  examples: humidificationExamples,
  summary: humidificationSentence,
  settings: humidificationSettings,
  tasks: humidificationTasks,
  usual,
  uses: humidificationUse,
  plannedUse: plannedExchangers,
  warnings: humidificationWarnings,
  standing: standingHumidificationWarnings,
  outOfRange: ({ method, waterLevel }) => method === 'none' || waterLevel === 'low',
})

/** The same method as before, with its exchanger left on. Water and secretions are looked at each time. */
function usual(context: CareContext) {
  const method = currentRun(context)[0]?.data.method
  if (method === undefined || method === 'none') return undefined
  return method === 'hme'
    ? { words: `${methods.hme}, not changed`, answers: { method, hmeChanged: 'no' } }
    : { words: methods[method], answers: { method } }
}

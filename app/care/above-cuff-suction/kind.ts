import { careKind } from '../kind.ts'
import { aboveCuffExamples } from './examples.ts'
import { aboveCuffSuctions } from './schema.ts'
import { aboveCuffSentence } from './sentence.ts'
import { aboveCuffSettings } from './settings.ts'
import { aboveCuffTasks } from './tasks.ts'
import { aboveCuffWarnings, standingAboveCuffWarnings } from './warnings.ts'

/** Secretions drawn from above the cuff, through the port of a tube that has one. */
export const aboveCuffSuction = careKind({
  ...aboveCuffSuctions,
  title: 'Above-cuff suction',
  chartWords: 'Chart volume',
  lane: 'Suction',
  chapter: 'At the bed',
  cautions: ['Empty the space above the cuff before every time that the cuff is let down.'],
  examples: aboveCuffExamples,
  summary: aboveCuffSentence,
  settings: aboveCuffSettings,
  tasks: aboveCuffTasks,
  warnings: aboveCuffWarnings,
  standing: standingAboveCuffWarnings,
  outOfRange: (data, context) => aboveCuffWarnings(data, context).length > 0,
})

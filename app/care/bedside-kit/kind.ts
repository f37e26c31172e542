import { type CareContext, careKind } from '../kind.ts'
import { kitExamples } from './examples.ts'
import { isComplete, kitChecks } from './schema.ts'
import { kitSentence } from './sentence.ts'
import { kitSettings } from './settings.ts'
import { spareWords } from './spares.ts'
import { kitTasks } from './tasks.ts'
import { kitWarnings, standingKitWarnings } from './warnings.ts'

/** The emergency kit at the bedside, held against the tube that is in. */
export const bedsideKit = careKind({
  ...kitChecks,
  title: 'Bedside kit',
  chartWords: 'Chart kit',
  lane: 'Tube',
  chapter: 'At the bed',
  cautions: ['The kit goes wherever the patient goes. The receiving ward has it ready before the handover.'],
  examples: kitExamples,
  summary: kitSentence,
  settings: kitSettings,
  tasks: kitTasks,
  startsWith: facts,
  warnings: kitWarnings,
  standing: standingKitWarnings,
  outOfRange: data => !isComplete(data),
})

/** The spares that the tube in place asks for, and the unit of the gauge as charted last. Whether they lie there is looked at. */
function facts(context: CareContext): Readonly<Record<string, unknown>> {
  const spares = spareWords(context)
  const suctionUnit = context.record.latest(kitChecks, data => data.suctionUnit !== undefined)?.data.suctionUnit
  return { ...(spares ? { spares } : {}), ...(suctionUnit ? { suctionUnit } : {}) }
}

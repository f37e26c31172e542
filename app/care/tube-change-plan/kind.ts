import { type CareContext, careKind } from '../kind.ts'
import { routineFirstChange } from '../tube-change/settings.ts'
import { isFirstTube, tubeInPlace } from '../tube-change/tube.ts'
import { tubePlanExamples } from './examples.ts'
import { planProblems, tractWords } from './gate.ts'
import { openPlan } from './open-plan.ts'
import { tubePlans } from './schema.ts'
import { tubePlanSentence } from './sentence.ts'
import { planWarnings, standingPlanWarnings } from './warnings.ts'

/** A tube change planned: the gate of questions before it, its day, who does it. Charting the change itself ends the plan. */
export const tubeChangePlan = careKind({
  ...tubePlans,
  title: 'Tube change plan',
  chartWords: 'Chart plan',
  lane: 'Tube',
  chapter: 'Tube',
  cautions: [
    'Answer every question before the day. A plan that is early or contraindicated needs a named senior; a change that has happened is charted in any case.',
  ],
  examples: tubePlanExamples,
  summary: tubePlanSentence,
  settings: [routineFirstChange],
  startsWith: start,
  problems: planProblems,
  warnings: planWarnings,
  standing: standingPlanWarnings,
})

/** A plan that stands is gone through again; else what the record knows of opening and tube. */
function start(context: CareContext): Readonly<Record<string, unknown>> {
  const tract = tractWords(context)
  const tube = tubeInPlace(context.record)
  const known = {
    step: 'plan',
    ...(tube && isFirstTube(tube) ? { indication: 'first change' } : {}),
    ...openPlan(context.record)?.entry.data,
    ...(tract ? { tract } : {}),
  }
  return tube ? known : {}
}

import type { CareContext } from '../kind.ts'
import { airflow, airwayOpen, cuffDown, trialPassed } from './airway.ts'
import type { StepCriterion } from './criterion.ts'
import { awake, furtherSigns } from './further-signs.ts'
import { notReady, readinessCriteria, strongCough } from './removal-criteria.ts'
import type { PlannedStep } from './schema.ts'
import { littleAboveCuff, stability } from './stability.ts'

export type WeaningStep = Exclude<PlannedStep, 'none'>

/** Every criterion of a step as the record has it: those that a plan is held against first. */
export function criteriaOf(step: WeaningStep, context: CareContext): readonly StepCriterion[] {
  const all = [...stability(context), ...ofStep[step](context)]
  return [...all.filter(({ isAsked }) => isAsked), ...all.filter(({ isAsked }) => !isAsked)]
}

const ofStep: Readonly<Record<WeaningStep, (context: CareContext) => readonly StepCriterion[]>> = {
  cuff: context => [...littleAboveCuff(context), ...furtherSigns(context)],
  valve: context => [
    ...littleAboveCuff(context),
    airwayOpen(context),
    cuffDown(context),
    airflow(context),
    awake(context),
  ],
  cap: context => [airwayOpen(context), trialPassed('valve', context), cuffDown(context), airflow(context)],
  removal: context => [
    airwayOpen(context),
    trialPassed('cap', context),
    strongCough(context),
    ...readinessCriteria(context),
    cuffDown(context),
  ],
}

/** Criteria of a step that the record shows as not met, or not assessed where it needs them, in short words. */
export function unmetCriteria(step: PlannedStep, context: CareContext): readonly string[] {
  if (step === 'none') return []
  const unmet = criteriaOf(step, context).flatMap(criterion => criterion.unmet ?? [])
  return step === 'removal' ? [...unmet, ...notReady(context)] : unmet
}

import type { CareContext } from '../care/kind.ts'
import { findKind } from '../care/kinds.ts'
import { criteriaOf, type WeaningStep } from '../care/weaning-plan/criteria.ts'
import type { CriterionState, StepCriterion } from '../care/weaning-plan/criterion.ts'
import { weaningPlan } from '../care/weaning-plan/kind.ts'
import { plannedStep } from '../care/weaning-plan/tasks.ts'
import { trialNames } from '../care/weaning-trial/schema.ts'
import { stopWords } from '../care/weaning-trial/trends.ts'
import { lengthOf, type Trial, trialsOf } from '../care/weaning-trial/trials.ts'
import { type TrialVerdict, targetOf, trialVerdict } from '../care/weaning-trial/verdict.ts'
import { isTooYoung } from './due-tasks.ts'
import { type WhyValue, whyValue } from './why.ts'

/** One criterion as a page shows it; moments are milliseconds. */
export interface CriterionView {
  readonly name: string
  readonly label: string
  readonly state: CriterionState
  readonly isAsked: boolean
  readonly value: string
  readonly entry: { readonly id: string; readonly at: number } | null
  /** What charts it. */
  readonly chart: { readonly kind: string; readonly words: string } | null
  readonly rule: string
  readonly source: string
  readonly values: readonly WhyValue[]
}

/** The criteria of a step, with the answer to "why?" of each. */
export function criterionViews(step: WeaningStep, context: CareContext): readonly CriterionView[] {
  return criteriaOf(step, context).map(criterion => criterionView(criterion, context))
}

function criterionView(criterion: StepCriterion, context: CareContext): CriterionView {
  const { name, label, state, isAsked, value = '', entry, chartedBy, rule, source, settings } = criterion
  const kind = chartedBy && findKind(chartedBy.slug)
  return {
    ...{ name, label, state, isAsked, value, rule, source },
    entry: entry ? { id: entry.id, at: entry.performedAt.getTime() } : null,
    chart: kind ? { kind: kind.slug, words: kind.chartWords } : null,
    values: settings.map(setting => whyValue(setting, context)),
  }
}

/** A trial of the past, or one that runs, as it is judged now. */
export interface TrialView {
  readonly entryId: string
  readonly title: string
  readonly startedAt: number
  readonly length: number
  /** Null, like the verdict, where no rule is for this patient. */
  readonly target: number | null
  readonly verdict: TrialVerdict | null
  readonly because: string
  readonly by: string
}

/** Trials of the stay, latest start first. */
export function trialViews(context: CareContext): readonly TrialView[] {
  return trialsOf(context.record).map(trial => trialView(trial, context))
}

function trialView(trial: Trial, context: CareContext): TrialView {
  const isJudged = !isTooYoung(context)
  return {
    entryId: trial.start.id,
    title: trialNames[trial.name],
    startedAt: trial.startedAt.getTime(),
    length: lengthOf(trial, context.now),
    target: isJudged ? targetOf(trial.name, context.values) : null,
    verdict: isJudged || !trial.endedAt ? trialVerdict(trial, context) : null,
    because: trial.endedAt ? stopWords(trial) : '',
    by: trial.start.recordedByName,
  }
}

/** The step that is planned, and not begun. */
export interface PlanView {
  readonly entryId: string
  readonly sentence: string
  readonly by: string
  readonly at: number
}

/** The plan in force, if there is one. */
export function planView({ record }: CareContext): PlanView | null {
  const plan = plannedStep(record)
  if (!plan) return null
  return {
    entryId: plan.id,
    sentence: weaningPlan.summary(plan.data),
    by: plan.recordedByName,
    at: plan.performedAt.getTime(),
  }
}

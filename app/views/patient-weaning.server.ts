import { type CurrentUser, can, canByGrant } from '#app/auth/permissions.ts'
import type { ChartingAct } from '#app/care/kind.ts'
import { weaningPlan } from '#app/care/weaning-plan/kind.ts'
import { plannedSteps } from '#app/care/weaning-plan/schema.ts'
import { weaningTrial } from '#app/care/weaning-trial/kind.ts'
import { dueTasks } from '#app/rules/due-tasks.ts'
import { type RunningView, runningViews } from '#app/rules/running.ts'
import { chartableKinds, type TaskView, taskView } from '#app/rules/views.ts'
import { type WeaningPath, weaningPath } from '#app/rules/weaning-path.ts'
import {
  type CriterionView,
  criterionViews,
  type PlanView,
  planView,
  type TrialView,
  trialViews,
} from '#app/rules/weaning-views.ts'
import { policyWords } from '#app/rules/why.ts'
import type { PatientCare } from './patient-context.server.ts'

/** Where a patient is on the way out of the tube, with the criteria of the next step. Moments are milliseconds. */
export interface PatientWeaning {
  readonly path: WeaningPath
  readonly next: { readonly title: string; readonly criteria: readonly CriterionView[] } | null
  readonly running: readonly RunningView[]
  /** What the patient is looked at by while something runs. */
  readonly tasks: readonly TaskView[]
  readonly trials: readonly TrialView[]
  readonly plan: PlanView | null
  readonly cautions: readonly string[]
  readonly policy: string
  readonly now: number
  readonly zone: string
}

/** The page of one patient; null where no policy was reviewed. What runs or is planned ends with a discharge. */
export function patientWeaning({ context, nothingDue }: PatientCare): PatientWeaning | null {
  if (!context) return null
  const { now, ward, values } = context
  const isHere = nothingDue === null
  const path = weaningPath(context)
  const running = isHere ? runningViews(context, [weaningTrial]) : []
  const watched = new Set(running.map(({ watchedBy }) => watchedBy))
  return {
    path,
    next: path.next && { title: plannedSteps[path.next], criteria: criterionViews(path.next, context) },
    running,
    tasks: dueTasks(context)
      .filter(({ rule }) => watched.has(rule.name))
      .map(taskView),
    trials: trialViews(context),
    plan: isHere ? planView(context) : null,
    cautions: weaningPlan.cautions ?? [],
    policy: policyWords(values.policy),
    now: now.getTime(),
    zone: ward.zone,
  }
}

/** The kinds that this person may chart for a patient who is here, by their slugs. */
export function chartedHere(
  user: CurrentUser,
  opened: { readonly wardId: string; readonly via: 'ward' | 'grant' },
  discharged: Date | null,
): readonly string[] {
  if (discharged !== null) return []
  const may = (act: ChartingAct) => (opened.via === 'ward' ? can(user, act, opened.wardId) : canByGrant(user, act))
  return chartableKinds(may).flatMap(({ kinds }) => kinds.map(({ slug }) => slug))
}

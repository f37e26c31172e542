import { type Clock, dayClock, noClock } from '../clock.ts'
import { decannulations } from '../decannulation/schema.ts'
import type { CareContext, Entry, PatientRecord, TaskRule } from '../kind.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { weaningTrials } from '../weaning-trial/schema.ts'
import { plannedSteps, type WeaningPlanData, weaningPlans } from './schema.ts'

/** The planned step that stands: neither taken back, nor begun since, nor overtaken by a later plan. */
export function plannedStep(record: PatientRecord): Entry<WeaningPlanData> | undefined {
  const plan = record.latest(weaningPlans)
  if (!plan || plan.data.step === 'none' || !tubeInPlace(record)) return undefined
  const { step } = plan.data
  const isDone =
    step === 'removal'
      ? record.since(decannulations, plan.performedAt).length > 0
      : record.since(weaningTrials, plan.performedAt).some(({ data }) => data.step !== 'end' && data.trial === step)
  return isDone ? undefined : plan
}

function plannedClock({ record, ward, values }: CareContext, isOf: (step: WeaningPlanData['step']) => boolean): Clock {
  const plan = plannedStep(record)
  if (!plan?.data.plannedOn || !isOf(plan.data.step)) return noClock
  const because = `${plannedSteps[plan.data.step].toLowerCase()}, agreed with ${plan.data.agreedWith ?? 'the team'}`
  return dayClock({ values, dueOn: plan.data.plannedOn, soonDays: 1, ward, last: plan, because })
}

/** A trial on the day for which it was planned. Charted as a trial, which lists it among its tasks. */
export const plannedTrial: TaskRule = {
  name: 'planned-trial',
  airway: false,
  settings: [],
  opensWith: { step: 'start' },
  says: () => 'On the day that the team planned it for. It is done when the trial has started.',
  clock: context => plannedClock(context, step => step !== 'removal'),
}

/** The removal of the tube on the day for which it was planned. */
export const plannedRemoval: TaskRule = {
  name: 'planned-removal',
  airway: false,
  settings: [],
  says: () => 'On the day that the team planned it for. Two staff, and the whole kit at the bedside.',
  clock: context => plannedClock(context, step => step === 'removal'),
}

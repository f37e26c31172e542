import { type Duration, hours } from '../../time/duration.ts'
import type { CareContext } from '../kind.ts'
import type { Setting, Values } from '../policy.ts'
import type { StopReason, TrialName } from './schema.ts'
import { capTrialTarget, cuffTrialTarget, valveTrialTarget } from './settings.ts'
import { lengthOf, type Trial, trialsOf } from './trials.ts'

const targets: Readonly<Record<TrialName, Setting<number>>> = {
  cuff: cuffTrialTarget,
  valve: valveTrialTarget,
  cap: capTrialTarget,
}

/** The number that a trial is held against. */
export function trialSetting(name: TrialName): Setting<number> {
  return targets[name]
}

/** How long a trial has to be borne to be passed, by policy or care plan. */
export function targetOf(name: TrialName, values: Values): Duration {
  return hours(values.of(targets[name]))
}

export type TrialVerdict = 'running' | 'passed' | 'stopped early' | 'failed'

const signs: readonly StopReason[] = [
  'rate',
  'saturation',
  'heart rate',
  'distress',
  'wet voice',
  'stridor',
  'no voice',
]
const wishes: readonly StopReason[] = ['tired', 'asked']

/**
 * Failed when a sign stopped it, at any length, or when the patient could not go on before the target; passed at the target; else
 * stopped early, which tells nothing either way.
 */
export function trialVerdict(trial: Trial, { values, now }: Pick<CareContext, 'values' | 'now'>): TrialVerdict {
  if (!trial.endedAt) return 'running'
  const reasons = trial.end?.data.reasons ?? []
  const isLong = lengthOf(trial, now) >= targetOf(trial.name, values)
  if (reasons.some(reason => signs.includes(reason))) return 'failed'
  if (isLong) return 'passed'
  return reasons.some(reason => wishes.includes(reason)) ? 'failed' : 'stopped early'
}

/** The latest trial of a sort that was passed and not failed again since. */
export function passedTrial(name: TrialName, context: CareContext): Trial | undefined {
  const done = trialsOf(context.record).filter(trial => trial.name === name)
  const last = done.find(trial => ['passed', 'failed'].includes(trialVerdict(trial, context)))
  return last && trialVerdict(last, context) === 'passed' ? last : undefined
}

import type { CareContext } from '../kind.ts'
import { LOCAL_PLAN, type Warning } from '../warning.ts'
import type { TrialName } from './schema.ts'
import { stopHeartRise, stopRateAbove, stopRateRise, stopSpo2Fall } from './settings.ts'
import { runningTrials, type Trial } from './trials.ts'

/** What is measured while a trial runs. */
export interface Seen {
  readonly respiratoryRate: number
  readonly spo2: number
  readonly heartRate?: number | undefined
  readonly effort: 'easy' | 'increased' | 'distress' | 'none'
}

/** Signs that a trial is not borne, in words, against the patient's own values before it and the prescribed target. */
export function stopSigns(trial: Trial, seen: Seen, { record, values }: CareContext): readonly string[] {
  const before = trial.start.data
  const { spo2Low } = record.patient
  const hasRisen = (from: number | undefined, to: number | undefined, percent: number) =>
    from !== undefined && to !== undefined && to >= from * (1 + percent / 100)
  const { respiratoryRate: rate, heartRate: heart, spo2, effort } = seen
  const rateRose = hasRisen(before.respiratoryRate, rate, values.of(stopRateRise))
  const fell = before.spo2 !== undefined && before.spo2 - spo2 >= values.of(stopSpo2Fall)
  const low = spo2Low !== null && spo2 < spo2Low
  return [
    ...(rate > values.of(stopRateAbove) || rateRose
      ? [`respiratory rate ${rate}${fromWords(before.respiratoryRate)}`]
      : []),
    ...(fell || low ? [`SpO2 ${spo2}%${fromWords(before.spo2)}`] : []),
    ...(hasRisen(before.heartRate, heart, values.of(stopHeartRise))
      ? [`heart rate ${heart}${fromWords(before.heartRate)}`]
      : []),
    ...(effort === 'distress' || effort === 'none' ? ['distress'] : []),
  ]
}

const fromWords = (before: number | undefined): string => (before === undefined ? '' : ` (before: ${before})`)

const actions: Readonly<Record<TrialName, string>> = {
  cap: `Take the cap off now. Check the patient, then call for help. ${LOCAL_PLAN}`,
  valve: 'Take the valve off now, check the patient, and chart the trial as stopped.',
  cuff: 'Stop the trial now: suction mouth and above the cuff, inflate the cuff, and check the patient.',
}

/** What a set of observations says of the trials that run: red with a cap, which leaves no other way to breathe. */
export function stopWarnings(seen: Seen, context: CareContext): readonly Warning[] {
  return runningTrials(context.record).flatMap(trial => {
    const found = stopSigns(trial, seen, context)
    if (found.length === 0) return []
    return [
      {
        name: `trial-stop-${trial.name}`,
        level: trial.name === 'cap' ? 'red' : 'amber',
        action: actions[trial.name],
        cause: `A stop limit of the trial is reached: ${found.join(', ')}.`,
        source: `${stopRateAbove.source.says}; BTS 2017 for SpO2; Royal Marsden Manual: a cap comes off at once`,
      } satisfies Warning,
    ]
  })
}

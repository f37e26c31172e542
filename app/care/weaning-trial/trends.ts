import type { CareContext } from '../kind.ts'
import type { LengthEnd, LengthsTrend, RecordInTime, TrendLength } from '../trend.ts'
import { stopReasons, trialNames } from './schema.ts'
import { lower } from './sentence.ts'
import { type Trial, trialsOf } from './trials.ts'
import { type TrialVerdict, targetOf, trialVerdict } from './verdict.ts'

/** Every trial by its sort: how long it was borne, and how it ended. */
export const trialTrends: readonly LengthsTrend[] = [
  {
    shape: 'lengths',
    name: 'weaning-trials',
    title: 'Weaning trials',
    says: 'How long each was borne, against the target of its time.',
    groups: trialNames,
    lengths: given => trialsOf(given.record).map(trial => lengthOf(trial, given)),
  },
]

const ends: Readonly<Record<TrialVerdict, LengthEnd>> = {
  running: 'running',
  passed: 'reached',
  failed: 'failed',
  'stopped early': 'short',
}

function lengthOf(trial: Trial, { at, now }: RecordInTime): TrendLength {
  const { name, start, startedAt, endedAt } = trial
  const then: CareContext = { ...at(endedAt ?? now), now }
  const verdict = trialVerdict(trial, then)
  return {
    group: name,
    entryId: start.id,
    startedAt,
    ...(endedAt ? { endedAt } : {}),
    target: targetOf(name, then.values),
    end: ends[verdict],
    verdict: capital(verdict),
    ...(endedAt ? { because: stopWords(trial) } : {}),
  }
}

/** Why a trial that has ended did so, in words. */
export function stopWords({ end }: Trial): string {
  if (!end) return 'The tube was changed or came out'
  const reasons = end.data.reasons ?? []
  return reasons.length === 0
    ? 'No reason given'
    : capital(reasons.map(reason => lower(stopReasons[reason])).join(', '))
}

const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)

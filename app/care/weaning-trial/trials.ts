import { type Duration, since } from '../../time/duration.ts'
import { adverseEvents, leavesTubeOut } from '../adverse-event/schema.ts'
import { decannulations } from '../decannulation/schema.ts'
import type { Entry, PatientRecord } from '../kind.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { type TrialName, type WeaningTrialData, weaningTrials } from './schema.ts'

export type TrialEntry = Entry<WeaningTrialData>

/** A whole trial: its start, and its end once it has one. A change or removal of the tube ends it too. */
export interface Trial {
  readonly name: TrialName
  readonly start: TrialEntry
  readonly startedAt: Date
  /** The entry that stopped it; absent while it runs, and where it ended with the tube. */
  readonly end?: TrialEntry
  readonly endedAt?: Date
}

/**
 * Every trial of the stay, latest start first. A start of one that runs already is the same trial; an end that nothing
 * had started is none.
 */
export function trialsOf(record: PatientRecord): readonly Trial[] {
  const open = new Map<TrialName, TrialEntry>()
  const trials: Trial[] = []
  const close = (start: TrialEntry, more: Pick<Trial, 'end' | 'endedAt'>) => {
    trials.push({ name: start.data.trial, start, startedAt: start.performedAt, ...more })
    open.delete(start.data.trial)
  }
  for (const entry of record.of(weaningTrials).toReversed()) {
    for (const start of [...open.values()]) {
      const tubeAt = tubeEndsAt(start, record)
      if (tubeAt && tubeAt <= entry.performedAt) close(start, { endedAt: tubeAt })
    }
    const start = open.get(entry.data.trial)
    if (entry.data.step !== 'end') open.set(entry.data.trial, start ?? entry)
    else if (start) close(start, { end: entry, endedAt: entry.performedAt })
  }
  for (const start of [...open.values()]) {
    const tubeAt = tubeEndsAt(start, record)
    close(start, tubeAt ? { endedAt: tubeAt } : {})
  }
  return trials.toSorted((a, b) => b.startedAt.getTime() - a.startedAt.getTime())
}

/** When the tube that a trial began with was changed, taken out for good, or came out. */
function tubeEndsAt({ performedAt: from }: TrialEntry, record: PatientRecord): Date | undefined {
  const isLater = ({ performedAt }: Entry) => performedAt > from
  const ends = [
    ...record.since(tubeChanges, from).filter(change => isLater(change) && change.data.difficulty !== 'failed'),
    ...record.since(decannulations, from).filter(isLater),
    ...record.since(adverseEvents, from).filter(event => isLater(event) && leavesTubeOut(event.data)),
  ].map(({ performedAt }) => performedAt.getTime())
  return ends.length === 0 ? undefined : new Date(Math.min(...ends))
}

/** Trials that run now, latest start first. */
export function runningTrials(record: PatientRecord): readonly Trial[] {
  return trialsOf(record).filter(({ endedAt }) => endedAt === undefined)
}

/** How long a trial lasted, or has lasted by `now`. */
export function lengthOf({ startedAt, endedAt }: Trial, now: Date): Duration {
  return since(startedAt, endedAt ?? now)
}

/** What closes the tube now, as far as trials tell: a cap, else a valve. */
export function onTheHub(record: PatientRecord): 'valve' | 'cap' | undefined {
  const running = runningTrials(record).map(({ name }) => name)
  return running.includes('cap') ? 'cap' : running.includes('valve') ? 'valve' : undefined
}

import type { AnyCharted, DataOf, Entry, PatientRecord } from '../care/kind.ts'
import { recordAsking } from '../care/record.ts'

/** A record that can be asked as it was at any moment, and that notes which kinds it was asked for. */
export interface RecordOverTime {
  /** What had been done by then. The same object answers for every moment: ask it before the next one. */
  at(moment: Date): PatientRecord
  /** Begins to note anew which kinds are asked for. */
  forget(): void
  /** The first moment after this one (ms) at which the patient was moved, or an entry of a kind that was asked for was performed; else Infinity. */
  nextChange(after: number): number
}

/** One record over time. It reads each kind once: asking for a moment is a search, and entries are copied only when one came. */
export function recordOverTime(record: PatientRecord): RecordOverTime {
  const timelines = new Map<string, Timeline>()
  let asked = new Set<string>()
  let moment = 0

  function of<K extends AnyCharted>(kind: K): readonly Entry<DataOf<K>>[] {
    asked.add(kind.slug)
    const known = timelines.get(kind.slug)
    const timeline = known ?? timelineOf(record.of(kind))
    if (!known) timelines.set(kind.slug, timeline)
    return timeline.until(moment) as readonly Entry<DataOf<K>>[]
  }

  const moveTimes = record.moves.map(move => move.at.getTime())
  const view: PatientRecord = {
    ...recordAsking(record, of),
    get moves() {
      return record.moves.slice(0, countUntil(moveTimes, moment))
    },
  }
  return {
    at(at) {
      moment = at.getTime()
      return view
    },
    forget() {
      asked = new Set()
    },
    nextChange(after) {
      const entries = [...asked].map(slug => timelines.get(slug)?.firstAfter(after) ?? Number.POSITIVE_INFINITY)
      return Math.min(...entries, firstAfter(moveTimes, after))
    },
  }
}

/** The entries of one kind, to be asked for up to a moment (ms). */
interface Timeline {
  until(moment: number): readonly Entry[]
  firstAfter(moment: number): number
}

function timelineOf(latestFirst: readonly Entry[]): Timeline {
  const times = latestFirst.map(entry => entry.performedAt.getTime()).toReversed()
  // Every task asks for the same moments: what was cut for one is there for the next.
  const cuts: (readonly Entry[])[] = []
  return {
    until(moment) {
      const count = countUntil(times, moment)
      cuts[count] ??= latestFirst.slice(latestFirst.length - count)
      return cuts[count]
    },
    firstAfter: moment => firstAfter(times, moment),
  }
}

function firstAfter(times: readonly number[], moment: number): number {
  return times[countUntil(times, moment)] ?? Number.POSITIVE_INFINITY
}

/** How many of these ascending times are at or before a moment. */
export function countUntil(times: readonly number[], moment: number): number {
  let [from, to] = [0, times.length]
  while (from < to) {
    const middle = (from + to) >> 1
    if ((times[middle] ?? 0) <= moment) from = middle + 1
    else to = middle
  }
  return from
}

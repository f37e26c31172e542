import type { AnyCharted, DataOf, Entry, PatientRecord } from '../care/kind.ts'

/** A record that can be asked as it was at any moment, and that notes which kinds it was asked for. */
export interface RecordOverTime {
  /** What had been done by then. The same object answers for every moment: ask it before the next one. */
  at(moment: Date): PatientRecord
  /** Begins to note anew which kinds are asked for. */
  forget(): void
  /** The first moment after this one (ms) at which an entry of a kind that was asked for was performed; Infinity when none was. */
  nextChange(after: number): number
}

/** One record over time. It reads each kind once: asking for a moment is a search, not a filter. */
export function recordOverTime(record: PatientRecord): RecordOverTime {
  const times = new Map<string, readonly number[]>()
  const slices = new Map<string, { readonly count: number; readonly entries: readonly Entry[] }>()
  let asked = new Set<string>()
  let moment = 0

  function timesOf(kind: AnyCharted): readonly number[] {
    const known = times.get(kind.slug)
    if (known) return known
    const ascending = record.of(kind).map(entry => entry.performedAt.getTime())
    ascending.reverse()
    times.set(kind.slug, ascending)
    return ascending
  }

  function of<K extends AnyCharted>(kind: K): readonly Entry<DataOf<K>>[] {
    asked.add(kind.slug)
    const count = countUntil(timesOf(kind), moment)
    const known = slices.get(kind.slug)
    if (known?.count === count) return known.entries as readonly Entry<DataOf<K>>[]
    const all = record.of(kind)
    const entries = all.slice(all.length - count)
    slices.set(kind.slug, { count, entries })
    return entries
  }

  const view: PatientRecord = {
    admittedAt: record.admittedAt,
    patient: record.patient,
    of,
    latest: (kind, where) => (where ? of(kind).find(entry => where(entry.data, entry)) : of(kind)[0]),
    since: (kind, from) => {
      const entries = of(kind)
      const end = entries.findIndex(entry => entry.performedAt < from)
      return end === -1 ? entries : entries.slice(0, end)
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
      let next = Number.POSITIVE_INFINITY
      for (const slug of asked) {
        const known = times.get(slug) ?? []
        next = Math.min(next, known[countUntil(known, after)] ?? next)
      }
      return next
    },
  }
}

/** How many of these ascending times are at or before a moment. */
function countUntil(times: readonly number[], moment: number): number {
  let [from, to] = [0, times.length]
  while (from < to) {
    const middle = (from + to) >> 1
    if ((times[middle] ?? 0) <= moment) from = middle + 1
    else to = middle
  }
  return from
}

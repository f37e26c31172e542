import type { AnyCharted, BedMove, DataOf, Entry, PatientFacts, PatientRecord, StoredEntry } from './kind.ts'
import { readPayload } from './payload.ts'

/**
 * The entries that count: superseded ones and retractions are left out. Order of input is irrelevant.
 * A chain of corrections counts once, as its last link.
 */
export function effectiveEntries(entries: readonly StoredEntry[]): readonly StoredEntry[] {
  const superseded = new Set<string>()
  for (const entry of entries) if (entry.supersedesId) superseded.add(entry.supersedesId)
  const seen = new Set<string>()
  return entries.filter(entry => {
    if (entry.status === 'retracted' || superseded.has(entry.id) || seen.has(entry.id)) return false
    seen.add(entry.id)
    return true
  })
}

/** What was known at a moment: entries recorded up to then. With it, what was due then can be computed again. */
export function knownAt(entries: readonly StoredEntry[], at: Date): readonly StoredEntry[] {
  return entries.filter(entry => entry.recordedAt <= at)
}

/** Latest performed first; equal times by id, so that the order is total. */
export function latestFirst(a: StoredEntry, b: StoredEntry): number {
  return b.performedAt.getTime() - a.performedAt.getTime() || (a.id < b.id ? 1 : a.id > b.id ? -1 : 0)
}

const NOTHING: readonly never[] = []

/**
 * One patient's record from stored entries of a stay, in any order.
 * Payloads are read when first asked for; one that cannot be read takes no part in rules (the timeline shows it as such).
 */
export function patientRecord(
  stored: readonly StoredEntry[],
  about: { readonly admittedAt: Date; readonly moves?: readonly BedMove[]; readonly patient: PatientFacts },
): PatientRecord {
  const byKind = groupedByKind(effectiveEntries(stored))
  const read = new Map<string, readonly Entry[]>()

  function of<K extends AnyCharted>(kind: K): readonly Entry<DataOf<K>>[] {
    const known = read.get(kind.slug)
    if (known) return known as readonly Entry<DataOf<K>>[]
    const entries = (byKind.get(kind.slug) ?? NOTHING).toSorted(latestFirst).flatMap(entry => readEntry(kind, entry))
    read.set(kind.slug, entries)
    return entries
  }

  return recordAsking({ moves: [], ...about }, of)
}

/** A record whose questions all come down to one: the entries of a kind, latest performed first. */
export function recordAsking(
  { admittedAt, moves, patient }: Pick<PatientRecord, 'admittedAt' | 'moves' | 'patient'>,
  of: PatientRecord['of'],
): PatientRecord {
  return {
    admittedAt,
    moves,
    patient,
    of,
    latest: (kind, where) => (where ? of(kind).find(entry => where(entry.data, entry)) : of(kind)[0]),
    since: (kind, from) => {
      const entries = of(kind)
      const end = entries.findIndex(entry => entry.performedAt < from)
      return end === -1 ? entries : entries.slice(0, end)
    },
  }
}

function groupedByKind(entries: readonly StoredEntry[]): ReadonlyMap<string, readonly StoredEntry[]> {
  const groups = new Map<string, StoredEntry[]>()
  for (const entry of entries) {
    const group = groups.get(entry.kind)
    if (group) group.push(entry)
    else groups.set(entry.kind, [entry])
  }
  return groups
}

/**
 * The record as it was at an act that is on it: what had been done by then, without the act itself. An older act is judged by the
 * tube and the cuff of its own time.
 */
export function recordBefore(record: PatientRecord, act: Pick<Entry, 'id' | 'performedAt'>): PatientRecord {
  return recordWhere(record, act.performedAt, entry => entry.id !== act.id)
}

/** The record as it was at a moment: what had been done by then, that moment included. */
export function recordUpTo(record: PatientRecord, at: Date): PatientRecord {
  return recordWhere(record, at, () => true)
}

function recordWhere(record: PatientRecord, at: Date, counts: (entry: Entry) => boolean): PatientRecord {
  const holds = (entry: Entry) => entry.performedAt <= at && counts(entry)
  const held = new Map<string, readonly Entry[]>()
  function of<K extends AnyCharted>(kind: K): readonly Entry<DataOf<K>>[] {
    const known = held.get(kind.slug) ?? record.of(kind).filter(holds)
    held.set(kind.slug, known)
    return known as readonly Entry<DataOf<K>>[]
  }
  return {
    admittedAt: record.admittedAt,
    moves: record.moves.filter(move => move.at <= at),
    patient: record.patient,
    of,
    latest: (kind, where) =>
      record.latest(kind, (data, entry) => holds(entry) && (where === undefined || where(data, entry))),
    since: (kind, from) => record.since(kind, from).filter(holds),
  }
}

const readings = new WeakMap<StoredEntry, readonly Entry[]>()

/** The entry with its payload read, or nothing. Kept per stored entry: entries never change. */
export function readEntry<K extends AnyCharted>(kind: K, stored: StoredEntry): readonly Entry<DataOf<K>>[] {
  const known = readings.get(stored)
  if (known) return known as readonly Entry<DataOf<K>>[]
  const { version, raw, ...spine } = stored
  const payload = readPayload(kind, version, raw)
  const entry: readonly Entry[] = payload.ok ? [{ ...spine, data: payload.data }] : NOTHING
  readings.set(stored, entry)
  return entry as readonly Entry<DataOf<K>>[]
}

import type { StoredEntry } from '#app/care/kind.ts'

/**
 * What this process keeps in memory: at most this many entries, about 0.7 kB each (measured), so some 140 MB.
 * A ward of 40 with two weeks of charting has about 30,000; one of 40 with 2,500 each has 100,000.
 */
const MOST_ENTRIES = 200_000

/** One for all: where nothing was charted, the array stays the same too. */
const NOTHING: readonly StoredEntry[] = []

const kept = new Map<string, readonly StoredEntry[]>()
let count = 0

/** The entries of a stay that this process knows, from number 1 without a gap. They never change; there may be more. */
export function knownEntries(stayId: string): readonly StoredEntry[] {
  const entries = kept.get(stayId)
  if (entries) keep(stayId, entries)
  return entries ?? NOTHING
}

/**
 * Adds what was read to what was known when the reading began, or to what another reading has learnt meanwhile, and returns
 * it all: the same array when nothing is new, so that the array itself tells whether something was charted. An entry that
 * does not follow the last one is not taken.
 */
export function learn(
  stayId: string,
  before: readonly StoredEntry[],
  read: readonly StoredEntry[],
): readonly StoredEntry[] {
  const meanwhile = kept.get(stayId) ?? NOTHING
  const known = meanwhile.length >= before.length ? meanwhile : before
  const fresh: StoredEntry[] = []
  for (const entry of read) if (entry.number === known.length + fresh.length + 1) fresh.push(entry)
  const entries = fresh.length > 0 ? [...known, ...fresh] : known
  keep(stayId, entries)
  return entries
}

/** Puts a stay last in the order of use, and forgets those unused for longest when there are too many entries. */
function keep(stayId: string, entries: readonly StoredEntry[]) {
  count += entries.length - (kept.get(stayId)?.length ?? 0)
  kept.delete(stayId)
  kept.set(stayId, entries)
  for (const [oldestId, oldest] of kept) {
    if (count <= MOST_ENTRIES) return
    kept.delete(oldestId)
    count -= oldest.length
  }
}

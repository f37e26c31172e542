import type { StoredEntry } from '#app/care/kind.ts'
import { knownEntries, learn } from './entry-cache.server.ts'
import type { Stay } from './stay-rows.server.ts'
import { storedEntries } from './stored-entries.server.ts'

type Counted = Pick<Stay, 'id' | 'entryCount'>
type EntriesByStay = ReadonlyMap<string, readonly StoredEntry[]>

/** Entries in one query: more would hold up everybody else while they are parsed. */
const AT_ONCE = 5000

/** Readings under way by stay, so that many boards opened at once read a ward once. */
const underWay = new Map<string, Promise<EntriesByStay>>()

/**
 * All entries of these stays, at least as far as their counts, by stay.
 *
 * What a process has in memory is only a copy of rows that never change, so several processes agree. An entry gets its
 * number under the lock of its stay's row, and that lock is held until the commit: whoever sees number n sees every number
 * before it, and only what follows the last known number has to be read. A gap, as a replica that lags might show, is not
 * passed.
 */
export async function entriesOfStays(stays: readonly Counted[]): Promise<EntriesByStay> {
  const found = new Map(stays.map(stay => [stay.id, knownEntries(stay.id)]))
  const short = () => stays.filter(stay => (found.get(stay.id)?.length ?? 0) < stay.entryCount)
  const others = new Set(short().flatMap(({ id }) => underWay.get(id) ?? []))
  const own = readTogether(short().filter(({ id }) => !underWay.has(id)))
  for (const read of await Promise.all([...others, own])) {
    for (const { id } of stays) found.set(id, read.get(id) ?? found.get(id) ?? knownEntries(id))
  }
  // A reading of others may have begun before these counts were read, and end short of them.
  const rest = short()
  if (rest.length > 0) for (const [id, entries] of await read(rest)) found.set(id, entries)
  return found
}

async function readTogether(stays: readonly Counted[]): Promise<EntriesByStay> {
  const reading = read(stays)
  for (const { id } of stays) underWay.set(id, reading)
  try {
    return await reading
  } finally {
    for (const { id } of stays) underWay.delete(id)
  }
}

async function read(stays: readonly Counted[]): Promise<EntriesByStay> {
  const found = new Map<string, readonly StoredEntry[]>()
  for (const portion of portionsOf(stays)) {
    const known = new Map(portion.map(({ id }) => [id, knownEntries(id)]))
    const fresh = await entriesAfter(known)
    for (const [id, before] of known) found.set(id, learn(id, before, fresh.get(id) ?? []))
  }
  return found
}

function portionsOf(stays: readonly Counted[]): readonly (readonly Counted[])[] {
  const portions: Counted[][] = []
  let room = 0
  for (const stay of stays) {
    const missing = stay.entryCount - knownEntries(stay.id).length
    if (missing > room) {
      portions.push([])
      room = AT_ONCE
    }
    portions.at(-1)?.push(stay)
    room -= missing
  }
  return portions
}

/** What follows the entries that are known, in one query. */
async function entriesAfter(known: EntriesByStay): Promise<EntriesByStay> {
  const last = [...known].map(([id, entries]) => ({ id, number: entries.length }))
  const conditions = last.map((_, i) => `(e.stay_id = :id${i} AND e.number > :number${i})`)
  const replacements = Object.fromEntries(
    last.flatMap(({ id, number }, i) => [
      [`id${i}`, id],
      [`number${i}`, number],
    ]),
  )
  const fresh = new Map<string, StoredEntry[]>(last.map(({ id }) => [id, []]))
  const entries = await storedEntries(`WHERE ${conditions.join(' OR ')} ORDER BY e.stay_id, e.number`, replacements)
  for (const entry of entries) fresh.get(entry.stayId)?.push(entry)
  return fresh
}

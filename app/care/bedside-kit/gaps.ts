import type { Entry, PatientRecord } from '../kind.ts'
import { isComplete, type KitData, kitChecks } from './schema.ts'

export type KitEntry = Entry<KitData>

/** The latest check at which everything lay there. */
export function lastComplete(record: PatientRecord): KitEntry | undefined {
  return record.latest(kitChecks, isComplete)
}

/** The checks since then at which something was missing, latest first: the last of them says since when. */
export function gapsSince(record: PatientRecord, done: KitEntry | undefined): readonly KitEntry[] {
  const checks = record.of(kitChecks)
  const end = done ? checks.indexOf(done) : -1
  return end === -1 ? checks : checks.slice(0, end)
}

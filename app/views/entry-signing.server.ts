import type { StoredEntry } from '#app/care/kind.ts'
import { isUnderSupervision } from '#app/care/supervision.ts'
import { type SignatureFact, secondPersonWords } from '#app/rules/signature-words.ts'
import { showDateTime } from '#app/time/display.ts'
import type { Zone } from '#app/time/zone.ts'
import { countersignaturesOf } from '#database/countersignatures.server.ts'
import { signaturesOf } from '#database/entry-signatures.server.ts'

/** How entries are signed and countersigned, in words. */
export interface EntrySigning {
  signatures(entry: StoredEntry): readonly SignatureFact[]
  /** Null for what was not charted under supervision, or is a retraction. */
  countersign(entry: StoredEntry, zone: Zone): { readonly says: string; readonly waits: boolean } | null
  second(entry: StoredEntry): string | null
}

/** Reads what was signed beside these entries, in two queries at most. */
export async function signingOf(entries: readonly StoredEntry[]): Promise<EntrySigning> {
  const supervised = entries.filter(({ recordedRole }) => isUnderSupervision(recordedRole))
  const [signatures, countersignatures] = await Promise.all([
    signaturesOf(entries.map(({ id }) => id)),
    countersignaturesOf(supervised.map(({ id }) => id)),
  ])
  const of = ({ id }: StoredEntry) => signatures.get(id) ?? []
  return {
    signatures: of,
    second: entry => secondPersonWords(entry, of(entry)),
    countersign: (entry, zone) => {
      if (entry.status === 'retracted' || !isUnderSupervision(entry.recordedRole)) return null
      const given = countersignatures.get(entry.id)
      if (!given) return { says: 'To be countersigned', waits: true }
      return { says: `Countersigned by ${given.by}, ${given.role}, on ${showDateTime(given.at, zone)}.`, waits: false }
    },
  }
}

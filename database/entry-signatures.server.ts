import type { CompetenceStanding } from '#app/care/skills.ts'
import type { Alongside } from './entries.server.ts'
import { change, select } from './sequelize.server.ts'

/** How somebody showed that it was them. `session`: nothing was asked for. `not given`: it was, and they charted without. */
export type Proof = 'password' | 'recent sign-in' | 'session' | 'not given'

/** A signature that is written with an entry. That of the second person exists only if they gave their own password. */
export interface Signature {
  readonly part: 'author' | 'second person'
  readonly userId: string
  /** At that moment. */
  readonly role: string
  readonly proof: Proof
  /** How the author stood in the skill that the act asks for, when it was charted. */
  readonly competence: CompetenceStanding | null
}

/** Writes signatures in the transaction of the entry they belong to; undefined when there is none to write. */
export function withSignatures(entryId: string, signatures: readonly Signature[]): Alongside | undefined {
  if (signatures.length === 0) return undefined
  return async transaction => {
    for (const signature of signatures) {
      await change(
        `INSERT INTO entry_signatures (entry_id, part, user_id, role, proof, competence)
         VALUES (:entryId, :part, :userId, :role, :proof, :competence)`,
        { entryId, ...signature },
        transaction,
      )
    }
  }
}

/** The signatures of entries, by entry; one query. */
export async function signaturesOf(entryIds: readonly string[]): Promise<ReadonlyMap<string, readonly Signature[]>> {
  if (entryIds.length === 0) return new Map()
  const rows = await select<Signature & { entryId: string }>(
    `SELECT entry_id AS entryId, part, user_id AS userId, role, proof, competence FROM entry_signatures
     WHERE entry_id IN (:entryIds) ORDER BY entry_id, part`,
    { entryIds },
  )
  return grouped(rows)
}

function grouped(rows: readonly (Signature & { readonly entryId: string })[]) {
  const byEntry = new Map<string, Signature[]>()
  for (const { entryId, ...signature } of rows) byEntry.set(entryId, [...(byEntry.get(entryId) ?? []), signature])
  return byEntry
}

import { select } from './sequelize.server.ts'

/** What a check of all signatures found: how many there are, and those that are not as they were written. */
export type SignaturesVerdict = {
  readonly signatures: number
  readonly faults: readonly { readonly entryId: string; readonly part: string }[]
}

/** Computes the hash of every signature again, from its entry: the same words as in the triggers of both tables. */
export async function verifySignatures(): Promise<SignaturesVerdict> {
  const [counted] = await select<{ signatures: number }>(
    'SELECT (SELECT COUNT(*) FROM entry_signatures) + (SELECT COUNT(*) FROM countersignatures) AS signatures',
  )
  const faults = await select<{ entryId: string; part: string }>(
    `SELECT s.entry_id AS entryId, s.part FROM entry_signatures s JOIN entries e ON e.id = s.entry_id
     WHERE BINARY s.hash <> SHA2(CONCAT_WS('\\n', e.hash, s.entry_id, s.part, s.user_id, s.role, s.proof,
       COALESCE(s.competence, '-'), s.signed_at), 256)
     UNION ALL SELECT c.entry_id, 'countersignature' FROM countersignatures c JOIN entries e ON e.id = c.entry_id
     WHERE BINARY c.hash <> SHA2(CONCAT_WS('\\n', e.hash, c.entry_id, c.signed_by, c.signed_role, c.signed_at), 256)
     LIMIT 1000`,
  )
  return { signatures: counted?.signatures ?? 0, faults }
}

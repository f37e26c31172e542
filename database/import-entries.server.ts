import type { AnyCharted, DataOf } from '#app/care/kind.ts'
import { versionOf } from '#app/care/payload.ts'
import type { Author } from './entries.server.ts'
import { change, transact } from './sequelize.server.ts'

/** An act that was charted elsewhere or is invented, with the moment at which it was written down. */
export interface ImportedEntry<K extends AnyCharted = AnyCharted> {
  readonly id: string
  readonly kind: K
  readonly stayId: string
  readonly performedAt: Date
  readonly recordedAt: Date
  readonly recordedBy: Author
  readonly data: DataOf<K>
  readonly supersedesId?: string
  readonly reason?: string
}

const AT_ONCE = 500

/** Adds many entries in one transaction, in this order: demonstration data, or a chart that comes over from another place. */
export async function importEntries(entries: readonly ImportedEntry[]): Promise<void> {
  await transact(async transaction => {
    for (let start = 0; start < entries.length; start += AT_ONCE) {
      const rows = entries.slice(start, start + AT_ONCE).map(columnsOf)
      await change(
        `INSERT INTO entries (id, stay_id, kind, version, performed_at, recorded_at, recorded_by, recorded_role,
           supersedes_id, reason, data) VALUES :rows`,
        { rows },
        transaction,
      )
    }
  })
}

function columnsOf(entry: ImportedEntry) {
  const { id, kind, stayId, performedAt, recordedAt, recordedBy, supersedesId = null, reason = null } = entry
  const data = JSON.stringify(kind.schema.parse(entry.data))
  const written = [performedAt, recordedAt, recordedBy.id, recordedBy.role]
  return [id, stayId, kind.slug, versionOf(kind), ...written, supersedesId, reason, data]
}

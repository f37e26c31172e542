import type { StoredEntry } from '#app/care/kind.ts'
import { type Replacements, select } from './sequelize.server.ts'

/** A row of `entries`, before its payload is parsed. */
export type EntryColumns = Omit<StoredEntry, 'raw'> & { readonly text: string }

/** The columns of an entry `e`, its author `u` and its witness `x`. The payload comes as text: see `storedEntry`. */
export const entryColumns = `e.id, e.stay_id AS stayId, e.number, e.kind, e.version, e.performed_at AS performedAt,
  e.recorded_at AS recordedAt, e.recorded_by AS recordedById, u.name AS recordedByName, e.recorded_role AS recordedRole,
  x.name AS witnessName, e.supersedes_id AS supersedesId, e.reason, e.status, CAST(e.data AS CHAR) AS text`

/** LEFT, though every entry has its author: else the server may start from the users, and read each one's entries (5 times slower). */
export const entryTables =
  'entries e LEFT JOIN users u ON u.id = e.recorded_by LEFT JOIN users x ON x.id = e.witness_id'

/** Entries by what stands after the tables. */
export async function storedEntries(rest: string, replacements: Replacements): Promise<readonly StoredEntry[]> {
  const rows = await select<EntryColumns>(`SELECT ${entryColumns} FROM ${entryTables} ${rest}`, replacements)
  const share = sharing()
  return rows.map(row => storedEntry(row, share))
}

/**
 * The entry of a row. The payload is parsed here and not by the connector, which would fail the whole page on one that is
 * damaged: such a payload is handed on as its text, which no schema takes, so that it is shown as it is.
 */
export function storedEntry(row: EntryColumns, share: (text: string) => string = text => text): StoredEntry {
  return {
    id: row.id,
    stayId: share(row.stayId),
    number: row.number,
    kind: share(row.kind),
    version: row.version,
    performedAt: row.performedAt,
    recordedAt: row.recordedAt,
    recordedById: share(row.recordedById),
    recordedByName: share(row.recordedByName),
    recordedRole: share(row.recordedRole),
    witnessName: row.witnessName,
    supersedesId: row.supersedesId,
    reason: row.reason,
    status: row.status,
    raw: parsed(row.text),
  }
}

/** One copy of texts that thousands of rows repeat, such as the author's name: a third of the memory of a ward. */
function sharing(): (text: string) => string {
  const copies = new Map<string, string>()
  return text => {
    const copy = copies.get(text)
    if (copy === undefined) copies.set(text, text)
    return copy ?? text
  }
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text)
  } catch (error) {
    if (error instanceof SyntaxError) return text
    throw error
  }
}

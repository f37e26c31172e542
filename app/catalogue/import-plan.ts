import { type CellChange, type Cells, type Column, cellChanges, columns, headings } from './columns.ts'
import { type CsvFault, type CsvRow, readCsvText } from './csv-text.ts'
import { type ReadRow, readRow } from './import-row.ts'
import { type Catalogue, knownItems } from './known-items.ts'
import type { ItemValues } from './read-values.ts'
import { type AfterImport, afterImport, fitsIn, sharedFaults } from './shared-faults.ts'

/** What becomes of one line of a file. */
export interface PlannedRow {
  readonly line: number
  readonly fate: 'new' | 'changed' | 'same' | 'error'
  readonly cells: Cells
  /** Null when a cell cannot be read. */
  readonly values: ItemValues | null
  /** What changes of a known item. */
  readonly changes: readonly CellChange[]
  readonly errors: readonly { readonly heading: string; readonly says: string }[]
  /** Ids of the inner cannulas that fit a tube. */
  readonly fitIds: readonly string[]
}

export type ImportPlan = { readonly rows: readonly PlannedRow[] } | { readonly fault: CsvFault }

const MOST_ROWS = 5000
const needed: readonly Column[] = ['item', 'line', 'maker', 'size']

/** The headings of a file, in their order. */
export const headLine: readonly string[] = columns.map(column => headings[column])

/** What a file would do to a catalogue, line by line; nothing is done. `newId` mints the id of an item that has none. */
export function importPlan(text: string, catalogue: Catalogue, newId: () => string): ImportPlan {
  const read = readCsvText(text)
  if ('fault' in read) return read
  const [head, ...rows] = read.rows
  const fault = headFault(head, rows)
  if (fault) return { fault }
  const named = (head?.cells ?? []).map(columnOf)
  const known = knownItems(catalogue)
  const readRows = rows.map(row => readRow(row, named, known, newId))
  const after = afterImport(known, readRows)
  return { rows: readRows.map(row => planned(row, after)) }
}

function columnOf(word: string): Column | undefined {
  const plain = word.trim().toLowerCase()
  return columns.find(column => headings[column].toLowerCase() === plain)
}

function headFault(head: CsvRow | undefined, rows: readonly CsvRow[]): CsvFault | undefined {
  if (!head) return { line: 1, says: 'There is nothing in it' }
  const { line } = head
  const named = head.cells.map(columnOf)
  const missing = needed.filter(column => !named.includes(column)).map(column => `"${headings[column]}"`)
  if (missing.length > 0) return { line, says: `The first line names the columns; it lacks ${missing.join(', ')}` }
  const foreign = head.cells.find((word, i) => named[i] === undefined && word.trim() !== '')
  if (foreign !== undefined) return { line, says: `No column is called "${foreign.slice(0, 40)}"` }
  const twice = named.find((column, i) => column !== undefined && named.indexOf(column) !== i)
  if (twice) return { line, says: `Two columns are called "${headings[twice]}"` }
  if (rows.length === 0) return { line, says: 'There is no item below the headings' }
  return rows.length > MOST_ROWS
    ? { line, says: `It has more than ${MOST_ROWS} items: import them in parts` }
    : undefined
}

function planned(row: ReadRow, after: AfterImport): PlannedRow {
  const { line, values, before } = row
  const fits = fitsIn(row, after)
  const cells = { ...row.cells, fits: fits.words }
  const faults = [...row.faults, ...sharedFaults(row, after), ...fits.faults]
  const errors = faults.map(({ column, says, oneOf }) => {
    return { heading: headings[column], says: oneOf ? `Write one of: ${oneOf.join(', ')}` : says }
  })
  const told = errors.filter((error, i) => errors.findIndex(other => other.says === error.says) === i)
  const changes = before && errors.length === 0 ? cellChanges(before, cells) : []
  const fate = errors.length > 0 ? 'error' : before === null ? 'new' : changes.length > 0 ? 'changed' : 'same'
  return { line, fate, cells, values, changes, errors: told, fitIds: fits.ids }
}

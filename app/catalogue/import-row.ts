import { type Cells, type Column, columns, type ItemKind } from './columns.ts'
import type { CsvRow } from './csv-text.ts'
import { descriptionOf, type KnownItems } from './known-items.ts'
import { type CellFault, type ItemValues, plainCell, readValues } from './read-values.ts'

/** A line of a file as it was read by itself, before what it shares with other lines was looked at. */
export interface ReadRow {
  readonly line: number
  /** As an export would write them. */
  readonly cells: Cells
  /** Null when a cell cannot be read. */
  readonly values: ItemValues | null
  /** The item that the line is about, as it is known; null when it is new. */
  readonly before: Cells | null
  readonly faults: readonly CellFault[]
}

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/

/** Reads one line. `named` says which column each cell is of; a column that is not there keeps what is known of the item. */
export function readRow(
  row: CsvRow,
  named: readonly (Column | undefined)[],
  known: KnownItems,
  newId: () => string,
): ReadRow {
  const given = Object.fromEntries(columns.map(column => [column, cellOf(row, named, column)])) as Cells
  const item = itemKindOf(given.item)
  if (!item) return wrong(row.line, given, { column: 'item', says: 'Write "tube" or "inner cannula"' })
  if (row.cells.slice(named.length).some(cell => cell.trim() !== '')) {
    return wrong(row.line, given, { column: 'item', says: 'The line has more cells than there are columns' })
  }
  const line = known.lines.get(given.line.toLowerCase())?.line ?? given.line
  const before = knownItem({ ...given, item, line }, known)
  const kept = Object.fromEntries(
    columns.filter(column => !named.includes(column)).map(name => [name, before?.[name] ?? '']),
  )
  const id = given.id || before?.id || newId()
  const cells = {
    ...given,
    ...kept,
    line,
    item,
    id,
    retired: (named.includes('retired') && given.retired.toLowerCase()) || before?.retired || 'no',
  }
  const read = readValues(item, cells)
  const faults = [...ownFaults(cells, before, given.id !== ''), ...('faults' in read ? read.faults : [])]
  return { line: row.line, cells, values: 'faults' in read ? null : read, before, faults }
}

const wrong = (line: number, cells: Cells, fault: CellFault): ReadRow => {
  return { line, cells, values: null, before: null, faults: [fault] }
}

function cellOf({ cells }: CsvRow, named: readonly (Column | undefined)[], column: Column): string {
  const plain = plainCell(column, cells[named.indexOf(column)] ?? '')
  return column === 'id' ? plain.toLowerCase() : plain
}

function itemKindOf(word: string): ItemKind | undefined {
  const plain = word.toLowerCase()
  return plain === 'tube' || plain === 'inner cannula' ? plain : undefined
}

/** An id decides; without one the GTIN within the line, without that what describes the item. */
function knownItem(given: Cells, known: KnownItems): Cells | null {
  if (given.id !== '') return known.byId.get(given.id) ?? null
  const sold = given.gtin === '' ? undefined : known.byGtin.get(given.gtin)
  if (sold && sold.item === given.item && sold.line === given.line) return sold
  return known.byDescription.get(descriptionOf(given)) ?? null
}

function ownFaults({ item, id, line, retired }: Cells, before: Cells | null, hasId: boolean): readonly CellFault[] {
  const isOther = before !== null && before.item !== item
  const hasMoved = before !== null && before.item === item && before.line !== line
  return [
    ...(hasId && !UUID.test(id) ? [{ column: 'id', says: 'Leave the id empty for a new item' } as const] : []),
    ...(isOther
      ? [{ column: 'id', says: `This id belongs to the ${before.item} ${before.line} ${before.size}` } as const]
      : []),
    ...(hasMoved
      ? [{ column: 'line', says: `It belongs to ${before.line}: retire it, and add another` } as const]
      : []),
    ...(retired === 'yes' || retired === 'no' ? [] : [{ column: 'retired', says: 'Write "yes" or "no"' } as const]),
  ]
}

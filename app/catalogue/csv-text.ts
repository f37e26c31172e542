import { CsvError, parse } from 'csv-parse/sync'
import { stringify } from 'csv-stringify/sync'
import { columns, headings } from './columns.ts'

/** A line of a file with its cells, under the number of the line it begins on. */
export interface CsvRow {
  readonly line: number
  readonly cells: readonly string[]
}

/** What cannot be read, with the line it is on. */
export interface CsvFault {
  readonly line: number
  readonly says: string
}

export type CsvRead = { readonly rows: readonly CsvRow[] } | { readonly fault: CsvFault }

// Programs of tables take a cell that begins so for a formula and run it. An apostrophe before it makes it text; an
// apostrophe that is already there gets another, so that reading takes back exactly what writing gave.
const FORMULA = /^'*[=+\-@\t\r＝＋－＠]/
const disarmed = (cell: string): string => (FORMULA.test(cell) ? `'${cell}` : cell)
const armed = (cell: string): string => (cell.startsWith("'") && FORMULA.test(cell) ? cell.slice(1) : cell)

/** Rows as a CSV file that programs of tables open as they should: marked as UTF-8, lines ended by CR LF. A number stays one. */
export function csvText(rows: readonly (readonly (string | number)[])[]): string {
  return stringify(
    rows.map(cells => cells.map(cell => (typeof cell === 'number' ? cell : disarmed(cell)))),
    { bom: true, record_delimiter: '\r\n', quoted_match: /[\r\n]|^\uFEFF/ },
  )
}

/** The rows of a CSV file, whatever separates its cells (comma, semicolon or tab). Empty lines are left out. */
export function readCsvText(text: string): CsvRead {
  try {
    const records = parse(text, {
      bom: true,
      delimiter: delimiterOf(text),
      record_delimiter: ['\r\n', '\n', '\r'],
      relax_column_count: true,
      info: true,
    }) as unknown as readonly { readonly record: readonly string[]; readonly info: { readonly lines: number } }[]
    return { rows: records.map(({ record, info }) => rowOf(record, info.lines)).filter(isFilled) }
  } catch (error) {
    if (error instanceof CsvError) return { fault: faultOf(error) }
    throw error
  }
}

/** Lines are counted up to the end of a record; one with a line break inside a cell began earlier. */
function rowOf(record: readonly string[], endsOn: number): CsvRow {
  const breaks = record.reduce((sum, cell) => sum + (cell.match(/\r\n|\r|\n/g)?.length ?? 0), 0)
  return { line: endsOn - breaks, cells: record.map(cell => armed(cell)) }
}

const isFilled = ({ cells }: CsvRow): boolean => cells.some(cell => cell.trim() !== '')

const known = new Set(columns.map(column => headings[column].toLowerCase()))

/** What separates the cells is what makes most of the first line's words known headings. */
function delimiterOf(text: string): string {
  const [first = ''] = text.replace(/^\uFEFF/, '').split(/\r\n|\r|\n/, 1)
  const found = [',', ';', '\t'].map(delimiter => ({
    delimiter,
    count: first.split(delimiter).filter(word => known.has(word.replaceAll('"', '').trim().toLowerCase())).length,
  }))
  return found.reduce((best, one) => (one.count > best.count ? one : best)).delimiter
}

function faultOf(error: CsvError): CsvFault {
  const { lines } = error as CsvError & { readonly lines?: number }
  const isOpen = error.code === 'CSV_QUOTE_NOT_CLOSED'
  const says = isOpen
    ? 'A quotation mark is opened and not closed'
    : 'A quotation mark stands where none may: write it twice inside a quoted cell'
  return { line: lines ?? 1, says }
}

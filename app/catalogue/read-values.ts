import type { z } from 'zod'
import { gtin14 } from '../clinical/gs1-gtin.ts'
import { type Cells, type Column, columns, type ItemKind } from './columns.ts'
import { type InnerCannulaValues, innerCannulaSchema } from './inner-cannula-schema.ts'
import { type TubeValues, tubeSchema } from './tube-schema.ts'

/** What is wrong with a cell of a line. */
export interface CellFault {
  readonly column: Column
  readonly says: string
  /** Words that the cell may hold, where it is one of a few. */
  readonly oneOf?: readonly string[]
}

/** An item as its form says it. */
export type ItemValues =
  | { readonly item: 'tube'; readonly values: TubeValues }
  | { readonly item: 'inner cannula'; readonly values: InnerCannulaValues }

const numbers: readonly Column[] = [
  'idWithInner',
  'idWithoutInner',
  'od',
  'lengthMm',
  'longestUseDays',
  'reusableInnerCannulas',
  'packSize',
]
/** Cells that are read apart from the schema: which item it is, what fits it, and whether it is still bought. */
const apart: readonly Column[] = ['item', 'id', 'fits', 'retired']
const schemas = { tube: tubeSchema, 'inner cannula': innerCannulaSchema } as const

/** The values in the cells of an item, checked as its form checks them, or what is wrong with which cell. */
export function readValues(item: ItemKind, cells: Cells): ItemValues | { readonly faults: readonly CellFault[] } {
  const given = columns.filter(column => !apart.includes(column) && cells[column].trim() !== '')
  const own = given.filter(column => column in schemas[item].shape)
  const foreign = given.filter(column => !own.includes(column))
  const read = schemas[item].safeParse(
    Object.fromEntries(own.map(column => [column, cellValue(column, cells[column])])),
  )
  if (read.success && foreign.length === 0) return { item, values: read.data } as ItemValues
  const says = `Leave this empty for ${item === 'tube' ? 'a tube' : 'an inner cannula'}`
  return {
    faults: [...foreign.map(column => ({ column, says })), ...(read.success ? [] : read.error.issues.map(faultOf))],
  }
}

function cellValue(column: Column, cell: string): string | number {
  const plain = cell.trim()
  if (!numbers.includes(column)) return plain
  const pointed = plain.replace(/^(-?\d+),(\d+)$/, '$1.$2')
  return /^-?\d+(\.\d+)?$/.test(pointed) ? Number(pointed) : Number.NaN
}

function faultOf(issue: z.core.$ZodIssue): CellFault {
  const column = columns.find(name => name === issue.path[0]) ?? 'item'
  const says = issue.message
  return issue.code === 'invalid_value' ? { column, says, oneOf: issue.values.map(String) } : { column, says }
}

/** The cell as an export would write it, as far as it can be read: `8,0` is `8`, a GTIN has fourteen digits. */
export function plainCell(column: Column, cell: string): string {
  const value = cellValue(column, cell)
  if (Number.isNaN(value)) return cell.trim()
  return column === 'gtin' ? (gtin14(String(value)) ?? cell.trim()) : String(value)
}

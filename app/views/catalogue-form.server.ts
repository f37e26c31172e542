import { data } from 'react-router'
import { type Cells, columns, type ItemKind } from '#app/catalogue/columns.ts'
import { type ItemValues, plainCell, readValues } from '#app/catalogue/read-values.ts'
import { type CatalogueSaving, saveItems } from '#database/catalogue-writes.server.ts'
import type { ItemView } from './catalogue-item.server.ts'

/** What stands in a form of an item, by column. */
export type TypedItem = Readonly<Record<string, readonly string[]>>

/** An item that was not saved: what was typed, and what is wrong with which field; '' for the whole form. */
export interface ItemRefusal {
  readonly typed: TypedItem
  readonly errors: Readonly<Record<string, readonly string[]>>
}

interface FormOf {
  readonly kind: ItemKind
  /** Line and maker of an item that is known: it stays in its line, so no form asks for them. */
  readonly ofLine?: Pick<Cells, 'line' | 'maker'>
  readonly id: string
  readonly version: number | null
  readonly retired: boolean
  /** Inner cannulas that may be named as fitting. */
  readonly fitting: readonly string[]
  readonly by: string
}

/** Saves what a form says of an item; null when it is saved. */
export async function savedFrom(sent: FormData, item: FormOf): Promise<ItemRefusal | null> {
  const typed = typedIn(sent)
  const cells = Object.fromEntries(
    columns.map(column => [column, plainCell(column, typed[column]?.[0] ?? '')]),
  ) as Cells
  const read = readValues(item.kind, { ...cells, ...item.ofLine, fits: '', id: '', item: item.kind, retired: '' })
  if ('faults' in read) {
    const names = [...new Set(read.faults.map(({ column }) => column))]
    const saysOf = (name: string) => read.faults.filter(({ column }) => column === name).map(({ says }) => says)
    return { typed, errors: Object.fromEntries(names.map(name => [name, saysOf(name)])) }
  }
  const { id, version, retired, fitting, by } = item
  const isDual = read.item === 'tube' && read.values.construction === 'dual'
  const fitIds = isDual ? [...new Set(typed.fits ?? [])].filter(fit => fitting.includes(fit)) : []
  const { outcome } = await saveItems([{ ...read, id, version, retired, fitIds }], by)
  return outcome === 'saved' ? null : { typed, errors: refusalOf(outcome, read) }
}

/** Every field that an item has, as text; other names and files are left out. */
function typedIn(sent: FormData): TypedItem {
  const names = columns.filter(column => sent.has(column))
  return Object.fromEntries(
    names.map(name => [
      name,
      sent.getAll(name).filter((value): value is string => typeof value === 'string' && value !== ''),
    ]),
  )
}

function refusalOf(outcome: Exclude<CatalogueSaving['outcome'], 'saved'>, { item, values }: ItemValues) {
  const errors = {
    'gtin taken': { gtin: ['Another item has this GTIN'] },
    'described already': { size: [`Nothing tells it from another ${item} of ${values.line}`] },
    'other maker': { maker: [`${values.line} is made by another maker in the catalogue`] },
    'other line': { line: ['An item stays in its line: retire it, and add another'] },
    'changed meanwhile': { '': ['Somebody else changed this item meanwhile. Open it again, and copy what you typed.'] },
  }
  return errors[outcome]
}

/** The id that a form was opened with. Throws a 400 when it has lost it. */
export function idIn(sent: FormData): string {
  const id = sent.get('id')
  if (typeof id !== 'string' || !/^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/.test(id)) {
    throw data('This form has lost a part of itself. Open it again.', 400)
  }
  return id
}

/** The version that a form was opened with; 0, which no item has, when it has lost it. */
export function versionIn(sent: FormData): number {
  const version = sent.get('version')
  return typeof version === 'string' && /^\d{1,9}$/.test(version) ? Number(version) : 0
}

/** Retires an item or puts it in use again, as its form says; it stays in the catalogue either way. */
export async function itemRetired(
  sent: FormData,
  { id, kind, cells, fits }: ItemView,
  by: string,
): Promise<{ readonly says: string; readonly status: number }> {
  const wanted = sent.get('retired')
  if (wanted !== 'yes' && wanted !== 'no') throw data('This form is not from this page.', 400)
  const read = readValues(kind, cells)
  if ('faults' in read) return { says: 'First edit what today’s rules do not allow.', status: 400 }
  const fitIds = kind === 'tube' ? fits.map(fit => fit.id) : []
  const { outcome } = await saveItems(
    [{ ...read, id, version: versionIn(sent), retired: wanted === 'yes', fitIds }],
    by,
  )
  if (outcome !== 'saved') return { says: 'Somebody else changed this item meanwhile. Look at it again.', status: 409 }
  return { says: wanted === 'yes' ? 'Retired. It stays in the catalogue.' : 'In use again.', status: 200 }
}

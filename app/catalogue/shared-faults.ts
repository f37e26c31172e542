import { type Cells, fitWords } from './columns.ts'
import type { ReadRow } from './import-row.ts'
import { descriptionOf, type KnownItems } from './known-items.ts'
import type { CellFault } from './read-values.ts'

/** The catalogue as it would be after a file, to find what two items would share. */
export interface AfterImport {
  /** Ids of inner cannulas by line and by the words that a tube's line names them with. */
  readonly fitIds: ReadonlyMap<string, string>
  readonly byGtin: ReadonlyMap<string, readonly string[]>
  readonly byDescription: ReadonlyMap<string, readonly string[]>
  readonly rowsOfId: ReadonlyMap<string, readonly number[]>
  readonly makers: ReadonlyMap<string, string>
  readonly names: ReadonlyMap<string, string>
}

/** Lays the lines of a file over what is known. */
export function afterImport(known: KnownItems, rows: readonly ReadRow[]): AfterImport {
  const readable = rows.filter(({ values }) => values !== null)
  const after = new Map([...known.byId, ...readable.map(({ cells }) => [cells.id, cells] as const)])
  const items = [...after.values()]
  const cannulas = items.filter(({ item }) => item === 'inner cannula')
  const first = readable.toReversed().map(({ cells }) => [cells.line.toLowerCase(), cells.maker] as const)
  return {
    fitIds: new Map(cannulas.map(cells => [fitKey(cells.line, fitWordsOf(cells)), cells.id])),
    byGtin: grouped(items.filter(({ gtin }) => gtin !== '').map(({ gtin, id }) => [gtin, id])),
    byDescription: grouped(items.map(cells => [descriptionOf(cells), cells.id])),
    rowsOfId: grouped(rows.filter(({ cells }) => cells.id !== '').map(({ cells, line }) => [cells.id, line])),
    makers: new Map([...first, ...[...known.lines].map(([name, { maker }]) => [name, maker] as const)]),
    names: new Map(items.map(({ id, item, line, size }) => [id, `${item} ${line} ${size}`])),
  }
}

function grouped<Value>(pairs: readonly (readonly [string, Value])[]): ReadonlyMap<string, readonly Value[]> {
  const groups = new Map<string, Value[]>()
  for (const [key, value] of pairs) {
    const group = groups.get(key)
    if (group) group.push(value)
    else groups.set(key, [value])
  }
  return groups
}

const fitKey = (line: string, fit: string): string => `${line}|${fit}`.toLowerCase()

function fitWordsOf({ size, use, fenestrated, packSize }: Cells): string {
  const isFenestrated = fenestrated === 'yes' ? 'yes' : 'no'
  return fitWords({
    size,
    use: use === 'reusable' ? 'reusable' : 'disposable',
    fenestrated: isFenestrated,
    packSize: Number(packSize),
  })
}

/** The inner cannulas that a tube's cell names, of the tube's own line, with what names none. */
export function fitsIn({ cells, values }: ReadRow, { fitIds }: AfterImport) {
  const names = cells.fits
    .split(';')
    .map(name => name.trim().replace(/\s+/g, ' '))
    .filter(Boolean)
  const isSingle = values?.item === 'tube' && values.values.construction === 'single'
  const unknown = names.filter(name => !fitIds.has(fitKey(cells.line, name)))
  const faults: readonly CellFault[] = [
    ...(cells.item === 'tube' && isSingle && names.length > 0
      ? [{ column: 'fits', says: 'A single cannula takes no inner cannula' } as const]
      : []),
    ...(cells.item !== 'tube' && names.length > 0
      ? [{ column: 'fits', says: 'Say on the line of the tube which inner cannula fits it' } as const]
      : []),
    ...unknown.map(
      name =>
        ({
          column: 'fits',
          says: `${cells.line} has no inner cannula "${name.slice(0, 40)}". Write it as "8.0 disposable x10"`,
        }) as const,
    ),
  ]
  const ids = [...new Set(names.flatMap(name => fitIds.get(fitKey(cells.line, name)) ?? []))]
  return { ids, words: [...new Set(names)].sort().join('; '), faults }
}

/** What a line shares with another item, and must not: its id with another line, its GTIN, all that describes it, its line's maker. */
export function sharedFaults({ line, cells, values }: ReadRow, after: AfterImport): readonly CellFault[] {
  const others = (ids: readonly string[] = []) =>
    ids.filter(id => id !== cells.id).map(id => after.names.get(id) ?? 'another item')
  const twice = (after.rowsOfId.get(cells.id) ?? []).filter(other => other !== line)
  if (twice.length > 0) return [{ column: 'id', says: `Line ${twice.join(', ')} is about the same item` }]
  if (values === null) return []
  const [sameGtin] = others(after.byGtin.get(cells.gtin))
  const [sameItem] = others(after.byDescription.get(descriptionOf(cells)))
  const maker = after.makers.get(cells.line.toLowerCase())
  return [
    ...(sameGtin ? [{ column: 'gtin', says: `The ${sameGtin} has this GTIN` } as const] : []),
    ...(sameItem ? [{ column: 'size', says: `Nothing tells it from another ${sameItem}` } as const] : []),
    ...(maker !== undefined && maker !== cells.maker
      ? [{ column: 'maker', says: `${cells.line} is made by ${maker}` } as const]
      : []),
  ]
}

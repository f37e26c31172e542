import type { CatalogueInnerCannula, CatalogueTube } from '#app/catalogue/item.ts'
import { innerCannulasWhere, tubesWhere } from './catalogue.server.ts'
import { type Replacements, select } from './sequelize.server.ts'

/** By what a list is sorted; the second key is always the line and the size. */
export const tubeOrders = ['line', 'od', 'id', 'length'] as const
export type TubeOrder = (typeof tubeOrders)[number]

/** What is looked for; what is left out or empty does not matter. */
export interface TubeSearch {
  /** Parts of line, maker or size, or a whole GTIN; each word must be found. */
  readonly words?: string | undefined
  readonly lineId?: string | undefined
  readonly sizeSystem?: CatalogueTube['sizeSystem'] | undefined
  readonly cuff?: CatalogueTube['cuff'] | undefined
  readonly construction?: CatalogueTube['construction'] | undefined
  /** Retired ones too. */
  readonly retired?: boolean | undefined
  readonly order?: TubeOrder | undefined
  /** From 1. */
  readonly page: number
  readonly pageSize: number
}

export type InnerCannulaSearch = Pick<TubeSearch, 'words' | 'lineId' | 'retired' | 'page' | 'pageSize'>

const orders: Readonly<Record<TubeOrder, string>> = {
  line: 'l.name, i.id_without_inner, LENGTH(i.size), i.size, i.cuff, i.id',
  od: 'i.od, l.name, i.size, i.id',
  id: 'COALESCE(i.id_with_inner, i.id_without_inner), l.name, i.size, i.id',
  length: 'i.length_mm, l.name, i.size, i.id',
}

/** A page of the tubes that are looked for, and how many there are in all. */
export async function searchTubes(
  search: TubeSearch,
): Promise<{ readonly tubes: readonly CatalogueTube[]; readonly total: number }> {
  const { sizeSystem, cuff, construction, order = 'line' } = search
  const { where, values, looksAtLine } = conditions(search, { size_system: sizeSystem, cuff, construction })
  const [total, tubes] = await Promise.all([
    counted(looksAtLine ? `tubes i ${LINE}` : 'tubes i', where, values),
    tubesWhere(where, values, `${orders[order]} LIMIT :limit OFFSET :offset`),
  ])
  return { tubes, total }
}

/** A page of the inner cannulas that are looked for, and how many there are in all. */
export async function searchInnerCannulas(
  search: InnerCannulaSearch,
): Promise<{ readonly innerCannulas: readonly CatalogueInnerCannula[]; readonly total: number }> {
  const { where, values, looksAtLine } = conditions(search, {})
  const order = 'l.name, LENGTH(i.size), i.size, i.fenestrated, i.id LIMIT :limit OFFSET :offset'
  const [total, innerCannulas] = await Promise.all([
    counted(looksAtLine ? `inner_cannulas i ${LINE}` : 'inner_cannulas i', where, values),
    innerCannulasWhere(where, values, order),
  ])
  return { innerCannulas, total }
}

const LINE = 'JOIN tube_lines l ON l.id = i.line_id'

async function counted(from: string, where: string, values: Replacements): Promise<number> {
  const [row] = await select<{ total: number }>(`SELECT COUNT(*) AS total FROM ${from} WHERE ${where}`, values)
  return row?.total ?? 0
}

const MOST_WORDS = 5

function conditions(search: InnerCannulaSearch, columns: Readonly<Record<string, string | undefined>>) {
  const { lineId, retired = false, page, pageSize } = search
  const equal = Object.entries({ line_id: lineId, ...columns }).filter(([, value]) => value !== undefined)
  const words = (search.words ?? '').trim().split(/\s+/).filter(Boolean).slice(0, MOST_WORDS)
  const parts = [
    ...equal.map(([column]) => `i.${column} = :${column}`),
    ...(retired ? [] : ['i.retired_at IS NULL']),
    ...words.map(
      (_, i) =>
        `(l.name LIKE :part${i} OR l.maker LIKE :part${i} OR i.size LIKE :start${i} OR i.gtin = LPAD(:word${i}, 14, '0'))`,
    ),
  ]
  const literal = (word: string) => word.replace(/[\\%_]/g, '\\$&')
  const values: Replacements = Object.fromEntries([
    ...equal.map(([column, value]) => [column, value ?? null] as const),
    ...words.flatMap((word, i) => [
      [`part${i}`, `%${literal(word)}%`] as const,
      [`start${i}`, `${literal(word)}%`] as const,
      [`word${i}`, word] as const,
    ]),
    ['limit', pageSize] as const,
    ['offset', (page - 1) * pageSize] as const,
  ])
  return { where: parts.join(' AND ') || 'TRUE', values, looksAtLine: words.length > 0 }
}

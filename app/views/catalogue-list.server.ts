import { tubeSchema } from '#app/catalogue/tube-schema.ts'
import { tubeLines } from '#database/catalogue.server.ts'
import { searchInnerCannulas, searchTubes, type TubeSearch, tubeOrders } from '#database/catalogue-search.server.ts'

const PAGE_SIZE = 50
const LONGEST_SEARCH = 100
const { sizeSystem, cuff, construction } = tubeSchema.shape

/** What a list of the catalogue asks for, as its form shows it again. */
export interface CatalogueAsk {
  readonly items: 'tubes' | 'inner-cannulas'
  readonly find: string
  readonly line: string
  readonly sizeSystem: string
  readonly cuff: string
  readonly construction: string
  readonly retired: string
  readonly order: string
  readonly page: number
}

/** The words of an address as an ask; what is none of the choices is left out. */
export function catalogueAsk(params: URLSearchParams): CatalogueAsk {
  const word = (name: string) => (params.get(name) ?? '').slice(0, LONGEST_SEARCH)
  const page = word('page')
  return {
    items: word('items') === 'inner-cannulas' ? 'inner-cannulas' : 'tubes',
    find: word('find'),
    line: /^[0-9a-f-]{36}$/.test(word('line')) ? word('line') : '',
    sizeSystem: sizeSystem.safeParse(word('sizeSystem')).data ?? '',
    cuff: cuff.safeParse(word('cuff')).data ?? '',
    construction: construction.safeParse(word('construction')).data ?? '',
    retired: word('retired') === 'yes' ? 'yes' : 'no',
    order: tubeOrders.find(order => order === word('order')) ?? 'line',
    page: /^[1-9]\d{0,4}$/.test(page) ? Number(page) : 1,
  }
}

/** A page of the catalogue: the rows that are asked for, how many there are, and the lines to choose from. */
export async function catalogueList(ask: CatalogueAsk) {
  const search: TubeSearch = {
    words: ask.find,
    lineId: ask.line || undefined,
    sizeSystem: sizeSystem.safeParse(ask.sizeSystem).data,
    cuff: cuff.safeParse(ask.cuff).data,
    construction: construction.safeParse(ask.construction).data,
    retired: ask.retired === 'yes',
    order: tubeOrders.find(order => order === ask.order),
    page: ask.page,
    pageSize: PAGE_SIZE,
  }
  const isTubes = ask.items === 'tubes'
  const [lines, { tubes, total: tubeCount }, { innerCannulas, total: cannulaCount }] = await Promise.all([
    tubeLines(),
    isTubes ? searchTubes(search) : { tubes: [], total: 0 },
    isTubes ? { innerCannulas: [], total: 0 } : searchInnerCannulas(search),
  ])
  const total = isTubes ? tubeCount : cannulaCount
  return { ask, lines, tubes, innerCannulas, total, pages: Math.max(1, Math.ceil(total / PAGE_SIZE)) }
}

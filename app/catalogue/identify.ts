import { type UsedCannula, type UsedItem, type UsedTube, unidentified } from '../care/supply.ts'

/** An item that is kept: by its name, or as a tube or an inner cannula of the catalogue. */
export type StockItem = { readonly supply: string } | { readonly tubeId: string } | { readonly innerCannulaId: string }

/** The key under which moves of an item are added up. */
export function itemKey(item: StockItem): string {
  if ('supply' in item) return item.supply
  return 'tubeId' in item ? item.tubeId : item.innerCannulaId
}

interface Listed {
  readonly id: string
  readonly line: string
  readonly size: string
  readonly fenestrated: string
}

/** The catalogue as far as it tells one device from another. */
export interface Listing {
  readonly tubes: readonly (Listed & { readonly cuff: string })[]
  readonly cannulas: readonly (Listed & { readonly use: string })[]
  readonly fits: readonly { readonly tubeId: string; readonly innerCannulaId: string }[]
}

/** Tells which item of the catalogue a used thing is. */
export type Identify = (item: UsedItem) => StockItem

/** Identifies by reference, else by what is printed, where exactly one item of the listing is so: never by a guess. */
export function identifyIn(listing: Listing): Identify {
  return item => {
    if ('supply' in item) return { supply: item.supply }
    if (item.device === 'tube') {
      const tube = tubeIn(listing, item)
      return tube ? { tubeId: tube.id } : { supply: unidentified.tube }
    }
    const cannula = cannulaIn(listing, item)
    return cannula ? { innerCannulaId: cannula.id } : { supply: unidentified.innerCannula }
  }
}

function tubeIn({ tubes }: Listing, used: UsedTube): Listed | undefined {
  const alike = named(tubes, used)
  return onlyOne(
    alike.length === 1
      ? alike
      : alike.filter(({ cuff, fenestrated }) => cuff === used.cuff && fenestrated === used.fenestrated),
  )
}

/** Of several of the same line and size, the one that is made for the tube: which fits is data, never a number. */
function cannulaIn(listing: Listing, used: UsedCannula): Listed | undefined {
  const alike = named(listing.cannulas, used)
  if (alike.length === 1 || used.ofTube === undefined) return onlyOne(alike)
  const tube = tubeIn(listing, used.ofTube)
  const fitting = new Set(listing.fits.filter(fit => fit.tubeId === tube?.id).map(fit => fit.innerCannulaId))
  return onlyOne(
    listing.cannulas.filter(
      ({ id, use }) => fitting.has(id) && (use === 'disposable' || alike.some(one => one.id === id)),
    ),
  )
}

function named<Item extends Listed>(
  items: readonly Item[],
  used: Pick<UsedCannula, 'id' | 'line' | 'size'>,
): readonly Item[] {
  const referred = items.filter(item => item.id === used.id?.toLowerCase())
  if (referred.length > 0) return referred
  return items.filter(item => isPrintedAs(item.line, used.line) && isPrintedAs(item.size, used.size))
}

/** As printed, but for case, spaces and a trailing zero: `8` is the size that another label prints as `8.0`. */
function isPrintedAs(one: string, other: string): boolean {
  return plain(one) === plain(other)
}

function plain(words: string): string {
  const text = words.trim().replaceAll(/\s+/g, ' ').toLowerCase()
  return /^\d+([.,]\d+)?$/.test(text) ? String(Number(text.replace(',', '.'))) : text
}

const onlyOne = <Item>(items: readonly Item[]): Item | undefined => (items.length === 1 ? items[0] : undefined)

import { lasting, type Rate } from '../clinical/supply.ts'
import { basisWords, lastingWords, showRate } from './words.ts'

/** One item at a bed: how many lie there and how long they last. */
export interface BedItem {
  readonly item: string
  readonly words: string
  readonly stock: number
  /** `2 a day, 14 days of data`. */
  readonly use: string
  readonly lasts: string
  readonly isLow: boolean
}

const LOW_DAYS = 1

/**
 * What lies at a bed and what its patient needs, the soonest gone first. An item that is neither there nor one of the catalogue's is left
 * out: what is taken from the store as it is needed has no place at every bed.
 */
export function bedItems(
  stock: ReadonlyMap<string, number>,
  rates: ReadonlyMap<string, Rate>,
  about: { readonly wordsOf: (item: string) => string; readonly belongsAtBed: (item: string) => boolean },
): readonly BedItem[] {
  const items = [...new Set([...stock.keys(), ...rates.keys()])]
  return items
    .map(item => ({ item, pieces: stock.get(item) ?? 0, rate: rates.get(item) ?? { perDay: 0, daysOfData: 0 } }))
    .filter(({ item, pieces }) => pieces !== 0 || (rates.has(item) && about.belongsAtBed(item)))
    .map(({ item, pieces, rate }) => {
      const time = lasting(pieces, rate.perDay)
      return {
        item,
        words: about.wordsOf(item),
        stock: pieces,
        use: rate.perDay > 0 ? `${showRate(rate.perDay)} a day, ${basisWords(rate)}` : '',
        lasts: lastingWords(time),
        isLow: pieces < 0 || (rate.perDay >= 1 && pieces < rate.perDay * LOW_DAYS),
      }
    })
    .toSorted((a, b) => Number(b.isLow) - Number(a.isLow) || a.words.localeCompare(b.words, 'en'))
}

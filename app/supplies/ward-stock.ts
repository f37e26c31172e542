import { lasting, needOver, type OrderRule, reorderPoint, toOrder } from '../clinical/supply.ts'
import type { WardRate } from './rates.ts'
import { lastingWords, showRate, wardBasisWords } from './words.ts'

/** How an item stands on a ward, from the most pressing. */
export type Standing = 'below nothing' | 'order now' | 'enough' | 'not used'

/** One item of a ward, as its page and its order list show it. */
export interface ItemRow {
  readonly item: string
  readonly words: string
  readonly store: number
  readonly atBeds: number
  readonly stock: number
  readonly perDay: string
  readonly basis: string
  readonly lasts: string
  readonly reorderAt: number
  readonly need: number
  readonly order: number
  /** Boxes that hold the order, where the catalogue says how many are in one. */
  readonly boxes: number | null
  readonly packSize: number | null
  readonly standing: Standing
}

/** What lies where, and what is known of an item. */
export interface ItemFacts {
  readonly item: string
  readonly words: string
  readonly packSize: number | null
  readonly store: number
  readonly atBeds: number
  readonly anyBelow: boolean
  readonly rate: WardRate | undefined
}

const NONE: WardRate = { perDay: 0, counted: 0, planned: 0, fewestDays: 0 }
const pressing: readonly Standing[] = ['below nothing', 'order now', 'enough', 'not used']

/** The items of a ward, the most pressing first, then by name. What is neither there nor used is left out. */
export function itemRows(facts: readonly ItemFacts[], rule: OrderRule): readonly ItemRow[] {
  return facts
    .filter(({ store, atBeds, anyBelow, rate }) => store !== 0 || atBeds !== 0 || anyBelow || (rate?.perDay ?? 0) > 0)
    .map(one => itemRow(one, rule))
    .toSorted(
      (a, b) => pressing.indexOf(a.standing) - pressing.indexOf(b.standing) || a.words.localeCompare(b.words, 'en'),
    )
}

function itemRow({ rate = NONE, packSize, ...facts }: ItemFacts, rule: OrderRule): ItemRow {
  const { item, words, store, atBeds } = facts
  const stock = store + atBeds
  const order = toOrder(stock, rate.perDay, rule)
  return {
    ...{ item, words, store, atBeds, stock, packSize, order },
    perDay: showRate(rate.perDay),
    basis: wardBasisWords(rate),
    lasts: lastingWords(lasting(stock, rate.perDay)),
    reorderAt: reorderPoint(rate.perDay, rule),
    need: needOver(rate.perDay, rule.horizonDays, rule.wastage),
    boxes: packSize === null ? null : Math.ceil(order / packSize),
    standing: standingOf(facts, stock, order, rate.perDay),
  }
}

function standingOf(
  { store, anyBelow }: Pick<ItemFacts, 'store' | 'anyBelow'>,
  stock: number,
  order: number,
  perDay: number,
): Standing {
  if (stock < 0 || store < 0 || anyBelow) return 'below nothing'
  if (order > 0) return 'order now'
  return perDay > 0 ? 'enough' : 'not used'
}

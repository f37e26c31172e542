import { lasting, type OrderRule, type Rate, toOrder } from '../clinical/supply.ts'
import type { BedItem } from './bed-stock.ts'
import { lastingWords } from './words.ts'

/** One item at the bed of a patient, with what the store could add and what is to be done about it. */
export interface PatientItem extends BedItem {
  readonly store: number
  /** What is to be done; null while there is enough. */
  readonly notice: string | null
}

interface Known {
  readonly store: ReadonlyMap<string, number>
  readonly rates: ReadonlyMap<string, Rate>
  readonly rule: OrderRule
}

/** What lies at a patient's bed, beside what the store holds of it; an order is due by what this patient alone uses. */
export function patientItems(items: readonly BedItem[], { store, rates, rule }: Known): readonly PatientItem[] {
  return items.map(item => {
    const inStore = store.get(item.item) ?? 0
    return { ...item, store: inStore, notice: noticeOf(item, inStore, rates.get(item.item)?.perDay ?? 0, rule) }
  })
}

function noticeOf({ stock, isLow }: BedItem, inStore: number, perDay: number, rule: OrderRule): string | null {
  if (stock < 0) return 'Below nothing: more was charted than came. Count what lies here.'
  if (isLow && inStore <= 0) return 'Less than a day, and none in the store: order now.'
  if (isLow) return 'Less than a day: bring some from the store.'
  // What lies at the bed is there, even where the store stands below nothing.
  const both = stock + Math.max(0, inStore)
  if (perDay === 0 || toOrder(both, perDay, rule) === 0) return null
  if (both === 0) return 'None here and none in the store: order.'
  return `With the store it lasts ${lastingWords(lasting(both, perDay))}: order.`
}

import { type Duration, days } from '../time/duration.ts'

/** How much of something is used in a day, and over how many days that was counted; 0 days: it is planned, not counted. */
export interface Rate {
  readonly perDay: number
  readonly daysOfData: number
}

/** How an order is reckoned. `wastage` in %: what is dropped or opened in vain. */
export interface OrderRule {
  readonly wastage: number
  readonly leadDays: number
  readonly safetyDays: number
  readonly horizonDays: number
}

/** Pieces that are used up over so many days, wastage in % added (domain 7.2): 2 a day for 30 days are 60, with 20 % 72. */
export function needOver(perDay: number, horizonDays: number, wastage: number): number {
  return wholeUp((perDay * horizonDays * (100 + wastage)) / 100)
}

/** The stock at or under which an order goes out: what is used until it arrives, with wastage, and the days in hand (domain 7.2). */
export function reorderPoint(perDay: number, { wastage, leadDays, safetyDays }: OrderRule): number {
  return Math.floor((perDay * leadDays * (100 + wastage)) / 100 + perDay * safetyDays + HAIR)
}

/** Pieces to order: the need over the horizon less what is there, once the stock is at the reorder point or under it; else 0. */
export function toOrder(stock: number, perDay: number, rule: OrderRule): number {
  if (stock >= 0 && (perDay === 0 || stock > reorderPoint(perDay, rule))) return 0
  return Math.max(0, needOver(perDay, rule.horizonDays, rule.wastage) - stock)
}

/** How long a stock lasts at a rate; null where nothing is used, so that it lasts for no known time. Nothing left lasts 0. */
export function lasting(stock: number, perDay: number): Duration | null {
  if (perDay <= 0) return null
  return days(Math.max(0, stock) / perDay)
}

/** The counted use, once there are enough days of it; before that what is planned, if anything is. */
export function rateOf(
  counted: { readonly used: number; readonly days: number },
  planned: number,
  leastDays: number,
): Rate {
  if (counted.days >= leastDays) return { perDay: Math.max(0, counted.used) / counted.days, daysOfData: counted.days }
  return { perDay: planned, daysOfData: 0 }
}

// A product such as 60 * 1.2 may come out a hair beside the whole number that it is.
const HAIR = 1e-9

function wholeUp(pieces: number): number {
  return Math.max(0, Math.ceil(pieces - HAIR))
}

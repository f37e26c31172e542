import { supplyWords, unidentified } from '../care/supply.ts'
import { type Rate, rateOf } from '../clinical/supply.ts'
import { days, since } from '../time/duration.ts'

/** What a patient is going to need of one item, by the intervals in force. */
export interface Planned {
  readonly item: string
  readonly perDay: number
  /** When the need for this item began. */
  readonly since?: Date | undefined
  /** An inner cannula: what was used and not identified is counted to it, since a patient has one. */
  readonly isCannula: boolean
}

/** What one patient used of an item in a day; `day`: how many whole days ago. */
export interface Use {
  readonly item: string
  readonly day: number
  readonly used: number
}

/** From when use was counted, until when, and how much of it is enough. */
export interface Counting {
  readonly from: Date
  readonly now: Date
  readonly leastDays: number
}

/**
 * How much a patient uses in a day, item by item. Of what is planned, the counted use once there are enough whole days of it
 * and an interval has passed; else the planned one. Tubes and inner cannulas that are not planned are those of an earlier tube.
 */
export function patientRates(
  planned: readonly Planned[],
  uses: readonly Use[],
  counting: Counting,
): ReadonlyMap<string, Rate> {
  const rates = new Map<string, Rate>()
  for (const one of planned) {
    const keys = one.isCannula ? [one.item, unidentified.innerCannula] : [one.item]
    const counted = countedUse(uses, new Set(keys), wholeDays(one.since, counting))
    const least = Math.max(counting.leastDays, 1 / one.perDay)
    const before = rates.get(one.item)
    const rate = rateOf(counted, one.perDay, least)
    if (!before || rate.perDay > before.perDay) rates.set(one.item, rate)
  }
  const others = [...new Set(uses.map(({ item }) => item))].filter(item => !rates.has(item) && isByName(item))
  for (const item of others) {
    const counted = countedUse(uses, new Set([item]), wholeDays(undefined, counting))
    rates.set(item, rateOf(counted, 0, counting.leastDays))
  }
  return rates
}

/** What is kept by name and is what it says: the rest of what was not identified has no rate of its own. */
function isByName(item: string): boolean {
  return supplyWords(item) !== undefined && item !== unidentified.tube && item !== unidentified.innerCannula
}

function wholeDays(began: Date | undefined, { from, now }: Counting): number {
  const start = began && began > from ? began : from
  return Math.max(0, Math.floor(since(start, now) / days(1)))
}

function countedUse(uses: readonly Use[], keys: ReadonlySet<string>, within: number) {
  const counted = uses.filter(({ item, day }) => keys.has(item) && day < within)
  return { used: counted.reduce((sum, { used }) => sum + used, 0), days: within }
}

/** How much a ward uses in a day: of its patients together, with how many of them were counted and how many are planned. */
export interface WardRate {
  readonly perDay: number
  readonly counted: number
  readonly planned: number
  readonly fewestDays: number
}

/** The rates of patients added up, item by item. */
export function wardRates(patients: readonly ReadonlyMap<string, Rate>[]): ReadonlyMap<string, WardRate> {
  const sums = new Map<string, WardRate>()
  for (const [item, { perDay, daysOfData }] of patients.flatMap(rates => [...rates])) {
    const known = sums.get(item) ?? { perDay: 0, counted: 0, planned: 0, fewestDays: Number.POSITIVE_INFINITY }
    const isCounted = daysOfData > 0
    sums.set(item, {
      perDay: known.perDay + perDay,
      counted: known.counted + (isCounted ? 1 : 0),
      planned: known.planned + (isCounted ? 0 : 1),
      fewestDays: isCounted ? Math.min(known.fewestDays, daysOfData) : known.fewestDays,
    })
  }
  return sums
}

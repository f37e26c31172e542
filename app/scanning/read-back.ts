import type { Gs1Element } from '#app/clinical/gs1.ts'
import { labelDate, showLabelDate } from '#app/clinical/gs1-dates.ts'
import type { Gs1Item } from '#app/clinical/gs1-scan.ts'
import type { LocalDay } from '#app/time/zone.ts'

/** One way to read a code of a scanner that may leave out separators: what would stand on the label. */
export interface ReadBackChoice {
  readonly value: string
  readonly words: string
}

/** What lot and expiry are, once nobody doubts them. */
export type Believed = Pick<Gs1Item, 'lot' | 'expiresOn' | 'expiryMonthOnly'>

export const AS_SCANNED = 'as scanned'

/** The readings to choose from, the likeliest first and the code as it came last; empty where nothing is in doubt. */
export function readBackChoices(item: Gs1Item, today: LocalDay): readonly ReadBackChoice[] {
  if (!item.separatorMissing) return []
  const parted = item.separatorMissing.readings.map((parts, i) => ({
    value: String(i + 1),
    words: words(partsOf(item, parts, today), serialIn(parts)),
  }))
  return [...parted, { value: AS_SCANNED, words: words(item, item.serial) }]
}

/** Lot and expiry as somebody read them back from the label; undefined for a choice that there is not. */
export function readBackOf(item: Gs1Item, choice: string | null, today: LocalDay): Believed | undefined {
  if (!item.separatorMissing || choice === AS_SCANNED) return item
  const parts = /^[1-9]$/.test(choice ?? '') ? item.separatorMissing.readings[Number(choice) - 1] : undefined
  return parts && partsOf(item, parts, today)
}

function partsOf(item: Gs1Item, parts: readonly Gs1Element[], today: LocalDay): Believed {
  const value = (ai: string) => parts.find(part => part.ai === ai)?.value
  const expiry = labelDate(value('17') ?? '', today)
  return {
    lot: value('10') ?? item.lot,
    expiresOn: expiry?.on ?? item.expiresOn,
    expiryMonthOnly: expiry?.monthOnly ?? item.expiryMonthOnly,
  }
}

const serialIn = (parts: readonly Gs1Element[]) => parts.find(({ ai }) => ai === '21')?.value ?? null

function words({ lot, expiresOn, expiryMonthOnly }: Believed, serial: string | null): string {
  const expiry = expiresOn && showLabelDate({ on: expiresOn, monthOnly: expiryMonthOnly })
  return [
    lot === null ? 'No lot' : `Lot ${lot}`,
    expiry ? `expires ${expiry}` : 'no expiry date',
    ...(serial === null ? [] : [`serial number ${serial}`]),
  ].join(', ')
}

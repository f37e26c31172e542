import type { LocalDay } from '../time/zone.ts'
import { type EntryMode, type Gs1Element, type Gs1Refusal, type Gs1Symbol, readSymbol } from './gs1.ts'
import { labelDate } from './gs1-dates.ts'
import { nameOf } from './gs1-elements.ts'
import { type SeparatorMissing, separatorMissing } from './gs1-separator.ts'

/** One reading of a code. `sendsSeparator` is true for a camera and for a scanner that has proved to send group separators. */
export interface Gs1Scan {
  readonly raw: string
  readonly entry: EntryMode
  readonly sendsSeparator: boolean
}

/** What the codes of an item say of it. A month-only date is the last day of its month; the raw values are in `symbols`. */
export interface Gs1ItemParts {
  readonly lot: string | null
  readonly serial: string | null
  readonly expiresOn: LocalDay | null
  readonly expiryMonthOnly: boolean
  readonly producedOn: LocalDay | null
  readonly productionMonthOnly: boolean
  /** Not null: lot and expiry have to be read back from the label before they are believed. */
  readonly separatorMissing: SeparatorMissing | null
  readonly symbols: readonly Gs1Symbol[]
}

/** One item, known by its GTIN in 14 digits. */
export interface Gs1Item extends Gs1ItemParts {
  readonly gtin: string
}

/** `scan` is the index of the scan which the refusal is about; `soFar` stands where only the item number is still to come. */
export interface ItemRefusal extends Gs1Refusal {
  readonly scan: number
  readonly soFar?: Gs1ItemParts
}

export type ItemReading = { readonly ok: true; readonly item: Gs1Item } | ItemRefusal

/** An element with the index of the scan it came from. */
type Found = Gs1Element & { readonly scan: number }

// Pairs that GS1 does not allow on one item. With an item number they mean a carton, a piece of an item or a coupon.
const EXCLUSIVE: readonly (readonly [string, RegExp, string])[] = [
  [
    '01',
    /^(02|03|37|255|8006)$/,
    'This code is for a carton or a piece, not for one item. Scan the code on the item itself.',
  ],
  ['21', /^235$/, 'This code gives two kinds of serial number. Type what is printed below it.'],
]

/**
 * One item from all codes scanned on it, in any order: a label may give the item number in one code and lot and expiry in another.
 * Codes that contradict each other are refused, the later one. A code read twice changes nothing. Never throws.
 */
export function itemOf(scans: readonly Gs1Scan[], today: LocalDay): ItemReading {
  const symbols: Gs1Symbol[] = []
  for (const [scan, { raw, entry }] of scans.entries()) {
    const reading = readSymbol(raw, entry, today)
    if (!reading.ok) return { ...reading, scan }
    symbols.push(reading.symbol)
  }
  const found = symbols.flatMap(({ elements }, scan) => elements.map(element => ({ ...element, scan })))
  const refusal = contradiction(found) ?? exclusion(found)
  if (refusal) return refusal
  const parts = { ...partsOf(found, today), separatorMissing: suspicionOf(scans, symbols, today), symbols }
  const gtin = given(found, '01')
  return gtin === null ? itemNumberMissing(scans, parts) : { ok: true, item: { gtin, ...parts } }
}

function partsOf(found: readonly Found[], today: LocalDay): Omit<Gs1ItemParts, 'separatorMissing' | 'symbols'> {
  const expiry = labelDate(given(found, '17') ?? '', today)
  const production = labelDate(given(found, '11') ?? '', today)
  return {
    lot: given(found, '10'),
    serial: given(found, '21'),
    expiresOn: expiry?.on ?? null,
    expiryMonthOnly: expiry?.monthOnly ?? false,
    producedOn: production?.on ?? null,
    productionMonthOnly: production?.monthOnly ?? false,
  }
}

function suspicionOf(
  scans: readonly Gs1Scan[],
  symbols: readonly Gs1Symbol[],
  today: LocalDay,
): SeparatorMissing | null {
  const doubtful = symbols.filter((_, scan) => !scans[scan]?.sendsSeparator)
  return doubtful.map(symbol => separatorMissing(symbol, today)).find(suspicion => suspicion !== null) ?? null
}

function contradiction(found: readonly Found[]): ItemRefusal | null {
  const later = found.find(({ ai, value }) => given(found, ai) !== value)
  if (!later) return null
  const first = found.find(({ ai }) => ai === later.ai)
  const where = first?.scan === later.scan ? 'twice, with different values' : 'otherwise than the code before'
  return {
    ok: false,
    scan: later.scan,
    at: later.at,
    says: `This code gives the ${nameOf(later.ai)} ${where}. Scan the codes of one item.`,
  }
}

function exclusion(found: readonly Found[]): ItemRefusal | null {
  for (const [ai, others, says] of EXCLUSIVE) {
    const other = found.find(element => others.test(element.ai))
    if (other && given(found, ai) !== null) return { ok: false, scan: other.scan, at: other.at, says }
  }
  return null
}

function itemNumberMissing(scans: readonly Gs1Scan[], soFar: Gs1ItemParts): ItemRefusal {
  const scan = Math.max(scans.length - 1, 0)
  const says = 'The item number (01) is still missing. Scan the other code on the label.'
  return { ok: false, scan, at: scans[scan]?.raw.length ?? 0, says, soFar }
}

function given(found: readonly Found[], ai: string): string | null {
  return found.find(element => element.ai === ai)?.value ?? null
}

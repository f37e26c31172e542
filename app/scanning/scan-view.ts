import type { Typed } from '#app/charting/chart-form.ts'
import type { Finding } from './findings.ts'
import type { ReadBackChoice } from './read-back.ts'

/** What a page shows of a scan. Each part is empty or null where there is nothing to say. */
export interface ScanView {
  /** Codes of this item so far, as the page carries them on. */
  readonly codes: readonly string[]
  /** What stays in the field. */
  readonly typed: string
  readonly error: string | null
  /** What to scan next. */
  readonly next: string | null
  /** Lot and expiry as they may stand on the label: somebody has to look. */
  readonly readBack: readonly ReadBackChoice[]
  readonly findings: readonly Finding[]
  /** Not filled in by itself. */
  readonly stops: boolean
  /** Of an act that is corrected: the item is not in the hand any more. */
  readonly isUsed: boolean
  readonly name: string | null
  readonly facts: readonly { readonly term: string; readonly value: string }[]
  readonly unknown: { readonly gtin: string; readonly mayDescribe: boolean } | null
  /** Answers for the form that it was scanned for. */
  readonly fill: Typed | null
  /** Pages about it, where it was scanned for no form. */
  readonly links: readonly { readonly href: string; readonly words: string }[]
}

/** What somebody says who fills in an item that stops. */
export function fillWords({ isUsed }: Pick<ScanView, 'isUsed'>): string {
  return isUsed ? 'It is what was used: fill it in' : 'It is in place already: fill it in'
}

export const NO_SCAN: ScanView = {
  codes: [],
  typed: '',
  error: null,
  next: null,
  readBack: [],
  findings: [],
  stops: false,
  isUsed: false,
  name: null,
  facts: [],
  unknown: null,
  fill: null,
  links: [],
}

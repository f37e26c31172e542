import type { LocalDay } from '../time/zone.ts'
import { faultOf, identifierAt, nameOf, ownLength } from './gs1-elements.ts'
import { gtin14, isGtin } from './gs1-gtin.ts'

/** How a text came in, by the words of FHIR's UDI entry type: read by a scanner or camera, or typed. */
export type EntryMode = 'barcode' | 'manual'

/** One part of a code: its application identifier, its value as printed, and where in the raw text the value begins. */
export interface Gs1Element {
  readonly ai: string
  readonly value: string
  readonly at: number
}

/** One code as it was read. `symbology` is the AIM identifier such as ']d2', null when the scanner sent none or a person typed. */
export interface Gs1Symbol {
  readonly raw: string
  readonly entry: EntryMode
  readonly symbology: string | null
  readonly form: 'element string' | 'bracketed' | 'bare number'
  readonly elements: readonly Gs1Element[]
}

/** Why a text was not accepted, in words for the reader, and at which character of the raw text. */
export interface Gs1Refusal {
  readonly ok: false
  readonly at: number
  readonly says: string
}

export type SymbolReading = { readonly ok: true; readonly symbol: Gs1Symbol } | Gs1Refusal
export type ElementsReading = { readonly ok: true; readonly elements: readonly Gs1Element[] } | Gs1Refusal

/** The group separator: how a scanner sends the FNC1 that ends a value of variable length. */
export const GROUP_SEPARATOR = '\u001d'

const ELEMENT_STRINGS = [']C1', ']d2', ']Q3', ']e0'] // GS1-128, GS1 DataMatrix, GS1 QR, GS1 DataBar and composite
const BARE_NUMBERS: Readonly<Record<string, number>> = { ']E0': 13, ']E4': 8 } // EAN-13, EAN-8
const OURS = ['01', '10', '11', '17', '21']
const PRINTED = 'Look for another code on the label, or type what is printed below it.'

/**
 * Reads one code: an element string with or without its symbology identifier, a bare item number, or the printed form
 * "(01)09521234543213(17)271231". Judges each part alone; what belongs together on one item is for `itemOf`. Never throws.
 */
export function readSymbol(raw: string, entry: EntryMode, today: LocalDay): SymbolReading {
  // A scanner may end with Enter or Tab; around what was typed there may be spaces too.
  const text = entry === 'manual' ? raw.trimEnd() : withoutEnter(raw)
  const start = entry === 'manual' ? text.length - text.trimStart().length : 0
  const symbology = text[start] === ']' ? text.slice(start, start + 3) : null
  const from = start + (symbology?.length ?? (text.startsWith(GROUP_SEPARATOR) ? 1 : 0))
  const form = formOf(text, from, symbology, entry, today)
  if (typeof form !== 'string') return form
  const read = form === 'bare number' ? readBareNumber(text, from) : readers[form](text, from, today)
  return read.ok ? { ok: true, symbol: { raw, entry, symbology, form, elements: read.elements } } : read
}

/** Reads identifiers and values from a place in an element string on. A separator too many after a part is let pass, an empty value is not. */
export function readElements(text: string, from: number, today: LocalDay): ElementsReading {
  const elements: Gs1Element[] = []
  let next = from
  while (next < text.length) {
    const ai = identifierAt(text, next)
    if (ai === null) return unknownIdentifier(next, elements)
    const at = next + ai.length
    const end = valueEnd(text, at, ownLength(ai))
    const element = { ai, value: text.slice(at, end), at }
    const refusal = refusalOf(element, today)
    if (refusal) return end === text.length && !text.includes(GROUP_SEPARATOR) ? withHint(refusal, ai) : refusal
    elements.push(element)
    next = text[end] === GROUP_SEPARATOR ? end + 1 : end
  }
  return elements.length > 0 ? { ok: true, elements } : refused(from, 'Nothing was read. Scan again.')
}

const readers = { 'element string': readElements, bracketed: readBracketed }

/** Cut by hand: a pattern such as /[\r\n]+$/ takes minutes over a long hostile text. */
function withoutEnter(raw: string): string {
  let end = raw.length
  while (end > 0 && '\t\r\n'.includes(raw.charAt(end - 1))) end--
  return raw.slice(0, end)
}

function formOf(
  text: string,
  from: number,
  symbology: string | null,
  entry: EntryMode,
  today: LocalDay,
): Gs1Symbol['form'] | Gs1Refusal {
  if (symbology === null) return formByItself(text, from, entry, today)
  if (ELEMENT_STRINGS.includes(symbology)) return 'element string'
  const length = BARE_NUMBERS[symbology]
  if (length === undefined) return refused(0, `This code is not in GS1 form. ${PRINTED}`)
  if (text.length - from === length) return 'bare number'
  return refused(from, `This item number should have ${length} digits. Scan again.`)
}

function formByItself(text: string, from: number, entry: EntryMode, today: LocalDay): Gs1Symbol['form'] | Gs1Refusal {
  const body = text.slice(from)
  if (body.startsWith('(')) return 'bracketed'
  if (entry === 'manual' && /^(\d{8}|\d{12,14})$/.test(body)) return 'bare number'
  if (!isGtin(body)) return 'element string'
  const elements = readElements(body, 0, today)
  if (!elements.ok || !elements.elements.some(({ ai }) => OURS.includes(ai))) return 'bare number'
  return refused(from, 'These digits can be read in two ways. Type what is printed below the code, with its brackets.')
}

function readBareNumber(text: string, from: number): ElementsReading {
  const value = gtin14(text.slice(from))
  if (value === null)
    return refused(
      from,
      'The digits of this item number do not fit its check digit. Compare with the label or scan again.',
    )
  return { ok: true, elements: [{ ai: '01', value, at: from }] }
}

function readBracketed(text: string, from: number, today: LocalDay): ElementsReading {
  const part = /\((\d{2,4})\)\s*([^(]*)/y
  const elements: Gs1Element[] = []
  let next = from
  while (next < text.length) {
    part.lastIndex = next
    const [whole, ai, printed] = part.exec(text) ?? []
    if (whole === undefined || ai === undefined || printed === undefined || identifierAt(ai, 0) !== ai)
      return unknownIdentifier(next, elements)
    next += whole.length
    const element = { ai, value: printed.trimEnd(), at: next - printed.length }
    const refusal = refusalOf(element, today)
    if (refusal) return refusal
    elements.push(element)
  }
  return { ok: true, elements }
}

/** Where a value ends: at its own length or, sooner, at a separator. */
function valueEnd(text: string, at: number, length: number | null): number {
  const most = length === null ? text.length : Math.min(at + length, text.length)
  const separator = text.slice(at, most).indexOf(GROUP_SEPARATOR)
  return separator < 0 ? most : at + separator
}

function refusalOf({ ai, value, at }: Gs1Element, today: LocalDay): Gs1Refusal | null {
  const fault = faultOf(ai, value, today)
  return fault && refused(at + fault.offset, `The ${nameOf(ai)} ${fault.says}. Compare with the label or scan again.`)
}

/** A value that swallowed what follows it is mostly found to be too long. */
function withHint(refusal: Gs1Refusal, ai: string): Gs1Refusal {
  return ownLength(ai) === null
    ? { ...refusal, says: `${refusal.says} The scanner may leave out separators.` }
    : refusal
}

function unknownIdentifier(at: number, before: readonly Gs1Element[]): Gs1Refusal {
  const last = before.at(-1)
  if (!last) return refused(at, `This code does not begin as a GS1 code does. ${PRINTED}`)
  return refused(at, `What follows the ${nameOf(last.ai)} is not known to GS1. Compare with the label or scan again.`)
}

function refused(at: number, says: string): Gs1Refusal {
  return { ok: false, at, says }
}

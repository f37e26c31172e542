import type { ReadCode } from '#app/care/carried-field.ts'
import type { Gs1Scan } from '#app/clinical/gs1-scan.ts'

/** How a code reached the page. */
export const scanSources = ['scanner', 'camera', 'typed'] as const
export type ScanSource = (typeof scanSources)[number]

/** One reading of one code. */
export interface Reading {
  readonly source: ScanSource
  readonly raw: string
}

/** The codes of one item so far, the one that was just added, and which reading of a doubtful code the label bears out. */
export interface ScanForm {
  readonly before: readonly Reading[]
  readonly added: Reading | null
  readonly readBack: string | null
}

/** No label has more, and no code is longer: what comes past them is no scan. */
export const MOST_CODES = 8
export const LONGEST_CODE = 500

const texts = (form: FormData, name: string): readonly string[] =>
  form.getAll(name).filter(value => typeof value === 'string')

/** A reading as a page carries it on: `scanner ]d201...`. */
export function carriedReading({ source, raw }: Reading): string {
  return `${source} ${raw}`
}

/** What a scan form holds, whatever was sent. */
export function scanForm(form: FormData): ScanForm {
  const source = scanSources.find(name => name === form.get('source')) ?? 'typed'
  const raw = texts(form, 'code').at(-1) ?? ''
  return {
    before: texts(form, 'before').flatMap(readingOf).slice(0, MOST_CODES),
    added: raw.trim() === '' ? null : { source, raw },
    readBack: texts(form, 'readBack').at(-1) ?? null,
  }
}

function readingOf(text: string): readonly Reading[] {
  const at = text.indexOf(' ')
  const source = scanSources.find(name => name === text.slice(0, at))
  const raw = text.slice(at + 1)
  return source && raw !== '' && raw.length <= LONGEST_CODE ? [{ source, raw }] : []
}

/** A reading for the parser. A scanner is believed to send separators where it has proved to on this workstation. */
export function gs1Scan({ source, raw }: Reading, isTrusted: boolean): Gs1Scan {
  return {
    raw,
    entry: source === 'typed' ? 'manual' : 'barcode',
    sendsSeparator: source === 'camera' || (source === 'scanner' && isTrusted),
  }
}

/** A reading as an entry keeps it. */
export function readCode({ source, raw }: Reading): ReadCode {
  return { entry: source === 'typed' ? 'manual' : 'barcode', raw: raw.trim() }
}

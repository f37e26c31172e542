import { z } from 'zod'
import { type EntryMode, GROUP_SEPARATOR } from '../clinical/gs1.ts'
import { type Extra, fieldMetas, type ItemMeta } from './field-meta.ts'

const SCAN_AGAIN = 'Scan the item again'

/** An item of the catalogue by its id. A scan fills it in, and the form carries it. */
export function itemOf(meta: Omit<ItemMeta, 'control'>): z.ZodUUID {
  const schema = z.uuid(SCAN_AGAIN)
  fieldMetas.add(schema, { ...meta, control: 'item' })
  return schema
}

/** One code as it was read: its raw text, with symbology identifier and separators, and how it came in. */
export interface ReadCode {
  readonly entry: EntryMode
  readonly raw: string
}

const MOST_CODES = 8

/** Codes as they are stored: one a line, how it came in, a space, the raw text: `barcode ]d20109521234543213`. */
export function codesText(read: readonly ReadCode[]): string {
  return read.map(({ entry, raw }) => `${entry} ${raw}`).join('\n')
}

/** The codes in a stored text; null when it is none. */
export function codesIn(text: string): readonly ReadCode[] | null {
  const found = text.split('\n').map(line => /^(barcode|manual) ([^\p{Cc}\p{Cs}].*)$/su.exec(line))
  const read = found.flatMap(match => (match?.[2] ? [{ entry: match[1] as EntryMode, raw: match[2] }] : []))
  const isClean = read.every(({ raw }) => !/[\p{Cc}\p{Cs}]/u.test(raw.replaceAll(GROUP_SEPARATOR, '')))
  return read.length === found.length && read.length <= MOST_CODES && isClean ? read : null
}

/** The codes on an item as they were read, up to eight, carried by the form as `codesText` writes them. */
export function codes(meta: { readonly label: string } & Extra): z.ZodString {
  const schema = z
    .string(SCAN_AGAIN)
    .overwrite(text => text.replaceAll('\r\n', '\n'))
    .max(2000, SCAN_AGAIN)
    .refine(text => codesIn(text) !== null, SCAN_AGAIN)
  fieldMetas.add(schema, { ...meta, control: 'codes' })
  return schema
}

/** The id of an item that the catalogue answers with as the act is charted. No form sends it. */
export function decidedItem(meta: { readonly label: string } & Extra): z.ZodUUID {
  const schema = z.uuid('No item of the catalogue')
  fieldMetas.add(schema, { ...meta, control: 'decided' })
  return schema
}

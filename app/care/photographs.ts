import { z } from 'zod'
import { fieldsOf } from './field.ts'
import { type Extra, fieldMetas } from './field-meta.ts'
import type { AnyCharted } from './kind.ts'

/** What one photograph may be: its file as it is sent, and what is in it. */
export const PHOTOGRAPH_LIMITS = { bytes: 8 * 1024 * 1024, pixels: 40_000_000, each: 4 } as const

/** The types that a photograph may have, as a file chooser takes them. What a file is, its content says. */
export const PHOTOGRAPH_TYPES = 'image/jpeg,image/png,image/webp'

/** Photographs by their ids: any kind may have them. The form sends files; what is stored with the entry are ids. */
export function photographs(meta: { readonly label: string } & Extra): z.ZodArray<z.ZodUUID> {
  const most = PHOTOGRAPH_LIMITS.each
  const schema = z
    .array(z.uuid('A photograph is not known'))
    .min(1, 'Choose a photograph')
    .max(most, `Choose at most ${most} photographs`)
  fieldMetas.add(schema, { ...meta, control: 'photographs', most })
  return schema
}

/** The names of a kind's fields that hold photographs. */
export function photographFields(kind: AnyCharted): readonly string[] {
  return fieldsOf(kind.schema).flatMap(({ name, meta }) => (meta.control === 'photographs' ? [name] : []))
}

/** The ids of the photographs of an act, in the order of the form. */
export function photographsIn(kind: AnyCharted, data: unknown): readonly string[] {
  const answers = data as Readonly<Record<string, unknown>>
  return photographFields(kind).flatMap(name => {
    const ids = answers[name]
    return Array.isArray(ids) ? ids.map(String) : []
  })
}

/** `2 photographs`. */
export function photographWords(count: number): string {
  return `${count} ${count === 1 ? 'photograph' : 'photographs'}`
}

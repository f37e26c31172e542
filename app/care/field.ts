import { z } from 'zod'
import { type Extra, type FieldMeta, fieldMetas, inSentence, type NameMeta, type QuantityMeta } from './field-meta.ts'

/** A number with its unit and range. Messages name the field and the range. */
export function quantity(meta: Omit<QuantityMeta, 'control' | 'step'> & { readonly step?: number }): z.ZodNumber {
  const unit = meta.unit ? ` ${meta.unit}` : ''
  const range = `${meta.label} must be from ${meta.min} to ${meta.max}${unit}`
  const schema = z
    .number({ error: issue => (issue.input === undefined ? `Enter the ${inSentence(meta.label)}` : range) })
    .min(meta.min, range)
    .max(meta.max, range)
  const step = meta.step ?? 1
  const checked = schema.refine(value => isMultipleOf(value, step), `${meta.label} must be in steps of ${step}${unit}`)
  fieldMetas.add(checked, { ...meta, control: 'quantity', step })
  return checked
}

/** Decimal steps without binary noise: 0.3 is a multiple of 0.1. */
function isMultipleOf(value: number, step: number): boolean {
  const ratio = value / step
  return Math.abs(ratio - Math.round(ratio)) < 1e-9 * Math.max(1, Math.abs(ratio))
}

/** One of a few named options, shown as chips. Yes/no is a choice too: an unticked box cannot tell "no" from "not asked". */
export function choice<const Options extends Readonly<Record<string, string>>>(
  meta: { readonly label: string; readonly options: Options } & Extra,
): z.ZodEnum<{ [Name in keyof Options & string]: Name }> {
  const names = Object.keys(meta.options) as (keyof Options & string)[]
  const schema = z.enum(names, { error: `Choose the ${inSentence(meta.label)}` })
  fieldMetas.add(schema, { ...meta, control: 'choice' })
  return schema as unknown as z.ZodEnum<{ [Name in keyof Options & string]: Name }>
}

/** Any number of named options, at least one. */
export function choices<const Options extends Readonly<Record<string, string>>>(
  meta: { readonly label: string; readonly options: Options } & Extra,
): z.ZodArray<z.ZodEnum<{ [Name in keyof Options & string]: Name }>> {
  const names = Object.keys(meta.options) as (keyof Options & string)[]
  const words = `Choose at least one for ${inSentence(meta.label)}`
  const schema = z
    .array(z.enum(names, { error: words }), { error: words })
    .min(1, words)
    .max(names.length, words)
    .refine(chosen => new Set(chosen).size === chosen.length, 'Choose each option once')
  fieldMetas.add(schema, { ...meta, control: 'choices' })
  return schema as unknown as z.ZodArray<z.ZodEnum<{ [Name in keyof Options & string]: Name }>>
}

export const yesNo = { yes: 'Yes', no: 'No' } as const

/** A short line: a name, a lot number. Trimmed; control characters are refused. */
export function text(meta: { readonly label: string; readonly maxLength?: number } & Extra): z.ZodString {
  return words('text', { maxLength: 120, ...meta })
}

/** Free words over several lines. Trimmed. */
export function note(meta: { readonly label: string; readonly maxLength?: number } & Extra): z.ZodString {
  return words('note', { maxLength: 2000, ...meta })
}

function words(control: 'text' | 'note', meta: { label: string; maxLength: number } & Extra): z.ZodString {
  const allowed = control === 'text' ? /^[^\p{Cc}\p{Cs}]*$/u : /^(?:[^\p{Cc}\p{Cs}]|[\n\r\t])*$/u
  const schema = z
    .string({ error: `Enter the ${inSentence(meta.label)}` })
    .trim()
    .min(1, `Enter the ${inSentence(meta.label)}`)
    .max(meta.maxLength, `${meta.label} must be at most ${meta.maxLength} characters`)
    .regex(allowed, `${meta.label} has characters that cannot be stored`)
  fieldMetas.add(schema, { ...meta, control })
  return schema
}

/** A calendar date, stored as `2026-12-01`. */
export function date(meta: { readonly label: string } & Extra): z.ZodISODate {
  const schema = z.iso.date({ error: `Enter the ${inSentence(meta.label)} as a date` })
  fieldMetas.add(schema, { ...meta, control: 'date' })
  return schema
}

/** The name of a due task or of a policy setting, chosen from a list that the page supplies. */
export function nameOf(control: NameMeta['control'], meta: { readonly label: string } & Extra): z.ZodString {
  const schema = z
    .string({ error: `Choose the ${inSentence(meta.label)}` })
    .regex(/^[a-z][a-z0-9-]{2,63}$/, `Choose the ${inSentence(meta.label)}`)
  fieldMetas.add(schema, { ...meta, control })
  return schema
}

export interface Field {
  readonly name: string
  readonly meta: FieldMeta
  readonly required: boolean
}

/** The fields of a schema in declared order, with what a form needs to draw each. A field without metadata is a mistake. */
export function fieldsOf(schema: z.ZodObject): readonly Field[] {
  return Object.entries(schema.shape).map(([name, member]) => {
    const inner = member instanceof z.ZodOptional ? member.unwrap() : member
    const meta = fieldMetas.get(inner as z.ZodType)
    if (!meta) throw new Error(`Field ${name} has no label: declare it with a function of field.ts`)
    return { name, meta, required: inner === member }
  })
}

/** Whether the question arises, given what else is filled in. */
export function arises(meta: FieldMeta, values: Readonly<Record<string, unknown>>): boolean {
  if (!meta.when) return true
  const other = values[meta.when.field]
  const chosen: readonly unknown[] = Array.isArray(other) ? other : [other]
  return meta.when.is.some(value => chosen.includes(value))
}

/**
 * Whether a form shows the question: it arises or, as the number that the act is about, it may still arise. The number comes
 * first and is typed before the question that decides whether it was measured at all.
 */
export function isShown(meta: FieldMeta, values: Readonly<Record<string, unknown>>): boolean {
  const isLarge = meta.control === 'quantity' && meta.large === true
  return arises(meta, values) || (isLarge && meta.when !== undefined && isUnanswered(values[meta.when.field]))
}

function isUnanswered(value: unknown): boolean {
  return value === undefined || value === '' || (Array.isArray(value) && value.every(isUnanswered))
}

/**
 * The schema of a kind: unknown fields are refused, and questions that arise from another answer are asked for
 * (`neededThen`) or refused when they do not arise.
 */
export function careFields<Shape extends z.core.$ZodLooseShape>(shape: Shape): z.ZodObject<Shape, z.core.$strict> {
  const schema = z.strictObject(shape)
  const conditional = fieldsOf(schema as unknown as z.ZodObject).filter(field => field.meta.when)
  if (conditional.length === 0) return schema
  return schema.superRefine((value, context) => {
    const values = value as Readonly<Record<string, unknown>>
    for (const { name, meta } of conditional) {
      const given = values[name] !== undefined
      const asked = arises(meta, values)
      if (asked && !given && meta.neededThen) context.addIssue({ code: 'custom', path: [name], message: missing(meta) })
      if (!asked && given) {
        context.addIssue({ code: 'custom', path: [name], message: `Leave out the ${inSentence(meta.label)} here` })
      }
    }
  })
}

function missing(meta: FieldMeta): string {
  return `${'options' in meta ? 'Choose' : 'Enter'} the ${inSentence(meta.label)}`
}

import { type Field, fieldsOf } from '#app/care/field.ts'
import type { AnyCareKind } from '#app/care/kind.ts'
import type { FormErrors } from '#app/charting/assess.ts'
import type { Typed } from '#app/charting/chart-form.ts'
import { fieldId } from './chart-errors.tsx'
import type { DrawnField } from './conform-fields.ts'

/** What stands in a form, what is wrong with it, and which options this patient is not offered. */
interface Standing {
  readonly typed: Typed
  readonly errors: FormErrors
  readonly notOffered: Readonly<Record<string, readonly string[]>>
}

/** The fields of a kind as a form draws them. What is filled in already is shown, whether it is offered or not. */
export function drawnOf(kind: AnyCareKind, { typed, errors, notOffered }: Standing): readonly DrawnField[] {
  return fieldsOf(kind.schema).flatMap(field => {
    const fullName = `care.${field.name}`
    const answers = typed[fullName] ?? []
    const shown = offered(field, notOffered[field.name] ?? [], answers)
    if (!shown) return []
    return [{ ...shown, id: fieldId(fullName), fullName, answers, errors: errors[fullName] }]
  })
}

/** The field without the options that are not offered; undefined when none is left. */
function offered(field: Field, without: readonly string[], answers: readonly string[]): Field | undefined {
  const { meta } = field
  if (without.length === 0 || (meta.control !== 'choice' && meta.control !== 'choices')) return field
  const left = Object.entries(meta.options).filter(([name]) => !without.includes(name) || answers.includes(name))
  return left.length === 0 ? undefined : { ...field, meta: { ...meta, options: Object.fromEntries(left) } }
}

import type { FieldMetadata } from '@conform-to/react'
import type { Field } from '#app/care/field.ts'

/** A field of a care kind, ready to be drawn: where it stands in the form, what it holds, what is wrong with it. */
export interface DrawnField extends Field {
  readonly id: string
  /** Name it is submitted under: `care.found`. */
  readonly fullName: string
  readonly answers: readonly string[]
  readonly errors?: readonly string[] | undefined
  /** Changes when the form is reset, so that the control starts afresh. */
  readonly formKey?: string | undefined
}

type FormField = Pick<FieldMetadata<unknown>, 'id' | 'name' | 'defaultValue' | 'defaultOptions' | 'errors' | 'key'>

/** The fields of a kind with their state in a conform form: `drawnFields(fieldsOf(kind.schema), form.care.getFieldset())`. */
export function drawnFields(
  fields: readonly Field[],
  formFields: Readonly<Record<string, FormField | undefined>>,
): readonly DrawnField[] {
  return fields.flatMap(field => {
    const formField = formFields[field.name]
    if (!formField) return []
    const { id, name, defaultValue, defaultOptions, errors, key } = formField
    const answers = defaultOptions ?? (defaultValue === undefined ? [] : [defaultValue])
    return [{ ...field, id, fullName: name, answers, errors, formKey: key }]
  })
}

import type { FieldMetadata } from '@conform-to/react'
import type { FormError } from './error-summary.tsx'

type FormField = Pick<
  FieldMetadata<unknown>,
  'id' | 'name' | 'defaultValue' | 'defaultOptions' | 'errors' | 'required' | 'maxLength'
>

/** What a text control takes from a form's field: its names, what was typed, what is wrong. Passwords are not sent back. */
export function textOf({ id, name, required = false, errors, maxLength, defaultValue }: FormField) {
  return {
    ...{ id, name, required, errors },
    ...(maxLength === undefined ? {} : { maxLength }),
    ...(defaultValue === undefined || /password/i.test(name) ? {} : { defaultValue }),
  }
}

/** The same for a control with several answers. */
export function chosenOf({ id, name, errors, defaultValue, defaultOptions }: FormField) {
  return { id, name, errors, chosen: defaultOptions ?? (defaultValue === undefined ? [] : [defaultValue]) }
}

/** The lines of an error summary: what is wrong with each field, then with the form as a whole. */
export function errorsOf(
  fields: Readonly<Record<string, FormField>>,
  ofForm: readonly string[] = [],
): readonly FormError[] {
  const ofFields = Object.values(fields).flatMap(({ id, errors = [] }) => errors.map(says => ({ fieldId: id, says })))
  return [...ofFields, ...ofForm.map(says => ({ says }))]
}

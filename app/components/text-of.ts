import type { FieldMetadata, FormMetadata } from '@conform-to/react'
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

/**
 * The lines of an error summary: what is wrong with each field, and with the form as a whole. Taken from the form, because
 * conform's set of fields cannot be listed.
 */
export function errorsOf({ id, allErrors }: Pick<FormMetadata, 'id' | 'allErrors'>): readonly FormError[] {
  return Object.entries(allErrors).flatMap(([name, errors]) =>
    errors.map(says => (name === '' ? { says } : { fieldId: `${id}-${name}`, says })),
  )
}

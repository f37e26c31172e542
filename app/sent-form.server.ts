import { parseWithZod } from '@conform-to/zod/v4'
import { data } from 'react-router'
import type { z } from 'zod'

/** The form in a request. Throws a 400 for a body that is no form. */
export async function sentForm(request: Request): Promise<FormData> {
  try {
    return await request.formData()
  } catch (error) {
    if (error instanceof TypeError) throw data('This is not a form. Nothing was charted.', 400)
    throw error
  }
}

/**
 * The fields of a form that it ought to have, as text; files and foreign names are left out. Names are compared before
 * anything takes them for paths: `wardIds[9999999]` would be followed, and took all memory of the process.
 */
export function onlyFields(sent: FormData, names: readonly string[]): FormData {
  const form = new FormData()
  for (const [name, value] of sent) if (typeof value === 'string' && names.includes(name)) form.append(name, value)
  return form
}

/** A form of plain fields, read by its schema: what the schema does not name is not looked at. */
export function readForm<Schema extends z.ZodObject>(sent: FormData, schema: Schema) {
  return parseWithZod(onlyFields(sent, Object.keys(schema.shape)), { schema })
}

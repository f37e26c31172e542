import { parseWithZod } from '@conform-to/zod/v4'
import { data } from 'react-router'
import type { z } from 'zod'
import { PHOTOGRAPH_LIMITS } from './care/photographs.ts'
import { type FormLimits, multipartForm, TooMuchText } from './multipart.server.ts'

/** As much as any form with files may hold; what is too large is said at its field, beside everything that was typed. */
const MOST: FormLimits = {
  fileBytes: PHOTOGRAPH_LIMITS.bytes,
  files: PHOTOGRAPH_LIMITS.each + 1,
  textBytes: 2.2 * 1024 * 1024, // the lines of a catalogue
}

/** The form in a request. Throws a 400 for a body that is no form, and a 413 for one with more text than any form has. */
export async function sentForm(request: Request): Promise<FormData> {
  const hasParts = /^multipart\/form-data/i.test(request.headers.get('Content-Type') ?? '')
  try {
    return hasParts ? await multipartForm(request, MOST) : await request.formData()
  } catch (error) {
    if (error instanceof TypeError) throw data('This is not a form. Nothing was charted.', 400)
    if (error instanceof TooMuchText) throw data('More was typed than a form may hold. Nothing was kept.', 413)
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

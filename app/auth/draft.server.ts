import { sentForm } from '#app/sent-form.server.ts'
import { type DraftFields, saveDraft, takeSavedDraft } from '#database/drafts.server.ts'
import { DRAFT_HOURS, DRAFT_LIMIT_CHARACTERS } from './limits.ts'

const formTypes = ['application/x-www-form-urlencoded', 'multipart/form-data']

/**
 * Keeps the form in a request for the person whose session has ended, under the path it was sent to. Passwords and files
 * are left out. False when there was nothing worth keeping, or too much.
 */
export async function keepDraft(userId: string, path: string, request: Request): Promise<boolean> {
  const type = request.headers.get('Content-Type') ?? ''
  const length = Number(request.headers.get('Content-Length') ?? 0)
  // Urlencoding triples a character at worst; what is longer than that is not parsed at all.
  if (!formTypes.some(known => type.startsWith(known)) || length > 3 * DRAFT_LIMIT_CHARACTERS) return false
  return keepFields(userId, path, await sentForm(request))
}

/** The same for a form that has been read. One that somebody else opened is theirs, and is not kept for this person. */
export async function keepFields(userId: string, path: string, form: FormData): Promise<boolean> {
  const openedBy = form.get('openedBy')
  if (openedBy !== null && openedBy !== userId) return false
  const fields = draftFields(form)
  const size = JSON.stringify(fields).length
  if (Object.keys(fields).length === 0 || size > DRAFT_LIMIT_CHARACTERS || path.length > 200) return false
  await saveDraft(userId, path, fields, DRAFT_HOURS)
  return true
}

/** What this person had typed on this page when their session ended: handed out once, within a day, to nobody else. */
export function takeDraft(userId: string, path: string): Promise<DraftFields | null> {
  return takeSavedDraft(userId, path, DRAFT_HOURS)
}

function draftFields(form: FormData): DraftFields {
  const fields = new Map<string, string[]>() // a name may be `constructor`
  for (const [name, value] of form) {
    if (typeof value !== 'string' || value === '' || /password/i.test(name)) continue
    const values = fields.get(name)
    if (values) values.push(value)
    else fields.set(name, [value])
  }
  return Object.fromEntries(fields)
}

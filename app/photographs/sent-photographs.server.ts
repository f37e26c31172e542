import { createHash } from 'node:crypto'
import { validate as isUuid, NIL, v4 as uuidv4, v5 as uuidv5 } from 'uuid'
import type { FormProblem } from '#app/care/form-problem.ts'
import type { AnyCareKind } from '#app/care/kind.ts'
import { PHOTOGRAPH_LIMITS, photographFields } from '#app/care/photographs.ts'
import { intentOf } from '#app/charting/chart-form.ts'
import type { NewPhotograph } from '#database/photographs.server.ts'

/** A form whose files have become ids: what to chart, what to show again, and the photographs behind the ids. */
export interface SentPhotographs {
  readonly form: FormData
  /** The form without what was sent as files: they are not kept when it is refused. */
  readonly shownAgain: FormData
  readonly added: readonly NewPhotograph[]
  readonly problems: readonly FormProblem[]
}

/**
 * Reads the photographs of a form. `kept`: ids of the entry that is corrected, the only ones a form may name. Looked at
 * alone, the form is judged without its files.
 */
export async function sentPhotographs(
  kind: AnyCareKind,
  sent: FormData,
  kept: readonly string[],
): Promise<SentPhotographs> {
  const names = new Set(photographFields(kind).map(name => `care.${name}`))
  const shownAgain = new FormData()
  const files: { readonly name: string; readonly file: File }[] = []
  const problems: FormProblem[] = []
  for (const [name, value] of sent) {
    if (!names.has(name)) shownAgain.append(name, value)
    else if (value instanceof File) {
      if (value.size > 0 || value.name !== '') files.push({ name, file: value })
    } else if (value === '' || kept.includes(value)) shownAgain.append(name, value)
    else problems.push({ field: name, message: 'A photograph belongs to another entry. Choose it again' })
  }
  const form = copied(shownAgain)
  if (intentOf(sent) !== 'chart') return { form, shownAgain, added: [], problems }
  const added: NewPhotograph[] = []
  const formId = sent.get('id')
  const entryId = typeof formId === 'string' && isUuid(formId) ? formId : NIL
  for (const { name, file } of files.slice(0, PHOTOGRAPH_LIMITS.each)) {
    const read = await readSent(file, entryId)
    if ('why' in read) problems.push({ field: name, message: `${nameOf(file)} ${read.why}` })
    else if (!added.some(({ id }) => id === read.id)) {
      added.push(read)
      form.append(name, read.id)
    }
  }
  const [first] = files
  if (first && files.length > PHOTOGRAPH_LIMITS.each) {
    problems.push({ field: first.name, message: `Choose at most ${PHOTOGRAPH_LIMITS.each} photographs` })
  }
  return { form, shownAgain, added, problems }
}

async function readSent(file: File, entryId: string): Promise<NewPhotograph | { readonly why: string }> {
  if (file.size > PHOTOGRAPH_LIMITS.bytes) return { why: 'is larger than 8 MB' }
  const bytes = new Uint8Array(await file.arrayBuffer())
  // Loaded with the first photograph: what reads pictures would make every start wait.
  const { readPicture } = await import('./picture.server.ts')
  const reading = await readPicture(bytes)
  if (!reading.ok) return { why: reading.why }
  // Of entry and content, so that the same form sent twice says the same; the files' own name is of this sending alone.
  const id = uuidv5(sha256(bytes), entryId)
  return { id, file: uuidv4(), ...reading.picture, sha256: sha256(reading.picture.large) }
}

const sha256 = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex')

const LONGEST_NAME = 40

/** The file's own name as far as it can be shown: it may be anything. */
function nameOf(file: File): string {
  const shown = file.name.replace(/[^\p{L}\p{N} ._-]/gu, '?').slice(0, LONGEST_NAME)
  return shown === '' ? 'A file' : `"${shown}"`
}

function copied(form: FormData): FormData {
  const copy = new FormData()
  for (const [name, value] of form) copy.append(name, value)
  return copy
}

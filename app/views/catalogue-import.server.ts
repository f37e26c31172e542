import { createHash } from 'node:crypto'
import { v7 as uuidv7 } from 'uuid'
import { importPlan, type PlannedRow } from '#app/catalogue/import-plan.ts'
import { innerCannulaName, tubeName } from '#app/catalogue/item.ts'
import { lineRanges } from '#app/catalogue/line-ranges.ts'
import { wholeCatalogue } from '#database/catalogue.server.ts'
import { type ItemToSave, saveItems } from '#database/catalogue-writes.server.ts'

const MOST_BYTES = 2_000_000
const SHOWN_ROWS = 500 // besides those with errors, which are all shown

/** One line of a preview. */
export interface PreviewRow {
  readonly line: number
  readonly fate: PlannedRow['fate']
  readonly name: string
  readonly details: readonly string[]
}

/** What came of a file: why it cannot be read, what it would do, or that it was done. `text` is what was sent. */
export type ImportOutcome =
  | { readonly is: 'unreadable'; readonly field: 'file' | 'text'; readonly text: string; readonly says: string }
  | {
      readonly is: 'preview'
      readonly text: string
      readonly digest: string
      readonly says: string | null
      readonly counts: Readonly<Record<PlannedRow['fate'], number>>
      readonly rows: readonly PreviewRow[]
      /** What becomes of the lines that are not among `rows`. */
      readonly more: readonly { readonly fate: PlannedRow['fate']; readonly lines: string }[]
    }
  | { readonly is: 'imported'; readonly says: string }

/** The CSV of an import form: the file that was chosen, else what stands in the box. */
export async function sentCsv(sent: FormData): Promise<{ readonly text: string } | { readonly says: string }> {
  const file = sent.get('file')
  const typed = sent.get('text')
  if (file instanceof File && file.size > 0) return fileText(file)
  if (typeof typed === 'string' && typed.trim() !== '') return { text: typed }
  return { says: 'Choose a file, or paste its lines' }
}

async function fileText(file: File): Promise<{ readonly text: string } | { readonly says: string }> {
  if (file.size > MOST_BYTES) return { says: 'The file is larger than 2 MB: import it in parts' }
  const bytes = new Uint8Array(await file.arrayBuffer())
  const words = (encoding: string) => new TextDecoder(encoding, { fatal: true, ignoreBOM: true }).decode(bytes)
  const says = 'The file is not text in UTF-8. Save it as "CSV UTF-8" and choose it again'
  try {
    const text = words('utf-8')
    return text.includes('\0') ? { says } : { text }
  } catch (error) {
    if (error instanceof TypeError) return { says }
    throw error
  }
}

/** Reads a file against the catalogue; with the digest of a preview that was seen, and no errors, imports it. */
export async function imported(text: string, seen: string | null, by: string): Promise<ImportOutcome> {
  const catalogue = await wholeCatalogue()
  const plan = importPlan(text, catalogue, () => uuidv7())
  if ('fault' in plan)
    return { is: 'unreadable', field: 'text', text, says: `Line ${plan.fault.line}: ${plan.fault.says}.` }
  const { rows } = plan
  const digest = digestOf(rows)
  const hasErrors = rows.some(({ fate }) => fate === 'error')
  if (seen === null || hasErrors) return previewOf(text, digest, rows, null)
  const meanwhile = 'The catalogue was changed meanwhile, so the file now does something else. Look again.'
  if (seen !== digest) return previewOf(text, digest, rows, meanwhile)
  const versions = new Map([...catalogue.tubes, ...catalogue.innerCannulas].map(({ id, version }) => [id, version]))
  const { outcome } = await saveItems(
    rows.flatMap(row => itemOf(row, versions)),
    by,
  )
  if (outcome !== 'saved') return previewOf(text, digest, rows, `${meanwhile} Nothing was imported.`)
  const { new: added, changed, same } = countsOf(rows)
  return { is: 'imported', says: `Imported: ${added} new, ${changed} changed, ${same} as before.` }
}

/** A file does the same when every line meets the same fate; ids that are minted anew do not count. */
function digestOf(rows: readonly PlannedRow[]): string {
  const told = rows.map(({ line, fate, changes, cells }) => [line, fate, changes, fate === 'new' ? '' : cells.id])
  return createHash('sha256').update(JSON.stringify(told)).digest('hex')
}

function itemOf(row: PlannedRow, versions: ReadonlyMap<string, number>): readonly ItemToSave[] {
  const { values, cells, fitIds, fate } = row
  if (values === null || (fate !== 'new' && fate !== 'changed')) return []
  return [
    { ...values, id: cells.id, version: versions.get(cells.id) ?? null, fitIds, retired: cells.retired === 'yes' },
  ]
}

function countsOf(rows: readonly PlannedRow[]): Record<PlannedRow['fate'], number> {
  const counts = { new: 0, changed: 0, same: 0, error: 0 }
  for (const { fate } of rows) counts[fate] += 1
  return counts
}

const order: readonly PlannedRow['fate'][] = ['error', 'changed', 'new', 'same']

/** Errors first, all of them, then what changes: a long file is read from what matters. */
function previewOf(text: string, digest: string, rows: readonly PlannedRow[], says: string | null): ImportOutcome {
  const sorted = rows.toSorted((a, b) => order.indexOf(a.fate) - order.indexOf(b.fate) || a.line - b.line)
  const counts = countsOf(rows)
  const [shown, rest] = [sorted.slice(0, counts.error + SHOWN_ROWS), sorted.slice(counts.error + SHOWN_ROWS)]
  const more = order.flatMap(fate => {
    const lines = lineRanges(rest.filter(row => row.fate === fate).map(({ line }) => line))
    return lines === '' ? [] : [{ fate, lines }]
  })
  return { is: 'preview', text, digest, says, counts, rows: shown.map(previewRow), more }
}

function previewRow({ line, fate, cells, values, errors, changes }: PlannedRow): PreviewRow {
  const details = [
    ...errors.map(error => `${error.heading}: ${error.says}`),
    ...changes.map(({ heading, was, now }) => `${heading}: ${was || 'empty'}, now ${now || 'empty'}`),
  ]
  return { line, fate, name: nameOf(values, cells), details }
}

/** As far as it can be read. */
function nameOf(read: PlannedRow['values'], { item, line, size }: PlannedRow['cells']): string {
  if (read?.item === 'tube')
    return `Tube ${tubeName({ ...read.values, innerCannula: read.values.innerCannula ?? null })}`
  if (read) return `Inner cannula ${innerCannulaName(read.values)}`
  return [item, line, size].filter(Boolean).join(' ').slice(0, 120)
}

import { fieldsOf } from '../care/field.ts'
import type { FieldMeta } from '../care/field-meta.ts'
import { type AnyCareKind, wordsOf } from '../care/kind.ts'
import { showDay } from '../time/display.ts'

/** One answer of an entry, in words. */
export interface Detail {
  readonly label: string
  readonly value: string
}

type Answers = Readonly<Record<string, unknown>>

/** Every answer of an entry with its label, in the order of the form; questions without an answer are left out. */
export function entryDetails(kind: AnyCareKind, data: Answers): readonly Detail[] {
  return fieldsOf(kind.schema).flatMap(({ name, meta }) => {
    const value = data[name]
    // The catalogue's ids are for programs: line and size stand in fields of their own.
    const isForReaders = meta.control !== 'item' && meta.control !== 'decided'
    return !isForReaders || value === undefined || value === null
      ? []
      : [{ label: meta.label, value: inWords(meta, value, data) }]
  })
}

function inWords(meta: FieldMeta, value: unknown, data: Answers): string {
  switch (meta.control) {
    case 'choice':
    case 'choices':
      return [value]
        .flat()
        .map(one => meta.options[String(one)] ?? String(one))
        .join(', ')
    case 'quantity':
      return `${String(value)} ${meta.unit ?? unitWords(meta.unitField, data)}`.trim()
    case 'date':
      return showDay(String(value))
    case 'task':
    case 'setting':
    case 'warning':
      return wordsOf(String(value))
    case 'photographs':
      return String([value].flat().length)
    case 'codes':
      return String(value).replaceAll('\u001d', ' ')
    case 'item':
    case 'decided':
    case 'text':
    case 'note':
      return String(value)
  }
}

/** What the field that holds the unit says; a name of a setting is no unit. */
function unitWords(unitField: string | undefined, data: Answers): string {
  const unit = unitField === undefined ? undefined : data[unitField]
  return typeof unit === 'string' && !unit.includes('-') ? unit : ''
}

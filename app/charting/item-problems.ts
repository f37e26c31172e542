import type { CataloguedItem } from '../care/catalogued-item.ts'
import { fieldsOf } from '../care/field.ts'
import type { ItemMeta } from '../care/field-meta.ts'
import type { FormProblem } from '../care/form-problem.ts'
import type { AnyCareKind } from '../care/kind.ts'
import { isPrintedAlike } from '../care/printed.ts'

/** The field of a kind that names an item of the catalogue; undefined where nothing is scanned. */
export function itemField(kind: AnyCareKind): { readonly name: string; readonly meta: ItemMeta } | undefined {
  return fieldsOf(kind.schema)
    .flatMap(({ name, meta }) => (meta.control === 'item' ? [{ name, meta }] : []))
    .at(0)
}

/** A form may not say one thing and name an item of which the catalogue says another. */
export function itemProblems(
  kind: AnyCareKind,
  care: Readonly<Record<string, unknown>>,
  item: CataloguedItem | null,
): readonly FormProblem[] {
  const field = itemField(kind)
  const named = field && care[field.name]
  if (!field || named === undefined) return []
  if (item?.id !== named) {
    return [{ field: `care.${field.name}`, message: 'The scanned item is not in the catalogue. Scan it again.' }]
  }
  return (['line', 'size'] as const).flatMap(what => {
    const name = field.meta.prints[what]
    const typed = care[name]
    const printed = what === 'line' ? [item.line, ...item.formerLines] : [item.size]
    if (typeof typed === 'string' && printed.some(words => isPrintedAlike(typed, words))) return []
    const message = `The scanned item has the ${what} ${item[what]}. Scan the other one, or take the scan out.`
    return [{ field: `care.${name}`, message }]
  })
}

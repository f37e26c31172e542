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
  const { prints } = field.meta
  if ('both' in prints) return nameProblems(prints.both, care, item)
  return (['line', 'size'] as const).flatMap(what => {
    const name = prints[what]
    const typed = care[name]
    const printed = what === 'line' ? linesOf(item) : [item.size]
    if (typeof typed === 'string' && printed.some(words => isPrintedAlike(typed, words))) return []
    const message = `The scanned item has the ${what} ${item[what]}. Scan the other one, or take the scan out.`
    return [{ field: `care.${name}`, message }]
  })
}

const linesOf = ({ line, formerLines }: CataloguedItem): readonly string[] => [line, ...formerLines]

/** Line and size in one field: each has to stand in it. */
function nameProblems(
  name: string,
  care: Readonly<Record<string, unknown>>,
  item: CataloguedItem,
): readonly FormProblem[] {
  const typed = care[name]
  const has = (words: string) => typeof typed === 'string' && typed.toLowerCase().includes(words.toLowerCase())
  if (linesOf(item).some(has) && has(item.size)) return []
  const message = `The scanned item is ${item.line} ${item.size}. Scan the other one, or take the scan out.`
  return [{ field: `care.${name}`, message }]
}

import { fieldsOf } from '#app/care/field.ts'
import type { ItemKind } from '#app/care/field-meta.ts'
import type { AnyCareKind } from '#app/care/kind.ts'
import type { Typed } from '#app/charting/chart-form.ts'
import { itemField } from '#app/charting/item-problems.ts'

/** A scanned item, as far as a form may ask about it. */
export interface ScannedItem {
  readonly of: ItemKind
  /** The item as the catalogue has it: what it calls as the form does is filled in. */
  readonly item: object & { readonly id: string }
  /** Line, size and what else tells it from others. */
  readonly name: string
  readonly lot: string | null
  readonly expiresOn: string | null
  /** As `codesText` writes them. */
  readonly codes: string
}

/**
 * The answers of a form that a scanned item gives. What the item does not have is emptied, so that nothing of an item scanned
 * before stays behind. Null for a form that asks for another kind of item.
 */
export function filledFrom(kind: AnyCareKind, scanned: ScannedItem): Typed | null {
  const field = itemField(kind)
  if (field?.meta.of !== scanned.of) return null
  const known: Readonly<Record<string, string | number | boolean | null | undefined>> = {
    ...scanned.item,
    lot: scanned.lot,
    expiresOn: scanned.expiresOn,
    [field.name]: scanned.item.id,
    ...('both' in field.meta.prints ? { [field.meta.prints.both]: scanned.name } : {}),
  }
  const answers = fieldsOf(kind.schema).flatMap(({ name, meta }) => {
    if (meta.control === 'codes') return [[`care.${name}`, [scanned.codes]] as const]
    if (!Object.hasOwn(known, name)) return []
    const value = known[name]
    return [[`care.${name}`, [value === null || value === undefined ? '' : String(value)]] as const]
  })
  return Object.fromEntries(answers)
}

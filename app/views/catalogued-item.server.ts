import { validate as isUuid } from 'uuid'
import type { CataloguedItem } from '#app/care/catalogued-item.ts'
import type { AnyCareKind } from '#app/care/kind.ts'
import { itemField } from '#app/charting/item-problems.ts'
import { catalogueInnerCannula, catalogueTube, tubesFitting } from '#database/catalogue.server.ts'
import { lineById } from '#database/catalogue-lines.server.ts'

/** The item of the catalogue that a form names; null when it names none, or none that there is. */
export async function cataloguedItem(kind: AnyCareKind, form: FormData): Promise<CataloguedItem | null> {
  const field = itemField(kind)
  const id = field && form.get(`care.${field.name}`)
  if (!field || typeof id !== 'string' || !isUuid(id)) return null
  const item = field.meta.of === 'tube' ? await catalogueTube(id) : await catalogueInnerCannula(id)
  if (!item) return null
  const [fits, line] = await Promise.all([field.meta.of === 'tube' ? [] : tubesFitting(id), lineById(item.lineId)])
  return {
    id: item.id,
    line: item.line,
    formerLines: line?.formerNames ?? [],
    size: item.size,
    fits: fits.map(tube => tube.id),
  }
}

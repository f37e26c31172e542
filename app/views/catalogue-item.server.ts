import { data } from 'react-router'
import {
  type Cells,
  type Column,
  cellChanges,
  columns,
  headings,
  type ItemKind,
  innerCannulaCells,
  tubeCells,
} from '#app/catalogue/columns.ts'
import { innerCannulaName, tubeName } from '#app/catalogue/item.ts'
import { env } from '#app/env.server.ts'
import { showDateTime } from '#app/time/display.ts'
import { catalogueInnerCannula, catalogueTube, innerCannulasFitting, tubesFitting } from '#database/catalogue.server.ts'
import { type CatalogueChange, catalogueChangesOf } from '#database/catalogue-changes.server.ts'

/** The two lists of the catalogue by their word in an address. */
const kinds: Readonly<Record<string, ItemKind>> = { tubes: 'tube', 'inner-cannulas': 'inner cannula' }

/** The kind of item that an address names. Throws a 404 for another word. */
export function itemKindOr404(items: string): ItemKind {
  const kind = Object.hasOwn(kinds, items) ? kinds[items] : undefined
  if (!kind) throw data('There is no such list in the catalogue.', 404)
  return kind
}

/** An item with what goes with it, as its pages show it. */
export interface ItemView {
  readonly kind: ItemKind
  readonly id: string
  readonly version: number
  readonly name: string
  readonly lineId: string
  readonly isRetired: boolean
  readonly cells: Cells
  readonly fits: readonly { readonly id: string; readonly name: string; readonly isRetired: boolean }[]
}

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/

/** The item of an address, with what fits it. Throws a 404 when there is none. */
export async function itemOr404(kind: ItemKind, id: string): Promise<ItemView> {
  const found = UUID.test(id) ? await (kind === 'tube' ? tubeView(id) : innerCannulaView(id)) : undefined
  if (!found) throw data('There is no such item in the catalogue.', 404)
  return found
}

async function tubeView(id: string): Promise<ItemView | undefined> {
  const [tube, fitting] = await Promise.all([catalogueTube(id), innerCannulasFitting(id)])
  if (!tube) return undefined
  const { lineId, version } = tube
  const fits = fitting.map(one => ({ id: one.id, name: innerCannulaName(one), isRetired: one.retiredAt !== null }))
  const told = { name: tubeName(tube), isRetired: tube.retiredAt !== null, cells: tubeCells(tube, fitting) }
  return { kind: 'tube', id, version, lineId, fits, ...told }
}

async function innerCannulaView(id: string): Promise<ItemView | undefined> {
  const [cannula, tubes] = await Promise.all([catalogueInnerCannula(id), tubesFitting(id)])
  if (!cannula) return undefined
  const { lineId, version } = cannula
  const fits = tubes.map(tube => ({
    id: tube.id,
    name: tubeName(tube),
    isRetired: tube.retiredAt !== null,
  }))
  const told = {
    name: innerCannulaName(cannula),
    isRetired: cannula.retiredAt !== null,
    cells: innerCannulaCells(cannula),
  }
  return { kind: 'inner cannula', id, version, lineId, fits, ...told }
}

/** What was changed of an item, of its line or of both, newest first, in words. */
export async function catalogueHistory(...ids: readonly string[]) {
  const changes = await catalogueChangesOf(...ids)
  return changes.map(change => ({
    key: String(change.id),
    when: showDateTime(change.changedAt, env.hospitalTimeZone),
    who: change.changedByName,
    what: [change.what.charAt(0).toUpperCase() + change.what.slice(1), ...detailsOf(change)].join('. '),
  }))
}

function detailsOf({ oldValues, newValues }: CatalogueChange): readonly string[] {
  if (!oldValues) return []
  const whole = (some: Readonly<Partial<Record<Column, string>>>) =>
    Object.fromEntries(columns.map(column => [column, some[column] ?? ''])) as Cells
  return cellChanges(whole(oldValues), whole(newValues))
    .filter(({ heading }) => heading !== headings.retired)
    .map(({ heading, was, now }) => `${heading}: ${was || 'empty'}, now ${now || 'empty'}`)
}

import { validate as isUuid } from 'uuid'
import { bedItems } from '#app/supplies/bed-stock.ts'
import { orderList } from '#app/supplies/order.ts'
import { bedsOf } from '#database/beds.server.ts'
import type { Stock } from '#database/stock.server.ts'
import type { ItemWords } from '#database/stock-items.server.ts'
import { type WardSupplies, wardSupplies } from './ward-supplies.server.ts'

/** The page of a ward's supplies: the stock, the order list, and what lies at each bed. */
export async function suppliesPage(wardId: string, now: Date) {
  const [supplies, beds] = await Promise.all([wardSupplies(wardId, now), bedsOf(wardId)])
  const { rule, items, hasPolicy, ward } = supplies
  return {
    ward,
    hasPolicy,
    rule,
    items,
    order: orderList(items),
    beds: beds.map(bed => bedView(bed, supplies)).filter(bed => bed.patient !== null || bed.items.length > 0),
  }
}

function bedView({ id, label }: { readonly id: string; readonly label: string }, supplies: WardSupplies) {
  const present = supplies.patients.find(({ stay }) => stay.stay.bedId === id)
  const { patient } = present?.stay ?? {}
  return {
    id,
    label,
    patient: patient ? `${patient.familyName.toUpperCase()}, ${patient.givenName}` : null,
    patientId: patient?.id ?? null,
    items: bedItems(stockAt(supplies.stock, id), present?.rates ?? new Map(), aboutItems(supplies.words)),
  }
}

/** What a bed's list has to know of items, beside their numbers. */
export function aboutItems(words: ReadonlyMap<string, ItemWords>): Parameters<typeof bedItems>[2] {
  return {
    wordsOf: item => words.get(item)?.words ?? 'An item that is not in the catalogue any more',
    // A tube, an inner cannula: made for this patient's tube alone, so a spare has to lie here.
    belongsAtBed: isUuid,
  }
}

function stockAt(stock: readonly Stock[], bedId: string): ReadonlyMap<string, number> {
  return new Map(stock.filter(one => one.bedId === bedId).map(({ item, stock: pieces }) => [item, pieces]))
}

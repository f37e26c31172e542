import { policyInForce, valuesFor } from '#app/care/policy.ts'
import { bedItems } from '#app/supplies/bed-stock.ts'
import { type PatientItem, patientItems } from '#app/supplies/patient-stock.ts'
import { policies } from '#database/policies.server.ts'
import { stockKeptSince, stockOfBed, stockOfStore } from '#database/stock.server.ts'
import { wordsOfItems } from '#database/stock-items.server.ts'
import type { PatientCare } from './patient-context.server.ts'
import { aboutItems } from './supplies-page.server.ts'
import { orderRule, patientSupplies } from './ward-supplies.server.ts'

/** What lies at a patient's bed. */
export interface PatientSupplies {
  readonly bed: string
  readonly bedId: string
  readonly items: readonly PatientItem[]
}

/** What lies at the bed of a patient, and how long it lasts; null once they have left it. */
export async function suppliesAtBed({ record, ward }: PatientCare, now: Date): Promise<PatientSupplies | null> {
  const { stay } = record
  if (stay.dischargedAt) return null
  const [known, atBed, keptSince] = await Promise.all([policies(), stockOfBed(stay.bedId), stockKeptSince(ward.id)])
  const policy = policyInForce(known, ward.id, now)
  const [supply] = await patientSupplies([record], { policy, ward, keptSince, now })
  const rates = supply?.rates ?? new Map()
  const stock = new Map(atBed.map(({ item, stock: pieces }) => [item, pieces]))
  const keys = [...new Set([...stock.keys(), ...rates.keys()])]
  const [words, store] = await Promise.all([wordsOfItems(keys), stockOfStore(ward.id, keys)])
  const rule = orderRule(policy ? valuesFor(policy) : null)
  const items = bedItems(stock, rates, aboutItems(words))
  return { bed: stay.bedLabel, bedId: stay.bedId, items: patientItems(items, { store, rates, rule }) }
}

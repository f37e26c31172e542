import { data } from 'react-router'
import type { AnyCareKind, CareContext } from '#app/care/kind.ts'
import { careKinds } from '#app/care/kinds.ts'
import { type Policy, policyInForce, type Values, valuesFor } from '#app/care/policy.ts'
import type { PlannedUse } from '#app/care/supply.ts'
import {
  supplyHorizon,
  supplyLeadDays,
  supplyLeastDays,
  supplyRateDays,
  supplySafetyDays,
  supplyWastage,
} from '#app/care/supply-settings.ts'
import type { OrderRule, Rate } from '#app/clinical/supply.ts'
import { env } from '#app/env.server.ts'
import { type Planned, patientRates, wardRates } from '#app/supplies/rates.ts'
import { type ItemFacts, type ItemRow, itemRows } from '#app/supplies/ward-stock.ts'
import { days, earlier } from '#app/time/duration.ts'
import { policies } from '#database/policies.server.ts'
import { type StayRecord, wardRecords } from '#database/records.server.ts'
import { type StayUse, type Stock, stockKeptSince, stockOfWard, usedByStays } from '#database/stock.server.ts'
import { type Identify, type ItemWords, identified, itemKey, wordsOfItems } from '#database/stock-items.server.ts'
import { type Ward, wardById } from '#database/wards.server.ts'
import { contextOf } from './care-of.server.ts'

/** The rule orders are reckoned by, on a ward; without a reviewed policy the product's own numbers. */
export function orderRule(values: Values | null): OrderRule {
  const of = (setting: typeof supplyWastage) => values?.of(setting) ?? setting.default
  return {
    wastage: of(supplyWastage),
    leadDays: of(supplyLeadDays),
    safetyDays: of(supplySafetyDays),
    horizonDays: of(supplyHorizon),
  }
}

/** One present patient with what they use. */
export interface PatientSupply {
  readonly stay: StayRecord
  readonly rates: ReadonlyMap<string, Rate>
}

/** The stock of a ward, with how fast it goes. */
export interface WardSupplies {
  readonly ward: { readonly id: string; readonly name: string }
  readonly rule: OrderRule
  readonly items: readonly ItemRow[]
  readonly stock: readonly Stock[]
  readonly patients: readonly PatientSupply[]
  readonly words: ReadonlyMap<string, ItemWords>
  readonly hasPolicy: boolean
}

/** What a ward has, uses and should order. The number of queries does not depend on patients or items. 404 without the ward. */
export async function wardSupplies(wardId: string, now: Date): Promise<WardSupplies> {
  const [ward, known, records, stock, keptSince] = await Promise.all([
    wardById(wardId),
    policies(),
    wardRecords(wardId),
    stockOfWard(wardId),
    stockKeptSince(wardId),
  ])
  if (!ward) throw data('There is no such ward.', 404)
  const policy = policyInForce(known, wardId, now)
  const values = policy ? valuesFor(policy) : null
  const patients = await patientSupplies(records.stays, { policy, ward, keptSince, now })
  const rates = wardRates(patients.map(patient => patient.rates))
  const keys = [...new Set([...stock.map(({ item }) => item), ...rates.keys()])]
  const words = await wordsOfItems(keys)
  const rule = orderRule(values)
  const items = itemRows(
    keys.map(item => ({ ...factsOf(item, stock, words), rate: rates.get(item) })),
    rule,
  )
  return {
    ward: { id: ward.id, name: ward.name },
    rule,
    items,
    stock,
    patients,
    words,
    hasPolicy: policy !== undefined,
  }
}

interface Kept {
  readonly policy: Policy | undefined
  readonly ward: Pick<Ward, 'shiftTimes' | 'pressureUnit'>
  readonly keptSince: Date | undefined
  readonly now: Date
}

/** What each of some present patients uses: counted since the stock was kept and they came, or planned. */
export async function patientSupplies(
  stays: readonly StayRecord[],
  { policy, ward, keptSince, now }: Kept,
): Promise<readonly PatientSupply[]> {
  const values = policy ? valuesFor(policy) : null
  const facts = { zone: env.hospitalTimeZone, shiftTimes: ward.shiftTimes, pressureUnit: ward.pressureUnit }
  const contexts = stays.map(stay => ({ stay, context: policy ? contextOf(stay, { policy, ward: facts, now }) : null }))
  const window = values?.of(supplyRateDays) ?? supplyRateDays.default
  const uses = await usedByStays(
    stays.map(({ stay }) => stay.id),
    now,
    window,
  )
  const plans = contexts.map(({ stay, context }) => ({ stay, planned: context ? plannedUse(context) : [] }))
  const itemOf = await identified(
    plans.flatMap(({ planned }) => planned.map(({ item }) => item)),
    null,
  )
  const began = latest(earlier(now, days(window)), keptSince ?? now)
  const leastDays = values?.of(supplyLeastDays) ?? supplyLeastDays.default
  return plans.map(({ stay, planned }) => {
    const counting = { from: latest(began, stay.stay.admittedAt), now, leastDays }
    return { stay, rates: patientRates(plannedOf(planned, itemOf), usesOf(uses, stay), counting) }
  })
}

/** What a patient is going to need by the intervals in force, from every kind of care. */
export function plannedUse(context: CareContext): readonly PlannedUse[] {
  return careKinds.flatMap((kind: AnyCareKind) => kind.plannedUse?.(context) ?? [])
}

/** The same by the keys under which items are added up. */
export function plannedOf(planned: readonly PlannedUse[], itemOf: Identify): readonly Planned[] {
  return planned.map(({ item, perDay, since }) => ({
    ...{ item: itemKey(itemOf(item)), perDay, since },
    isCannula: 'device' in item && item.device !== 'tube',
  }))
}

const latest = (a: Date, b: Date): Date => (a > b ? a : b)

const usesOf = (uses: readonly StayUse[], { stay }: StayRecord) => uses.filter(({ stayId }) => stayId === stay.id)

function factsOf(
  item: string,
  stock: readonly Stock[],
  words: ReadonlyMap<string, ItemWords>,
): Omit<ItemFacts, 'rate'> {
  const here = stock.filter(one => one.item === item)
  const sum = (rows: readonly Stock[]) => rows.reduce((total, one) => total + one.stock, 0)
  return {
    item,
    ...(words.get(item) ?? { words: 'An item that is not in the catalogue any more', packSize: null }),
    store: sum(here.filter(({ bedId }) => bedId === null)),
    atBeds: sum(here.filter(({ bedId }) => bedId !== null)),
    anyBelow: here.some(one => one.stock < 0),
  }
}

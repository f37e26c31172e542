import { data } from 'react-router'
import type { CareContext, WardFacts } from '#app/care/kind.ts'
import { policyOverTime } from '#app/care/policy.ts'
import { env } from '#app/env.server.ts'
import { showDateTime } from '#app/time/display.ts'
import { recalls } from '#database/lot-recalls.server.ts'
import { policies, type StoredPolicy } from '#database/policies.server.ts'
import { type StayRecord, stayRecord } from '#database/records.server.ts'
import { wardById } from '#database/wards.server.ts'
import { contextOf } from './care-of.server.ts'

/** One patient with everything rules decide from. `context` is null when nothing may be computed, and `nothingDue` says why. */
export interface PatientCare {
  readonly record: StayRecord
  readonly ward: WardFacts & { readonly id: string; readonly name: string }
  readonly context: CareContext | null
  readonly nothingDue: string | null
  /** Every version of every policy, as they were when this was read. */
  readonly policies: readonly StoredPolicy[]
}

/** The care of one stay at `now`. Throws a 404 when there is no such stay. */
export async function patientCare(stayId: string, now: Date): Promise<PatientCare> {
  const [record, recalled, known] = await Promise.all([stayRecord(stayId), recalls(), policies()])
  const found = record && (await wardById(record.stay.wardId))
  if (!record || !found) throw data('There is no such patient.', 404)
  const { id, name, shiftTimes, pressureUnit } = found
  const ward = { id, name, shiftTimes, pressureUnit, zone: env.hospitalTimeZone, recalls: recalled }
  const policyAt = policyOverTime(known, id)
  const policy = policyAt(now)
  const about = { record, ward, policies: known }
  if (!policy) return { ...about, context: null, nothingDue: 'This ward has no reviewed policy: nothing is computed.' }
  const context = contextOf(record, { policy, policyAt, ward, now })
  const discharged = record.stay.dischargedAt
  return { ...about, context, nothingDue: discharged && `Discharged on ${showDateTime(discharged, ward.zone)}.` }
}

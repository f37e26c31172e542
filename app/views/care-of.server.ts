import type { CareContext, PatientRecord, WardFacts } from '#app/care/kind.ts'
import type { Policy } from '#app/care/policy.ts'
import { patientRecord } from '#app/care/record.ts'
import { careContext } from '#app/rules/context.ts'
import type { StayRecord } from '#database/records.server.ts'

const records = new WeakMap<StayRecord['entries'], { readonly version: number; readonly record: PatientRecord }>()

/** The record of a stay: the same object until something is charted or the patient's facts are edited. */
export function recordOf({ entries, patient, stay }: StayRecord): PatientRecord {
  const known = records.get(entries)
  if (known?.version === patient.version && entries.length > 0) return known.record
  const record = patientRecord(entries, { admittedAt: stay.admittedAt, patient })
  records.set(entries, { version: patient.version, record })
  return record
}

/** What rules decide from, for one stay on a ward under its policy. */
export function contextOf(stay: StayRecord, policy: Policy, ward: WardFacts, now: Date): CareContext {
  return careContext({ record: recordOf(stay), policy, ward, now })
}

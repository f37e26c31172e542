import type { CareContext, PatientRecord, WardFacts } from '#app/care/kind.ts'
import type { Policy, PolicyOverTime } from '#app/care/policy.ts'
import { patientRecord } from '#app/care/record.ts'
import { careContext } from '#app/rules/context.ts'
import type { StayRecord } from '#database/records.server.ts'

interface Known {
  readonly version: number
  readonly bed: string
  readonly moves: number
  readonly record: PatientRecord
}

const records = new WeakMap<StayRecord['entries'], Known>()

/** The record of a stay: the same object until something is charted, the patient's facts are edited, or they are moved. */
export function recordOf({ entries, patient, stay }: StayRecord): PatientRecord {
  const known = records.get(entries)
  const { version } = patient
  const { bedLabel: bed, admittedAt, moves } = stay
  const isSame = known?.version === version && known.bed === bed && known.moves === moves.length
  if (known && isSame && entries.length > 0) return known.record
  const identity = `${patient.familyName}, ${patient.givenName}; ${patient.bornOn}; ${patient.recordNumber}`
  const record = patientRecord(entries, { admittedAt, moves, patient: { ...patient, bed, identity } })
  records.set(entries, { version, bed, moves: moves.length, record })
  return record
}

/** What rules decide from, for one stay on a ward under its policy; `policyAt`: that of the past, where acts on record are judged. */
export function contextOf(
  stay: StayRecord,
  under: {
    readonly policy: Policy
    readonly policyAt?: PolicyOverTime
    readonly ward: WardFacts
    readonly now: Date
  },
): CareContext {
  return careContext({ record: recordOf(stay), ...under })
}

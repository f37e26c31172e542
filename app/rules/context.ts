import { personalValues } from '../care/care-plan/personal-values.ts'
import type { CareContext, PatientRecord, WardFacts } from '../care/kind.ts'
import { type Policy, valuesFor } from '../care/policy.ts'

/** What rules decide from: the record, the policy of the ward with the patient's own plan over it, and the moment. */
export function careContext(given: {
  readonly record: PatientRecord
  readonly policy: Policy
  readonly ward: WardFacts
  readonly now: Date
}): CareContext {
  const { record, policy, ward, now } = given
  return { record, values: valuesFor(policy, personalValues(record)), ward, now }
}

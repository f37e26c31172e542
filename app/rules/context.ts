import { personalValues } from '../care/care-plan/personal-values.ts'
import type { CareContext, Entry, PatientRecord, WardFacts } from '../care/kind.ts'
import { type Policy, valuesFor } from '../care/policy.ts'
import { recordBefore } from '../care/record.ts'

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

/** What an act that is on record is judged by: the record and the patient's own values of its moment, under the policy in force now. */
export function contextBefore(act: Pick<Entry, 'id' | 'performedAt'>, context: CareContext): CareContext {
  const { record, values, ward } = context
  return careContext({ record: recordBefore(record, act), policy: values.policy, ward, now: act.performedAt })
}

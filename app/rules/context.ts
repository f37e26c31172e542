import { personalValues } from '../care/care-plan/personal-values.ts'
import { ageGroupOf } from '../care/children.ts'
import { adultAge } from '../care/general-settings.ts'
import type { CareContext, Entry, PatientRecord, WardFacts } from '../care/kind.ts'
import { type Policy, type PolicyOverTime, type Values, valuesFor } from '../care/policy.ts'
import { recordBefore } from '../care/record.ts'
import { ageOn } from '../time/display.ts'
import { localDay } from '../time/zone.ts'

/**
 * What rules decide from: the record, the policy of the ward with the patient's own plan over it, and the moment. Somebody under the
 * age for adults is judged by the rule set for children where there is one; where there is none, `isTooYoung` keeps rules from running.
 */
export function careContext(given: {
  readonly record: PatientRecord
  readonly policy: Policy
  readonly ward: WardFacts
  readonly now: Date
  readonly policyAt?: PolicyOverTime | undefined
}): CareContext {
  const { record, policy, ward, now, policyAt } = given
  return { record, values: valuesOf(policy, record, ward, now), ward, now, ...(policyAt ? { policyAt } : {}) }
}

function valuesOf(policy: Policy, record: PatientRecord, ward: WardFacts, now: Date): Values {
  const personal = personalValues(record)
  const children = policy.ruleSet === 'children' ? policy : policy.children
  if (!children) return valuesFor(policy, personal)
  const today = localDay(now, ward.zone)
  const age = ageOn(record.patient.bornOn, today)
  const isChild = policy.ruleSet === 'children' || age < valuesFor(policy).of(adultAge)
  return isChild
    ? valuesFor(children, personal, ageGroupOf(age, record.patient.bornOn, today))
    : valuesFor(policy, personal)
}

/**
 * What an act that is on record is judged by: the record, the patient's own values and the policy of its moment. One of before the
 * first version is judged by the policy in force now.
 */
export function contextBefore(act: Pick<Entry, 'id' | 'performedAt'>, context: CareContext): CareContext {
  const { record, values, ward, policyAt } = context
  const policy = policyAt?.(act.performedAt) ?? values.policy
  return careContext({ record: recordBefore(record, act), policy, ward, now: act.performedAt, policyAt })
}

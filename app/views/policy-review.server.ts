import type { WardFacts } from '#app/care/kind.ts'
import { type Policy, policyInForce, type RuleSet, ruleSetInForce } from '#app/care/policy.ts'
import type { LoadLine, WhatIf } from '#app/components/what-if-tables.tsx'
import { env } from '#app/env.server.ts'
import { completeValues, type PolicyDifference, policyDifferences, policyProblems } from '#app/rules/policy-values.ts'
import { type Load, type WardLoad, wardLoad } from '#app/rules/what-if.ts'
import { days, earlier } from '#app/time/duration.ts'
import { policies } from '#database/policies.server.ts'
import type { PolicyDraft } from '#database/policy-drafts.server.ts'
import { wardRecordsSince } from '#database/records.server.ts'
import type { Ward } from '#database/wards.server.ts'
import { recordOf } from './care-of.server.ts'

export interface PolicyReview {
  readonly differences: readonly PolicyDifference[]
  readonly problems: readonly string[]
  readonly whatIf: WhatIf
}

const DAYS_BACK = 14

/** A draft beside the version in force: what differs, what does not fit, and what it would have asked for. */
export async function policyReview(draft: PolicyDraft, ward: Ward, now: Date): Promise<PolicyReview> {
  const { ruleSet } = draft
  const known = await policies()
  const inForce = ruleSetInForce(known, ward.id, ruleSet, now)
  const adults = policyInForce(known, ward.id, now)
  return {
    differences: policyDifferences(ruleSet, inForce?.values ?? {}, draft.values),
    problems: policyProblems(ruleSet, draft.values),
    whatIf: await whatIf(ward, adults, drafted(draft, adults, now), now),
  }
}

/** The policy of a ward as it would be with the draft in force. */
function drafted({ ruleSet, values }: PolicyDraft, adults: Policy | undefined, now: Date): Policy {
  const base = adults ?? nobodys('adults', now)
  const complete = completeValues(ruleSet, values)
  if (ruleSet === 'adults') return { ...base, values: complete }
  return { ...base, children: { ...nobodys('children', now), values: complete } }
}

function nobodys(ruleSet: RuleSet, now: Date): Policy {
  const about = { id: 'draft', name: 'Draft', version: 0, wardId: null, reviewedBy: '', reviewedOn: '' }
  return { ...about, ruleSet, startsAt: now, values: {} }
}

async function whatIf(ward: Ward, inForce: Policy | undefined, draft: Policy, now: Date): Promise<WhatIf> {
  const from = earlier(now, days(DAYS_BACK))
  const found = await wardRecordsSince(ward.id, from)
  const stays = found.map(({ record, arrivedAt }) => ({
    record: recordOf(record),
    from: arrivedAt,
    until: record.stay.dischargedAt ?? now,
  }))
  const facts: WardFacts = { zone: env.hospitalTimeZone, shiftTimes: ward.shiftTimes, pressureUnit: ward.pressureUnit }
  const asked = { stays, ward: facts, from, to: now }
  const before = inForce ? wardLoad({ ...asked, policy: inForce }) : null
  const after = wardLoad({ ...asked, policy: draft })
  return {
    days: DAYS_BACK,
    patients: stays.length,
    withoutRules: after.withoutRules,
    total: { label: 'All care', inForce: before?.total ?? null, draft: after.total },
    byShift: linesOf(before, after, ({ byShift }) => byShift),
    byTask: linesOf(before, after, ({ byTask }) => byTask),
  }
}

const NOTHING: Load = { tasks: 0, late: 0 }

function linesOf(
  before: WardLoad | null,
  after: WardLoad,
  loads: (load: WardLoad) => ReadonlyMap<string, Load>,
): readonly LoadLine[] {
  const labels = new Set([...(before ? loads(before).keys() : []), ...loads(after).keys()])
  return [...labels].map(label => ({
    label,
    inForce: before && (loads(before).get(label) ?? NOTHING),
    draft: loads(after).get(label) ?? NOTHING,
  }))
}

/** The name that the next version starts with: that of the one in force. */
export async function policyName({ id, name }: Ward, ruleSet: RuleSet, now: Date): Promise<string> {
  const inForce = ruleSetInForce(await policies(), id, ruleSet, now)
  return inForce?.name ?? `Tracheostomy care${ruleSet === 'children' ? ' of children' : ''}, ${name}`
}

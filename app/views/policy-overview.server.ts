import { type AnySetting, type Policy, policyInForce, type RuleSet, ruleSetInForce } from '#app/care/policy.ts'
import { isSameValue } from '#app/care/setting-value.ts'
import type { PolicyLine, PolicySection, VersionLine } from '#app/components/policy-sections.tsx'
import { env } from '#app/env.server.ts'
import { completeValues, settingSections } from '#app/rules/policy-values.ts'
import { showValue } from '#app/rules/why.ts'
import { showDateTime, showDay } from '#app/time/display.ts'
import { policies, type StoredPolicy } from '#database/policies.server.ts'

export interface PolicyOverview {
  readonly title: string
  readonly review: string
  readonly isInForce: boolean
  readonly sections: readonly PolicySection[]
}

/** The versions that count for a ward and rule set: its own, or the hospital's until it has some. Latest start first. */
export function versionsFor(known: readonly StoredPolicy[], wardId: string, ruleSet: RuleSet): readonly StoredPolicy[] {
  return known.filter(policy => policy.ruleSet === ruleSet && (policy.wardId === wardId || policy.wardId === null))
}

/** A version of a ward's policy in words, section by section: the one that is asked for, else that in force; null when there is none. */
export async function policyOverview(
  wardId: string,
  ruleSet: RuleSet,
  versionId: string | null,
  now: Date,
): Promise<PolicyOverview | null> {
  const known = versionsFor(await policies(), wardId, ruleSet)
  const inForce = ruleSetInForce(known, wardId, ruleSet, now)
  const policy = versionId === null ? inForce : known.find(({ id }) => id === versionId)
  if (!policy) return null
  return {
    title: titleOf(policy),
    review: `Reviewed by ${policy.reviewedBy} on ${showDay(policy.reviewedOn)}.`,
    isInForce: policy.id === inForce?.id,
    sections: sectionsOf(policy),
  }
}

const titleOf = ({ name, version, wardId }: StoredPolicy): string =>
  `${name}, version ${version}${wardId === null ? ' of the hospital' : ''}`

/** Every version of a ward's policy with what became of it. */
export async function policyVersions(
  wardId: string,
  ruleSet: RuleSet,
  now: Date,
  manages: boolean,
): Promise<readonly VersionLine[]> {
  const known = versionsFor(await policies(), wardId, ruleSet)
  const inForce = ruleSetInForce(known, wardId, ruleSet, now)
  return known.map((policy, i) => {
    const standing = standingOf(policy, inForce, now)
    return {
      id: policy.id,
      title: titleOf(policy),
      standing,
      says: versionWords(policy, standing),
      reason: policy.reason,
      mayWithdraw: manages && standing === 'coming' && policy.wardId === wardId,
      before: known.slice(i + 1).find(({ withdrawn }) => !withdrawn)?.id ?? null,
    }
  })
}

function standingOf(policy: StoredPolicy, inForce: Policy | undefined, now: Date): VersionLine['standing'] {
  if (policy.withdrawn) return 'withdrawn'
  if (policy.startsAt > now) return 'coming'
  return policy.id === inForce?.id ? 'in force' : 'earlier'
}

function versionWords(policy: StoredPolicy, standing: VersionLine['standing']): string {
  const at = (moment: Date) => showDateTime(moment, env.hospitalTimeZone)
  const by = policy.createdByName ? ` Published by ${policy.createdByName}.` : ''
  const review = `Reviewed by ${policy.reviewedBy} on ${showDay(policy.reviewedOn)}.${by}`
  if (policy.withdrawal)
    return `Withdrawn on ${at(policy.withdrawal.at)} by ${policy.withdrawal.by}: ${policy.withdrawal.reason} ${review}`
  return `${standing === 'coming' ? 'Starts' : 'Started'} on ${at(policy.startsAt)}. ${review}`
}

function sectionsOf(policy: StoredPolicy): readonly PolicySection[] {
  const values = completeValues(policy.ruleSet, policy.values)
  return settingSections(policy.ruleSet).map(({ id, title, settings }) => ({
    id,
    title,
    lines: settings.map(setting => lineOf(setting, policy, values)),
  }))
}

function lineOf(setting: AnySetting, policy: Policy, values: Policy['values']): PolicyLine {
  const { name, label, unit, min, max, affects, source } = setting
  const value = values[name] ?? setting.default
  return {
    name,
    label,
    value: showValue(value, unit),
    differsFrom: isSameValue(value, setting.default) ? null : showValue(setting.default, unit),
    range: min === undefined || max === undefined ? null : `${min} to ${max} ${unit}`,
    affects,
    source: source.says,
    standing: source.standing,
    personal: setting.personal === true,
    reviewed: policy.values[name] !== undefined,
  }
}

/** Who reviewed the policy of the first of these wards, in words, and the names of wards that have none that was reviewed. */
export async function reviewOfWards(
  wards: readonly { readonly id: string; readonly name: string }[],
  now: Date,
): Promise<{ readonly reviewed: string | null; readonly unreviewed: readonly string[] }> {
  const known = wards.length === 0 ? [] : await policies()
  const inForce = wards.map(ward => ({ ward, policy: policyInForce(known, ward.id, now) }))
  const first = inForce[0]?.policy
  return {
    reviewed: first ? `Last reviewed by ${first.reviewedBy}, ${showDay(first.reviewedOn)}.` : null,
    unreviewed: inForce.flatMap(({ ward, policy }) => (policy ? [] : [ward.name])),
  }
}

import type { AnyCareKind } from '#app/care/kind.ts'
import { careKinds, careSettings } from '#app/care/kinds.ts'
import { type AnySetting, type Policy, policyInForce, type Standing, valuesFor } from '#app/care/policy.ts'
import { showValue } from '#app/rules/why.ts'
import { showDay } from '#app/time/display.ts'
import { policies } from '#database/policies.server.ts'

export interface PolicyLine {
  readonly name: string
  readonly label: string
  readonly value: string
  /** Set when it differs from the product's default. */
  readonly differsFrom: string | null
  readonly affects: string
  readonly source: string
  readonly standing: Standing
  readonly personal: boolean
  readonly reviewed: boolean
}

export interface PolicySection {
  readonly title: string
  readonly lines: readonly PolicyLine[]
}

export interface PolicyOverview {
  readonly title: string
  readonly review: string
  readonly sections: readonly PolicySection[]
}

/** The policy in force on a ward in words, section by section; null when none was reviewed. */
export async function policyOverview(wardId: string, now: Date): Promise<PolicyOverview | null> {
  const policy = policyInForce(await policies(), wardId, now)
  if (!policy) return null
  return {
    title: `${policy.name}, version ${policy.version}`,
    review: `Reviewed by ${policy.reviewedBy} on ${showDay(policy.reviewedOn)}.`,
    sections: sectionsOf(policy),
  }
}

function sectionsOf(policy: Policy): readonly PolicySection[] {
  const shown = new Set<string>()
  const kinds: readonly AnyCareKind[] = careKinds
  const sections = kinds.map(kind => ({
    title: kind.title,
    lines: (kind.settings ?? []).filter(setting => isNew(setting, shown)).map(setting => lineOf(setting, policy)),
  }))
  const general = careSettings.filter(setting => isNew(setting, shown)).map(setting => lineOf(setting, policy))
  return [...sections, { title: 'Charting', lines: general }].filter(section => section.lines.length > 0)
}

function isNew(setting: AnySetting, shown: Set<string>): boolean {
  if (shown.has(setting.name)) return false
  shown.add(setting.name)
  return true
}

function lineOf(setting: AnySetting, policy: Policy): PolicyLine {
  const values = valuesFor(policy)
  const value = showValue(values.shown(setting), setting.unit)
  const byDefault = showValue(setting.default, setting.unit)
  return {
    name: setting.name,
    label: setting.label,
    value,
    differsFrom: value === byDefault ? null : byDefault,
    affects: setting.affects,
    source: setting.source.says,
    standing: setting.source.standing,
    personal: setting.personal === true,
    reviewed: values.originOf(setting) === 'policy',
  }
}

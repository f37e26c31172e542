import { type AgeGroup, ageGroups, settingsOf } from '../care/children.ts'
import { generalSettings } from '../care/general-settings.ts'
import type { AnyCareKind } from '../care/kind.ts'
import { careChecks, careKinds } from '../care/kinds.ts'
import { type AnySetting, type Policy, type RuleSet, type SettingValue, valuesFor } from '../care/policy.ts'
import { isSameValue, readSettingValue, typedValue } from '../care/setting-value.ts'
import { toleranceSettings } from '../care/tolerance-settings.ts'
import { showValue } from './why.ts'

/** The settings of one kind, under its title, in a rule set. */
export interface SettingSection {
  readonly id: string
  readonly title: string
  readonly settings: readonly AnySetting[]
}

/** Every setting of a rule set, once, under the first kind that reads it; those of all care alike come last. */
export function settingSections(ruleSet: RuleSet): readonly SettingSection[] {
  const shown = new Set<AnySetting>()
  const fresh = (settings: readonly AnySetting[]) =>
    settings.filter(setting => {
      if (shown.has(setting)) return false
      shown.add(setting)
      return true
    })
  const kinds: readonly AnyCareKind[] = careKinds
  const sections = [
    ...kinds.map(({ slug, title, settings }) => ({ id: slug, title, settings: fresh(settings ?? []) })),
    { id: 'lateness', title: 'When care is late', settings: fresh(toleranceSettings) },
    { id: 'charting', title: 'Charting', settings: fresh(generalSettings) },
  ]
  return sections
    .map(section => ({ ...section, settings: settingsOf(ruleSet, section.settings) }))
    .filter(({ settings }) => settings.length > 0)
}

type PolicyValues = Policy['values']

/** The value of each setting of a rule set: that of the policy, or the default. What is of the wrong type or of no setting is left out. */
export function completeValues(ruleSet: RuleSet, values: PolicyValues): Readonly<Record<string, SettingValue>> {
  return Object.fromEntries(
    settingSections(ruleSet).flatMap(({ settings }) =>
      settings.map(setting => [setting.name, valueIn(setting, values)] as const),
    ),
  )
}

function valueIn(setting: AnySetting, values: PolicyValues): SettingValue {
  const value = values[setting.name]
  return typeof value === typeof setting.default && value !== undefined ? value : setting.default
}

/** One setting that differs between two versions, in words. */
export interface PolicyDifference {
  readonly name: string
  readonly section: string
  readonly label: string
  readonly affects: string
  readonly from: string
  readonly to: string
  /** `from 8 h to 6 h` */
  readonly says: string
}

/** What differs between the values of two versions of a rule set, in the order of the editor. */
export function policyDifferences(
  ruleSet: RuleSet,
  before: PolicyValues,
  after: PolicyValues,
): readonly PolicyDifference[] {
  return settingSections(ruleSet).flatMap(({ title, settings }) =>
    settings.flatMap(setting => {
      const [old, fresh] = [valueIn(setting, before), valueIn(setting, after)]
      if (isSameValue(old, fresh)) return []
      const [from, to] = [showValue(old, setting.unit), showValue(fresh, setting.unit)]
      const { name, label, affects } = setting
      return [{ name, section: title, label, affects, from, to, says: `from ${from} to ${to}` }]
    }),
  )
}

const groups = Object.keys(ageGroups) as readonly AgeGroup[]

/** What keeps values from being published: numbers outside their range, and settings that do not fit together. Once each. */
export function policyProblems(ruleSet: RuleSet, values: PolicyValues): readonly string[] {
  const complete = completeValues(ruleSet, values)
  const outside = settingSections(ruleSet).flatMap(({ settings }) =>
    settings.flatMap(setting => {
      const read = readSettingValue(setting, typedValue(complete[setting.name] ?? setting.default))
      return read.ok ? [] : [`${setting.label}: ${read.problem}`]
    }),
  )
  const policy: Policy = { ...nobodys, ruleSet, values: complete }
  const asked = ruleSet === 'children' ? groups : [undefined]
  const unfit = asked.flatMap(group => {
    const judged = valuesFor(policy, [], group)
    return careChecks.flatMap(check => check.problem(judged) ?? [])
  })
  return [...new Set([...outside, ...unfit])]
}

const nobodys = { id: '', name: '', version: 0, wardId: null, reviewedBy: '', reviewedOn: '', startsAt: new Date(0) }

import { addDays, type LocalDay } from '../time/zone.ts'
import type { AnySetting, RuleSet, Setting, SettingValue, Source } from './policy.ts'

/** Ages that published numbers for children are given for. */
export const ageGroups = {
  neonate: 'in the first 28 days of life',
  infant: 'under 1 year',
  child: 'from 1 to 11 years',
  adolescent: 'from 12 years',
} as const

export type AgeGroup = keyof typeof ageGroups

/** What a setting is for children: a value of its own, or one for each age. */
export type ForChildren<Value> =
  | { readonly default: Value; readonly min?: number; readonly max?: number; readonly source: Source }
  | {
      readonly byAge: Readonly<Record<AgeGroup, Value>>
      readonly min?: number
      readonly max?: number
      readonly source: Source
    }

const groupNames = Object.keys(ageGroups) as readonly AgeGroup[]

/** The age group on a day of somebody born on a day, by whole years and days. A neonate: the first 28 days (WHO). */
export function ageGroupOf(age: number, bornOn: LocalDay, on: LocalDay): AgeGroup {
  if (on < addDays(bornOn, 28)) return 'neonate'
  if (age < 1) return 'infant'
  return age < 12 ? 'child' : 'adolescent'
}

/** The settings of a rule set. That for children has a setting for each age where numbers differ by age, and leaves out what is for adults. */
export function settingsOf(ruleSet: RuleSet, settings: readonly AnySetting[]): readonly AnySetting[] {
  if (ruleSet === 'adults') return settings
  return settings.flatMap(setting => {
    if (setting.adultsOnly) return []
    const byAge = setting.children !== undefined && 'byAge' in setting.children
    return byAge ? groupNames.map(group => childSetting(setting, group)) : [childSetting(setting, undefined)]
  })
}

const derived = new WeakMap<AnySetting, Map<AgeGroup | undefined, AnySetting>>()

/**
 * A setting as it is for children of an age: its name, default and source. What has no number for children carries that for
 * adults over, and says so.
 */
export function childSetting(setting: AnySetting, group: AgeGroup | undefined): AnySetting {
  const known = derived.get(setting) ?? new Map<AgeGroup | undefined, AnySetting>()
  derived.set(setting, known)
  const made = known.get(group) ?? derivedFrom(setting as Setting, group)
  known.set(group, made)
  // What is derived stands for itself, so that it can be asked for again.
  if (!derived.has(made)) derived.set(made, new Map([...groupNames, undefined].map(name => [name, made])))
  return made
}

function derivedFrom(setting: Setting, group: AgeGroup | undefined): AnySetting {
  const { children, ...plain } = setting
  if (children === undefined) return { ...plain, source: carriedOver(setting.source) } as AnySetting
  const { source, min = setting.min, max = setting.max } = children
  const range = { ...(min === undefined ? {} : { min }), ...(max === undefined ? {} : { max }) }
  const about = { ...plain, ...range, source }
  if (!('byAge' in children)) return { ...about, default: children.default } as AnySetting
  const age = group ?? 'child'
  return {
    ...about,
    name: `${setting.name}.${age}`,
    label: `${setting.label}, ${ageGroups[age]}`,
    default: children.byAge[age] as SettingValue,
  } as AnySetting
}

function carriedOver({ says }: Source): Source {
  return { says: `Carried over from the rules for adults: ${says}`, standing: 'product proposal' }
}

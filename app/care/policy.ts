import type { LocalDay } from '../time/zone.ts'
import { type AgeGroup, childSetting, type ForChildren } from './children.ts'

export type SettingValue = number | boolean | readonly number[]

/** How far the origin of a number was checked: read at its source, read second-hand, common practice, or our own proposal. */
export type Standing =
  | 'published'
  | 'published, read second-hand'
  | 'common practice'
  | 'from memory'
  | 'product proposal'

export interface Source {
  readonly says: string
  readonly standing: Standing
}

/** One number (or switch, or list) that a hospital sets. Rules ask for it by this object, so a misspelt name cannot compile. */
export interface Setting<Value extends SettingValue = SettingValue> {
  /** Stored in policies and care plans; never renamed after release. */
  readonly name: string
  readonly label: string
  readonly unit: string
  readonly default: Value
  /** Allowed range of numbers; absent for switches and lists. */
  readonly min?: number
  readonly max?: number
  /** Names of settings of the same unit that it may not lie above, or below: both ends of one band. */
  readonly notAbove?: string
  readonly notBelow?: string
  /** A patient's care plan may override it. */
  readonly personal?: boolean
  /** Its value for children, where one is known; without it the number for adults is carried over and says so. */
  readonly children?: ForChildren<Value>
  /** Not part of a rule set for children. */
  readonly adultsOnly?: boolean
  readonly affects: string
  readonly source: Source
}

export type AnySetting = Setting<number> | Setting<boolean> | Setting<readonly number[]>

/** Declares a setting whose value is a number. */
export function numberSetting(
  setting: Setting<number> & { readonly min: number; readonly max: number },
): Setting<number> {
  return setting
}

/** Declares a setting that is on or off. */
export function switchSetting(setting: Setting<boolean>): Setting<boolean> {
  return setting
}

/** Declares a setting whose value is a list of numbers, such as stocked sizes. */
export function listSetting(setting: Setting<readonly number[]>): Setting<readonly number[]> {
  return setting
}

/** Whom a policy is for: people of the age from which the rules for adults apply, or those under it. */
export type RuleSet = 'adults' | 'children'

/** One reviewed set of values, for one ward or (wardId null) for the whole hospital, in force from `startsAt`. */
export interface Policy {
  readonly id: string
  readonly name: string
  readonly version: number
  readonly wardId: string | null
  /** For adults unless it says otherwise. */
  readonly ruleSet?: RuleSet
  /** Of a policy in force for adults: the rule set for children in force beside it. */
  readonly children?: Policy
  /** Taken back before it started: never in force. */
  readonly withdrawn?: boolean
  readonly reviewedBy: string
  readonly reviewedOn: LocalDay
  readonly startsAt: Date
  readonly values: Readonly<Record<string, SettingValue>>
}

/** A patient's own value for one setting, with its reason and the day by which it must be looked at again. */
export interface PersonalValue {
  readonly setting: string
  readonly value: number
  readonly reason: string
  readonly reviewOn: LocalDay
  readonly since: Date
  readonly by: string
}

/**
 * The policy of a ward at a moment, with the rule set for children of that moment beside it: the ward's own if it has one, else the
 * hospital's; the latest that has started. One that nobody has reviewed, or that was withdrawn, is never in force. Undefined when
 * there is none for adults, in which case no rule may run.
 */
export function policyInForce(policies: readonly Policy[], wardId: string, at: Date): Policy | undefined {
  const adults = ruleSetInForce(policies, wardId, 'adults', at)
  const children = ruleSetInForce(policies, wardId, 'children', at)
  return adults && (children ? { ...adults, children } : adults)
}

/** What was in force at a moment; undefined before the first version. */
export type PolicyOverTime = (at: Date) => Policy | undefined

/** The policy of a ward at any moment, each made once: what a whole record is judged by asks for it again and again. */
export function policyOverTime(policies: readonly Policy[], wardId: string): PolicyOverTime {
  const starts = [...new Set(policies.map(({ startsAt }) => startsAt.getTime()))].toSorted((a, b) => b - a)
  const made = new Map<number, Policy | undefined>()
  return at => {
    const start = starts.find(start => start <= at.getTime())
    if (start === undefined) return undefined
    if (!made.has(start)) made.set(start, policyInForce(policies, wardId, new Date(start)))
    return made.get(start)
  }
}

/** The version of one rule set that is in force on a ward at a moment, if there is one. */
export function ruleSetInForce<P extends Policy>(
  policies: readonly P[],
  wardId: string,
  ruleSet: RuleSet,
  at: Date,
): P | undefined {
  const started = policies.filter(
    policy =>
      (policy.ruleSet ?? 'adults') === ruleSet &&
      policy.startsAt <= at &&
      !policy.withdrawn &&
      policy.reviewedBy.trim() !== '',
  )
  const own = started.filter(policy => policy.wardId === wardId)
  return latest(own.length > 0 ? own : started.filter(policy => policy.wardId === null))
}

function latest<P extends Policy>(policies: readonly P[]): P | undefined {
  return policies.reduce<P | undefined>(
    (best, policy) =>
      !best ||
      policy.startsAt > best.startsAt ||
      (policy.startsAt.getTime() === best.startsAt.getTime() && policy.version > best.version)
        ? policy
        : best,
    undefined,
  )
}

/** Values to decide by: a policy with the patient's own values over it. Built by `valuesFor`. */
export interface Values {
  readonly policy: Policy
  /** The value in force for this patient: own value, else the policy's, else the product's default. */
  of<Value extends SettingValue>(setting: Setting<Value>): Value
  /** The same for a setting of any type, to show it. */
  shown(setting: AnySetting): SettingValue
  /** The setting as it applies to this patient: for a child, the one of its age. */
  judged(setting: AnySetting): AnySetting
  /** Where that value came from. */
  originOf(setting: AnySetting): 'care plan' | 'policy' | 'product default'
  personal(setting: AnySetting): PersonalValue | undefined
}

/**
 * The values in force for one patient. Personal values count only for settings that allow it. Of a rule set for children, the
 * numbers are those of the age group.
 */
export function valuesFor(policy: Policy, personal: readonly PersonalValue[] = [], group?: AgeGroup): Values {
  const own = new Map(personal.map(value => [value.setting, value]))
  const personalOf = (setting: AnySetting) => (setting.personal ? own.get(setting.name) : undefined)
  const judged = (setting: AnySetting) => (policy.ruleSet === 'children' ? childSetting(setting, group) : setting)
  function of<Value extends SettingValue>(setting: Setting<Value>): Value {
    const mine = setting.personal ? own.get(setting.name)?.value : undefined
    const here = policy.ruleSet === 'children' ? judged(setting as AnySetting) : setting
    const value = mine ?? policy.values[here.name] ?? here.default
    return (typeof value === typeof here.default ? value : here.default) as Value
  }
  return {
    policy,
    of,
    shown: setting => of(setting as Setting),
    judged,
    originOf: setting => {
      if (personalOf(setting)) return 'care plan'
      return policy.values[judged(setting).name] === undefined ? 'product default' : 'policy'
    },
    personal: personalOf,
  }
}

/** What a ward's policy says of a setting, apart from any patient; the product's default where no policy is in force. */
export function valueUnder<Value extends SettingValue>(policy: Policy | undefined, setting: Setting<Value>): Value {
  return policy ? valuesFor(policy).of(setting) : setting.default
}

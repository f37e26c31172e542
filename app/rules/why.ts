import type { CareContext } from '../care/kind.ts'
import type { AnySetting, PersonalValue, Policy, SettingValue, Standing } from '../care/policy.ts'
import { toleranceSettings } from '../care/tolerance-settings.ts'
import { showDateTime, showDay } from '../time/display.ts'
import { localDay, type Zone } from '../time/zone.ts'
import type { DueTask } from './due-tasks.ts'
import { noting } from './noting.ts'
import { momentWords } from './words.ts'

/** One number behind an answer, with where it came from. */
export interface WhyValue {
  readonly label: string
  readonly value: string
  readonly origin: string
  readonly source: string
  readonly standing: Standing
}

/** The answer to "why?" of a task, a warning or a band: the rule in sentences, the numbers that it read, and the policy in force. */
export interface Why {
  readonly rule: readonly string[]
  readonly values: readonly WhyValue[]
  readonly policy: string
}

/** Why a task is due, and the act that its clock counts from. */
export interface WhyDue extends Why {
  readonly last: string
}

/** Why, with the numbers of these settings as they are in force. */
export function whyOf(rule: readonly string[], settings: readonly AnySetting[], context: CareContext): Why {
  return {
    rule,
    values: settings.map(setting => whyValue(setting, context)),
    policy: policyWords(context.values.policy),
  }
}

/** The answer to "Why is this due?", ready to read. */
export function whyDue(task: DueTask, context: CareContext): WhyDue {
  const { zone } = context.ward
  const { because, deferral, rule } = task
  const deferred = deferral
    ? `Deferred to ${showDateTime(deferral.until, zone)} by ${deferral.entry.recordedByName}.`
    : undefined
  const known = [rule.says(context), because && `${capital(because)}.`, deferred, windowWords(task, context)]
  const sentences = known.flatMap(words => words ?? [])
  return {
    last: lastWords(task, zone),
    ...whyOf(sentences, [...rule.settings, ...tolerancesOf(task, context)], context),
  }
}

/** The numbers of what is late that the clock of a task goes by. */
function tolerancesOf({ rule }: DueTask, context: CareContext): readonly AnySetting[] {
  const noted = noting(context)
  rule.clock(noted.context)
  const read = new Set(noted.read())
  return toleranceSettings.filter(setting => read.has(setting))
}

/** `In time from 13:00 to 15:00, seriously overdue after 18:00.` */
function windowWords({ window, byDay }: DueTask, { now, ward }: CareContext): string | undefined {
  if (!window) return undefined
  const { soonAt, opensAt, closesAt, seriousAt } = window
  const day = (at: Date) => showDay(localDay(at, ward.zone))
  if (byDay) return `Shown as due soon from ${day(soonAt)}, seriously overdue from ${day(seriousAt)}.`
  const words = (at: Date) => momentWords(at.getTime(), now.getTime(), ward.zone)
  return `In time from ${words(opensAt)} to ${words(closesAt)}, seriously overdue after ${words(seriousAt)}.`
}

function lastWords({ byDay, last, from }: DueTask, zone: Zone): string {
  if (byDay) return `By date: ${showDay(byDay)}.`
  if (last) return `Last on ${showDateTime(last.performedAt, zone)} by ${last.recordedByName}.`
  return from ? `Not charted yet; counted from ${showDateTime(from, zone)}.` : 'Its clock stands still.'
}

/** Which policy is in force, who reviewed it and when. */
export function policyWords(policy: Policy): string {
  const whom = policy.ruleSet === 'children' ? ' (rule set for children)' : ''
  return `${policy.name}${whom}, version ${policy.version}, reviewed by ${policy.reviewedBy} on ${showDay(policy.reviewedOn)}.`
}

/** One number as it is in force for a patient, with where it came from. */
export function whyValue(asked: AnySetting, { values }: CareContext): WhyValue {
  const personal = values.personal(asked)
  const setting = values.judged(asked)
  return {
    label: setting.label,
    value: showValue(values.shown(asked), setting.unit),
    origin: personal ? personalWords(personal) : values.originOf(asked) === 'policy' ? 'Policy' : 'Product default',
    source: setting.source.says,
    standing: setting.source.standing,
  }
}

function personalWords(personal: PersonalValue): string {
  return `This patient's plan, ${personal.reason} (${personal.by}, review by ${showDay(personal.reviewOn)})`
}

/** A setting's value in words with its unit: `8 h`, `on`, `5, 6, 8 Fr`. */
export function showValue(value: SettingValue, unit: string): string {
  if (typeof value === 'boolean') return value ? 'on' : 'off'
  return `${typeof value === 'number' ? value : value.join(', ')} ${unit}`
}

const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)

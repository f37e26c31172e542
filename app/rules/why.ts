import type { CareContext } from '../care/kind.ts'
import type { AnySetting, PersonalValue, Policy, SettingValue, Standing } from '../care/policy.ts'
import { showDateTime, showDay } from '../time/display.ts'
import type { Zone } from '../time/zone.ts'
import type { DueTask } from './due-tasks.ts'

/** One number behind a task, with where it came from. */
export interface WhyValue {
  readonly label: string
  readonly value: string
  readonly origin: string
  readonly source: string
  readonly standing: Standing
}

/** Why a task is due: the act its clock counts from, the rule in words, the policy, and every number with its source. */
export interface WhyDue {
  readonly last: string
  readonly rule: string
  readonly because?: string
  readonly deferral?: string
  readonly policy: string
  readonly values: readonly WhyValue[]
}

/** The answer to "Why is this due?", ready to read. */
export function whyDue(task: DueTask, context: CareContext): WhyDue {
  const { zone } = context.ward
  return {
    last: lastWords(task, zone),
    rule: task.rule.says(context),
    ...(task.because === undefined ? {} : { because: `${capital(task.because)}.` }),
    ...(task.deferral
      ? { deferral: `Deferred to ${showDateTime(task.deferral.until, zone)} by ${task.deferral.entry.recordedByName}.` }
      : {}),
    policy: policyWords(context.values.policy),
    values: task.rule.settings.map(setting => whyValue(setting, context)),
  }
}

function lastWords({ byDay, last }: DueTask, zone: Zone): string {
  if (byDay) return `By date: ${showDay(byDay)}.`
  return last
    ? `Last on ${showDateTime(last.performedAt, zone)} by ${last.recordedByName}.`
    : 'Not charted yet; counted from when the tube went in or the patient came.'
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

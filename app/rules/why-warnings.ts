import type { Gauge } from '../care/gauge.ts'
import type { AnyCareKind, CareContext } from '../care/kind.ts'
import { careKinds } from '../care/kinds.ts'
import { sentence } from '../care/sentence.ts'
import type { Warning } from '../care/warning.ts'
import { noting } from './noting.ts'
import { noChildRules } from './warnings.ts'
import { type Why, whyOf } from './why.ts'

/** Answers to "why?" by the name of a warning. */
export type WhyByName = Readonly<Record<string, Why>>

/** A warning as it is shown, with why it is there. */
export interface ExplainedWarning extends Pick<Warning, 'name' | 'level' | 'action' | 'cause'> {
  readonly why?: Why | undefined
}

/** Why each of the warnings that a rule gives is there: its source, and the numbers that it read on the way. */
export function whyWarned(context: CareContext, rule: (context: CareContext) => readonly Warning[]): WhyByName {
  const noted = noting(context)
  const warnings = rule(noted.context)
  const settings = noted.read()
  return Object.fromEntries(
    warnings.map(({ name, source }) => [name, whyOf([sentence(`Source of this rule: ${source}`)], settings, context)]),
  )
}

/** Why each warning that stands does. */
export function whyStanding(context: CareContext, kinds: readonly AnyCareKind[] = careKinds): WhyByName {
  const rules = [noChildRules, ...kinds.map(kind => (asked: CareContext) => kind.standing?.(asked) ?? [])]
  // Of two kinds that say the same, the first one speaks, as in the list of what stands.
  return Object.assign({}, ...rules.toReversed().map(rule => whyWarned(context, rule)))
}

/** Why an act asks for what it does; `context`: the moment before it. */
export function whyEntry(kind: AnyCareKind, data: unknown, context: CareContext): WhyByName {
  return whyWarned(context, asked => kind.warnings?.(data, asked) ?? [])
}

/** Warnings for a page, each with its answer to "why?". */
export function explained(warnings: readonly Warning[], why: WhyByName): readonly ExplainedWarning[] {
  return warnings.map(({ name, level, action, cause }) => ({ name, level, action, cause, why: why[name] }))
}

/** The band that a number is read against, with why it lies there. */
export interface ExplainedGauge extends Gauge {
  readonly why: Why
}

/** The bands of a kind's form, each with its answer to "why?". */
export function explainedGauges(kind: AnyCareKind, context: CareContext): readonly ExplainedGauge[] {
  const noted = noting(context)
  const gauges = kind.gauges?.(noted.context) ?? []
  const settings = noted.read()
  return gauges.map(gauge => {
    const { lower, upper, unit } = gauge
    return { ...gauge, why: whyOf([`In range from ${lower} to ${upper} ${unit}, both included.`], settings, context) }
  })
}

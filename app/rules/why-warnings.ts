import type { AnyCareKind, CareContext } from '../care/kind.ts'
import { careKinds } from '../care/kinds.ts'
import type { AnySetting } from '../care/policy.ts'
import { policyWords, type WhyValue, whyValue } from './why.ts'

/** Why a warning stands: where its rule comes from, the policy, and the numbers that its kind of care was judged by. */
export interface WhyWarning {
  readonly source: string
  readonly policy: string
  readonly values: readonly WhyValue[]
}

/** The answers to "why?" of every warning that stands, by its name. */
export function whyStanding(
  context: CareContext,
  kinds: readonly AnyCareKind[] = careKinds,
): Readonly<Record<string, WhyWarning>> {
  return Object.fromEntries(kinds.flatMap(kind => answers(kind, context)))
}

/** A context that notes which settings it is asked for answers for the numbers behind a kind's warnings. */
function answers(kind: AnyCareKind, context: CareContext): readonly (readonly [string, WhyWarning])[] {
  const read = new Set<AnySetting>()
  const { values } = context
  const of: typeof values.of = setting => {
    read.add(setting as unknown as AnySetting)
    return values.of(setting)
  }
  const warnings = kind.standing?.({ ...context, values: { ...values, of } }) ?? []
  const policy = policyWords(values.policy)
  const numbers = [...read].map(setting => whyValue(setting, context))
  return warnings.map(({ name, source }) => [name, { source, policy, values: numbers }] as const)
}

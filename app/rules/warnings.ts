import { adultAge } from '../care/general-settings.ts'
import type { AnyCareKind, CareContext } from '../care/kind.ts'
import { careKinds } from '../care/kinds.ts'
import { byUrgency, type Warning } from '../care/warning.ts'
import { isTooYoung } from './due-tasks.ts'

/** Warnings that stand for one patient now, most urgent first, each rule once. */
export function standingWarnings(context: CareContext, kinds: readonly AnyCareKind[] = careKinds): readonly Warning[] {
  const warnings = forAge(
    kinds.flatMap(kind => kind.standing?.(context) ?? []),
    context,
  )
  return onceEach([...noChildRules(context), ...warnings]).toSorted(byUrgency)
}

/** Warnings about one act, as it is or was charted; `context` is that of the moment before it. */
export function entryWarnings(kind: AnyCareKind, data: unknown, context: CareContext): readonly Warning[] {
  return onceEach(forAge(kind.warnings?.(data, context) ?? [], context)).toSorted(byUrgency)
}

/** What stands wherever care would be due of somebody whom no rule of the ward is for. */
export const NO_CHILD_RULES_NAME = 'no-rules-for-children'
export const NO_CHILD_RULES = 'No rule set for children here: follow the written plan of the tracheostomy team.'

/** Limits for adults say nothing of a child; what is an emergency is one at any age. */
function forAge(warnings: readonly Warning[], context: CareContext): readonly Warning[] {
  return isTooYoung(context) ? warnings.filter(({ level }) => level === 'red') : warnings
}

/** What is said in place of due care where nothing is computed for a child. */
export function noChildRules(context: CareContext): readonly Warning[] {
  if (!isTooYoung(context)) return []
  const from = context.values.of(adultAge)
  return [
    {
      name: NO_CHILD_RULES_NAME,
      level: 'amber',
      action: NO_CHILD_RULES,
      cause: `Nothing is computed: the rules of this ward apply from the age of ${from}. Charting stays possible.`,
      source: adultAge.source.says,
    },
  ]
}

function onceEach(warnings: readonly Warning[]): readonly Warning[] {
  return [...new Map(warnings.toReversed().map(warning => [warning.name, warning])).values()].toReversed()
}

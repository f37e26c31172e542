import type { CareContext } from '../care/kind.ts'
import type { AnySetting } from '../care/policy.ts'

/** A context that notes which settings a rule asks it for, in the order of asking. */
export interface NotingContext {
  readonly context: CareContext
  read(): readonly AnySetting[]
}

/** The same context, which notes what is read from its policy: so a rule that is asked says itself which numbers it goes by. */
export function noting(context: CareContext): NotingContext {
  const read = new Set<AnySetting>()
  const { values } = context
  const of: typeof values.of = setting => {
    read.add(setting as unknown as AnySetting)
    return values.of(setting)
  }
  return { context: { ...context, values: { ...values, of } }, read: () => [...read] }
}

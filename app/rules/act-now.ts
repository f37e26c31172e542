import type { ExplainedWarning } from './why-warnings.ts'

/** One thing to do now, and everything found that asks for it. */
export interface UrgentStep {
  readonly action: string
  readonly reasons: readonly ExplainedWarning[]
}

/** What red warnings ask to do now, each instruction once, in their order: nobody reads the same words twice while someone cannot breathe. */
export function urgentSteps(warnings: readonly ExplainedWarning[]): readonly UrgentStep[] {
  const red = warnings.filter(({ level }) => level === 'red')
  const actions = [...new Set(red.map(({ action }) => action))]
  return actions.map(action => ({ action, reasons: red.filter(warning => warning.action === action) }))
}

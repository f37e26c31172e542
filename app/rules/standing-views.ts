import type { CareContext } from '../care/kind.ts'
import type { WarningLevel } from '../care/warning.ts'
import { type WarningAnswer, type WarningLife, warningLives } from './warning-lives.ts'

/** An answer to a warning. */
export interface AnswerView {
  readonly entryId: string
  readonly by: string
  readonly at: number
  readonly words?: string
}

/** A warning that stands, with what people did about it. */
export interface StandingView {
  readonly level: WarningLevel
  readonly name: string
  readonly action: string
  readonly cause: string
  readonly raised: { readonly entryId: string; readonly at: number; readonly by: string } | null
  readonly seen: AnswerView | null
  readonly acted: readonly AnswerView[]
  readonly settled: AnswerView | null
  /** From when it is to be said that nobody has seen it. */
  readonly risesAt: number | null
}

/** What stands for one patient and what people did about it, most urgent first, as plain data; moments are milliseconds. */
export function standingViews(context: CareContext): readonly StandingView[] {
  return warningLives(context).map(standingView)
}

function standingView({ warning, raised, seen, acted, settled, risesAt }: WarningLife): StandingView {
  const { level, name, action, cause } = warning
  return {
    ...{ level, name, action, cause },
    raised: raised && { ...raised, at: raised.at.getTime() },
    seen: seen && answerView(seen),
    acted: acted.map(answerView),
    settled: settled && answerView(settled),
    risesAt: risesAt && risesAt.getTime(),
  }
}

const answerView = (answer: WarningAnswer): AnswerView => ({ ...answer, at: answer.at.getTime() })

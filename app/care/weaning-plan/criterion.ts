import type { AnyCharted, Entry } from '../kind.ts'
import type { AnySetting } from '../policy.ts'

export type CriterionState = 'met' | 'not met' | 'not assessed'

/** One criterion of a step of weaning, as the record has it. */
export interface StepCriterion {
  /** Unlike that of others of the step. */
  readonly name: string
  readonly label: string
  readonly state: CriterionState
  /** A plan of the step is held against it; the others only inform. */
  readonly isAsked: boolean
  /** What was found, in words. */
  readonly value?: string
  /** The act that says so; absent where it is a fact of the patient, or nothing does. */
  readonly entry?: Pick<Entry, 'id' | 'performedAt'>
  /** What charts it. */
  readonly chartedBy?: AnyCharted
  /** Why a plan needs a senior, in words; absent when it does not. */
  readonly unmet?: string
  readonly rule: string
  /** The numbers of the rule. */
  readonly settings: readonly AnySetting[]
  readonly source: string
}

/** `met` or `not met` by an answer; `not assessed` while there is none. */
export function stateOf(isMet: boolean | undefined): CriterionState {
  return isMet === undefined ? 'not assessed' : isMet ? 'met' : 'not met'
}

/** What a criterion says of the act that it was read from; nothing when there is none. */
export function readFrom(entry: Entry | undefined, value?: string): Pick<StepCriterion, 'entry' | 'value'> {
  return {
    ...(entry ? { entry: { id: entry.id, performedAt: entry.performedAt } } : {}),
    ...(value === undefined ? {} : { value }),
  }
}

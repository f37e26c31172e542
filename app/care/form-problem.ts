import type { TaskRule } from './kind.ts'
import type { AnySetting } from './policy.ts'

/** What the names of settings and tasks stand for. Handed in, since a kind cannot import the list that it is on. */
export interface KnownNames {
  readonly settings: readonly AnySetting[]
  readonly tasks: readonly { readonly rule: TaskRule }[]
}

/** A mistake of the form, said at its field. */
export interface FormProblem {
  readonly field: string
  readonly message: string
}

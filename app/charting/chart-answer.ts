import type { ExplainedWarning } from '../rules/why-warnings.ts'
import type { FormErrors } from './assess.ts'
import type { Typed } from './chart-form.ts'

/** Who signs the form. */
export interface FormSigner {
  readonly id: string
  readonly name: string
  readonly role: string
}

/** What a form goes on with: everything typed into it, the id it is sent under next, and who signs it from now on. */
interface Kept {
  readonly typed: Typed
  readonly id: string
  readonly signer: FormSigner
}

/** Another entry that explains why a form was refused. */
export interface Otherwise {
  readonly href: string
  readonly words: string
}

/** What the server says to a form that it did not chart. */
export type ChartAnswer =
  | ({
      readonly is: 'refused'
      readonly title: string
      readonly errors: FormErrors
      readonly asks: boolean
      readonly see?: Otherwise | undefined
    } & Kept)
  | ({ readonly is: 'reviewed'; readonly sentence: string; readonly warnings: readonly ExplainedWarning[] } & Kept)
  | { readonly is: 'previewed'; readonly warnings: readonly ExplainedWarning[] }
  | { readonly is: 'unavailable'; readonly says: string }

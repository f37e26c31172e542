import type { Role } from '#app/auth/permissions.ts'
import type { AnyCharted, DataOf } from '#app/care/kind.ts'

/** An act of the story, before it is somebody's entry. */
export interface Draft {
  readonly kind: AnyCharted
  readonly at: Date
  readonly data: unknown
  /** Left out: the nurse who had the bed. */
  readonly by?: Role
  readonly witness?: Role
  /** Minutes from the act to its being written; left out, as it comes. */
  readonly writtenAfter?: number
  readonly reason?: string
  /** Another act whose id this one's payload names, under that field. */
  readonly names?: { readonly field: string; readonly act: Draft }
  readonly supersedes?: Draft
  readonly status?: 'retracted'
}

/** Declares an act, with the payload of its kind. */
export function draft<K extends AnyCharted>(
  kind: K,
  at: Date,
  data: DataOf<K>,
  more: Omit<Draft, 'kind' | 'at' | 'data'> = {},
): Draft {
  return { kind, at, data, ...more }
}

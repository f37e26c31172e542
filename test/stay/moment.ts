/** What somebody who asks "why?" is told of a task or a warning, at least. */
export interface Why {
  readonly last?: string
  /** Among the sentences of the rule. */
  readonly says?: string
  readonly policy?: string
  /** Numbers with their units, by their labels. */
  readonly values?: Readonly<Record<string, string>>
}

/** A moment of the stay, with everything that board and patient's page are to show at it, worked out by hand. */
export interface Moment {
  readonly day: number
  readonly time: string
  /** What is looked at. */
  readonly what: string
  /** Every task that is late, due, due soon or put off, most pressing first: `Observations: due, due by 13:00`. */
  readonly board: readonly string[]
  /** Every warning that stands, most urgent first, with its life. */
  readonly warnings: readonly string[]
  /** Warnings that rise on the board, as nobody has seen them in time. */
  readonly unseen?: readonly string[]
  readonly running?: readonly string[]
  readonly suspended?: readonly string[]
  /** By the name of the task or the warning. */
  readonly why?: Readonly<Record<string, Why>>
}

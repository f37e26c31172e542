/** Something of a kind that has begun and not ended, such as a trial: it shows itself until it is charted as stopped. */
export interface RunningAct {
  /** Unlike that of others running at the same time. */
  readonly name: string
  readonly title: string
  readonly since: Date
  /** When it will have lasted as long as it should. */
  readonly until?: Date
  /** What holds while it runs, in a short sentence. */
  readonly says: string
  /** The task by which the patient is looked at meanwhile. */
  readonly watchedBy?: string
  readonly stopWords: string
  /** Answers that the form starts with when it is to be stopped. */
  readonly stopsWith: Readonly<Record<string, string>>
}

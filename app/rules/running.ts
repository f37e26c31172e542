import type { AnyCareKind, CareContext } from '../care/kind.ts'
import { careKinds } from '../care/kinds.ts'
import { showDuration } from '../time/display.ts'

/** Something that runs, as plain data; moments are milliseconds. */
export interface RunningView {
  readonly kind: string
  readonly name: string
  readonly title: string
  readonly says: string
  readonly since: number
  readonly until?: number
  /** The task by which the patient is looked at meanwhile. */
  readonly watchedBy?: string
  readonly stopWords: string
}

/** What runs for one patient now, begun last first. */
export function runningViews(context: CareContext, kinds: readonly AnyCareKind[] = careKinds): readonly RunningView[] {
  return kinds
    .flatMap(kind => (kind.running?.(context) ?? []).map(act => ({ kind, act })))
    .map(({ kind, act: { name, title, says, since, until, watchedBy, stopWords } }) => ({
      kind: kind.slug,
      name,
      title,
      says,
      since: since.getTime(),
      ...(until ? { until: until.getTime() } : {}),
      ...(watchedBy === undefined ? {} : { watchedBy }),
      stopWords,
    }))
    .toSorted((a, b) => b.since - a.since)
}

/** `Valve trial 1 h 12 min`: what runs and for how long, for one line of a board. */
export function runningWords({ title, since }: Pick<RunningView, 'title' | 'since'>, now: number): string {
  return `${title} ${showDuration(Math.max(0, now - since))}`
}

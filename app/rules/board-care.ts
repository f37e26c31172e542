import { type Lane, lanes } from '../care/lanes.ts'
import type { WarningLevel } from '../care/warning.ts'
import type { RunningView } from './running.ts'
import type { CareView, TaskView, TubeView } from './views.ts'

/** A due task as a board shows it: its words and reasons are on the patient's own page. */
export type BoardTask = Omit<TaskView, 'chartWords' | 'because' | 'opensWith'>

/** What runs, for one line: the card is on the patient's own page. */
export type BoardRunning = Pick<RunningView, 'name' | 'title' | 'since'>

/** What was charted in one lane, oldest first (ms). */
export interface LaneMarks {
  readonly lane: Lane
  readonly done: readonly number[]
  readonly outOfRange: readonly number[]
  readonly deferred: readonly number[]
}

/** A warning that needs something, as a board shows it. */
export interface BoardWarning {
  readonly level: WarningLevel
  readonly name: string
  readonly action: string
  /** From when (ms) it rises because nobody has seen it; null once somebody has. */
  readonly risesAt: number | null
}

/** One patient's care on a board or a round: what these show and no more, since forty of them make one page. */
export interface BoardCare {
  readonly tasks: readonly BoardTask[]
  readonly marks: readonly LaneMarks[]
  readonly running: readonly BoardRunning[]
  readonly warnings: readonly BoardWarning[]
  readonly tube?: TubeView
}

/** The part of a patient's care that boards show. */
export function boardCare({ tasks, marks, running, warnings, tube }: CareView): BoardCare {
  const momentsOf = (lane: Lane, shape: string) =>
    marks.filter(mark => mark.lane === lane && mark.shape === shape).map(({ at }) => at)
  return {
    tasks: tasks.map(({ chartWords: _words, because: _because, opensWith: _answers, ...task }) => task),
    marks: lanes.map(lane => ({
      lane,
      done: momentsOf(lane, 'done'),
      outOfRange: momentsOf(lane, 'out of range'),
      deferred: momentsOf(lane, 'deferred'),
    })),
    running: running.map(({ name, title, since }) => ({ name, title, since })),
    warnings: warnings
      .filter(({ settled }) => settled === null)
      .map(({ level, name, action, risesAt }) => ({ level, name, action, risesAt })),
    ...(tube ? { tube } : {}),
  }
}

import type { BoardCare, BoardTask, BoardWarning } from './board-care.ts'
import { pressOf } from './due-tasks.ts'
import type { TaskStatus } from './status.ts'
import { liveStatus, type TaskView } from './views.ts'

/** A patient on a board: bed and person beside the care. */
export interface BoardPatient {
  readonly patientId: string
  readonly bed: string
  readonly familyName: string
  readonly givenName: string
  readonly age: number
  readonly recordNumber: string
  readonly laryngectomy: boolean
  readonly care: BoardCare
}

/** A whole board as plain data; moments are milliseconds. */
export interface Board {
  readonly wardId: string
  readonly wardName: string
  readonly zone: string
  readonly shiftEndsAt: number
  /** Which policy is in force, in words; null when the ward has none that was reviewed. */
  readonly policy: string | null
  /** Entries charted under supervision that nobody has countersigned. */
  readonly toCountersign: number
  readonly patients: readonly BoardPatient[]
}

/** How a task stands at a moment. */
export type Live<Task extends BoardTask> = Task & {
  readonly status: TaskStatus
  /** How long it has been overdue (ms), 0 when it is not. */
  readonly lateBy: number
}
export type LiveTask = Live<TaskView>
export type LiveBoardTask = Live<BoardTask>

// Made once: comparing by locale makes a new one for each pair.
const byTitle = new Intl.Collator('en')
const byLabel = new Intl.Collator('en', { numeric: true })

/** The tasks of one patient as they stand at `now` (ms), most pressing first. */
export function liveTasks<Task extends BoardTask>(tasks: readonly Task[], now: number): readonly Live<Task>[] {
  return tasks
    .map(task => ({
      ...task,
      status: liveStatus(task, now),
      lateBy: Math.max(0, now - (task.window?.closesAt ?? now)),
    }))
    .toSorted(
      (a, b) =>
        pressOf(a.status, a.airway) - pressOf(b.status, b.airway) ||
        (a.window?.closesAt ?? 0) - (b.window?.closesAt ?? 0) ||
        byTitle.compare(a.title, b.title),
    )
}

export interface LivePatient extends Omit<BoardPatient, 'care'> {
  readonly care: BoardCare
  readonly tasks: readonly LiveBoardTask[]
  /** The status of the most pressing task; undefined when nothing is due at all. */
  readonly worst: TaskStatus | undefined
  /** Warnings that nobody has seen in time, most urgent first. */
  readonly unseen: readonly BoardWarning[]
}

export type BoardOrder = 'pressing' | 'bed'

/**
 * Patients in the order of a board: red warnings first, then warnings that nobody has seen in time, then by the most pressing
 * task, then the longest late;
 * or by bed.
 */
export function livePatients(board: Board, now: number, order: BoardOrder): readonly LivePatient[] {
  const patients = board.patients.map(patient => {
    const tasks = liveTasks(patient.care.tasks, now)
    const unseen = patient.care.warnings.filter(({ risesAt }) => risesAt !== null && risesAt <= now)
    return { ...patient, tasks, worst: tasks[0]?.status, unseen }
  })
  return patients.toSorted((a, b) => (order === 'bed' ? 0 : byRisk(a, b)) || byBed(a, b))
}

function byRisk(a: LivePatient, b: LivePatient): number {
  return risk(a) - risk(b) || (b.tasks[0]?.lateBy ?? 0) - (a.tasks[0]?.lateBy ?? 0) || firstDue(a) - firstDue(b)
}

/** A red warning that nobody has seen, a red one, an amber one that nobody has seen in time, then the care that is late. */
function risk({ care, tasks, unseen }: LivePatient): number {
  if (unseen.some(({ level }) => level === 'red')) return -3
  if (care.warnings.some(({ level }) => level === 'red')) return -2
  if (unseen.length > 0) return -1
  const first = tasks[0]
  return first ? pressOf(first.status, first.airway) : 9
}

const firstDue = ({ tasks }: LivePatient): number => tasks[0]?.window?.closesAt ?? Number.MAX_SAFE_INTEGER

const byBed = (a: LivePatient, b: LivePatient): number => byLabel.compare(a.bed, b.bed)

export interface BoardCounts {
  readonly overdue: number
  readonly due: number
  /** Not due yet, but before the shift ends. */
  readonly thisShift: number
  /** Tubes at or past their change-by date, or within the strong notice. */
  readonly tubesNearLimit: number
  /** Patients with a red or amber warning. */
  readonly warned: number
}

/** The numbers above a board. */
export function boardCounts(patients: readonly LivePatient[], shiftEndsAt: number): BoardCounts {
  const tasks = patients.flatMap(patient => patient.tasks)
  const waiting = tasks.filter(({ status }) => status === 'upcoming' || status === 'due soon' || status === 'deferred')
  return {
    overdue: tasks.filter(({ status }) => isLate(status)).length,
    due: tasks.filter(({ status }) => status === 'due').length,
    thisShift: waiting.filter(({ window }) => window !== undefined && window.dueAt <= shiftEndsAt).length,
    tubesNearLimit: patients.filter(({ care }) => care.tube && !['quiet', 'notice'].includes(care.tube.stage)).length,
    warned: patients.filter(({ care }) => care.warnings.some(({ level }) => level !== 'blue')).length,
  }
}

/** Whether a status counts as overdue, seriously or not. */
export function isLate(status: TaskStatus): boolean {
  return status === 'overdue' || status === 'seriously overdue'
}

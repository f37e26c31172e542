import { type Lane, lanes } from '#app/care/lanes.ts'
import { type Board, boardCounts, type LiveBoardTask, type LivePatient } from '#app/rules/board.ts'
import type { LaneMarks } from '#app/rules/board-care.ts'
import { runningWords } from '#app/rules/running.ts'
import { NO_CHILD_RULES_NAME } from '#app/rules/warnings.ts'
import { standingWords } from '#app/rules/words.ts'
import { showTime } from '#app/time/display.ts'
import type { Zone } from '#app/time/zone.ts'
import { BoardHead, type BoardPatient, BoardRow } from './board-row.tsx'
import { chartHref } from './chart-href.ts'
import { Empty } from './empty.tsx'
import { BOARD_LANE_PX, HourStrip } from './hour-strip.tsx'
import { gridTicks } from './hour-ticks.ts'
import type { StripLane, StripMark, StripWindow } from './strip-lanes.ts'
import { StripPatterns } from './strip-patterns.tsx'
import { SharedGrid } from './strip-shapes.tsx'
import { SummaryCounts } from './summary-counts.tsx'

const HOUR_MS = 3_600_000
const BACK_MS = 8 * HOUR_MS
const AHEAD_MS = 6 * HOUR_MS
/** Of the strip on a desk 1440 px wide. */
const STRIP_PX = 530
const GRID = 'board-hours'

interface BoardViewProps {
  readonly board: Board
  /** The server's clock (ms). */
  readonly now: number
  /** Its patients as they stand now, in the order of the rows. */
  readonly patients: readonly LivePatient[]
  /** The person may chart on this ward, so that due care leads to its form. */
  readonly charts: boolean
}

/** The ward's patients with their strips and what is due next; drawn anew as `now` moves on. */
export function BoardView({ board: { zone }, now, patients, charts }: BoardViewProps) {
  const span = {
    from: new Date(now - BACK_MS),
    to: new Date(now + AHEAD_MS),
    now: new Date(now),
    zone,
    width: STRIP_PX,
  }
  return (
    <>
      <StripPatterns />
      <SharedGrid
        id={GRID}
        {...{ ticks: gridTicks(span, zone, STRIP_PX), rows: lanes.length, top: 0, laneHeight: BOARD_LANE_PX }}
      />
      <div className="rounded-card border border-line bg-surface">
        <BoardHead>
          <HourStrip {...span} lanes={[]} axis title="Hours" />
        </BoardHead>
        {patients.length === 0 && <Empty title="No patients on this ward" />}
        <ul aria-label="Patients">
          {patients.map(patient => (
            <BoardRow key={patient.patientId} patient={rowOf(patient, { now, zone, charts })}>
              <HourStrip
                {...span}
                grid={GRID}
                lanes={stripLanes(patient, now, zone)}
                axis={false}
                title={`Bed ${patient.bed}`}
              />
            </BoardRow>
          ))}
        </ul>
      </div>
      <Legend />
    </>
  )
}

interface BoardSummaryProps {
  readonly board: Board
  readonly patients: readonly LivePatient[]
}

/** The ward in a few numbers. */
export function BoardSummary({ board: { shiftEndsAt, zone }, patients }: BoardSummaryProps) {
  const counts = boardCounts(patients, shiftEndsAt)
  return (
    <SummaryCounts
      counts={[
        { count: counts.overdue, words: 'overdue', tone: 'late' },
        { count: counts.due, words: 'due now', tone: 'due' },
        { count: counts.thisShift, words: `due by ${showTime(new Date(shiftEndsAt), zone)}` },
        {
          count: counts.tubesNearLimit,
          words: counts.tubesNearLimit === 1 ? 'tube near its limit' : 'tubes near their limit',
        },
        { count: counts.warned, words: counts.warned === 1 ? 'patient with a warning' : 'patients with a warning' },
      ]}
    />
  )
}

interface Seen {
  readonly now: number
  readonly zone: Zone
  readonly charts: boolean
}

function rowOf(patient: LivePatient, { now, zone, charts }: Seen): BoardPatient {
  const { patientId, bed, familyName, givenName, age, recordNumber, care, tasks, worst, unseen } = patient
  const tubeTask = tasks.find(task => task.byDay !== undefined && task.name === care.tube?.task)
  return {
    href: `/patients/${patientId}`,
    bed,
    family: familyName,
    given: givenName,
    age,
    recordNo: recordNumber,
    tube: care.tube
      ? { says: care.tube.words, day: care.tube.day, limit: care.tube.limit, status: tubeTask?.status ?? 'upcoming' }
      : null,
    next: tasks
      .filter(({ status }) => status !== 'suspended')
      .map(task => ({
        name: task.name,
        title: task.title,
        status: task.status,
        says: standingWords(task, now, zone),
        ...(charts ? { href: chartHref(patientId, task) } : {}),
      })),
    worst: worst ?? 'upcoming',
    running: care.running.map(act => runningWords(act, now)),
    warnings: care.warnings.filter(({ level }) => level !== 'blue').length,
    statement: care.warnings.find(({ name }) => name === NO_CHILD_RULES_NAME)?.action,
    isUrgent: care.warnings.some(({ level }) => level === 'red'),
    unseen: unseen.length,
  }
}

/** The lanes of a patient with what was done and what is due, in words for those who hear it. */
function stripLanes({ care, tasks }: LivePatient, now: number, zone: Zone): readonly StripLane[] {
  return care.marks.map(marks => ({
    name: marks.lane,
    marks: stripMarks(marks, zone),
    windows: stripWindows(marks.lane, tasks, now, zone),
  }))
}

function stripMarks({ done, outOfRange, deferred }: LaneMarks, zone: Zone): readonly StripMark[] {
  const as = (shape: StripMark['shape']) => (ms: number) => {
    const at = new Date(ms)
    return { at, shape, says: () => `${shape} ${showTime(at, zone)}` }
  }
  return [...done.map(as('done')), ...outOfRange.map(as('out of range')), ...deferred.map(as('deferred'))]
}

function stripWindows(lane: Lane, tasks: readonly LiveBoardTask[], now: number, zone: Zone): readonly StripWindow[] {
  return tasks.flatMap(task => {
    if (task.lane !== lane || !task.window || task.byDay) return []
    const { opensAt, closesAt } = task.window
    const says = `${task.title} ${standingWords(task, now, zone)}`
    return [{ opensAt: new Date(opensAt), closesAt: new Date(closesAt), status: task.status, says }]
  })
}

function Legend() {
  return (
    <p className="px-1 py-3 text-sm text-ink2 print:hidden">
      Lanes, top to bottom: {lanes.map(lane => lane.toLowerCase()).join(', ')}. Dot: done. Outline: next window. Filled:
      due now. Hatched: overdue, and it grows until it is charted. Triangle: out of range. Note: deferred.
    </p>
  )
}

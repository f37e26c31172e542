import { Link } from 'react-router'
import { type Board, isLate, type LiveBoardTask, type LivePatient, livePatients } from '#app/rules/board.ts'
import { runningWords } from '#app/rules/running.ts'
import { momentWords, standingWords } from '#app/rules/words.ts'
import type { Zone } from '#app/time/zone.ts'
import { LinkButton } from './button.tsx'
import { chartHref } from './chart-href.ts'
import { dwellWords } from './dwell-bar.tsx'
import { Empty } from './empty.tsx'
import { edgeOf } from './status-look.ts'

interface RoundViewProps {
  readonly board: Board
  /** The server's clock (ms). */
  readonly now: number
  readonly charts: boolean
}

/** Bed after bed, what is due until the shift ends: made for a thumb. */
export function RoundView({ board, now, charts }: RoundViewProps) {
  const patients = livePatients(board, now, 'pressing')
  if (patients.length === 0) return <Empty title="No patients on this ward" />
  return (
    <ul className="grid gap-3 md:grid-cols-2 xl:grid-cols-3">
      {patients.map(patient => (
        <RoundPatient key={patient.patientId} patient={patient} board={board} now={now} charts={charts} />
      ))}
    </ul>
  )
}

/** How the round stands, in one line. */
export function roundWords(board: Board, now: number): string {
  const patients = livePatients(board, now, 'bed')
  const late = patients.flatMap(({ tasks }) => tasks).filter(({ status }) => isLate(status)).length
  const people = patients.length === 1 ? '1 patient' : `${patients.length} patients`
  return `Shift to ${momentWords(board.shiftEndsAt, now, board.zone)} · ${people} · ${late} overdue`
}

function RoundPatient({ patient, board, now, charts }: RoundViewProps & { readonly patient: LivePatient }) {
  const { patientId, bed, familyName, givenName, care, tasks } = patient
  const shown = tasks.filter(task => isThisShift(task, board.shiftEndsAt))
  return (
    <li className="overflow-hidden rounded-card border border-line bg-surface">
      <div className="flex items-center gap-3.5 px-4 py-2.5">
        <span className="text-2xl font-bold tracking-tight">
          <span className="sr-only">Bed </span>
          {bed}
        </span>
        <div className="min-w-0">
          <Link
            to={`/patients/${patientId}`}
            className="inline-flex min-h-11 items-center text-lg leading-tight font-semibold hover:underline"
          >
            {`${familyName.toUpperCase()}, ${givenName}`}
          </Link>
          <p className="text-sm text-ink2">
            {care.tube
              ? `${care.tube.words} · ${dwellWords(care.tube.day, care.tube.limit).toLowerCase()}`
              : 'No tube charted'}
          </p>
          {care.running.map(act => (
            <p key={act.name} className="text-sm font-semibold text-brand">
              {runningWords(act, now)}
            </p>
          ))}
          {care.warnings[0] && care.warnings[0].level !== 'blue' && (
            <p className={`text-sm font-semibold ${care.warnings[0].level === 'red' ? 'text-late' : 'text-due'}`}>
              {care.warnings[0].action}
            </p>
          )}
        </div>
      </div>
      <ul aria-label={`Due care, bed ${bed}`}>
        {shown.map(task => (
          <RoundTask key={task.name} task={task} patientId={patientId} now={now} zone={board.zone} charts={charts} />
        ))}
        {shown.length === 0 && <li className="border-t border-hair px-4 py-3 text-ink2">Nothing due this shift</li>}
      </ul>
    </li>
  )
}

function isThisShift({ status, window, byDay }: LiveBoardTask, shiftEndsAt: number): boolean {
  if (status === 'suspended' || !window) return false
  return status !== 'upcoming' ? !(byDay && status === 'due soon') : window.dueAt <= shiftEndsAt
}

interface RoundTaskProps {
  readonly task: LiveBoardTask
  readonly patientId: string
  readonly now: number
  readonly zone: Zone
  readonly charts: boolean
}

const tones: Readonly<Record<string, string>> = {
  due: 'font-semibold text-due',
  overdue: 'font-semibold text-late',
  'seriously overdue': 'font-semibold text-late',
}

function RoundTask({ task, patientId, now, zone, charts }: RoundTaskProps) {
  const since =
    isLate(task.status) && task.window && !task.byDay ? ` · due ${momentWords(task.window.dueAt, now, zone)}` : ''
  return (
    <li className={`flex min-h-15 items-center gap-3 border-t border-hair py-1.5 pr-2 pl-4 ${edgeOf[task.status]}`}>
      <div className="min-w-0 flex-1">
        <p className="font-semibold">{task.title}</p>
        <p className={`text-sm ${tones[task.status] ?? 'text-ink2'}`}>
          {standingWords(task, now, zone)}
          {since}
        </p>
      </div>
      {charts && (
        <LinkButton
          href={chartHref(patientId, task)}
          size={48}
          variant={tones[task.status] ? 'primary' : 'plain'}
          label={`Chart ${task.title}`}
        >
          Chart
        </LinkButton>
      )}
    </li>
  )
}

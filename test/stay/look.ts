import { type LiveBoardTask, livePatients } from '#app/rules/board.ts'
import { runningWords } from '#app/rules/running.ts'
import type { StandingView } from '#app/rules/standing-views.ts'
import type { Why } from '#app/rules/why.ts'
import { standingWords } from '#app/rules/words.ts'
import { showTime } from '#app/time/display.ts'
import { patientCare } from '#app/views/patient-context.server.ts'
import { patientTimeline } from '#app/views/patient-timeline.server.ts'
import { wardBoard } from '#app/views/ward-board.server.ts'
import type { Scene } from './play.ts'

const zone = 'Europe/London'

/** What board and page of the patient show at this moment, in the words that they show it in. */
export async function look({ wardId, stayId, patientId }: Scene) {
  const now = new Date()
  const board = await wardBoard(wardId, now)
  const [row] = board ? livePatients(board.data, now.getTime(), 'pressing') : []
  if (!row) throw new Error('The board does not show the patient')
  const url = new URL(`http://127.0.0.1/patients/${patientId}`)
  const page = (await patientTimeline(await patientCare(stayId, now), url, now)).data
  return {
    board: row.tasks
      .filter(({ status }) => status !== 'upcoming' && status !== 'suspended')
      .map(task => said(task, now)),
    /** Warnings that rise on the board, since nobody has seen them in time. */
    unseen: row.unseen.map(({ name }) => name),
    warnings: page.care.warnings.map(lifeOf),
    running: row.care.running.map(act => runningWords(act, now.getTime())),
    suspended: row.tasks.filter(({ status }) => status === 'suspended').map(({ title }) => title),
    why: { ...reasons(page.why), ...reasons(page.whyWarned) },
  }
}

export type Looked = Awaited<ReturnType<typeof look>>

/** Answers to "why?", their sentences as one text, their numbers by their labels. */
function reasons(answers: Readonly<Record<string, Why>>) {
  return Object.fromEntries(
    Object.entries(answers).map(([name, { rule, values, ...answer }]) => [
      name,
      {
        ...answer,
        says: rule.join(' '),
        values: Object.fromEntries(values.map(({ label, value }) => [label, value])),
      },
    ]),
  )
}

/** `Suction need: due, due by 13:05`. */
function said(task: LiveBoardTask, now: Date): string {
  return `${task.title}: ${task.status}, ${standingWords(task, now.getTime(), zone)}`
}

/** `red suction-will-not-pass, raised 13:20, seen 13:26`: the warning, and its life so far. */
function lifeOf({ level, name, raised, seen, acted, settled, risesAt }: StandingView): string {
  const time = (at: number) => showTime(new Date(at), zone)
  return [
    `${level} ${name}`,
    raised ? `raised ${time(raised.at)}` : 'raised by no act',
    ...(seen ? [`seen ${time(seen.at)}`] : []),
    ...acted.map(({ at }) => `acted on ${time(at)}`),
    ...(settled ? [`settled ${time(settled.at)}`] : []),
    ...(risesAt === null ? [] : [`rises ${time(risesAt)}`]),
  ].join(', ')
}

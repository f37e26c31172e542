import { deferrals } from '#app/care/deferral/schema.ts'
import { isLate, type LiveTask, liveTasks } from '#app/rules/board.ts'
import type { TaskView } from '#app/rules/views.ts'
import type { WhyDue } from '#app/rules/why.ts'
import { momentWords, standingWords } from '#app/rules/words.ts'
import type { Zone } from '#app/time/zone.ts'
import { LinkButton } from './button.tsx'
import { Card } from './card.tsx'
import { chartHref } from './chart-href.ts'
import { DueTask, type DueTaskView } from './due-task.tsx'
import { WhyDetails } from './why.tsx'

interface CareDueProps {
  readonly patientId: string
  readonly tasks: readonly TaskView[]
  readonly why: Readonly<Record<string, WhyDue>>
  /** The server's clock (ms). */
  readonly now: number
  readonly zone: Zone
  readonly charts: boolean
  /** Why nothing is due, when nothing is computed. */
  readonly nothingDue: string | null
}

/** What is due for one patient, most pressing first, each with its reasons. */
export function CareDue({ patientId, tasks, why, now, zone, charts, nothingDue }: CareDueProps) {
  const live = liveTasks(tasks, now)
  const policy = Object.values(why)[0]?.policy
  return (
    <Card title="Care due" flush aside={policy}>
      {nothingDue && <p className="px-4 pb-4 text-ink2">{nothingDue}</p>}
      <ul>
        {live.map(task => {
          const reasons = why[task.name]
          return (
            <DueTask
              key={task.name}
              task={taskRow(task, { patientId, now, zone, charts, reasons })}
              why={
                reasons && (
                  <WhyTask why={reasons} about={task.title} defer={charts ? deferHref(patientId, task) : null} />
                )
              }
            />
          )
        })}
      </ul>
    </Card>
  )
}

interface Seen {
  readonly patientId: string
  readonly now: number
  readonly zone: Zone
  readonly charts: boolean
  readonly reasons: WhyDue | undefined
}

function taskRow(task: LiveTask, { patientId, now, zone, charts, reasons }: Seen): DueTaskView {
  const since =
    isLate(task.status) && task.window && !task.byDay ? `Due ${momentWords(task.window.dueAt, now, zone)}. ` : ''
  const because = task.because && task.status !== 'suspended' ? ` Sooner because ${task.because}.` : ''
  return {
    name: task.name,
    title: task.title,
    detail:
      task.status === 'suspended'
        ? `Suspended: ${task.because ?? ''}`
        : `${since}${reasons?.last ?? ''}${task.byDay ? '' : because}`,
    status: task.status,
    says: standingWords(task, now, zone),
    ...(charts ? { chart: { href: chartHref(patientId, task), words: task.chartWords } } : {}),
  }
}

const deferHref = (patientId: string, { name }: LiveTask) => chartHref(patientId, { kind: deferrals.slug, name })

interface WhyTaskProps {
  readonly why: WhyDue
  readonly about: string
  readonly defer: string | null
}

function WhyTask({ why, about, defer }: WhyTaskProps) {
  return (
    <WhyDetails why={why} about={about}>
      {defer && (
        <p>
          <LinkButton href={defer}>Defer this</LinkButton>
        </p>
      )}
    </WhyDetails>
  )
}

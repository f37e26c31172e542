import { Link } from 'react-router'
import { liveTasks } from '#app/rules/board.ts'
import { type CareView, kindTitle } from '#app/rules/views.ts'
import { standingWords } from '#app/rules/words.ts'
import { showTime } from '#app/time/display.ts'
import type { Zone } from '#app/time/zone.ts'
import { HourStrip } from './hour-strip.tsx'
import type { StripLane } from './strip-lanes.ts'
import { StripPatterns } from './strip-patterns.tsx'

const HOUR_MS = 3_600_000

interface CareStripProps {
  readonly care: CareView
  /** The server's clock (ms). */
  readonly now: number
  readonly zone: Zone
  readonly span: { readonly back: number; readonly ahead: number }
}

/** One patient's hours, a lane for each kind of care that was charted or is due. */
export function CareStrip({ care, now, zone, span }: CareStripProps) {
  return (
    <>
      <StripPatterns />
      <HourStrip
        from={new Date(now - span.back * HOUR_MS)}
        to={new Date(now + span.ahead * HOUR_MS)}
        now={new Date(now)}
        zone={zone}
        width={880}
        lanes={kindLanes(care, now, zone)}
        axis
        labels
        title={`Last ${span.back} hours and next ${span.ahead}`}
      />
    </>
  )
}

function kindLanes(care: CareView, now: number, zone: Zone): readonly StripLane[] {
  const tasks = liveTasks(care.tasks, now)
  const kinds = new Set([...care.tasks.map(({ kind }) => kind), ...care.marks.map(({ kind }) => kind)])
  return [...kinds].map(kind => ({
    name: kindTitle(kind),
    marks: care.marks
      .filter(mark => mark.kind === kind)
      .map(({ at, shape }) => ({ at: new Date(at), shape, says: () => `${shape} ${showTime(new Date(at), zone)}` })),
    windows: tasks
      .filter(task => task.kind === kind)
      .flatMap(task => {
        if (!task.window) return []
        const { opensAt, closesAt } = task.window
        const says = `${task.title} ${standingWords(task, now, zone)}`
        return [{ opensAt: new Date(opensAt), closesAt: new Date(closesAt), status: task.status, says }]
      }),
  }))
}

interface SpanChoiceProps {
  readonly label?: string
  readonly names: readonly string[]
  readonly current: string
  readonly href: (name: string) => string
}

/** The spans to choose from, as links: they work without scripts and can be kept. */
export function SpanChoice({ label = 'Span of the strip', names, current, href }: SpanChoiceProps) {
  return (
    <nav aria-label={label} className="flex flex-wrap gap-2 print:hidden">
      {names.map(name => (
        <Link
          key={name}
          to={href(name)}
          preventScrollReset
          aria-current={name === current ? 'true' : undefined}
          className="inline-flex min-h-11 items-center rounded-control border border-edge px-3 font-semibold aria-[current=true]:border-brand aria-[current=true]:bg-brand-tint aria-[current=true]:text-brand"
        >
          {name}
        </Link>
      ))}
    </nav>
  )
}

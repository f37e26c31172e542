import type { LiveTask } from '#app/rules/board.ts'
import type { RunningView } from '#app/rules/running.ts'
import { momentWords, standingWords } from '#app/rules/words.ts'
import { showDuration } from '#app/time/display.ts'
import type { Zone } from '#app/time/zone.ts'
import { LinkButton } from './button.tsx'
import { Card } from './card.tsx'
import { chartHref } from './chart-href.ts'
import { toneOf } from './status-look.ts'
import { Tag } from './tag.tsx'

interface RunningActsProps {
  readonly patientId: string
  readonly running: readonly RunningView[]
  readonly tasks: readonly LiveTask[]
  /** The server's clock (ms). */
  readonly now: number
  readonly zone: Zone
  readonly charts: boolean
}

/** What runs now, one card each: how long it has lasted, when the patient is looked at next, and how to stop it. */
export function RunningActs({ running, ...shared }: RunningActsProps) {
  return running.map(act => <RunningCard key={`${act.kind} ${act.name}`} act={act} {...shared} />)
}

interface RunningCardProps extends Omit<RunningActsProps, 'running'> {
  readonly act: RunningView
}

function RunningCard({ act, patientId, tasks, now, zone, charts }: RunningCardProps) {
  const watch = tasks.find(task => task.name === act.watchedBy)
  return (
    <Card title={act.title} aside={<Tag tone="ok">Running</Tag>} className="border-brand">
      <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
        <div>
          <p className="text-3xl font-bold tracking-tight">{showDuration(Math.max(0, now - act.since))}</p>
          <p className="text-ink2">
            {`Since ${momentWords(act.since, now, zone)}. `}
            {act.until !== undefined && untilWords(act.since, act.until, now, zone)}
          </p>
          <p className="font-semibold">{act.says}</p>
        </div>
        {charts && (
          <div className="flex flex-wrap gap-2">
            {watch && (
              <LinkButton href={chartHref(patientId, watch)} size={48}>
                {watch.chartWords}
              </LinkButton>
            )}
            <LinkButton
              href={`/patients/${patientId}/chart/${act.kind}?running=${act.name}`}
              size={48}
              variant="primary"
              label={`${act.stopWords}: ${act.title}`}
            >
              {act.stopWords}
            </LinkButton>
          </div>
        )}
      </div>
      {act.until !== undefined && <RunningBar share={(now - act.since) / (act.until - act.since)} />}
      {watch && (
        <p className="mt-3 flex flex-wrap items-center gap-x-3 border-t border-hair pt-3">
          <span>{`Next: ${watch.title.toLowerCase()}`}</span>
          <Tag tone={toneOf[watch.status]}>{standingWords(watch, now, zone)}</Tag>
        </p>
      )}
    </Card>
  )
}

function untilWords(since: number, until: number, now: number, zone: Zone): string {
  const target = showDuration(until - since)
  return `Target ${target}${now >= until ? ' is reached' : `: ${momentWords(until, now, zone)}`}.`
}

/** How much of its time has passed; the words above say the same. */
function RunningBar({ share }: { readonly share: number }) {
  const width = Math.round(Math.min(1, Math.max(0, share)) * 1000) / 10
  return (
    <svg aria-hidden="true" viewBox="0 0 100 2" preserveAspectRatio="none" className="mt-3 h-2 w-full rounded-full">
      <rect width="100" height="2" className="fill-sunk" />
      <rect width={width} height="2" className="fill-brand" />
    </svg>
  )
}

import type { PlanView, TrialView } from '#app/rules/weaning-views.ts'
import { momentWords } from '#app/rules/words.ts'
import { showDuration } from '#app/time/display.ts'
import type { Zone } from '#app/time/zone.ts'
import { LinkButton } from './button.tsx'
import { Card } from './card.tsx'
import { Table } from './table.tsx'
import { EntryLink } from './trend-tables.tsx'

interface Moment {
  /** The server's clock (ms). */
  readonly now: number
  readonly zone: Zone
}

/** The trials of a stay with their verdicts, latest first. */
export function WeaningTrials({ trials, now, zone }: Moment & { readonly trials: readonly TrialView[] }) {
  return (
    <Card title="Trials" flush>
      {trials.length === 0 ? (
        <p className="px-4 pb-4">No trial was charted in this stay.</p>
      ) : (
        <Table
          caption="Trials"
          isTall
          columns={[{ label: 'Begun' }, { label: 'Trial' }, { label: 'Length', numeric: true }, { label: 'Verdict' }]}
          rows={trials.map(({ entryId, title, startedAt, length, target, verdict, because, by }) => ({
            key: entryId,
            cells: [
              <EntryLink key="begun" entryId={entryId} words={momentWords(startedAt, now, zone)} />,
              title,
              <span key="length" className="whitespace-nowrap">
                {showDuration(length)}
                {target !== null && <span className="block text-sm text-ink2">of {showDuration(target)}</span>}
              </span>,
              <span key="verdict">
                {verdict && <b className="font-semibold">{capital(verdict)}. </b>}
                {because && `${because}. `}
                <span className="text-sm text-ink2">{by}</span>
              </span>,
            ],
          }))}
        />
      )}
    </Card>
  )
}

const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)

interface WeaningPlannedProps {
  readonly plan: PlanView | null
  /** Null for those who may not plan. */
  readonly chart: { readonly href: string; readonly words: string } | null
}

/** What the team has planned next, or that it has planned nothing. */
export function WeaningPlanned({ plan, chart, now, zone }: Moment & WeaningPlannedProps) {
  return (
    <Card title="Plan in force">
      {plan ? (
        <>
          <p className="font-semibold">{plan.sentence}</p>
          <p className="flex flex-wrap items-center gap-x-3 text-ink2">
            <span>{plan.by}</span>
            <EntryLink entryId={plan.entryId} words={momentWords(plan.at, now, zone)} />
          </p>
        </>
      ) : (
        <p>No step is planned.</p>
      )}
      {chart && (
        <p className="mt-3">
          <LinkButton href={chart.href}>{chart.words}</LinkButton>
        </p>
      )}
    </Card>
  )
}

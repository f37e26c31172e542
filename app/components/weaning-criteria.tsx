import type { CriterionState } from '#app/care/weaning-plan/criterion.ts'
import type { CriterionView } from '#app/rules/weaning-views.ts'
import { momentWords } from '#app/rules/words.ts'
import type { Zone } from '#app/time/zone.ts'
import { LinkButton } from './button.tsx'
import { Tag, type TagTone } from './tag.tsx'
import { EntryLink } from './trend-tables.tsx'
import { WhyDetails } from './why.tsx'

export interface CriteriaProps {
  readonly criteria: readonly CriterionView[]
  readonly patientId: string
  /** Kinds that the viewer may chart here, by slug. */
  readonly charts: readonly string[]
  readonly policy: string
  /** The server's clock (ms). */
  readonly now: number
  readonly zone: Zone
}

/** What a plan of the next step is held against, and what only informs, each with its act and its reasons. */
export function WeaningCriteria({ criteria, ...shared }: CriteriaProps) {
  const asked = criteria.filter(({ isAsked }) => isAsked)
  const further = criteria.filter(({ isAsked }) => !isAsked)
  return (
    <>
      <p className="px-4 pb-2 text-base font-semibold">{missingWords(asked)}</p>
      <CriterionList title="Asked of a plan" criteria={asked} {...shared} />
      {further.length > 0 && <CriterionList title="Further signs, for information" criteria={further} {...shared} />}
    </>
  )
}

/** `Missing: cap trial passed, effective swallow (not assessed).` */
function missingWords(asked: readonly CriterionView[]): string {
  const open = asked.filter(({ state }) => state !== 'met')
  if (open.length === 0) return 'Nothing is missing: every criterion that a plan is held against is met.'
  const words = open.map(({ label, state }) => `${label} (${state})`)
  return `Missing for this step: ${words.join('; ')}.`
}

function CriterionList({ title, criteria, ...shared }: CriteriaProps & { readonly title: string }) {
  return (
    <section aria-label={title}>
      <h3 className="border-t border-hair bg-sunk px-4 py-1.5 text-sm font-semibold text-ink2">{title}</h3>
      <ul>
        {criteria.map(criterion => (
          <Criterion key={criterion.name} criterion={criterion} {...shared} />
        ))}
      </ul>
    </section>
  )
}

const tones: Readonly<Record<CriterionState, TagTone>> = { met: 'ok', 'not met': 'late', 'not assessed': 'due' }
const signs: Readonly<Record<CriterionState, string>> = {
  met: '✓ Met',
  'not met': '✕ Not met',
  'not assessed': '? Not assessed',
}

type CriterionProps = Omit<CriteriaProps, 'criteria'> & { readonly criterion: CriterionView }

function Criterion({ criterion, patientId, charts, policy, now, zone }: CriterionProps) {
  const { label, state, value, values, entry, chart } = criterion
  // A number says its own source.
  const sources = values.length === 0 ? [`${criterion.source}.`] : []
  const isChartable = state !== 'met' && chart !== null && charts.includes(chart.kind)
  return (
    <li className="grid grid-cols-[minmax(0,1fr)] items-start gap-x-4 gap-y-1 border-t border-hair px-4 py-2 sm:grid-cols-[minmax(0,1fr)_8.5rem_9.5rem]">
      <div className="min-w-0">
        <p className="font-semibold">{label}</p>
        <div className="-mb-1.5 flex flex-wrap items-center gap-x-4 text-ink2">
          {value && <span>{value}</span>}
          {entry && <EntryLink entryId={entry.id} words={momentWords(entry.at, now, zone)} />}
          <WhyDetails why={{ rule: [criterion.rule, ...sources], values, policy }} about={label} />
        </div>
      </div>
      <p className="sm:pt-0.5">
        <Tag tone={tones[state]}>{signs[state]}</Tag>
      </p>
      {isChartable && (
        <div className="sm:text-right">
          <LinkButton href={`/patients/${patientId}/chart/${chart.kind}`} label={`${chart.words}: ${label}`}>
            {chart.words}
          </LinkButton>
        </div>
      )}
    </li>
  )
}

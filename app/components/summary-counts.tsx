export interface SummaryCount {
  readonly count: number
  /** `overdue`, `due now`, `due by 18:00`, `tube in its last 3 days` */
  readonly words: string
  readonly tone?: 'late' | 'due'
}
export interface SummaryCountsProps {
  readonly counts: readonly SummaryCount[]
}

const tones = { late: 'text-late', due: 'text-due' } as const

/** The ward in a few numbers. A count of nothing is not coloured. */
export function SummaryCounts({ counts }: SummaryCountsProps) {
  return (
    <ul aria-label="Summary" className="flex flex-wrap gap-x-6 gap-y-1">
      {counts.map(({ count, words, tone }) => (
        <li
          key={words}
          className={`flex items-baseline gap-2 border-line not-last:md:border-r not-last:md:pr-6 ${tone && count > 0 ? `font-semibold ${tones[tone]}` : ''}`}
        >
          <b className="text-2xl font-bold md:text-3xl">{count}</b>
          <span className={tone && count > 0 ? '' : 'text-ink2'}>{words}</span>
        </li>
      ))}
    </ul>
  )
}

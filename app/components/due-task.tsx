import type { ReactNode } from 'react'
import type { TaskStatus } from '#app/rules/status.ts'
import { LinkButton } from './button.tsx'
import { edgeOf, toneOf } from './status-look.ts'
import { Tag } from './tag.tsx'

export interface DueTaskView {
  readonly name: string
  readonly title: string
  /** The rule and when it was last done. */
  readonly detail: string
  readonly status: TaskStatus
  /** How it stands: `52 min late`, `due by 14:36`, `deferred to 17:00`, `suspended: cuff is down`. */
  readonly says: string
  /** Absent for those who may not chart it. */
  readonly chart?: { readonly href: string; readonly words: string }
}

export interface DueTaskProps {
  readonly task: DueTaskView
  /** Why it is due: the rule, its numbers and their source. */
  readonly why?: ReactNode
}

const pressing: readonly TaskStatus[] = ['due', 'overdue', 'seriously overdue']

/** One piece of due care, as a row of a list. */
export function DueTask({ task, why }: DueTaskProps) {
  const { title, detail, status, says, chart } = task
  return (
    <li
      className={`grid grid-cols-[1fr_auto] items-center gap-x-4 gap-y-2 border-t border-hair px-4 py-2.5 pl-5 first:border-0 md:grid-cols-[1fr_8.5rem_11rem] ${edgeOf[status]}`}
    >
      <div className="min-w-0 max-md:col-span-2">
        <h3 className="text-base font-semibold">{title}</h3>
        <p className="text-sm text-ink2">{detail}</p>
        {why && <div className="-mb-2.5">{why}</div>}
      </div>
      <div>
        <Tag tone={toneOf[status]}>{says}</Tag>
      </div>
      {chart && (
        <LinkButton
          href={chart.href}
          size={48}
          variant={pressing.includes(status) ? 'primary' : 'plain'}
          className="min-w-24"
          label={`${chart.words}, ${title}`}
        >
          {chart.words}
        </LinkButton>
      )}
    </li>
  )
}

import type { ReactNode } from 'react'
import { Link } from 'react-router'
import { Tag } from './tag.tsx'

export interface TimelineEntryView {
  readonly id: string
  /** When it was done: `13:12`. The day is the heading above. */
  readonly time: string
  readonly title: string
  readonly sentence: string
  readonly author: string
  readonly role: string
  /** When it was written well after it was done: `charted 2 h 10 min later`. */
  readonly late?: string | undefined
  readonly status: 'final' | 'corrected' | 'retracted'
  /** Who corrected or retracted it, when and why. */
  readonly statusSays?: string | undefined
  readonly outOfRange?: boolean
  readonly countersign?: { readonly says: string; readonly waits: boolean } | null
  readonly second?: string | null
  readonly href?: string | undefined
}

export interface TimelineEntryProps {
  readonly entry: TimelineEntryView
  /** Pictures, warnings, the words it replaced. */
  readonly children?: ReactNode
}

/** One charted act, as an item of a list. What was corrected or retracted stays readable, struck through. */
export function TimelineEntry({ entry, children }: TimelineEntryProps) {
  const {
    time,
    title,
    sentence,
    author,
    role,
    late,
    status,
    statusSays,
    outOfRange = false,
    countersign,
    second,
    href,
  } = entry
  const struck = status === 'final' ? '' : 'line-through decoration-1'
  return (
    <li className="grid grid-cols-[3.5rem_1rem_1fr] gap-x-2 gap-y-0.5 border-t border-hair px-4 py-2.5 first:border-0 md:grid-cols-[3.5rem_1rem_1fr_12rem]">
      <span className={`font-semibold ${struck}`}>{time}</span>
      <Shape outOfRange={outOfRange} />
      <div className="min-w-0">
        <p>
          <span className={struck}>
            <b className="font-semibold">{title}.</b> {sentence}
          </span>{' '}
          {late && <Tag>{late}</Tag>} {status !== 'final' && <Tag tone="due">{status}</Tag>}
        </p>
        {countersign && (
          <p className="text-sm text-ink2">
            {countersign.waits ? <Tag tone="due">{countersign.says}</Tag> : countersign.says}
          </p>
        )}
        {second && <p className="text-sm text-ink2">{`Second person: ${second}`}</p>}
        {statusSays && <p className="text-sm text-ink2">{statusSays}</p>}
        {children}
      </div>
      <p className="text-sm text-ink2 max-md:col-start-3 md:text-right">
        {author}, {role}
        {href && (
          <>
            {' '}
            <Link
              to={href}
              className="-my-2.5 inline-flex min-h-11 min-w-11 items-center justify-center font-semibold underline underline-offset-3 print:hidden"
            >
              Open <span className="sr-only">{`${title} at ${time}`}</span>
            </Link>
          </>
        )}
      </p>
    </li>
  )
}

/** The same shapes as on the hour strip. */
function Shape({ outOfRange }: { readonly outOfRange: boolean }) {
  if (!outOfRange) {
    return (
      <svg aria-hidden="true" viewBox="0 0 12 12" className="mt-1.5 size-3 fill-done">
        <circle cx="6" cy="6" r="4.5" />
      </svg>
    )
  }
  return (
    <svg
      role="img"
      aria-label="Out of range"
      viewBox="0 0 12 12"
      className="mt-1.5 size-3 fill-none stroke-late stroke-2"
    >
      <path d="M6 1.5L11 10.5H1z" strokeLinejoin="round" />
    </svg>
  )
}

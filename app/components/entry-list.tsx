import type { ReactNode } from 'react'
import { showDay } from '#app/time/display.ts'
import { Empty } from './empty.tsx'
import { Thumbnails } from './thumbnails.tsx'
import { TimelineEntry, type TimelineEntryView } from './timeline-entry.tsx'

export interface EntryListItem extends Omit<TimelineEntryView, 'href' | 'late' | 'statusSays'> {
  /** Local day on which it was done. */
  readonly day: string
  readonly late: string | null
  readonly statusSays: string | null
  readonly photographs: readonly string[]
}

interface EntryListProps {
  /** Where photographs are seen beside those of another day. */
  readonly photographsHref: string
  readonly entries: readonly EntryListItem[]
  /** Local day, to say "today". */
  readonly today: string
  /** Shown when there is nothing. */
  readonly children?: ReactNode
}

/** What was charted, latest first, under a heading for each day. */
export function EntryList({ entries, today, photographsHref, children }: EntryListProps) {
  if (entries.length === 0) return <Empty title="Nothing charted">{children}</Empty>
  const days = [...new Set(entries.map(({ day }) => day))]
  return days.map(day => (
    <section key={day} aria-label={day === today ? 'Today' : showDay(day)}>
      <h3 className="border-t border-hair bg-sunk px-4 py-1.5 text-sm font-semibold">
        {day === today ? `Today, ${showDay(day)}` : showDay(day)}
      </h3>
      <ul>
        {entries
          .filter(entry => entry.day === day)
          .map(({ late, statusSays, photographs, ...entry }) => (
            <TimelineEntry
              key={entry.id}
              entry={{
                ...entry,
                href: `/entries/${entry.id}`,
                late: late ?? undefined,
                statusSays: statusSays ?? undefined,
              }}
            >
              <Thumbnails
                ids={photographs}
                of={`${entry.title} at ${entry.time}`}
                compareHref={`${photographsHref}?later=${entry.id}`}
              />
            </TimelineEntry>
          ))}
      </ul>
    </section>
  ))
}

import { Link } from 'react-router'

export interface CountersignItem {
  readonly id: string
  readonly title: string
  readonly sentence: string
  readonly author: string
  readonly done: string
  /** The second person who was named, if any. */
  readonly second: string | null
  readonly patient: { readonly href: string; readonly says: string }
}

interface CountersignListProps {
  readonly entries: readonly CountersignItem[]
  readonly chosen: readonly string[]
}

/** Entries to be countersigned, each readable in full beside its box. */
export function CountersignList({ entries, chosen }: CountersignListProps) {
  return (
    <fieldset id="entries" tabIndex={-1} className="rounded-card border border-line bg-surface">
      <legend className="sr-only">Entries to countersign</legend>
      <ul>
        {entries.map(entry => (
          <li key={entry.id} className="border-t border-hair px-4 py-3 first:border-0">
            <label className="flex min-h-11 gap-3 py-2">
              <input
                id={`entry-${entry.id}`}
                type="checkbox"
                name="entry"
                value={entry.id}
                defaultChecked={chosen.includes(entry.id)}
                className="mt-0.5 size-5 flex-none"
              />
              <span className="min-w-0">
                <b className="font-semibold">{entry.title}.</b> {entry.sentence}
              </span>
            </label>
            <div className="ml-8">
              <p className="text-sm text-ink2">
                {entry.done}. {entry.author}.{entry.second && ` Second person: ${entry.second}.`}
              </p>
              <p className="flex flex-wrap gap-x-4 text-sm">
                <Link
                  to={entry.patient.href}
                  className="inline-flex min-h-11 items-center underline underline-offset-3"
                >
                  {entry.patient.says}
                </Link>
                <Link
                  to={`/entries/${entry.id}`}
                  className="inline-flex min-h-11 min-w-11 items-center font-semibold underline underline-offset-3"
                >
                  Open<span className="sr-only">{` ${entry.title} of ${entry.done}`}</span>
                </Link>
              </p>
            </div>
          </li>
        ))}
      </ul>
    </fieldset>
  )
}

import { Link } from 'react-router'
import { LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { DataList } from '#app/components/data-list.tsx'
import { EntryHead, Replaced } from '#app/components/entry-head.tsx'
import { Tag } from '#app/components/tag.tsx'
import { Thumbnails } from '#app/components/thumbnails.tsx'
import { Warnings } from '#app/components/warnings.tsx'
import { type EntryView, entryView } from '#app/views/entry-view.server.ts'
import { openedEntry } from '#app/views/opened-entry.server.ts'
import type { Route } from './+types/entry.ts'

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: `${loaderData?.title ?? 'Entry'} | Cannulary` }]

export async function loader({ params, context, request, url }: Route.LoaderArgs) {
  return entryView(await openedEntry({ params, context, request, url }, 'see'))
}

const standingWords = { final: null, corrected: 'corrected', retracted: 'entered in error' } as const

/** One entry in full: what was charted, by whom and when, what it asked people to do, and every version of it. */
export default function Entry({ loaderData: entry }: Route.ComponentProps) {
  const stands = standingWords[entry.standing]
  return (
    <EntryHead head={entry.head} title={entry.title}>
      <div className="grid gap-4">
        {entry.replacedBy && <Replaced {...entry.replacedBy} />}
        <div className="grid gap-4 px-4 md:px-6">
          <div className="flex flex-wrap items-baseline gap-3">
            <p className={`max-w-prose text-lg ${stands ? 'line-through decoration-1' : ''}`}>{entry.sentence}</p>
            {stands && <Tag tone="due">{stands}</Tag>}
          </div>
          <Thumbnails ids={entry.photographs} of={entry.title} struck={stands !== null} />
          {entry.countersign && (
            <p className="flex flex-wrap items-center gap-3">
              {entry.countersign.waits ? <Tag tone="due">{entry.countersign.says}</Tag> : entry.countersign.says}
              {entry.countersign.mayDo && <LinkButton href="/countersign">Countersign</LinkButton>}
            </p>
          )}
          <Warnings warnings={entry.warnings} />
          <EntryActs entry={entry} />
          <div className="grid items-start gap-4 md:grid-cols-2">
            <Card title="When and who">
              <DataList items={entry.facts} />
            </Card>
            {entry.raw === null ? (
              <Card title="Answers">
                <DataList items={entry.details} />
              </Card>
            ) : (
              <Card title="As stored">
                <pre className="overflow-x-auto text-sm whitespace-pre-wrap">{entry.raw}</pre>
              </Card>
            )}
          </div>
          {entry.policy && <p className="text-ink2">Policy in force then: {entry.policy}</p>}
          {entry.history.length > 0 && <History lines={entry.history} />}
        </div>
      </div>
    </EntryHead>
  )
}

function EntryActs({ entry: { id, mayCorrect, mayRetract } }: { readonly entry: EntryView }) {
  if (!mayCorrect && !mayRetract) return null
  return (
    <div className="flex flex-wrap gap-3 print:hidden">
      {mayCorrect && <LinkButton href={`/entries/${id}/correct`}>Correct</LinkButton>}
      {mayRetract && (
        <LinkButton href={`/entries/${id}/retract`} variant="danger">
          Entered in error
        </LinkButton>
      )}
    </div>
  )
}

function History({ lines }: { readonly lines: EntryView['history'] }) {
  return (
    <Card title="Every version, oldest first" flush>
      <ol>
        {lines.map(line => (
          <li key={line.id} className="border-t border-hair px-4 py-3 first:border-0">
            <p className="text-sm text-ink2">{line.says}</p>
            <p className={line.isShown ? 'font-semibold' : ''}>{line.sentence}</p>
            {line.reason && <p className="text-sm text-ink2">Reason: {line.reason}</p>}
            {line.isShown ? (
              <p className="text-sm font-semibold">Shown on this page</p>
            ) : (
              <Link to={`/entries/${line.id}`} className="inline-flex min-h-11 items-center font-semibold underline">
                Open this version
              </Link>
            )}
          </li>
        ))}
      </ol>
    </Card>
  )
}

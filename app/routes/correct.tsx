import { data, redirect } from 'react-router'
import { authorOf } from '#app/auth/permissions.ts'
import { scannerOf } from '#app/auth/scanner.server.ts'
import { findKind } from '#app/care/kinds.ts'
import { itemField } from '#app/charting/item-problems.ts'
import { ChartForm } from '#app/components/chart-form.tsx'
import { CorrectReason, EntryHead, Replaced } from '#app/components/entry-head.tsx'
import { answerOrKept } from '#app/components/kept-form.ts'
import { ScanPanel } from '#app/components/scan-panel.tsx'
import { chartedWith } from '#app/photographs/charted-with.server.ts'
import { sentPhotographs } from '#app/photographs/sent-photographs.server.ts'
import { photographsOf } from '#app/rules/entry-words.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { afterCharting, checked, refusedByRecord } from '#app/views/chart-submission.server.ts'
import { correctForm } from '#app/views/correct-form.server.ts'
import { entryView } from '#app/views/entry-view.server.ts'
import { openedEntry } from '#app/views/opened-entry.server.ts'
import { correctEntry } from '#database/entries.server.ts'
import type { Route } from './+types/correct.ts'

function kindOr404(slug: string) {
  const kind = findKind(slug)
  if (!kind) throw data('This kind of care is not charted any more: its entries can be read and retracted.', 404)
  return kind
}

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Correct ${loaderData?.entry.title ?? 'an entry'} | Cannulary` },
]

export async function loader({ params, context, request, url }: Route.LoaderArgs) {
  const opened = await openedEntry({ params, context, request, url }, 'correct')
  const kind = kindOr404(opened.entry.kind)
  const { separatorKey } = await scannerOf(request)
  return { entry: await entryView(opened), form: await correctForm(kind, opened, url), separatorKey }
}

export async function action({ params, context, request, url }: Route.ActionArgs) {
  const { entry, patientId, ...asked } = await openedEntry({ params, context, request, url }, 'correct')
  const kind = kindOr404(entry.kind)
  const photographs = await sentPhotographs(kind, await sentForm(request), photographsOf(entry))
  const sent = { ...asked, kind, form: photographs.form, photographs, corrects: entry.id }
  const check = await checked(sent)
  if (!check.ok) return data(check.answer, check.status)
  const { id, performedAt, witnessId, reason = '' } = check.chart
  const correction = {
    ...{ id, kind, performedAt, witnessId, reason, data: check.chart.care },
    stayId: entry.stayId,
    recordedBy: authorOf(asked.user),
    supersedes: entry.id,
    before: asked.care.context?.record,
  }
  const charting = await chartedWith(correction, photographs.added, check.alongside, also =>
    correctEntry(correction, also),
  )
  if (charting.outcome === 'charted' || charting.outcome === 'already charted') {
    return redirect(afterCharting(patientId, charting.entry.id, check.isUrgent))
  }
  const { answer, status } = refusedByRecord(sent, charting)
  return data(answer, status)
}

export const clientAction = ({ serverAction }: Route.ClientActionArgs) => answerOrKept(serverAction)

/** The form of the entry's kind, filled in with the entry; what it says now stays readable. */
export default function Correct({ loaderData: { entry, form, separatorKey }, actionData }: Route.ComponentProps) {
  const kind = findKind(form.kind)
  if (!kind) return null
  const of = itemField(kind)?.meta.of
  const path = `/entries/${entry.id}/correct`
  const typed = actionData && 'typed' in actionData ? actionData.typed : form.typed
  const errors = actionData?.is === 'refused' ? actionData.errors : {}
  return (
    <EntryHead head={entry.head} title={`Correct: ${entry.title}`}>
      {entry.replacedBy && !actionData ? (
        <Replaced {...entry.replacedBy} />
      ) : (
        <ChartForm
          key={entry.id}
          kind={kind}
          view={form}
          answer={actionData}
          words="Chart correction"
          cancelHref={`/entries/${entry.id}`}
        >
          {fill => (
            <>
              <CorrectReason entry={entry} typed={typed} errors={errors} />
              {of && <ScanPanel what={of} path={path} separatorKey={separatorKey} onFill={fill} />}
            </>
          )}
        </ChartForm>
      )}
    </EntryHead>
  )
}

import { data, redirect } from 'react-router'
import { patientGate, placeContext } from '#app/auth/patient-access.server.ts'
import { authorOf } from '#app/auth/permissions.ts'
import { scannerOf } from '#app/auth/scanner.server.ts'
import { ownSession, signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { findKind } from '#app/care/kinds.ts'
import { itemField } from '#app/charting/item-problems.ts'
import { ChartForm } from '#app/components/chart-form.tsx'
import { ChartHead, UsualAct } from '#app/components/chart-head.tsx'
import { answerOrKept } from '#app/components/kept-form.ts'
import { ScanPanel } from '#app/components/scan-panel.tsx'
import { chartedWith } from '#app/photographs/charted-with.server.ts'
import { sentPhotographs } from '#app/photographs/sent-photographs.server.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { chartForm } from '#app/views/chart-form.server.ts'
import { afterCharting, checked, refusedByRecord } from '#app/views/chart-submission.server.ts'
import { patientCare } from '#app/views/patient-context.server.ts'
import { addEntry } from '#database/entries.server.ts'
import type { Route } from './+types/chart.ts'

function kindOr404({ kind: slug, patientId }: { readonly kind: string; readonly patientId: string }) {
  const kind = findKind(slug)
  if (!kind) throw data('There is no such kind of care.', 404)
  if (kind.page !== undefined) throw redirect(`/patients/${patientId}/${kind.page}`)
  return kind
}

export const meta: Route.MetaFunction = ({ params }) => [{ title: `${findKind(params.kind)?.title} | Cannulary` }]

export async function loader({ params, context, request, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  const kind = kindOr404(params)
  const { stayId } = await patientGate(user, params.patientId, askOf({ kind, context, request, url }))
  const now = new Date()
  const care = await patientCare(stayId, now)
  const { separatorKey } = await scannerOf(request)
  const form = await chartForm(kind, { care, user, url, now, signedInAt: ownSession(context).startedAt })
  return { ...form, separatorKey }
}

export async function action({ params, context, request, url }: Route.ActionArgs) {
  const user = signedIn(context)
  const kind = kindOr404(params)
  const { stayId } = await patientGate(user, params.patientId, askOf({ kind, context, request, url }))
  const now = new Date()
  const from = { signedInAt: ownSession(context).startedAt, by: traceOf({ request, url, context }) }
  const photographs = await sentPhotographs(kind, await sentForm(request), [])
  const sent = { kind, user, now, ...from, form: photographs.form, photographs, care: await patientCare(stayId, now) }
  const check = await checked(sent)
  if (!check.ok) return data(check.answer, check.status)
  const { id, performedAt, witnessId, reason, care } = check.chart
  const before = sent.care.context?.record
  const entry = { id, kind, stayId, performedAt, recordedBy: authorOf(user), witnessId, reason, data: care, before }
  const charting = await chartedWith(entry, photographs.added, check.alongside, also => addEntry(entry, also))
  if (charting.outcome === 'charted' || charting.outcome === 'already charted') {
    return redirect(afterCharting(params.patientId, charting.entry.id, check.isUrgent))
  }
  const { answer, status } = refusedByRecord(sent, charting)
  return data(answer, status)
}

export const clientAction = ({ serverAction }: Route.ClientActionArgs) => answerOrKept(serverAction)

type Asking = Pick<Route.ActionArgs, 'context' | 'request' | 'url'> & { readonly kind: ReturnType<typeof kindOr404> }

function askOf({ kind, ...arrived }: Asking) {
  const { pathname, search } = arrived.url
  const place = arrived.context.get(placeContext)
  return { path: pathname + search, act: kind.act ?? 'chart care', by: traceOf(arrived), place } as const
}

/** The form of every kind of care. */
export default function Chart({ loaderData: view, actionData, params }: Route.ComponentProps) {
  const kind = findKind(view.kind)
  if (!kind) return null
  const item = itemField(kind)
  const path = `/patients/${params.patientId}/chart/${kind.slug}`
  return (
    <div className="mx-auto max-w-5xl pt-5">
      <ChartHead
        title={kind.title}
        due={view.due}
        recently={view.recently}
        warnings={view.warnings}
        isRestored={view.isRestored}
      />
      {kind.cautions && <p className="px-4 pb-2 text-sm text-ink2 md:px-6">{kind.cautions.join(' ')}</p>}
      <ChartForm
        key={view.kind}
        kind={kind}
        view={view}
        answer={actionData}
        words={kind.chartWords}
        cancelHref={`/patients/${params.patientId}`}
        reasonAfterHours={view.reasonAfterHours}
      >
        {fill => (
          <>
            {item && <ScanPanel what={item.meta.of} path={path} separatorKey={view.separatorKey} onFill={fill} />}
            {view.usual && <UsualAct words={view.usual.words} onFill={() => view.usual && fill(view.usual.answers)} />}
          </>
        )}
      </ChartForm>
    </div>
  )
}

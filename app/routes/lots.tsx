import { data, Form, redirect } from 'react-router'
import { v7 as uuidv7 } from 'uuid'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { Button, LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { LotDecision } from '#app/components/lot-decision.tsx'
import { LotUses, RecalledLots } from '#app/components/lot-uses.tsx'
import { TextField } from '#app/components/text-field.tsx'
import { lotDecisionForm, lotName } from '#app/scanning/lot-form.ts'
import { readForm, sentForm } from '#app/sent-form.server.ts'
import { lotTrace, recalledLots } from '#app/views/lot-trace.server.ts'
import { decideLot } from '#database/lot-recalls.server.ts'
import type { Route } from './+types/lots.ts'

const NOT_YOURS = 'Tracing lots is not for your role.'

export const meta: Route.MetaFunction = () => [{ title: 'Lots | Cannulary' }]

export async function loader({ context, request, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  if (!can(user, 'trace lots')) throw data(NOT_YOURS, 403)
  const asked = url.searchParams.get('lot') ?? ''
  const lot = lotName.safeParse(asked)
  const error = asked !== '' && !lot.success ? (lot.error.issues[0]?.message ?? null) : null
  const trace = lot.success ? await lotTrace(lot.data, user, traceOf({ request, url, context })) : null
  return {
    asked: asked.slice(0, 200),
    error,
    trace,
    recalled: await recalledLots(),
    decisionId: uuidv7(),
    mayRecall: can(user, 'recall lots'),
  }
}

export async function action({ context, request }: Route.ActionArgs) {
  const user = signedIn(context)
  if (!can(user, 'recall lots'))
    throw data('Recalls are entered by the tracheostomy specialist or an administrator.', 403)
  const submission = readForm(await sentForm(request), lotDecisionForm)
  if (submission.status !== 'success') return data(submission.reply(), 400)
  const { id, lot, line, decision, reason } = submission.value
  await decideLot({ id, lot, line: line || null, reason, isRecalled: decision === 'recall', decidedBy: user.id })
  return redirect(`/lots?${new URLSearchParams({ lot })}`)
}

/** Which patients had a lot, and whether it may still be used. */
export default function Lots({ loaderData, actionData }: Route.ComponentProps) {
  const { asked, error, trace, recalled, decisionId, mayRecall } = loaderData
  return (
    <div className="grid gap-5 px-4 py-5 md:px-6">
      <h1 className="text-2xl">Lots</h1>
      <Form role="search" className="grid gap-3">
        <TextField
          id="lot"
          name="lot"
          label="Lot"
          hint="As printed on the pack. Tubes and inner cannulas charted with a lot are found."
          errors={error ? [error] : undefined}
          defaultValue={asked}
          autoComplete="off"
          short
        />
        <div className="flex flex-wrap gap-2">
          <Button>Find</Button>
          <LinkButton href="/scan">Scan a pack</LinkButton>
        </div>
      </Form>
      {!trace && <RecalledLots recalled={recalled} />}
      {trace && (
        <>
          {trace.decisions.length > 0 && (
            <Card title={trace.isRecalled ? 'This lot is recalled' : 'This lot was recalled'}>
              <ul className="grid gap-1">
                {trace.decisions.map(says => (
                  <li key={says} className="break-words">
                    {says}
                  </li>
                ))}
              </ul>
            </Card>
          )}
          <LotUses trace={trace} />
          <div>
            <LinkButton href={`/lots/export?${new URLSearchParams({ lot: trace.lot })}`} reload>
              Download as CSV
            </LinkButton>
          </div>
          {mayRecall && (
            <LotDecision
              id={decisionId}
              lot={trace.lot}
              isRecalled={trace.isRecalled}
              answer={{ errors: actionData?.error ?? {}, typed: actionData?.initialValue ?? {} }}
            />
          )}
        </>
      )}
    </div>
  )
}

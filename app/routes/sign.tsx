import { useEffect } from 'react'
import { data, Form, Link, redirect } from 'react-router'
import { v7 as uuidv7 } from 'uuid'
import { patientContext, patientGate } from '#app/auth/patient-access.server.ts'
import { can, canByGrant } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { Button } from '#app/components/button.tsx'
import { Empty } from '#app/components/empty.tsx'
import { Notice } from '#app/components/notice.tsx'
import { SignSheet } from '#app/components/sign-sheet.tsx'
import { qrPath, qrSymbol } from '#app/print/qr.server.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { hangingSign, signOf } from '#app/views/bed-head-sign.server.ts'
import { patientCare } from '#app/views/patient-context.server.ts'
import { shownBy, signNoted } from '#app/views/print-sign.server.ts'
import type { Route } from './+types/sign.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Bed-head sign | Cannulary' }]

export async function loader({ context, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  const opened = context.get(patientContext)
  const now = new Date()
  const care = await patientCare(opened.stayId, now)
  const hanging = hangingSign(care)
  const justPrinted = hanging !== null && url.searchParams.get('printed') === hanging.entryId
  const { sign, none, facts } = await signOf(care, justPrinted ? hanging.printedAt : now)
  const symbol = qrSymbol(`${url.origin}/patients/${opened.patientId}`)
  const may = opened.via === 'ward' ? can(user, 'chart care', opened.wardId) : canByGrant(user, 'chart care')
  return {
    ...{ sign, none, hanging, justPrinted },
    qr: { size: symbol.size, path: qrPath(symbol) },
    form: may && care.record.stay.dischargedAt === null ? { id: uuidv7(), shows: shownBy(facts) } : null,
  }
}

export async function action({ params, context, request, url }: Route.ActionArgs) {
  const user = signedIn(context)
  const page = `/patients/${params.patientId}/sign`
  const ask = { path: page, act: 'chart care', by: traceOf({ context, request, url }) } as const
  const { stayId } = await patientGate(user, params.patientId, ask)
  const now = new Date()
  const outcome = await signNoted(await sentForm(request), { care: await patientCare(stayId, now), user, now })
  if ('problem' in outcome) return data({ problem: outcome.problem }, outcome.status)
  if (outcome.done === 'taken down') return redirect(page)
  return redirect(outcome.done === 'downloaded' ? `${page}.pdf` : `${page}?printed=${outcome.entryId}`)
}

/** The sign for the head of the bed, and whether the one that hangs there is still true. */
export default function Sign({ loaderData: view, actionData, params }: Route.ComponentProps) {
  const { sign, none, hanging, justPrinted, qr } = view
  useEffect(() => {
    if (justPrinted) window.print()
  }, [justPrinted])
  return (
    <div className="grid gap-4 px-4 py-5 md:px-6 print:block print:p-0">
      <div className="grid gap-3 print:hidden">
        <h1 className="text-2xl font-bold">Bed-head sign</h1>
        {actionData && (
          <Notice tone="amber" action="Not noted.">
            {actionData.problem}
          </Notice>
        )}
        <Standing hanging={hanging} isNeeded={sign !== null} />
        {justPrinted && <p role="status">Noted as printed. If nothing was printed, print this page by the browser.</p>}
        <Buttons {...view} />
      </div>
      {sign ? (
        <SignSheet sign={sign} qr={qr} />
      ) : (
        <Empty title="No sign to print">
          {none}{' '}
          <Link to={`/patients/${params.patientId}/emergency`} className="font-semibold underline">
            Airway emergency steps
          </Link>
        </Empty>
      )}
    </div>
  )
}

type View = Route.ComponentProps['loaderData']

function Standing({ hanging, isNeeded }: Pick<View, 'hanging'> & { readonly isNeeded: boolean }) {
  if (!hanging) return <p>{isNeeded ? 'No sign was printed yet for this stay.' : 'No sign hangs at the bed.'}</p>
  if (hanging.changed.length === 0) return <p>{`${hanging.says} It is current.`}</p>
  return (
    <Notice
      tone="amber"
      action={isNeeded ? 'Destroy the printed sign and print a new one.' : 'Take the printed sign down and destroy it.'}
    >
      {`${hanging.says} Changed since: ${hanging.changed.join(', ')}.`}
    </Notice>
  )
}

function Buttons({ form, sign, hanging }: Pick<View, 'form' | 'sign' | 'hanging'>) {
  if (!form) return null
  const button = (act: string, words: string, isFirst = false) => (
    <Button name="act" value={act} size={48} variant={isFirst ? 'primary' : 'plain'}>
      {words}
    </Button>
  )
  return (
    <Form method="post" reloadDocument className="flex flex-wrap items-center gap-3">
      <input type="hidden" name="id" value={form.id} />
      <input type="hidden" name="shows" value={form.shows} />
      {sign && button('printed', 'Print the sign', true)}
      {sign && button('downloaded', 'Download as PDF')}
      {hanging && button('taken down', 'Sign taken down and destroyed')}
    </Form>
  )
}

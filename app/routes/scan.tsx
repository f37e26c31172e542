import { data, Form, Link, useNavigation, useSubmit } from 'react-router'
import { scannerOf } from '#app/auth/scanner.server.ts'
import { ownSession, signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { Button, LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { ChoiceField } from '#app/components/choice-field.tsx'
import { ScanResult } from '#app/components/scan-result.tsx'
import { ScanSources } from '#app/components/scan-sources.tsx'
import { useWedge } from '#app/components/use-wedge.ts'
import { withAnswers } from '#app/scanning/form-address.ts'
import { type ScanSource, scanForm } from '#app/scanning/scan-form.ts'
import { fillWords, NO_SCAN, type ScanView } from '#app/scanning/scan-view.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { scanResult } from '#app/views/scan-result.server.ts'
import { scanTarget } from '#app/views/scan-target.server.ts'
import type { Route } from './+types/scan.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Scan | Cannulary' }]

export async function loader({ context, request, url }: Route.LoaderArgs) {
  const asking = { user: signedIn(context), now: new Date(), by: traceOf({ request, url, context }) }
  const target = await scanTarget(url.searchParams.get('for'), asking)
  const where = target && { path: target.path, what: target.what, bed: target.bed }
  return { target: where, scanner: await scannerOf(request) }
}

export async function action({ context, request, url }: Route.ActionArgs) {
  const asking = { user: signedIn(context), now: new Date(), by: traceOf({ request, url, context }) }
  const form = await sentForm(request)
  const target = await scanTarget(form.get('for'), asking)
  const { isTrusted } = await scannerOf(request)
  const { wards } = ownSession(context)
  const view = await scanResult(scanForm(form), { ...asking, wards, isTrusted, form: target })
  return view.error === null ? view : data(view, 400)
}

/** Scan, see what it is, and take it to the form that asked for it. */
export default function Scan({ loaderData: { target, scanner }, actionData }: Route.ComponentProps) {
  const view = actionData ?? NO_SCAN
  const path = target?.path ?? ''
  const submit = useSubmit()
  const isBusy = useNavigation().state !== 'idle'
  const before = view.next === null && view.readBack.length === 0 && view.error === null ? [] : view.codes
  const send = (source: ScanSource) => (code: string) => {
    const body = new FormData()
    body.set('for', path)
    for (const text of before) body.append('before', text)
    body.set('source', source)
    body.set('code', code)
    void submit(body, { method: 'post' })
  }
  useWedge(send('scanner'), scanner.separatorKey)
  return (
    <Form method="post" noValidate className="mx-auto grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl">{target ? `Scan the ${target.what} for bed ${target.bed}` : 'Scan'}</h1>
      <input type="hidden" name="for" value={path} />
      {before.map(text => (
        <input key={text} type="hidden" name="before" value={text} />
      ))}
      <Outcome view={view} path={path} />
      <ScanSources view={view} isBusy={isBusy} onCamera={send('camera')} />
      <p className="text-sm text-ink2">
        {scanner.isTrusted
          ? 'The scanner of this workstation has proved to send whole codes.'
          : 'The scanner of this workstation has not been tested: lot and expiry may have to be read back.'}{' '}
        <Link to="/scan/set-up" className="inline-flex min-h-11 items-center underline underline-offset-3">
          Set up the scanner
        </Link>
      </p>
    </Form>
  )
}

interface OutcomeProps {
  readonly view: ScanView
  readonly path: string
}

function Outcome({ view, path }: OutcomeProps) {
  if (view === NO_SCAN || (view.error !== null && view.codes.length === 0)) return null
  const options = Object.fromEntries(view.readBack.map(({ value, words }) => [value, words]))
  const readBack = (
    <div className="grid gap-3">
      <ChoiceField
        id="readBack"
        name="readBack"
        label="Which of these is on the label?"
        hint="The scanner may have left out a separator."
        options={options}
      />
      <Button className="justify-self-start">That is on the label</Button>
    </div>
  )
  return (
    <Card>
      <ScanResult view={view} readBack={readBack}>
        <div className="flex flex-wrap gap-2">
          {view.fill && (
            <LinkButton href={withAnswers(path, view.fill)} variant={view.stops ? 'plain' : 'primary'} size={48}>
              {view.stops ? fillWords(view) : 'Fill it into the form'}
            </LinkButton>
          )}
          {view.links.map(({ href, words }) => (
            <LinkButton key={href} href={href} size={48}>
              {words}
            </LinkButton>
          ))}
          <LinkButton href={path === '' ? '/scan' : `/scan?for=${encodeURIComponent(path)}`} size={48} reload>
            Scan another
          </LinkButton>
        </div>
      </ScanResult>
    </Card>
  )
}

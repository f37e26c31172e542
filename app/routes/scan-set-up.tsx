import { data, Form, Link, useSubmit } from 'react-router'
import { scannerCookie, scannerOf, separatorKeys } from '#app/auth/scanner.server.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { Button } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { Notice } from '#app/components/notice.tsx'
import { SelectField, TextField } from '#app/components/text-field.tsx'
import { useWedge } from '#app/components/use-wedge.ts'
import { isWholeTestCode } from '#app/scanning/test-code.ts'
import { testSymbol } from '#app/scanning/test-symbol.server.ts'
import { sentForm } from '#app/sent-form.server.ts'
import type { Route } from './+types/scan-set-up.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Set up the scanner | Cannulary' }]

export async function loader({ context, request }: Route.LoaderArgs) {
  signedIn(context)
  return { scanner: await scannerOf(request), symbol: testSymbol(), keys: separatorKeys }
}

/** Two forms: the key that stands for the separator, and the test itself. Only a whole test code makes the scanner trusted. */
export async function action({ context, request }: Route.ActionArgs) {
  signedIn(context)
  const form = await sentForm(request)
  const before = await scannerOf(request)
  const code = form.get('code')
  if (typeof code !== 'string') {
    const separatorKey = separatorKeys.find(key => key === form.get('key')) ?? null
    const answer = { says: 'Kept. Now scan the test code.', isTrusted: false }
    return data(answer, { headers: { 'Set-Cookie': await scannerCookie({ isTrusted: false, separatorKey }) } })
  }
  const test = isWholeTestCode(code)
  const headers = { 'Set-Cookie': await scannerCookie({ ...before, isTrusted: test.isWhole }) }
  return data({ says: test.says, isTrusted: test.isWhole }, { headers, status: test.isWhole ? 200 : 400 })
}

const STEPS = [
  'Print this page, or hold the scanner to the screen.',
  'If the scanner can be told to: switch on symbology identifiers, let it send the group separator, and end with Enter.',
  'Scan the code below. What it sent is judged at once.',
]

export default function ScanSetUp({ loaderData: { scanner, symbol, keys }, actionData }: Route.ComponentProps) {
  const submit = useSubmit()
  useWedge(code => void submit({ code }, { method: 'post' }), scanner.separatorKey)
  const isTrusted = actionData?.isTrusted ?? scanner.isTrusted
  return (
    <div className="mx-auto grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl">Set up the scanner of this workstation</h1>
      <p>
        Many scanners leave out the separator after a lot. Lot and expiry then run into each other, and nothing in the
        code shows it. This page finds out.
      </p>
      <div aria-live="polite">
        {actionData && <Notice tone={isTrusted ? 'blue' : 'amber'} action={actionData.says} />}
        {!actionData && <p className="font-semibold">{isTrusted ? TRUSTED : NOT_TESTED}</p>}
      </div>
      <ol className="grid list-decimal gap-1 pl-6">
        {STEPS.map(step => (
          <li key={step}>{step}</li>
        ))}
      </ol>
      <TestSymbol {...symbol} />
      <Form method="post" noValidate className="grid gap-3 print:hidden">
        <TextField
          id="code"
          name="code"
          label="What the scanner sent"
          hint="A scan goes here by itself"
          autoComplete="off"
        />
        <Button className="justify-self-start">Judge it</Button>
      </Form>
      <Card title="If the separator does not come through" className="print:hidden">
        <Form method="post" className="grid gap-3">
          <SelectField
            id="key"
            name="key"
            label="Key that the scanner sends for the separator"
            hint="Ctrl and ] is always understood. Set the scanner to one of these keys if it cannot send that."
            options={Object.fromEntries(keys.map(key => [key, key]))}
            nothing="Ctrl and ]"
            defaultValue={scanner.separatorKey ?? ''}
          />
          <Button className="justify-self-start">Keep this key</Button>
        </Form>
        <p className="mt-3">
          Until then lot and expiry are read back from the label at each scan where they may have run together. Nothing
          else changes.
        </p>
      </Card>
      <p>
        <Link to="/scan" className="inline-flex min-h-11 items-center underline underline-offset-3">
          Back to scanning
        </Link>
      </p>
    </div>
  )
}

const TRUSTED = 'This workstation’s scanner has proved to send whole codes.'
const NOT_TESTED = 'This workstation’s scanner has not been tested yet.'
const QUIET_ZONE = 2 // modules of white around the symbol, which readers need

function TestSymbol({ path, width, height }: ReturnType<typeof testSymbol>) {
  const box = `${-QUIET_ZONE} ${-QUIET_ZONE} ${width + 2 * QUIET_ZONE} ${height + 2 * QUIET_ZONE}`
  return (
    <svg viewBox={box} role="img" aria-label="Test code to scan" className="w-56" shapeRendering="crispEdges">
      <rect x={-QUIET_ZONE} y={-QUIET_ZONE} width="100%" height="100%" fill="#fff" />
      <path d={path} fill="#000" />
    </svg>
  )
}

import { data, Form, Link } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { Button, LinkButton } from '#app/components/button.tsx'
import { CountersignList } from '#app/components/countersign-list.tsx'
import { Empty } from '#app/components/empty.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { env } from '#app/env.server.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { countersigned, countersigningWards, countersignList } from '#app/views/countersigning.server.ts'
import { logLook } from '#database/access-log.server.ts'
import type { Route } from './+types/countersign.ts'

export const meta: Route.MetaFunction = () => [{ title: 'To countersign | Cannulary' }]

export async function loader({ context, request, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  if (!can(user, 'countersign')) throw data('Countersigning is for registered colleagues at the bedside.', 403)
  const named = url.searchParams.get('show') === 'mine'
  const list = await countersignList(user, named, env.hospitalTimeZone)
  const by = traceOf({ request, url, context })
  for (const wardId of countersigningWards(user)) {
    await logLook({ action: 'saw entries to countersign', purpose: 'TREAT', by, wardId })
  }
  return { named, ...list }
}

export async function action({ context, request }: Route.ActionArgs) {
  const user = signedIn(context)
  if (!can(user, 'countersign')) throw data('Countersigning is for registered colleagues at the bedside.', 403)
  const outcome = await countersigned(user, await sentForm(request))
  return data(outcome, outcome.ok ? 200 : 400)
}

/** What students and assistants charted on one's own wards, to be read and countersigned, several at once. */
export default function Countersign({ loaderData: { named, entries, isWhole }, actionData }: Route.ComponentProps) {
  const problem = actionData?.ok === false ? actionData : undefined
  return (
    <div className="mx-auto grid max-w-5xl gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">To countersign</h1>
      <p className="max-w-prose text-ink2">
        Charted under supervision on your wards. These entries count as they stand; countersigning says that you
        supervised the care. To change one, correct it.
      </p>
      <nav aria-label="Which entries" className="flex flex-wrap gap-x-4">
        <Choice href="/countersign" here={!named} words="All of my wards" />
        <Choice href="/countersign?show=mine" here={named} words="Where I was the second person" />
      </nav>
      <div role="status" className="empty:-mb-4">
        {actionData?.ok && <p className="font-semibold text-brand">{outcomeWords(actionData)}</p>}
      </div>
      {entries.length === 0 ? (
        <Empty title="Nothing to countersign" />
      ) : (
        <Form method="post" className="grid gap-4">
          {problem && <ErrorSummary title="Not countersigned yet. Please check:" errors={[problem]} />}
          {!isWhole && (
            <p className="font-semibold">
              {`The oldest ${entries.length} are shown. More wait: they come up as these are countersigned.`}
            </p>
          )}
          <CountersignList entries={entries} chosen={problem?.chosen ?? []} />
          <label className="flex min-h-11 items-start gap-3">
            <input id="supervised" type="checkbox" name="supervised" value="yes" className="mt-0.5 size-5 flex-none" />
            <span className="font-semibold">I supervised this care, and have read the chosen entries.</span>
          </label>
          <div className="flex flex-wrap gap-3">
            <Button variant="primary" size={48}>
              Countersign the chosen
            </Button>
            <LinkButton href="/" size={48}>
              Back
            </LinkButton>
          </div>
        </Form>
      )}
    </div>
  )
}

function outcomeWords({ signed, left }: { readonly signed: number; readonly left: number }): string {
  const done = `${signed} ${signed === 1 ? 'entry' : 'entries'} countersigned.`
  return left === 0
    ? done
    : `${done} ${left} had changed meanwhile or are not yours to countersign: nothing was done there.`
}

function Choice({ href, here, words }: { readonly href: string; readonly here: boolean; readonly words: string }) {
  return (
    <Link
      to={href}
      aria-current={here ? 'page' : undefined}
      className="inline-flex min-h-11 items-center font-semibold text-brand underline underline-offset-3 aria-[current]:text-ink aria-[current]:no-underline"
    >
      {words}
    </Link>
  )
}

import { data, Link, redirect } from 'react-router'
import { newCalendarSecret } from '#app/auth/calendar-secret.server.ts'
import { type CurrentUser, can } from '#app/auth/permissions.ts'
import { ownSession, signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { CalendarAddress } from '#app/components/calendar-address.tsx'
import { Card } from '#app/components/card.tsx'
import { TubeTable } from '#app/components/tube-table.tsx'
import { env } from '#app/env.server.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { showDate } from '#app/time/display.ts'
import { tubesOfWards } from '#app/views/tube-list.server.ts'
import { logLook } from '#database/access-log.server.ts'
import { feedOf, makeFeed, revokeFeeds } from '#database/calendar-feeds.server.ts'
import type { Route } from './+types/tubes.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Tubes | Cannulary' }]

/** The wards whose tubes this person may see together. Throws a 403 to others. */
function wardsOf(user: CurrentUser, context: Route.LoaderArgs['context']) {
  const wards = ownSession(context).wards.filter(ward => can(user, 'see tubes of wards', ward.id))
  if (wards.length === 0) throw data('Tubes of whole wards are for tracheostomy specialists and charge nurses.', 403)
  return wards
}

export async function loader({ context, request, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  const wards = wardsOf(user, context)
  const asked = url.searchParams.get('ward')
  const shown = asked === null ? wards : wards.filter(({ id }) => id === asked)
  if (shown.length === 0) throw data('There is no such ward.', 404)
  const now = new Date()
  const tubes = await tubesOfWards(
    shown.map(({ id }) => id),
    now,
  )
  const by = traceOf({ request, url, context })
  for (const { id } of shown) await logLook({ action: 'saw tubes', purpose: 'TREAT', by, wardId: id })
  const feed = await feedOf(user.id)
  return {
    tubes,
    wards: wards.map(({ id, name }) => ({ id, name })),
    ward: asked,
    feedSince: feed && showDate(feed.madeAt, env.hospitalTimeZone),
  }
}

export async function action({ request, url, context }: Route.ActionArgs) {
  const user = signedIn(context)
  wardsOf(user, context)
  const by = traceOf({ request, url, context })
  const step = (await sentForm(request)).get('step')
  if (step === 'make') {
    const { secret, hash } = newCalendarSecret()
    await makeFeed(user.id, hash, by)
    // Shown in this answer only: what is stored is its hash.
    return { address: new URL(`/calendar/${secret}/tubes.ics`, url.origin).href }
  }
  if (step !== 'end') throw data('Choose what to do with the address of the calendar.', 400)
  await revokeFeeds(user.id, by)
  return redirect('/tubes')
}

/** Every tube in place on one's wards, the next to be changed first. */
export default function Tubes({ loaderData: { tubes, wards, ward, feedSince }, actionData }: Route.ComponentProps) {
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-4 px-4 py-5 md:px-6">
      <header>
        <h1 className="text-2xl font-bold">Tubes in place</h1>
        <p className="text-ink2">By the day they are to be changed. Days count from the day of insertion, day 0.</p>
        {wards.length > 1 && <WardFilter wards={wards} current={ward} />}
      </header>
      <Card flush>
        <TubeTable tubes={tubes} />
      </Card>
      <CalendarAddress since={feedSince} address={actionData?.address ?? null} />
    </div>
  )
}

interface WardFilterProps {
  readonly wards: readonly { readonly id: string; readonly name: string }[]
  readonly current: string | null
}

function WardFilter({ wards, current }: WardFilterProps) {
  const links = [
    { id: null, name: 'All wards', to: '/tubes' },
    ...wards.map(one => ({ ...one, to: `?ward=${one.id}` })),
  ]
  return (
    <nav aria-label="Wards" className="mt-3 flex flex-wrap gap-2">
      {links.map(({ id, name, to }) => (
        <Link
          key={to}
          to={to}
          aria-current={id === current ? 'page' : undefined}
          className="inline-flex min-h-11 items-center rounded-control border border-edge px-4 font-semibold aria-[current=page]:border-brand aria-[current=page]:bg-brand-tint aria-[current=page]:text-brand"
        >
          {name}
        </Link>
      ))}
    </nav>
  )
}

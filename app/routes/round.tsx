import { data } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { ownSession, signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { LinkButton } from '#app/components/button.tsx'
import { CompetenceReminders } from '#app/components/competence-reminders.tsx'
import { useLive } from '#app/components/live.ts'
import { RoundView, roundWords } from '#app/components/round-view.tsx'
import { Stale } from '#app/components/stale.tsx'
import { ownReminders } from '#app/views/competence-reminders.server.ts'
import { wardBoard } from '#app/views/ward-board.server.ts'
import { logLook } from '#database/access-log.server.ts'
import type { Route } from './+types/round.ts'

export const meta: Route.MetaFunction = () => [{ title: 'My round | Cannulary' }]

export async function loader({ context, request, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  const wards = ownSession(context).wards.filter(({ id }) => can(user, 'see ward', id))
  const asked = url.searchParams.get('ward')
  const ward = asked === null ? wards[0] : wards.find(({ id }) => id === asked)
  if (!ward) throw data('You belong to no ward with patients.', 404)
  const now = new Date()
  const charts = can(user, 'chart care', ward.id)
  const [served, reminders] = await Promise.all([
    wardBoard(ward.id, now, ward.rev),
    charts ? ownReminders(user, ward.id, now) : [],
  ])
  if (!served) throw data('There is no such ward.', 404)
  const by = traceOf({ request, url, context })
  await logLook({ action: 'saw round', purpose: 'TREAT', by, wardId: ward.id })
  return {
    served,
    others: wards.filter(({ id }) => id !== ward.id).map(({ id, name }) => ({ id, name })),
    charts,
    reminders: { lines: reminders, href: `/competence/${user.id}` },
  }
}

/** The patients of one's ward and what is due for each until the shift ends. */
export default function Round({ loaderData: { served, others, charts, reminders } }: Route.ComponentProps) {
  const { data: board, now, staleSince } = useLive(`/api/wards/${served.data.wardId}/board`, served)
  return (
    <div className="px-4 py-4 md:px-6">
      <header className="mb-3 flex flex-wrap items-end justify-between gap-x-6 gap-y-2">
        <div>
          <h1 className="text-2xl font-bold">My round</h1>
          <p className="text-ink2">
            {board.wardName} · {roundWords(board, now)}
          </p>
        </div>
        <nav aria-label="Other wards" className="flex flex-wrap gap-2">
          {others.map(({ id, name }) => (
            <LinkButton key={id} href={`/round?ward=${id}`}>
              {name}
            </LinkButton>
          ))}
        </nav>
      </header>
      <Stale since={staleSince === null ? null : new Date(staleSince)} zone={board.zone} />
      <CompetenceReminders reminders={reminders.lines} href={reminders.href} />
      <RoundView board={board} now={now} charts={charts} />
    </div>
  )
}

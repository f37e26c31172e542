import { data, Link } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { ownSession, signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { BoardSummary, BoardView } from '#app/components/board-view.tsx'
import { LinkButton } from '#app/components/button.tsx'
import { useLive } from '#app/components/live.ts'
import { Notice } from '#app/components/notice.tsx'
import { Stale } from '#app/components/stale.tsx'
import { livePatients } from '#app/rules/board.ts'
import { wardBoard } from '#app/views/ward-board.server.ts'
import { logLook } from '#database/access-log.server.ts'
import type { Route } from './+types/board.ts'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.served.data.wardName ?? 'Ward'} board | Cannulary` },
]

export async function loader({ params: { wardId }, context, request, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  if (!can(user, 'see ward', wardId)) throw data('There is no such ward.', 404)
  const { wards } = ownSession(context)
  const served = await wardBoard(wardId, new Date(), wards.find(ward => ward.id === wardId)?.rev)
  if (!served) throw data('There is no such ward.', 404)
  await logLook({ action: 'saw board', purpose: 'TREAT', by: traceOf({ request, url, context }), wardId })
  return {
    served,
    order: url.searchParams.get('sort') === 'bed' ? ('bed' as const) : ('pressing' as const),
    wards: wards.map(({ id, name }) => ({ id, name })),
    charts: can(user, 'chart care', wardId),
    admits: can(user, 'admit patients', wardId),
    keepsSupplies: can(user, 'keep supplies', wardId),
    seesAccess: can(user, 'see access log', wardId),
    countersigns: can(user, 'countersign', wardId),
  }
}

/** The ward at a glance: who is late, how late, and what is due next. */
export default function WardBoard({ loaderData }: Route.ComponentProps) {
  const { served, order, wards, charts, admits, keepsSupplies, seesAccess, countersigns } = loaderData
  const { data: board, now, staleSince } = useLive(`/api/wards/${served.data.wardId}/board`, served)
  const patients = livePatients(board, now, order)
  const here = `/wards/${board.wardId}`
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-2 px-4 py-3 md:px-6">
      <header className="flex flex-wrap items-center gap-x-8 gap-y-3">
        <h1 className="text-2xl font-bold">{board.wardName}</h1>
        <BoardSummary board={board} patients={patients} />
        <WardLinks wards={wards.filter(ward => ward.id !== board.wardId)} />
        <div className="flex flex-wrap gap-2 print:hidden md:ml-auto">
          <LinkButton href={order === 'bed' ? `${here}/board` : `${here}/board?sort=bed`}>
            {order === 'bed' ? 'Sort by lateness' : 'Sort by bed'}
          </LinkButton>
          {countersigns && board.toCountersign > 0 && (
            <LinkButton href="/countersign">{`${board.toCountersign} to countersign`}</LinkButton>
          )}
          {admits && <LinkButton href={`${here}/admit`}>Admit</LinkButton>}
          {keepsSupplies && <LinkButton href={`${here}/supplies`}>Supplies</LinkButton>}
          {seesAccess && <LinkButton href={`${here}/access`}>Who looked</LinkButton>}
        </div>
      </header>
      <Stale since={staleSince === null ? null : new Date(staleSince)} zone={board.zone} />
      {board.policy === null && (
        <Notice tone="amber" action="Ask the clinical lead to review a policy for this ward.">
          Without one nothing is computed: no due care and no warnings.
        </Notice>
      )}
      <BoardView board={board} now={now} patients={patients} charts={charts} />
    </div>
  )
}

interface WardLinksProps {
  readonly wards: readonly { readonly id: string; readonly name: string }[]
}

function WardLinks({ wards }: WardLinksProps) {
  if (wards.length === 0) return null
  return (
    <nav aria-label="Other wards" className="flex flex-wrap gap-x-4">
      {wards.map(({ id, name }) => (
        <Link key={id} to={`/wards/${id}/board`} className="inline-flex min-h-11 items-center font-semibold underline">
          {name}
        </Link>
      ))}
    </nav>
  )
}

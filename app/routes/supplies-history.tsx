import { Link } from 'react-router'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { Empty } from '#app/components/empty.tsx'
import { Pager } from '#app/components/pager.tsx'
import { Table } from '#app/components/table.tsx'
import { stockMoves } from '#app/views/stock-moves.server.ts'
import { suppliesGate } from '#app/views/supplies-gate.server.ts'
import type { Route } from './+types/supplies-history.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Moves of supplies | Cannulary' }]

export async function loader({ params, context, url }: Route.LoaderArgs) {
  const ward = await suppliesGate(signedIn(context), params.wardId)
  return { ward, ...(await stockMoves(ward.id, url)) }
}

/** Every move of a ward's stock, latest first: who, when, what, how many, from where to where. */
export default function SuppliesHistory({ loaderData: { ward, moves, of, older } }: Route.ComponentProps) {
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-4 px-4 py-5 md:px-6">
      <header className="flex flex-wrap items-center justify-between gap-3">
        <h1 className="text-2xl font-bold">{ward.name}: moves of supplies</h1>
        <LinkButton href={`/wards/${ward.id}/supplies`}>Back to supplies</LinkButton>
      </header>
      <p className="text-ink2">
        {of ? `Only ${of}. ` : ''}Moves are never changed or deleted: the stock of a place is their sum.
      </p>
      <Card flush>
        {moves.length === 0 ? (
          <Empty title="Nothing was moved" />
        ) : (
          <Table
            caption="Moves, latest first"
            columns={[
              { label: 'Done' },
              { label: 'What' },
              { label: 'Item' },
              { label: 'Pieces', numeric: true },
              { label: 'Place' },
              { label: 'By' },
              { label: 'Reason' },
            ]}
            rows={moves.map(move => ({ key: move.key, cells: cellsOf(move) }))}
          />
        )}
        <Pager label="Moves" {...(older ? { older } : {})} />
      </Card>
    </div>
  )
}

type Move = Route.ComponentProps['loaderData']['moves'][number]

function cellsOf({ done, what, href, item, pieces, place, by, reason }: Move) {
  const whole = (text: string) => <span className="whitespace-nowrap">{text}</span>
  const act = href ? (
    <Link to={href} className="inline-flex min-h-11 min-w-11 items-center underline underline-offset-3">
      {what}
    </Link>
  ) : (
    what
  )
  const roomy = (text: string, room = 'min-w-28') => <span className={`block wrap-anywhere ${room}`}>{text}</span>
  return [whole(done), act, roomy(item, 'min-w-56'), whole(pieces), roomy(place), roomy(by), roomy(reason, 'min-w-48')]
}

import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { Empty } from '#app/components/empty.tsx'
import { Notice } from '#app/components/notice.tsx'
import { BedStock, OrderTable, StockTable } from '#app/components/stock-tables.tsx'
import { stockActs } from '#app/supplies/act-form.ts'
import { suppliesGate } from '#app/views/supplies-gate.server.ts'
import { suppliesPage } from '#app/views/supplies-page.server.ts'
import { logLook } from '#database/access-log.server.ts'
import type { Route } from './+types/supplies.ts'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Supplies of ${loaderData?.ward.name ?? 'a ward'} | Cannulary` },
]

export async function loader({ params, context, request, url }: Route.LoaderArgs) {
  const ward = await suppliesGate(signedIn(context), params.wardId)
  await logLook({ action: 'saw supplies', purpose: 'TREAT', by: traceOf({ request, url, context }), wardId: ward.id })
  return suppliesPage(ward.id, new Date())
}

/** What a ward has, how long it lasts, what to order, and what lies at each bed. */
export default function Supplies({ loaderData: { ward, hasPolicy, rule, items, order, beds } }: Route.ComponentProps) {
  const here = `/wards/${ward.id}/supplies`
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-4 px-4 py-5 md:px-6">
      <header className="flex flex-wrap items-center gap-x-8 gap-y-3">
        <h1 className="text-2xl font-bold">Supplies of {ward.name}</h1>
        <div className="flex flex-wrap gap-2 md:ml-auto print:hidden">
          {Object.entries(stockActs).map(([act, { title }]) => (
            <LinkButton key={act} href={`${here}/${act}`} variant={act === 'receive' ? 'primary' : 'plain'}>
              {title}
            </LinkButton>
          ))}
          <LinkButton href={`${here}/history`}>All moves</LinkButton>
        </div>
      </header>
      {!hasPolicy && (
        <Notice tone="amber" action="Ask the clinical lead to review a policy for this ward.">
          Until then the use of each patient is not known by interval, and orders follow the product’s own numbers.
        </Notice>
      )}
      <Card title="Stock" flush>
        {items.length === 0 ? (
          <Empty title="Nothing is kept yet">Receive what lies in the store, or count it.</Empty>
        ) : (
          <StockTable items={items} here={here} />
        )}
      </Card>
      <Card
        title="To order"
        flush
        aside={
          order.length > 0 && (
            <LinkButton href={`${here}/order.csv`} reload>
              Order list as CSV
            </LinkButton>
          )
        }
      >
        {order.length === 0 ? (
          <Empty title="Nothing has to be ordered" />
        ) : (
          <OrderTable items={order} days={rule.horizonDays} />
        )}
        <p className="px-4 py-3 text-sm text-ink2">
          Need: use a day for {rule.horizonDays} days and {rule.wastage} % more. An order goes out when the stock is
          down to what is used until it arrives ({rule.leadDays} days) and {rule.safetyDays} days in hand. These are
          settings of the policy.
        </p>
      </Card>
      <BedStock beds={beds} here={here} />
    </div>
  )
}

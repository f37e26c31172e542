import { signedIn } from '#app/auth/signed-in.server.ts'
import { orderCsv } from '#app/supplies/order.ts'
import { suppliesGate } from '#app/views/supplies-gate.server.ts'
import { wardSupplies } from '#app/views/ward-supplies.server.ts'
import type { Route } from './+types/supplies-order.ts'

/** The order list of a ward as a file for a program of tables. */
export async function loader({ params, context }: Route.LoaderArgs) {
  const ward = await suppliesGate(signedIn(context), params.wardId)
  const { items } = await wardSupplies(ward.id, new Date())
  return new Response(orderCsv(items), {
    headers: {
      'Content-Type': 'text/csv; charset=utf-8',
      'Content-Disposition': 'attachment; filename="order-list.csv"',
      'Cache-Control': 'no-store',
    },
  })
}

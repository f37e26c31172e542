import { data } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { csvText } from '#app/catalogue/csv-text.ts'
import { lotName } from '#app/scanning/lot-form.ts'
import { lotTrace } from '#app/views/lot-trace.server.ts'
import type { Route } from './+types/lots-export.ts'

const HEAD = ['Lot', 'Patient', 'Record no.', 'Where', 'Charted', 'Device', 'When']

/** The table of the page as a file. */
export async function loader({ context, request, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  if (!can(user, 'trace lots')) throw data('Tracing lots is not for your role.', 403)
  const lot = lotName.safeParse(url.searchParams.get('lot') ?? '')
  if (!lot.success) throw data(lot.error.issues[0]?.message ?? 'Enter the lot', 400)
  const { uses, elsewhere } = await lotTrace(lot.data, user, traceOf({ request, url, context }))
  const rows = uses.map(use => [lot.data, use.name, use.recordNumber, use.where, use.what, use.device, use.at])
  const others = elsewhere.map(({ wardName, patients }) => [lot.data, `${patients} patients`, '', wardName, '', '', ''])
  return new Response(csvText([HEAD, ...rows, ...others]), {
    headers: {
      'Content-Type': 'text/csv; charset=utf-8',
      'Content-Disposition': `attachment; filename="lot-${lot.data.replace(/[^A-Za-z0-9-]/g, '_')}.csv"`,
    },
  })
}

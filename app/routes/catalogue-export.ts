import { data } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { columns } from '#app/catalogue/columns.ts'
import { csvText } from '#app/catalogue/csv-text.ts'
import { headLine } from '#app/catalogue/import-plan.ts'
import { catalogueCells } from '#app/catalogue/known-items.ts'
import { wholeCatalogue } from '#database/catalogue.server.ts'
import type { Route } from './+types/catalogue-export.ts'

/** The whole catalogue as a file that the import takes back unchanged. */
export async function loader({ context }: Route.LoaderArgs) {
  if (!can(signedIn(context), 'see catalogue')) throw data('The catalogue is not for your role.', 403)
  const rows = catalogueCells(await wholeCatalogue()).map(cells => columns.map(column => cells[column]))
  return new Response(csvText([headLine, ...rows]), {
    headers: {
      'Content-Type': 'text/csv; charset=utf-8',
      'Content-Disposition': 'attachment; filename="catalogue.csv"',
      'Cache-Control': 'no-store',
    },
  })
}

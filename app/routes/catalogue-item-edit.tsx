import { data, Link, redirect } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { fitWords } from '#app/catalogue/columns.ts'
import { ItemForm } from '#app/components/item-form.tsx'
import { sentForm } from '#app/sent-form.server.ts'
import { savedFrom, versionIn } from '#app/views/catalogue-form.server.ts'
import { type ItemView, itemKindOr404, itemOr404 } from '#app/views/catalogue-item.server.ts'
import { innerCannulasWhere } from '#database/catalogue.server.ts'
import type { Route } from './+types/catalogue-item-edit.ts'

const KEPT_BY = 'The catalogue is kept by the tracheostomy specialist and the administrators.'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.item.name ?? 'Item'} | Cannulary` },
]

export async function loader({ params: { items, itemId }, context }: Route.LoaderArgs) {
  const kind = itemKindOr404(items)
  if (!can(signedIn(context), 'manage catalogue')) throw data(KEPT_BY, 403)
  const item = await itemOr404(kind, itemId)
  return { items, item, fitting: await fittingOf(item) }
}

/** The inner cannulas of the tube's line: what a tube may be given, by id, as its export names them. */
async function fittingOf({ kind, lineId, cells }: ItemView): Promise<Record<string, string>> {
  if (kind !== 'tube' || cells.construction !== 'dual') return {}
  const cannulas = await innerCannulasWhere('i.line_id = :lineId', { lineId })
  return Object.fromEntries(cannulas.map(cannula => [cannula.id, fitWords(cannula)]))
}

export async function action({ params: { items, itemId }, request, context }: Route.ActionArgs) {
  const user = signedIn(context)
  const kind = itemKindOr404(items)
  if (!can(user, 'manage catalogue')) throw data(KEPT_BY, 403)
  const item = await itemOr404(kind, itemId)
  const sent = await sentForm(request)
  const fitting = Object.keys(await fittingOf(item))
  const { line, maker } = item.cells
  const form = {
    kind,
    ofLine: { line, maker },
    id: itemId,
    version: versionIn(sent),
    retired: item.isRetired,
    fitting,
    by: user.id,
  }
  const refusal = await savedFrom(sent, form)
  return refusal ? data(refusal, 400) : redirect(`/catalogue/${items}/${itemId}`)
}

export default function EditItem({ loaderData: { items, item, fitting }, actionData }: Route.ComponentProps) {
  const { kind, id, version, name, cells, fits } = item
  const stored = Object.fromEntries(Object.entries(cells).map(([column, cell]) => [column, cell === '' ? [] : [cell]]))
  return (
    <div className="grid gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">{name}</h1>
      <p>
        Line {cells.line}, by {cells.maker}.{' '}
        <Link
          to={`/catalogue/lines/${item.lineId}`}
          className="inline-flex min-h-11 items-center underline underline-offset-3"
        >
          Name the line anew
        </Link>
      </p>
      <ItemForm
        {...{ kind, id, version, fitting }}
        without={['line', 'maker']}
        typed={actionData?.typed ?? { ...stored, fits: fits.map(fit => fit.id) }}
        errors={actionData?.errors ?? {}}
        words="Save"
        cancelHref={`/catalogue/${items}/${id}`}
      />
    </div>
  )
}

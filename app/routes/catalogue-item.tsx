import { data, Form, Link } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { tubeCautions } from '#app/care/tube-change/cautions.ts'
import { columns, headings } from '#app/catalogue/columns.ts'
import { Button, LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { DataList } from '#app/components/data-list.tsx'
import { ItemHistory } from '#app/components/item-history.tsx'
import { Tag } from '#app/components/tag.tsx'
import { sentForm } from '#app/sent-form.server.ts'
import { itemRetired } from '#app/views/catalogue-form.server.ts'
import { catalogueHistory, itemKindOr404, itemOr404 } from '#app/views/catalogue-item.server.ts'
import type { Route } from './+types/catalogue-item.ts'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.item.name ?? 'Item'} | Cannulary` },
]

export async function loader({ params: { items, itemId }, context }: Route.LoaderArgs) {
  const user = signedIn(context)
  if (!can(user, 'see catalogue')) throw data('The catalogue is not for your role.', 403)
  const item = await itemOr404(itemKindOr404(items), itemId)
  return { items, item, history: await catalogueHistory(item.id, item.lineId), mayEdit: can(user, 'manage catalogue') }
}

export async function action({ params: { items, itemId }, request, context }: Route.ActionArgs) {
  const user = signedIn(context)
  const kind = itemKindOr404(items)
  if (!can(user, 'manage catalogue')) {
    throw data('The catalogue is kept by the tracheostomy specialist and the administrators.', 403)
  }
  const item = await itemOr404(kind, itemId)
  const outcome = await itemRetired(await sentForm(request), item, user.id)
  return data(outcome, outcome.status)
}

export default function Item({ loaderData: { items, item, history, mayEdit }, actionData }: Route.ComponentProps) {
  const { kind, id, name, isRetired } = item
  return (
    <div className="grid gap-4 px-4 py-5 md:px-6">
      <header className="flex flex-wrap items-center gap-3">
        <h1 className="text-2xl font-bold">{name}</h1>
        {isRetired && <Tag tone="due">Retired</Tag>}
      </header>
      <div role="status" className="empty:-mb-4">
        {actionData && <p className="font-semibold">{actionData.says}</p>}
      </div>
      <div className="flex flex-wrap gap-3">
        {kind === 'tube' && <LinkButton href={`/catalogue/compare?tube=${id}`}>Compare with other tubes</LinkButton>}
        {mayEdit && <LinkButton href={`/catalogue/${items}/${id}/edit`}>Edit</LinkButton>}
        {mayEdit && <RetireForm item={item} />}
        <LinkButton href={`/catalogue/lines/${item.lineId}`}>Its line</LinkButton>
        <LinkButton href={kind === 'tube' ? '/catalogue' : '/catalogue?items=inner-cannulas'}>All of them</LinkButton>
      </div>
      <div className="grid items-start gap-4 lg:grid-cols-2">
        <Card title={kind === 'tube' ? 'The tube' : 'The inner cannula'}>
          <Facts item={item} />
          {kind === 'tube' && <p className="mt-4 text-sm text-ink2">{tubeCautions.join(' ')}</p>}
        </Card>
        <Card title={kind === 'tube' ? 'Inner cannulas that fit' : 'Tubes that it fits'}>
          <Fits item={item} />
        </Card>
      </div>
      <ItemHistory history={history} />
    </div>
  )
}

type Shown = Pick<Route.ComponentProps['loaderData'], 'item'>

function Facts({ item: { cells } }: Shown) {
  const left: readonly string[] = ['item', 'id', 'fits', 'retired']
  const told = columns.filter(column => cells[column] !== '' && !left.includes(column))
  return <DataList items={told.map(column => ({ label: headings[column], value: cells[column] }))} />
}

function Fits({ item: { kind, cells, fits } }: Shown) {
  if (kind === 'tube' && cells.construction === 'single') return <p>A single cannula takes none.</p>
  if (fits.length === 0) return <p>None is noted. Ask the tracheostomy specialist.</p>
  const list = kind === 'tube' ? 'inner-cannulas' : 'tubes'
  return (
    <ul className="grid gap-2">
      {fits.map(fit => (
        <li key={fit.id} className="flex flex-wrap items-center gap-x-3">
          <Link
            to={`/catalogue/${list}/${fit.id}`}
            className="inline-flex min-h-11 items-center underline underline-offset-3"
          >
            {fit.name}
          </Link>
          {fit.isRetired && <Tag>Retired</Tag>}
        </li>
      ))}
    </ul>
  )
}

function RetireForm({ item: { version, isRetired } }: Shown) {
  return (
    <Form method="post">
      <input type="hidden" name="version" value={version} />
      <Button name="retired" value={isRetired ? 'no' : 'yes'} variant={isRetired ? 'plain' : 'danger'}>
        {isRetired ? 'Put in use again' : 'Retire'}
      </Button>
    </Form>
  )
}

import { data, Link } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { innerCannulaName, tubeName } from '#app/catalogue/item.ts'
import { LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { CatalogueFilter, catalogueHref } from '#app/components/catalogue-filter.tsx'
import { Empty } from '#app/components/empty.tsx'
import { Table } from '#app/components/table.tsx'
import { Tag } from '#app/components/tag.tsx'
import { catalogueAsk, catalogueList } from '#app/views/catalogue-list.server.ts'
import type { Route } from './+types/catalogue.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Catalogue | Cannulary' }]

export async function loader({ url, context }: Route.LoaderArgs) {
  const user = signedIn(context)
  if (!can(user, 'see catalogue')) throw data('The catalogue is not for your role.', 403)
  return { ...(await catalogueList(catalogueAsk(url.searchParams))), mayEdit: can(user, 'manage catalogue') }
}

export default function Catalogue({ loaderData }: Route.ComponentProps) {
  const { ask, lines, total, mayEdit } = loaderData
  const isTubes = ask.items === 'tubes'
  return (
    <div className="grid gap-4 px-4 py-5 md:px-6">
      <header className="flex flex-wrap items-center gap-3">
        <h1 className="mr-auto text-2xl font-bold">Catalogue</h1>
        {mayEdit && <LinkButton href="/catalogue/tubes/new">Add a tube</LinkButton>}
        {mayEdit && <LinkButton href="/catalogue/inner-cannulas/new">Add an inner cannula</LinkButton>}
        {mayEdit && <LinkButton href="/catalogue/import">Import</LinkButton>}
        <LinkButton href="/catalogue/export" reload>
          Export
        </LinkButton>
      </header>
      <CatalogueFilter ask={ask} lines={lines} />
      <Card flush>
        {total === 0 ? (
          <Empty title="Nothing was found">Take a filter away, or look among the retired too.</Empty>
        ) : isTubes ? (
          <TubeTable {...loaderData} />
        ) : (
          <InnerCannulaTable {...loaderData} />
        )}
        <Pages {...loaderData} />
      </Card>
    </div>
  )
}

type Listed = Route.ComponentProps['loaderData']

const LINK = 'inline-flex min-h-11 min-w-56 items-center py-1 underline underline-offset-3'

function TubeTable({ tubes, total }: Pick<Listed, 'tubes' | 'total'>) {
  const numeric = (label: string) => ({ label, numeric: true })
  return (
    <Table
      caption={`Tubes: ${total}`}
      captionShown
      columns={[
        { label: 'Tube' },
        { label: 'Maker' },
        numeric('OD mm'),
        numeric('ID, inner in'),
        numeric('ID outer'),
        numeric('Length mm'),
        { label: 'State' },
      ]}
      rows={tubes.map(tube => ({
        key: tube.id,
        cells: [
          <Link key="tube" to={`/catalogue/tubes/${tube.id}`} className={LINK}>
            {tubeName(tube)}
          </Link>,
          tube.maker,
          tube.od.toFixed(1),
          tube.idWithInner?.toFixed(1) ?? '',
          tube.idWithoutInner.toFixed(1),
          tube.lengthMm,
          tube.retiredAt ? <Tag key="retired">Retired</Tag> : 'In use',
        ],
      }))}
    />
  )
}

function InnerCannulaTable({ innerCannulas, total }: Pick<Listed, 'innerCannulas' | 'total'>) {
  return (
    <Table
      caption={`Inner cannulas: ${total}`}
      captionShown
      columns={[
        { label: 'Inner cannula' },
        { label: 'Maker' },
        { label: 'In a box', numeric: true },
        { label: 'GTIN' },
        { label: 'State' },
      ]}
      rows={innerCannulas.map(cannula => ({
        key: cannula.id,
        cells: [
          <Link key="cannula" to={`/catalogue/inner-cannulas/${cannula.id}`} className={LINK}>
            {innerCannulaName(cannula)}
          </Link>,
          cannula.maker,
          cannula.packSize,
          cannula.gtin ?? '',
          cannula.retiredAt ? <Tag key="retired">Retired</Tag> : 'In use',
        ],
      }))}
    />
  )
}

function Pages({ ask, pages }: Pick<Listed, 'ask' | 'pages'>) {
  if (pages <= 1) return null
  return (
    <nav aria-label="Catalogue, pages" className="flex items-center justify-between gap-3 p-4 print:hidden">
      {ask.page > 1 ? <LinkButton href={catalogueHref(ask, ask.page - 1)}>Previous</LinkButton> : <span />}
      <span>
        Page {ask.page} of {pages}
      </span>
      {ask.page < pages ? <LinkButton href={catalogueHref(ask, ask.page + 1)}>Next</LinkButton> : <span />}
    </nav>
  )
}

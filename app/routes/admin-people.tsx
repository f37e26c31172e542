import { data, Link } from 'react-router'
import { authorOf, can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { Table } from '#app/components/table.tsx'
import { Tag } from '#app/components/tag.tsx'
import { env } from '#app/env.server.ts'
import { showDateTime } from '#app/time/display.ts'
import { people } from '#database/users.server.ts'
import type { Route } from './+types/admin-people.ts'

export const meta: Route.MetaFunction = () => [{ title: 'People | Cannulary' }]

export async function loader({ context }: Route.LoaderArgs) {
  if (!can(signedIn(context), 'manage people')) throw data('People are kept by the administrators.', 403)
  const everybody = await people()
  return {
    zone: env.hospitalTimeZone,
    people: everybody.map(({ id, name, email, role, supervised, wards, lastSeenAt, disabledAt, oneTimeUntil }) => ({
      ...{ id, name, email, lastSeenAt, role: authorOf({ id, role, isSupervised: supervised }).role },
      wards: wards.map(ward => ward.name).join(', '),
      state: stateOf(disabledAt, oneTimeUntil),
    })),
  }
}

function stateOf(disabledAt: Date | null, oneTimeUntil: Date | null) {
  if (disabledAt !== null) return 'Disabled'
  return oneTimeUntil === null ? null : 'One-time password'
}

export default function People({ loaderData }: Route.ComponentProps) {
  const { zone } = loaderData
  return (
    <div className="grid gap-4 px-4 py-5 md:px-6">
      <header className="flex flex-wrap items-center justify-between gap-3">
        <h1 className="text-2xl font-bold">People</h1>
        <LinkButton href="/admin/people/new" variant="primary">
          Add a person
        </LinkButton>
      </header>
      <Card flush>
        <Table
          caption="People who may sign in"
          columns={[
            { label: 'Name' },
            { label: 'Role' },
            { label: 'Wards' },
            { label: 'Last seen' },
            { label: 'State' },
          ]}
          rows={loaderData.people.map(person => ({
            key: person.id,
            cells: [
              <NameCell key="name" {...person} />,
              person.role,
              person.wards || 'None',
              person.lastSeenAt ? showDateTime(person.lastSeenAt, zone) : 'Never',
              person.state ? <Tag key="state">{person.state}</Tag> : 'Active',
            ],
          }))}
        />
      </Card>
    </div>
  )
}

function NameCell({ id, name, email }: { readonly id: string; readonly name: string; readonly email: string }) {
  return (
    <>
      <Link to={`/admin/people/${id}`} className="inline-flex min-h-11 items-center underline underline-offset-3">
        {name}
      </Link>
      <span className="block font-normal text-ink2">{email}</span>
    </>
  )
}

import { Fragment } from 'react'
import { Link, redirect } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { Card } from '#app/components/card.tsx'
import { Table } from '#app/components/table.tsx'
import { type GapLine, type WardGaps, wardGaps } from '#app/views/competence.server.ts'
import type { Route } from './+types/competence.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Staff competence | Cannulary' }]

export async function loader({ context }: Route.LoaderArgs) {
  const user = signedIn(context)
  if (!can(user, 'see competence gaps')) return redirect(`/competence/${user.id}`)
  return { wards: await wardGaps(user, new Date()), ownHref: `/competence/${user.id}` }
}

/** Who on a ward lacks a skill that some act asks for, and what runs out soon. */
export default function Competence({ loaderData: { wards, ownHref } }: Route.ComponentProps) {
  return (
    <div className="grid gap-4 px-4 py-5 md:px-6">
      <header className="flex flex-wrap items-baseline justify-between gap-3">
        <h1 className="text-2xl font-bold">Staff competence</h1>
        <Link to={ownHref} className="inline-flex min-h-11 items-center font-semibold underline underline-offset-3">
          Your own sign-offs
        </Link>
      </header>
      <p className="max-w-prose text-ink2">
        Registered staff who chart, and the skills that an act asks for. Nobody is kept from charting by a gap; the
        entry says so. No roster is kept here: a person counts for the shifts in which they charted, and a shift in
        which nobody charted is left out.
      </p>
      {wards.map(ward => (
        <section key={ward.id} aria-label={ward.name} className="grid gap-4">
          <h2 className="text-xl font-bold">{`${ward.name}: ${ward.people} people`}</h2>
          <Card title={`${ward.gaps.length} gaps`} flush>
            <Lines caption={`Gaps on ${ward.name}`} lines={ward.gaps} none="Everybody is signed off." />
          </Card>
          <Card title={`Runs out within ${ward.noticeDays} days: ${ward.expiring.length}`} flush>
            <Lines caption={`Runs out soon on ${ward.name}`} lines={ward.expiring} none="Nothing runs out." />
          </Card>
          <ShiftCard ward={ward.name} cover={ward.byShift} />
        </section>
      ))}
    </div>
  )
}

interface ShiftCardProps {
  readonly ward: string
  readonly cover: WardGaps['byShift']
}

function ShiftCard({ ward, cover: { days, lines } }: ShiftCardProps) {
  return (
    <Card title={`Shifts without anybody in date, last ${days} days`} flush>
      {lines.length === 0 ? (
        <p className="p-4 text-ink2">In every shift somebody in date charted.</p>
      ) : (
        <Table
          caption={`Gaps by shift on ${ward}`}
          columns={['Shift', 'Skill', 'Nobody in date charted in', 'Such acts in those shifts'].map(label => ({
            label,
          }))}
          rows={lines.map(({ key, shift, skill, without, acts }) => ({ key, cells: [shift, skill, without, acts] }))}
        />
      )}
    </Card>
  )
}

interface LinesProps {
  readonly caption: string
  readonly lines: readonly GapLine[]
  readonly none: string
}

function personsOf(lines: readonly GapLine[]) {
  const ids = [...new Set(lines.map(({ userId }) => userId))]
  return ids.map(userId => ({ userId, own: lines.filter(line => line.userId === userId) }))
}

/** A row for each person: what they lack stands together. */
function Lines({ caption, lines, none }: LinesProps) {
  if (lines.length === 0) return <p className="p-4 text-ink2">{none}</p>
  return (
    <Table
      caption={caption}
      columns={[{ label: 'Name and role' }, { label: 'Skills, and how they stand' }]}
      rows={personsOf(lines).map(({ userId, own }) => ({
        key: userId,
        cells: [
          <Fragment key="name">
            <Link
              to={`/competence/${userId}`}
              className="inline-flex min-h-11 items-center underline underline-offset-3"
            >
              {own[0]?.name}
            </Link>
            <span className="block text-sm font-normal text-ink2">{own[0]?.role}</span>
          </Fragment>,
          <ul key="skills">
            {own.map(({ key, skill, stands }) => (
              <li key={key}>
                {skill}: <b className="font-semibold">{stands}</b>
              </li>
            ))}
          </ul>,
        ],
      }))}
    />
  )
}

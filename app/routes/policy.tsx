import { data, Link } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { Card } from '#app/components/card.tsx'
import { Notice } from '#app/components/notice.tsx'
import { Tag } from '#app/components/tag.tsx'
import { type PolicyLine, type PolicySection, policyOverview } from '#app/views/policy-overview.server.ts'
import { allWards } from '#database/wards.server.ts'
import type { Route } from './+types/policy.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Policy | Cannulary' }]

export async function loader({ context, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  const wards = (await allWards()).filter(ward => can(user, 'see policy', ward.id) && !ward.retired)
  const asked = url.searchParams.get('ward')
  const ward = asked === null ? wards[0] : wards.find(({ id }) => id === asked)
  if (!ward) throw data('There is no such ward.', 404)
  return {
    wards: wards.map(({ id, name }) => ({ id, name })),
    ward: { id: ward.id, name: ward.name, shiftTimes: ward.shiftTimes, pressureUnit: ward.pressureUnit },
    overview: await policyOverview(ward.id, new Date()),
  }
}

/** The policy in force, every number in words with its source. */
export default function Policy({ loaderData: { wards, ward, overview } }: Route.ComponentProps) {
  return (
    <div className="grid gap-5 px-4 py-5 md:px-6">
      <header>
        <h1 className="text-2xl font-bold">Policy, {ward.name}</h1>
        <p className="max-w-prose text-ink2">
          Intervals and limits are set by your hospital.{' '}
          {overview ? `${overview.title}. ${overview.review}` : 'This ward has no reviewed policy.'}
        </p>
        <p className="text-ink2">
          Shifts from {ward.shiftTimes.join(', ')}. Pressure gauges read in {ward.pressureUnit}.
        </p>
        <WardChoice wards={wards} current={ward.id} />
      </header>
      {!overview && (
        <Notice tone="amber" action="Ask the clinical lead to review a policy for this ward.">
          Without one nothing is computed: no due care and no warnings.
        </Notice>
      )}
      {overview?.sections.map(section => (
        <Section key={section.title} section={section} />
      ))}
    </div>
  )
}

interface WardChoiceProps {
  readonly wards: readonly { readonly id: string; readonly name: string }[]
  readonly current: string
}

function WardChoice({ wards, current }: WardChoiceProps) {
  if (wards.length < 2) return null
  return (
    <nav aria-label="Wards" className="mt-3 flex flex-wrap gap-2">
      {wards.map(({ id, name }) => (
        <Link
          key={id}
          to={`?ward=${id}`}
          aria-current={id === current ? 'page' : undefined}
          className="inline-flex min-h-11 items-center rounded-control border border-edge px-4 font-semibold aria-[current=page]:border-brand aria-[current=page]:bg-brand-tint aria-[current=page]:text-brand"
        >
          {name}
        </Link>
      ))}
    </nav>
  )
}

function Section({ section: { title, lines } }: { readonly section: PolicySection }) {
  return (
    <Card title={title} flush>
      <dl>
        {lines.map(line => (
          <Line key={line.name} line={line} />
        ))}
      </dl>
    </Card>
  )
}

function Line({ line }: { readonly line: PolicyLine }) {
  return (
    <div className="grid gap-x-6 gap-y-1 border-t border-hair px-4 py-3 first:border-0 md:grid-cols-[minmax(0,1fr)_10rem_minmax(0,1fr)]">
      <dt>
        <span className="font-semibold">{line.label}</span>
        <span className="block text-sm text-ink2">{line.affects}</span>
      </dt>
      <dd>
        <b className="text-lg font-bold">{line.value}</b>
        {line.differsFrom && <span className="block text-sm text-ink2">product default {line.differsFrom}</span>}
        {line.personal && <span className="block text-sm text-ink2">may be set for one patient</span>}
        {!line.reviewed && <Tag tone="due">not in the reviewed version</Tag>}
      </dd>
      <dd className="text-sm text-ink2">
        {line.source} <Tag>{line.standing}</Tag>
      </dd>
    </div>
  )
}

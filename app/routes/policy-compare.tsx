import { data } from 'react-router'
import { LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { DifferenceList } from '#app/components/difference-list.tsx'
import { policyHref, policyPlace } from '#app/policies/policy-place.server.ts'
import { policyDifferences } from '#app/rules/policy-values.ts'
import { policyVersions, versionsFor } from '#app/views/policy-overview.server.ts'
import { policies } from '#database/policies.server.ts'
import type { Route } from './+types/policy-compare.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Two versions of a policy | Cannulary' }]

export async function loader({ context, url }: Route.LoaderArgs) {
  const place = await policyPlace({ context, url }, 'see policy')
  const { ward, ruleSet } = place
  const known = versionsFor(await policies(), ward.id, ruleSet)
  const [from, to] = ['from', 'to'].map(name => known.find(({ id }) => id === url.searchParams.get(name)))
  if (!from || !to) throw data('There is no such version.', 404)
  const lines = await policyVersions(ward.id, ruleSet, new Date(), false)
  return {
    ward: ward.name,
    back: policyHref('', place),
    sides: [from, to].flatMap(({ id }) => lines.filter(line => line.id === id)),
    differences: policyDifferences(ruleSet, from.values, to.values),
  }
}

/** What one version changed against another. */
export default function PolicyCompare({ loaderData: { ward, back, sides, differences } }: Route.ComponentProps) {
  return (
    <div className="grid max-w-4xl gap-5 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">Two versions, {ward}</h1>
      <div className="grid gap-4 md:grid-cols-2">
        {sides.map(({ id, title, says, reason }, i) => (
          <Card key={`${i === 0 ? 'from' : 'to'} ${id}`} title={`${i === 0 ? 'From' : 'To'}: ${title}`}>
            <p className="text-ink2">{says}</p>
            <p>{reason}</p>
          </Card>
        ))}
      </div>
      <Card title="Differences">
        <DifferenceList differences={differences} />
      </Card>
      <p>
        <LinkButton href={back}>Back to the policy</LinkButton>
      </p>
    </div>
  )
}

import { data } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { LinkButton } from '#app/components/button.tsx'
import { Notice } from '#app/components/notice.tsx'
import { PolicyNav } from '#app/components/policy-nav.tsx'
import { JumpLinks, PolicySections, Versions } from '#app/components/policy-sections.tsx'
import { policyHref, policyPlace } from '#app/policies/policy-place.server.ts'
import { policyOverview, policyVersions } from '#app/views/policy-overview.server.ts'
import type { Route } from './+types/policy.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Policy | Cannulary' }]

export async function loader({ context, url }: Route.LoaderArgs) {
  const place = await policyPlace({ context, url }, 'see policy')
  const { user, wards, ward, ruleSet } = place
  const now = new Date()
  const asked = url.searchParams.get('version')
  const manages = can(user, 'manage policy', ward.id)
  const overview = await policyOverview(ward.id, ruleSet, asked, now)
  if (asked !== null && !overview) throw data('There is no such version.', 404)
  return {
    ...{ wards, ruleSet, manages, overview },
    ward: { id: ward.id, name: ward.name, shiftTimes: ward.shiftTimes, pressureUnit: ward.pressureUnit },
    versions: await policyVersions(ward.id, ruleSet, now, manages),
    seesPlans: can(user, 'see patients', ward.id),
    here: policyHref('', place),
    draft: policyHref('/draft', place),
    published: url.searchParams.has('published'),
  }
}

const NONE = {
  adults: {
    action: 'Ask the clinical lead to review a policy for this ward.',
    says: 'Without one nothing is computed: no due care and no warnings.',
  },
  children: {
    action: 'No rule set for children here.',
    says: 'For somebody under the age for adults nothing is computed on this ward; charting stays possible.',
  },
}

/** The policy in force or one of its versions, every number in words with its source. */
export default function Policy({ loaderData }: Route.ComponentProps) {
  const { wards, ward, ruleSet, overview, versions, manages, seesPlans, here, draft, published } = loaderData
  return (
    <div className="grid gap-5 px-4 py-5 md:px-6">
      <header className="grid gap-3">
        <h1 className="text-2xl font-bold">
          Policy, {ward.name}
          {ruleSet === 'children' ? ', children' : ''}
        </h1>
        {published && <p role="status">Published. It is in the list of versions below.</p>}
        <p className="max-w-prose text-ink2">
          Intervals and limits are set by your hospital.{' '}
          {overview ? `${overview.title}. ${overview.review}` : 'No reviewed version is in force.'}
        </p>
        <p className="text-ink2">
          Shifts from {ward.shiftTimes.join(', ')}. Pressure gauges read in {ward.pressureUnit}.
        </p>
        <PolicyNav page="/policy" wards={wards} ward={ward.id} ruleSet={ruleSet} />
        <p className="flex flex-wrap gap-2 print:hidden">
          {manages && <LinkButton href={draft}>Draft the next version</LinkButton>}
          {seesPlans && <LinkButton href={`/wards/${ward.id}/care-plans`}>Care plans of this ward</LinkButton>}
        </p>
      </header>
      {overview && !overview.isInForce && (
        <Notice tone="blue" action="This version is not in force.">
          It is shown as it was published.
        </Notice>
      )}
      {!overview && (
        <Notice tone="amber" action={NONE[ruleSet].action}>
          {NONE[ruleSet].says}
        </Notice>
      )}
      {overview && <JumpLinks sections={[...overview.sections, { id: 'versions', title: 'Versions' }]} />}
      {overview && <PolicySections sections={overview.sections} />}
      {versions.length > 0 && <Versions versions={versions} here={here} />}
    </div>
  )
}

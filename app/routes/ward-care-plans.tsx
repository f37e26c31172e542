import { data, Link } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { Card } from '#app/components/card.tsx'
import { Empty } from '#app/components/empty.tsx'
import { Table } from '#app/components/table.tsx'
import { Tag } from '#app/components/tag.tsx'
import { wardCarePlans } from '#app/views/ward-care-plans.server.ts'
import { logLook } from '#database/access-log.server.ts'
import { wardById } from '#database/wards.server.ts'
import type { Route } from './+types/ward-care-plans.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Care plans | Cannulary' }]

export async function loader({ params: { wardId }, context, request, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  const ward = can(user, 'see patients', wardId) ? await wardById(wardId) : undefined
  if (!ward) throw data('There is no such ward.', 404)
  await logLook({ action: 'saw care plans', purpose: 'TREAT', by: traceOf({ request, url, context }), wardId })
  return { ward: ward.name, plans: await wardCarePlans(wardId, new Date()) }
}

type Plan = Route.ComponentProps['loaderData']['plans'][number]

/** Every own value on a ward, with its reason and the day by which it must be looked at again. */
export default function WardCarePlans({ loaderData: { ward, plans } }: Route.ComponentProps) {
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">Care plans, {ward}</h1>
      <p className="max-w-prose text-ink2">
        Numbers that are set for one patient in place of the ward’s policy. Each stays in force until it is changed;
        past its review date it warns.
      </p>
      <Card flush>
        {plans.length === 0 ? (
          <Empty title="No patient here has an own value" />
        ) : (
          <Table
            caption="Own values by review date"
            columns={['Patient', 'Own value', 'Reason', 'Set by', 'Review'].map(label => ({ label }))}
            rows={plans.map(plan => ({ key: plan.key, cells: cellsOf(plan) }))}
          />
        )}
      </Card>
    </div>
  )
}

function cellsOf({ patientId, bed, family, given, setting, value, reason, by, reviewOn, daysLeft, isSoon }: Plan) {
  return [
    <Link key="patient" to={`/patients/${patientId}`} className="inline-flex min-h-11 items-center underline">
      {`Bed ${bed}, ${family.toUpperCase()}, ${given}`}
    </Link>,
    `${setting}: ${value}`,
    reason,
    by,
    <span key="review">
      {reviewOn} <Tag tone={daysLeft < 0 ? 'late' : isSoon ? 'due' : 'plain'}>{daysWords(daysLeft)}</Tag>
    </span>,
  ]
}

function daysWords(days: number): string {
  if (days === 0) return 'today'
  const count = Math.abs(days) === 1 ? '1 day' : `${Math.abs(days)} days`
  return days < 0 ? `${count} past` : `in ${count}`
}

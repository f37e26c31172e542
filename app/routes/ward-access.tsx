import { data } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { Card } from '#app/components/card.tsx'
import { Empty } from '#app/components/empty.tsx'
import { Table } from '#app/components/table.tsx'
import { env } from '#app/env.server.ts'
import { showDateTime, showTime } from '#app/time/display.ts'
import { type Opening, openingsOf } from '#database/access-grants.server.ts'
import { logLook } from '#database/access-log.server.ts'
import { wardById } from '#database/wards.server.ts'
import type { Route } from './+types/ward-access.ts'

const DAYS = 30

export const meta: Route.MetaFunction = () => [{ title: 'Opened from elsewhere | Cannulary' }]

export async function loader({ params: { wardId }, request, url, context }: Route.LoaderArgs) {
  const user = signedIn(context)
  const ward = can(user, 'see ward', wardId) ? await wardById(wardId) : undefined
  if (!ward) throw data('There is no such ward.', 404)
  if (!can(user, 'see access log', wardId)) throw data('This is for the charge nurse of the ward.', 403)
  const openings = await openingsOf(wardId, DAYS)
  await logLook({ action: 'read access log', purpose: 'ADMIN', by: traceOf({ request, url, context }), wardId })
  return { wardName: ward.name, zone: env.hospitalTimeZone, openings }
}

export default function WardAccess({ loaderData }: Route.ComponentProps) {
  const { wardName, zone, openings } = loaderData
  return (
    <div className="grid gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">{wardName}: opened from elsewhere</h1>
      <p className="text-ink2">
        People who do not belong to this ward and opened its patients in the last {DAYS} days, with the reason they
        gave. Ask them when a reason is not clear.
      </p>
      <Card flush>
        {openings.length === 0 ? (
          <Empty title="Nobody from elsewhere opened a patient of this ward" />
        ) : (
          <Table
            caption="Patients opened from elsewhere"
            columns={[
              { label: 'Who' },
              { label: 'When' },
              { label: 'Patient' },
              { label: 'Reason' },
              { label: 'Pages', numeric: true },
            ]}
            rows={openings.map(opening => rowOf(opening, zone))}
          />
        )}
      </Card>
    </div>
  )
}

function rowOf(opening: Opening, zone: string) {
  const { id, userName, userRole, grantedAt, endsAt, familyName, givenName, reason, looks } = opening
  return {
    key: id,
    cells: [
      <span key="who">
        {userName} <span className="block font-normal text-ink2">{userRole}</span>
      </span>,
      `${showDateTime(grantedAt, zone)} to ${showTime(endsAt, zone)}`,
      `${familyName.toUpperCase()}, ${givenName}`,
      reason,
      looks,
    ],
  }
}

import { data } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { tubeCautions } from '#app/care/tube-change/cautions.ts'
import { tubeName } from '#app/catalogue/item.ts'
import { LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { CatheterCard } from '#app/components/catheter-card.tsx'
import { ComparedTubes } from '#app/components/compared-tubes.tsx'
import { Empty } from '#app/components/empty.tsx'
import { JacksonTables } from '#app/components/jackson-tables.tsx'
import { Notice } from '#app/components/notice.tsx'
import { tubesCompared } from '#app/views/catalogue-compare.server.ts'
import type { Route } from './+types/catalogue-compare.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Tubes side by side | Cannulary' }]

export async function loader({ request, url, context }: Route.LoaderArgs) {
  const user = signedIn(context)
  if (!can(user, 'see catalogue')) throw data('The catalogue is not for your role.', 403)
  const by = traceOf({ request, url, context })
  const ask = { params: url.searchParams, path: url.pathname + url.search, user, by }
  return { compared: await tubesCompared(ask, new Date()) }
}

export default function Compare({ loaderData: { compared } }: Route.ComponentProps) {
  return (
    <div className="grid gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">Tubes side by side</h1>
      <Notice tone="amber" action="The decision is the tracheostomy specialist’s.">
        This page compares numbers. It converts no size, and says of no tube that it can stand in for another.{' '}
        {tubeCautions.join(' ')}
      </Notice>
      {compared ? (
        <>
          <Present {...compared.present} />
          <ComparedTubes present={compared.present} candidates={compared.candidates} />
          <CatheterCard present={compared.present} rule={compared.rule} />
        </>
      ) : (
        <Card>
          <Empty title="No tube is chosen">
            <LinkButton href="/catalogue">Choose one in the catalogue</LinkButton>
          </Empty>
        </Card>
      )}
      <JacksonTables />
    </div>
  )
}

type Compared = NonNullable<Route.ComponentProps['loaderData']['compared']>

function Present({ tube, tubeId, patientId }: Compared['present']) {
  const { od, idWithInner, idWithoutInner, lengthMm } = tube
  const inside =
    idWithInner === null
      ? `${idWithoutInner.toFixed(1)} mm`
      : `${idWithInner.toFixed(1)} mm with the inner cannula in, ${idWithoutInner.toFixed(1)} mm without`
  return (
    <Card title={`Present tube: ${tubeName(tube)}`}>
      <p className="mb-3">
        Outside diameter {od.toFixed(1)} mm, inside {inside}, length {lengthMm} mm.
      </p>
      {patientId && <LinkButton href={`/patients/${patientId}`}>Back to the patient</LinkButton>}
      {tubeId && <LinkButton href={`/catalogue/tubes/${tubeId}`}>Back to the tube</LinkButton>}
    </Card>
  )
}

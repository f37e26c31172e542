import { Outlet, useLocation } from 'react-router'
import { patientContext, patientOnly } from '#app/auth/patient-access.server.ts'
import { LinkButton } from '#app/components/button.tsx'
import { PatientBanner } from '#app/components/patient-banner.tsx'
import { patientHead } from '#app/views/patient-care.server.ts'
import { patientCare } from '#app/views/patient-context.server.ts'
import { photographedLooks } from '#app/views/patient-photographs.server.ts'
import type { Route } from './+types/patient.ts'

// Of the patient's own page. By bed, not by name: titles stay in the browser's history.
export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: `Bed ${loaderData?.banner.bed} | Cannulary` }]

export const middleware: Route.MiddlewareFunction[] = [patientOnly]

export async function loader({ context }: Route.LoaderArgs) {
  const { stayId, via } = context.get(patientContext)
  const now = new Date()
  const care = await patientCare(stayId, now)
  return { ...patientHead(care, now), via, isPhotographed: photographedLooks(care).length > 0 }
}

/** Every page of a patient stands under who they are. */
export default function Patient({
  loaderData: { banner, patientId, discharged, via, isPhotographed },
}: Route.ComponentProps) {
  // The patient's own page has no other heading than whose it is.
  const isTitle = useLocation().pathname.replace(/\/$/, '').endsWith(patientId)
  return (
    <>
      <PatientBanner
        patient={banner}
        isTitle={isTitle}
        actions={
          <>
            <LinkButton href={`/patients/${patientId}/trends`}>Trends</LinkButton>
            <LinkButton href={`/patients/${patientId}/weaning`}>Weaning</LinkButton>
            {isPhotographed && <LinkButton href={`/patients/${patientId}/photographs`}>Photographs</LinkButton>}
            <LinkButton href={`/patients/${patientId}/sign`}>Bed-head sign</LinkButton>
            <LinkButton variant="danger" href={`/patients/${patientId}/emergency`}>
              Airway emergency steps
            </LinkButton>
          </>
        }
      >
        {discharged && <p className="mt-2 font-semibold">{discharged} Earlier care stays readable.</p>}
        {via === 'grant' && (
          <p className="mt-2 rounded-control border border-late bg-late-tint px-3 py-1.5 font-semibold text-late">
            Another ward’s patient, open to you for the reason you gave. This is logged and shown to their charge nurse.
          </p>
        )}
      </PatientBanner>
      <Outlet />
    </>
  )
}

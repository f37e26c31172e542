import { patientContext } from '#app/auth/patient-access.server.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { weaningPlan } from '#app/care/weaning-plan/kind.ts'
import { Card } from '#app/components/card.tsx'
import { Empty } from '#app/components/empty.tsx'
import { RunningActs } from '#app/components/running-acts.tsx'
import { WeaningCriteria } from '#app/components/weaning-criteria.tsx'
import { WeaningSteps } from '#app/components/weaning-path.tsx'
import { WeaningPlanned, WeaningTrials } from '#app/components/weaning-trials.tsx'
import { liveTasks } from '#app/rules/board.ts'
import type { WeaningPath } from '#app/rules/weaning-path.ts'
import { patientCare } from '#app/views/patient-context.server.ts'
import { chartedHere, patientWeaning } from '#app/views/patient-weaning.server.ts'
import type { Route } from './+types/patient-weaning.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Weaning | Cannulary' }]

export async function loader({ context }: Route.LoaderArgs) {
  const opened = context.get(patientContext)
  const care = await patientCare(opened.stayId, new Date())
  const { patient, stay } = care.record
  return {
    patientId: patient.id,
    weaning: patientWeaning(care),
    charts: chartedHere(signedIn(context), opened, stay.dischargedAt),
    nothing: care.nothingDue,
  }
}

/** Where a patient is on the way out of the tube, and what the next step still needs. It informs and decides nothing. */
export default function PatientWeaning({ loaderData }: Route.ComponentProps) {
  const { patientId, weaning, charts, nothing } = loaderData
  if (!weaning) {
    return (
      <div className="px-4 py-5 md:px-6">
        <h1 className="text-2xl font-bold">Weaning</h1>
        <Empty title="Nothing is computed">{nothing}</Empty>
      </div>
    )
  }
  const { path, next, running, tasks, trials, plan, cautions, policy, now, zone } = weaning
  const moment = { now, zone }
  const mayPlan = path.next !== null && charts.includes(weaningPlan.slug)
  const planning = mayPlan
    ? { href: `/patients/${patientId}/chart/${weaningPlan.slug}`, words: weaningPlan.chartWords }
    : null
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-4 px-4 py-5 md:px-6">
      <div>
        <h1 className="text-2xl font-bold">Weaning</h1>
        <p className="max-w-prose text-ink2">{cautions.join(' ')}</p>
      </div>
      <Path path={path} />
      <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-4 lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        <div className="grid grid-cols-[minmax(0,1fr)] gap-4 lg:order-2">
          <RunningActs
            patientId={patientId}
            running={running}
            tasks={liveTasks(tasks, now)}
            charts={charts.length > 0}
            {...moment}
          />
          {(plan || path.next) && <WeaningPlanned plan={plan} chart={planning} {...moment} />}
          <WeaningTrials trials={trials} {...moment} />
        </div>
        {next && (
          <Card title={`Next: ${next.title}`} flush>
            <WeaningCriteria criteria={next.criteria} {...{ patientId, charts, policy }} {...moment} />
          </Card>
        )}
      </div>
    </div>
  )
}

function Path({ path: { steps, noPath, notes } }: { readonly path: WeaningPath }) {
  return (
    <Card title="Where on the path">
      {noPath && (
        <div className="mb-3 last:mb-0">
          <p className="text-lg font-semibold">{noPath.title}</p>
          <p className="max-w-prose">{noPath.says}</p>
        </div>
      )}
      {steps.length > 0 && <WeaningSteps steps={steps} />}
      {notes.map(note => (
        <p key={note} className="mt-3 border-t border-hair pt-3 font-semibold">
          {note}
        </p>
      ))}
    </Card>
  )
}

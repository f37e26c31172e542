import { data } from 'react-router'
import { patientContext } from '#app/auth/patient-access.server.ts'
import { can, canByGrant } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { wordsOf } from '#app/care/kind.ts'
import { warningAnswers } from '#app/care/warning-answer/schema.ts'
import { LinkButton } from '#app/components/button.tsx'
import { type Answering, SeenButton } from '#app/components/standing-warnings.tsx'
import { WhyDetails } from '#app/components/why.tsx'
import { type UrgentStep, urgentSteps } from '#app/rules/act-now.ts'
import { answeringOf } from '#app/views/answering.server.ts'
import { chartedNow } from '#app/views/charted-now.server.ts'
import { patientCare } from '#app/views/patient-context.server.ts'
import type { Route } from './+types/act-now.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Act now | Cannulary' }]

export async function loader({ params: { entryId }, context }: Route.LoaderArgs) {
  const user = signedIn(context)
  const opened = context.get(patientContext)
  const now = new Date()
  const charted = await chartedNow(await patientCare(opened.stayId, now), entryId)
  if (!charted) throw data('There is no such entry.', 404)
  const urgent = urgentSteps(charted.warnings)
  const reasons = urgent.flatMap(step => step.reasons)
  const answers = opened.via === 'ward' ? can(user, 'chart care', opened.wardId) : canByGrant(user, 'chart care')
  const { patientId } = opened
  return {
    patientId,
    entryId,
    says: charted.says,
    urgent,
    answering: answers ? answeringOf(reasons, { patientId, user, now }) : null,
  }
}

/** What was charted asks to act now: it takes the place of everything else until somebody goes on. */
export default function ActNow({ loaderData: { patientId, entryId, says, urgent, answering } }: Route.ComponentProps) {
  return (
    <div className="mx-auto grid max-w-4xl gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">{urgent.length > 0 ? 'Act now' : 'Nothing here asks to act now'}</h1>
      {urgent.map(step => (
        <Step key={step.action} {...{ step, patientId, answering }} />
      ))}
      <p className="text-ink2">{says}</p>
      <p>
        <LinkButton size={48} href={`/patients/${patientId}?charted=${entryId}`}>
          Go on to the patient’s page
        </LinkButton>
      </p>
    </div>
  )
}

interface StepProps {
  readonly step: UrgentStep
  readonly patientId: string
  readonly answering: Answering | null
}

/** One instruction, large, with what was found under it: each finding is seen and acted on by itself. */
function Step({ step: { action, reasons }, patientId, answering }: StepProps) {
  const href = `/patients/${patientId}/chart/${warningAnswers.slug}?warning=`
  return (
    <section className="rounded-card border-2 border-late bg-late-tint p-5">
      <p className="text-2xl font-bold">{action}</p>
      <ul>
        {reasons.map(({ name, cause, why }) => (
          <li key={name} className="mt-3 grid gap-3 not-first:border-t not-first:border-late not-first:pt-4">
            <p className="text-lg">{cause}</p>
            {answering && (
              <div className="flex flex-wrap gap-3">
                <SeenButton name={name} about={cause} answering={answering} size={56} />
                <LinkButton size={56} href={href + name} label={`Chart what was done: ${cause}`}>
                  Chart what was done
                </LinkButton>
              </div>
            )}
            {why && <WhyDetails why={why} about={wordsOf(name)} />}
          </li>
        ))}
      </ul>
    </section>
  )
}

import { patientContext } from '#app/auth/patient-access.server.ts'
import { Card } from '#app/components/card.tsx'
import { emergencyOf } from '#app/views/emergency.server.ts'
import { patientCare } from '#app/views/patient-context.server.ts'
import type { Route } from './+types/emergency.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Airway emergency steps | Cannulary' }]

export async function loader({ context }: Route.LoaderArgs) {
  const now = new Date()
  return emergencyOf(await patientCare(context.get(patientContext).stayId, now), now)
}

/** What to do when breathing fails, in order, large enough to read from the foot of the bed. */
export default function Emergency({
  loaderData: { airway, oxygen, steps, cautions, source, madeAt },
}: Route.ComponentProps) {
  return (
    <div className="mx-auto grid max-w-4xl gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">If breathing is difficult</h1>
      <p className="rounded-card border-2 border-late bg-surface px-5 py-4">
        <span className="block text-3xl font-bold">{airway}</span>
        <span className="text-xl">{oxygen}.</span>
      </p>
      <ol className="rounded-card border border-line bg-surface">
        {steps.map(({ act, next }, index) => (
          <li
            key={act}
            className="grid grid-cols-[2rem_1fr] gap-x-3 border-t border-hair px-5 py-3 text-lg first:border-0"
          >
            <span aria-hidden="true" className="text-xl font-bold">
              {index + 1}
            </span>
            <p>
              <b className="block text-xl font-bold">{act}</b>
              {next}
            </p>
          </li>
        ))}
      </ol>
      <Card>
        <ul className="grid gap-1 text-lg font-semibold">
          {cautions.map(caution => (
            <li key={caution}>{caution}</li>
          ))}
        </ul>
      </Card>
      <p className="text-sm text-ink2">
        An aid for trained staff. Follow the hospital’s own airway emergency plan where it differs. {source}. As of{' '}
        {madeAt}.
      </p>
    </div>
  )
}

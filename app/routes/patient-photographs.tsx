import { Form, Link } from 'react-router'
import { patientContext } from '#app/auth/patient-access.server.ts'
import { Button } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { Empty } from '#app/components/empty.tsx'
import { SelectField } from '#app/components/text-field.tsx'
import { patientCare } from '#app/views/patient-context.server.ts'
import { type PhotographedLook, photographedLooks } from '#app/views/patient-photographs.server.ts'
import type { Route } from './+types/patient-photographs.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Photographs | Cannulary' }]

export async function loader({ context, url }: Route.LoaderArgs) {
  const looks = photographedLooks(await patientCare(context.get(patientContext).stayId, new Date()))
  const chosen = (name: string) => looks.find(({ entryId }) => entryId === url.searchParams.get(name))
  const later = chosen('later') ?? looks[0]
  const earlier = chosen('earlier') ?? looks[1] ?? looks[0]
  return { looks, later, earlier }
}

/** Two looks beside each other, the earlier on the left: what has changed between them. */
export default function PatientPhotographs({ loaderData: { looks, later, earlier } }: Route.ComponentProps) {
  return (
    <div className="grid gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">Photographs</h1>
      {later && earlier ? (
        <>
          <Form className="flex flex-wrap items-end gap-4 print:hidden">
            <LookChoice name="earlier" label="On the left" looks={looks} chosen={earlier} />
            <LookChoice name="later" label="On the right" looks={looks} chosen={later} />
            <Button size={48}>Compare</Button>
          </Form>
          <div className="grid grid-cols-[minmax(0,1fr)] gap-4 md:grid-cols-2">
            <Look look={earlier} />
            <Look look={later} />
          </div>
        </>
      ) : (
        <Empty title="No photographs in this stay">They are taken with a charted look at the stoma and skin.</Empty>
      )}
    </div>
  )
}

interface LookChoiceProps {
  readonly name: string
  readonly label: string
  readonly looks: readonly PhotographedLook[]
  readonly chosen: PhotographedLook
}

function LookChoice({ name, label, looks, chosen }: LookChoiceProps) {
  const options = Object.fromEntries(looks.map(({ entryId, when, title }) => [entryId, `${when}, ${title}`]))
  // Anew for each answer, so that it shows what the page shows.
  return (
    <SelectField
      key={chosen.entryId}
      id={name}
      name={name}
      label={label}
      options={options}
      defaultValue={chosen.entryId}
    />
  )
}

function Look({ look }: { readonly look: PhotographedLook }) {
  return (
    <Card title={look.when}>
      <ul className="grid gap-3">
        {look.photographs.map((id, index) => (
          <li key={id}>
            <a href={`/photographs/${id}`} className="block">
              <img
                src={`/photographs/${id}`}
                alt={`${look.title}, ${look.when}, photograph ${index + 1}`}
                className="w-full rounded-control border border-line"
              />
            </a>
          </li>
        ))}
      </ul>
      <p className="mt-3">{look.sentence}</p>
      <Link to={`/entries/${look.entryId}`} className="inline-flex min-h-11 items-center font-semibold underline">
        Open this entry
      </Link>
    </Card>
  )
}

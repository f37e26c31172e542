import { data } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { lineSchema } from '#app/catalogue/line-schema.ts'
import { LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { ItemHistory } from '#app/components/item-history.tsx'
import { LineForm } from '#app/components/line-form.tsx'
import { readForm, sentForm } from '#app/sent-form.server.ts'
import { catalogueHistory } from '#app/views/catalogue-item.server.ts'
import { lineOr404, lineRefusals } from '#app/views/catalogue-line.server.ts'
import { nameLine } from '#database/catalogue-lines.server.ts'
import type { Route } from './+types/catalogue-line.ts'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.line.line ?? 'Line'} | Cannulary` },
]

export async function loader({ params: { lineId }, context }: Route.LoaderArgs) {
  const user = signedIn(context)
  if (!can(user, 'see catalogue')) throw data('The catalogue is not for your role.', 403)
  const line = await lineOr404(lineId)
  return { line, history: await catalogueHistory(line.id), mayEdit: can(user, 'manage catalogue') }
}

export async function action({ params: { lineId }, request, context }: Route.ActionArgs) {
  const user = signedIn(context)
  if (!can(user, 'manage catalogue')) {
    throw data('The catalogue is kept by the tracheostomy specialist and the administrators.', 403)
  }
  const { id } = await lineOr404(lineId)
  const submission = readForm(await sentForm(request), lineSchema)
  if (submission.status !== 'success') return data({ reply: submission.reply(), says: null }, 400)
  const outcome = await nameLine(id, submission.value, user.id)
  if (outcome === 'named') return data({ reply: null, says: 'Saved for every item of the line.' })
  const { status, ...refusal } = lineRefusals[outcome]
  return data({ reply: submission.reply(refusal), says: null }, status)
}

/** A line: its items, its name and maker, and what they were before. */
export default function Line({ loaderData: { line, history, mayEdit }, actionData }: Route.ComponentProps) {
  const { id, maker, formerNames, tubes, innerCannulas } = line
  return (
    <div className="grid gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold break-words">{line.line}</h1>
      <div role="status" className="empty:-mb-4">
        {actionData?.says && <p className="font-semibold">{actionData.says}</p>}
      </div>
      <p className="break-words">
        By {maker}. {counted(tubes, 'tube')}, {counted(innerCannulas, 'inner cannula')}.
        {formerNames.length > 0 && ` Called before: ${formerNames.join(', ')}.`}
      </p>
      <div className="flex flex-wrap gap-3">
        <LinkButton href={`/catalogue?retired=yes&line=${id}`}>Its tubes</LinkButton>
        <LinkButton href={`/catalogue?items=inner-cannulas&retired=yes&line=${id}`}>Its inner cannulas</LinkButton>
      </div>
      {mayEdit && (
        <Card title="Name it anew">
          {/* Begun afresh once it was saved, from what stands now. */}
          <LineForm key={`${line.line}, ${maker}`} line={line} reply={actionData?.reply ?? null} />
        </Card>
      )}
      <ItemHistory history={history} />
    </div>
  )
}

const counted = (count: number, what: string): string => `${count} ${what}${count === 1 ? '' : 's'}`

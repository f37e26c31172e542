import { data, Form, redirect } from 'react-router'
import { v7 as uuidv7 } from 'uuid'
import { EntryHead, ReadBack, Replaced } from '#app/components/entry-head.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { FinalBar } from '#app/components/final-bar.tsx'
import { answerOrKept } from '#app/components/kept-form.ts'
import { TextArea } from '#app/components/text-field.tsx'
import { sentForm } from '#app/sent-form.server.ts'
import { entryView } from '#app/views/entry-view.server.ts'
import { openedEntry } from '#app/views/opened-entry.server.ts'
import { retracted } from '#app/views/retraction.server.ts'
import type { Route } from './+types/retract.ts'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Retract ${loaderData?.entry.title ?? 'an entry'} | Cannulary` },
]

export async function loader({ params, context, request, url }: Route.LoaderArgs) {
  const opened = await openedEntry({ params, context, request, url }, 'retract')
  return { id: uuidv7(), openedBy: opened.user.id, entry: await entryView(opened) }
}

export async function action({ params, context, request, url }: Route.ActionArgs) {
  const opened = await openedEntry({ params, context, request, url }, 'retract')
  const answer = await retracted(opened, await sentForm(request))
  return answer === 'retracted' ? redirect(`/entries/${opened.entry.id}`) : data(answer, answer.status)
}

export const clientAction = ({ serverAction }: Route.ClientActionArgs) => answerOrKept(serverAction)

/** Takes an entry out of the record, read back first. It stays readable. */
export default function Retract({ loaderData: { id, openedBy, entry }, actionData }: Route.ComponentProps) {
  const refused = actionData?.is === 'not retracted' ? actionData : undefined
  return (
    <EntryHead head={entry.head} title={`Entered in error: ${entry.title}`}>
      {entry.replacedBy && !actionData ? (
        <Replaced {...entry.replacedBy} />
      ) : (
        <Form method="post" noValidate>
          <input type="hidden" name="id" value={refused?.id ?? id} />
          <input type="hidden" name="openedBy" value={refused?.openedBy ?? openedBy} />
          <div className="grid gap-5 px-4 md:px-6">
            {actionData?.is === 'unavailable' && (
              <ErrorSummary title="Not retracted." errors={[{ says: actionData.says }]} />
            )}
            {refused && <ErrorSummary title="Not retracted yet. Please check:" errors={refused.problems} />}
            {refused?.see && <Replaced {...refused.see} />}
            <ReadBack entry={entry} />
            <TextArea
              id="reason"
              name="reason"
              label="Why it is in error"
              hint="For example: charted on the wrong patient, not done after all, charted twice"
              maxLength={500}
              required
              defaultValue={refused?.reason}
              errors={refused?.reasonErrors}
            />
          </div>
          <FinalBar
            sentence={null}
            missing="The entry is struck through and stays readable."
            words="Retract entry"
            cancelHref={`/entries/${entry.id}`}
          />
        </Form>
      )}
    </EntryHead>
  )
}

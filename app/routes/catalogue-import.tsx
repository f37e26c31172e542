import { data, Form } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { Button, LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { describedBy, HintAndErrors, INPUT, isInvalid, LabelWords } from '#app/components/field-parts.tsx'
import { ImportPreview } from '#app/components/import-preview.tsx'
import { TextArea } from '#app/components/text-field.tsx'
import { sentForm } from '#app/sent-form.server.ts'
import { type ImportOutcome, imported, sentCsv } from '#app/views/catalogue-import.server.ts'
import type { Route } from './+types/catalogue-import.ts'

const KEPT_BY = 'The catalogue is kept by the tracheostomy specialist and the administrators.'

export const meta: Route.MetaFunction = () => [{ title: 'Import a catalogue | Cannulary' }]

export function loader({ context }: Route.LoaderArgs) {
  if (!can(signedIn(context), 'manage catalogue')) throw data(KEPT_BY, 403)
  return null
}

export async function action({ request, context }: Route.ActionArgs) {
  const user = signedIn(context)
  if (!can(user, 'manage catalogue')) throw data(KEPT_BY, 403)
  const sent = await sentForm(request)
  const csv = await sentCsv(sent)
  if ('says' in csv) {
    return data({ is: 'unreadable', field: 'file', text: '', says: `${csv.says}.` } satisfies ImportOutcome, 400)
  }
  const digest = sent.get('digest')
  const wantsImport = sent.get('intent') === 'import' && typeof digest === 'string'
  const outcome = await imported(csv.text, wantsImport ? digest : null, user.id)
  const isWrong =
    outcome.is === 'unreadable' || (outcome.is === 'preview' && (outcome.counts.error > 0 || outcome.says))
  return data(outcome, isWrong ? 400 : 200)
}

export default function Import({ actionData: outcome }: Route.ComponentProps) {
  return (
    <div className="grid gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">Import a catalogue</h1>
      {outcome?.is === 'imported' && (
        <Card>
          <p role="status" className="mb-3 font-semibold">
            {outcome.says}
          </p>
          <LinkButton href="/catalogue">To the catalogue</LinkButton>
        </Card>
      )}
      {outcome?.is === 'unreadable' && (
        <ErrorSummary
          title="Nothing was imported. Please check:"
          errors={[{ fieldId: outcome.field, says: outcome.says }]}
        />
      )}
      {outcome?.is === 'preview' && <ImportPreview preview={outcome} />}
      {outcome?.is !== 'imported' && (
        <FileForm text={outcome?.text ?? ''} wrong={outcome?.is === 'unreadable' ? outcome : undefined} />
      )}
    </div>
  )
}

interface FileFormProps {
  readonly text: string
  readonly wrong: { readonly field: 'file' | 'text'; readonly says: string } | undefined
}

/** What was sent stays in the box, so that a mistake can be mended here as well as in the file. */
function FileForm({ text, wrong }: FileFormProps) {
  const errorsOf = (field: 'file' | 'text') => (wrong?.field === field ? [wrong.says] : undefined)
  const file = { id: 'file', name: 'file', label: 'CSV file', errors: errorsOf('file') }
  return (
    <Card title={text === '' ? 'File' : 'Mend it here, or choose the file again'}>
      <Form method="post" encType="multipart/form-data" className="grid gap-4" key={text}>
        <p className="max-w-3xl">
          A CSV file with one line for each tube and each inner cannula, as the export writes it. Nothing is kept until
          you have seen what each line would do, and then all lines or none.
        </p>
        <div className="grid gap-1.5">
          <label htmlFor="file">
            <LabelWords field={file} />
          </label>
          <input
            id="file"
            name="file"
            type="file"
            accept=".csv,text/csv"
            aria-describedby={describedBy(file)}
            aria-invalid={isInvalid(file)}
            className={`${INPUT} max-w-xl`}
          />
          <HintAndErrors field={file} />
        </div>
        <TextArea
          id="text"
          name="text"
          label="Or its lines"
          errors={errorsOf('text')}
          defaultValue={text}
          rows={6}
          spellCheck={false}
        />
        <Button name="intent" value="preview" variant="primary" size={48} className="justify-self-start">
          Show what it would do
        </Button>
      </Form>
    </Card>
  )
}

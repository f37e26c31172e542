import { Form } from 'react-router'
import { Button } from './button.tsx'
import { Card } from './card.tsx'
import { ErrorSummary } from './error-summary.tsx'
import { Table } from './table.tsx'
import { Tag, type TagTone } from './tag.tsx'

type Fate = 'new' | 'changed' | 'same' | 'error'

export interface ImportPreviewProps {
  readonly preview: {
    readonly text: string
    readonly digest: string
    readonly says: string | null
    readonly counts: Readonly<Record<Fate, number>>
    readonly rows: readonly {
      readonly line: number
      readonly fate: Fate
      readonly name: string
      readonly details: readonly string[]
    }[]
    /** What becomes of the lines that are not among them. */
    readonly more: readonly { readonly fate: Fate; readonly lines: string }[]
  }
}

const fates: Readonly<Record<Fate, { readonly words: string; readonly tone: TagTone }>> = {
  error: { words: 'Error', tone: 'late' },
  changed: { words: 'Changed', tone: 'due' },
  new: { words: 'New', tone: 'ok' },
  same: { words: 'As before', tone: 'plain' },
}
const LISTED_ERRORS = 5

/** What each line of a file would do, errors first, and the button that does it once there are none. */
export function ImportPreview({ preview: { text, digest, says, counts, rows, more } }: ImportPreviewProps) {
  const { error, changed, new: added, same } = counts
  const wrong = rows.filter(({ fate }) => fate === 'error').slice(0, LISTED_ERRORS)
  const errors = [
    ...(says === null ? [] : [{ says }]),
    ...wrong.map(({ line, details }) => ({ fieldId: `line-${line}`, says: `Line ${line}, ${details.join('. ')}` })),
    ...(error > LISTED_ERRORS
      ? [{ says: `${error - LISTED_ERRORS} more lines with errors are in the table below` }]
      : []),
  ]
  const counted = `${error} with errors, ${changed} changed, ${added} new, ${same} as before.`
  return (
    <>
      <ErrorSummary title="Nothing was imported. Please check:" errors={errors} />
      <Card flush>
        <div className="grid gap-3 p-4">
          <p>{counted}</p>
          {error === 0 && changed + added > 0 && (
            <Form method="post" encType="multipart/form-data">
              <input type="hidden" name="text" value={text} />
              <input type="hidden" name="digest" value={digest} />
              <Button name="intent" value="import" variant="primary" size={48}>
                Import {changed + added} of {changed + added + same}
              </Button>
            </Form>
          )}
          {error === 0 && changed + added === 0 && (
            <p className="font-semibold">The catalogue says the same already.</p>
          )}
        </div>
        <Table
          caption="What each line would do"
          columns={[
            { label: 'Line', numeric: true },
            { label: 'Fate' },
            { label: 'Item, and what is wrong or changes' },
          ]}
          rows={rows.map(({ line, fate, name, details }) => ({
            key: String(line),
            cells: [
              <span key="line" id={`line-${line}`} tabIndex={-1}>
                {line}
              </span>,
              <span key="fate" className="whitespace-nowrap">
                <Tag tone={fates[fate].tone}>{fates[fate].words}</Tag>
              </span>,
              <ItemAndDetails key="item" name={name} details={details} />,
            ],
          }))}
        />
        {more.map(({ fate, lines }) => (
          <p key={fate} className="border-t border-hair p-4 break-words">
            <Tag tone={fates[fate].tone}>{fates[fate].words}</Tag> too: lines {lines}.
          </p>
        ))}
      </Card>
    </>
  )
}

interface ItemAndDetailsProps {
  readonly name: string
  readonly details: readonly string[]
}

function ItemAndDetails({ name, details }: ItemAndDetailsProps) {
  return (
    <>
      <p className="break-words">{name}</p>
      {details.length > 0 && (
        <ul className="mt-1 grid gap-1 text-sm text-ink2">
          {details.map(says => (
            <li key={says} className="break-words">
              {says}
            </li>
          ))}
        </ul>
      )}
    </>
  )
}

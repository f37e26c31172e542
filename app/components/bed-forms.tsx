import { getFormProps, type SubmissionResult, useForm } from '@conform-to/react'
import { Form } from 'react-router'
import { Button } from './button.tsx'
import { FieldErrors } from './field-parts.tsx'
import { TextField } from './text-field.tsx'
import { textOf } from './text-of.ts'
import { BedFormFields } from './ward-fields.tsx'

type Reply = SubmissionResult<string[]> | undefined

interface BedView {
  readonly id: string
  readonly label: string
  readonly position: number
  readonly retired: boolean
  readonly occupied: boolean
}

export interface BedFormsProps {
  readonly beds: readonly BedView[]
  /** Minted with the page: the same form twice adds one bed. */
  readonly newBedId: string
  /** What came of the form of that name, if it was the one sent. */
  readonly replyTo: (intent: string) => Reply
}

/** A small form for each bed of a ward, and one for a new bed. */
export function BedForms({ beds, newBedId, replyTo }: BedFormsProps) {
  return (
    <div className="grid gap-5">
      {beds.map(bed => (
        <BedForm key={bed.id} bed={bed} reply={replyTo(`bed ${bed.id}`)} />
      ))}
      <NewBedForm id={newBedId} reply={replyTo('add bed')} />
    </div>
  )
}

interface BedFormProps {
  readonly bed: BedView
  readonly reply: Reply
}

function BedForm({ bed, reply }: BedFormProps) {
  const { id, label, position, retired, occupied } = bed
  const [form, fields] = useForm<{ label: string; position: string; retired: string }>({
    id: `bed-${id}`,
    lastResult: reply ?? null,
    defaultValue: { label, position: String(position) },
  })
  const state = retired ? 'Out of use.' : occupied ? 'Somebody lies here.' : 'Free.'
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-3 border-b border-hair pb-5">
      <input type="hidden" name="intent" value="bed" />
      <input type="hidden" name="id" value={id} />
      <FieldErrors id={fields.retired.id} errors={fields.retired.errors} />
      <div className="flex flex-wrap items-end gap-x-4 gap-y-3">
        <BedFormFields fields={fields} bed={label} />
        <Button name="retired" value={retired ? 'yes' : 'no'}>
          Save
        </Button>
        {!occupied && (
          <Button name="retired" value={retired ? 'no' : 'yes'}>
            {retired ? 'Take into use again' : 'Take out of use'}
          </Button>
        )}
        <span className="inline-flex min-h-11 items-center text-ink2">{state}</span>
      </div>
    </Form>
  )
}

interface NewBedFormProps {
  readonly id: string
  readonly reply: Reply
}

function NewBedForm({ id, reply }: NewBedFormProps) {
  const [form, fields] = useForm<{ id: string; label: string }>({
    id: 'new-bed',
    lastResult: reply ?? null,
    defaultValue: { id, label: '' },
  })
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-3">
      <input type="hidden" name="intent" value="add bed" />
      <input type="hidden" name="id" value={fields.id.initialValue} />
      <TextField key={fields.label.key} {...textOf(fields.label)} label="Label of a new bed" maxLength={16} short />
      <Button className="justify-self-start">Add the bed</Button>
    </Form>
  )
}

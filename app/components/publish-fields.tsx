import type { FieldMetadata } from '@conform-to/react'
import { ChoiceField } from './choice-field.tsx'
import { SelectField, TextArea, TextField } from './text-field.tsx'
import { chosenOf, textOf } from './text-of.ts'

interface PublishFieldsProps {
  readonly fields: Readonly<
    Record<
      | 'name'
      | 'reviewer'
      | 'otherReviewer'
      | 'otherRole'
      | 'reviewedOn'
      | 'reason'
      | 'start'
      | 'day'
      | 'time'
      | 'wards',
      FieldMetadata<unknown>
    >
  >
  /** Names by id. */
  readonly reviewers: Readonly<Record<string, string>>
  readonly wards: Readonly<Record<string, string>>
}

/** Who reviewed the draft, why it comes, when it starts, and where. */
export function PublishFields({ fields, reviewers, wards }: PublishFieldsProps) {
  return (
    <>
      <TextField {...textOf(fields.name)} label="Name of the policy" />
      <SelectField
        {...textOf(fields.reviewer)}
        label="Reviewer from this ward"
        hint="Somebody other than who wrote the draft or publishes it"
        options={reviewers}
        nothing="Somebody else, named below"
        optional
      />
      <div className="grid gap-5 md:grid-cols-2">
        <TextField {...textOf(fields.otherReviewer)} label="Name of another reviewer" optional />
        <TextField {...textOf(fields.otherRole)} label="Role of that reviewer" optional />
      </div>
      <TextField {...textOf(fields.reviewedOn)} label="Reviewed on" type="date" />
      <TextArea
        {...textOf(fields.reason)}
        label="Reason"
        hint="Why these numbers change; it stays beside the version"
      />
      <ChoiceField
        {...chosenOf(fields.start)}
        label="It starts"
        options={{ now: 'Now, as it is published', later: 'Later' }}
      />
      <div className="flex flex-wrap gap-5">
        <TextField {...textOf(fields.day)} label="Day, when later" type="date" optional />
        <TextField
          {...textOf(fields.time)}
          label="Time, when later"
          hint="24-hour clock, such as 07:00"
          short
          optional
        />
      </div>
      {Object.keys(wards).length > 0 && (
        <ChoiceField
          {...chosenOf(fields.wards)}
          label="Publish the same for other wards"
          options={wards}
          several
          optional
        />
      )}
    </>
  )
}

import type { FieldMetadata, FormMetadata } from '@conform-to/react'
import type { Zone } from '#app/time/zone.ts'
import { ChoiceField } from './choice-field.tsx'
import type { FormError } from './error-summary.tsx'
import { SelectField } from './text-field.tsx'
import { chosenOf, errorsOf, textOf } from './text-of.ts'
import { type WhenAnswers, WhenField } from './when-field.tsx'

type MomentName = 'id' | 'openedBy' | 'at' | 'when' | 'day' | 'time' | 'occurrence'

export interface MomentFieldsProps {
  readonly fields: Readonly<Record<MomentName, FieldMetadata<unknown>>>
  readonly zone: Zone
  readonly label: string
  readonly daysBack: number
}

/** When it was, with what makes the same form twice one act. */
export function MomentFields({ fields, zone, label, daysBack }: MomentFieldsProps) {
  const { id, openedBy, at, when, day, time, occurrence } = fields
  const answers: WhenAnswers = {
    when: initial(when),
    day: initial(day),
    time: initial(time),
    occurrence: initial(occurrence),
  }
  const asks = occurrence.errors !== undefined || answers.occurrence !== undefined
  return (
    <>
      {[id, openedBy, at].map(field => (
        <input key={field.name} type="hidden" name={field.name} defaultValue={initial(field)} />
      ))}
      <WhenField
        now={new Date(initial(at) ?? 0)}
        zone={zone}
        label={label}
        daysBack={daysBack}
        answers={answers}
        errors={{ when: when.errors, day: day.errors, time: time.errors, occurrence: occurrence.errors }}
        asksOccurrence={asks}
      />
    </>
  )
}

/** The lines of an error summary. The controls of "when" carry their own names as ids. */
export function momentErrorsOf(form: Pick<FormMetadata, 'id' | 'allErrors'>): readonly FormError[] {
  return errorsOf(form).map(error => {
    const name = error.fieldId?.slice(form.id.length + 1) ?? ''
    return ['when', 'day', 'time', 'occurrence'].includes(name) ? { ...error, fieldId: name } : error
  })
}

function initial(field: FieldMetadata<unknown>): string | undefined {
  return typeof field.initialValue === 'string' ? field.initialValue : undefined
}

export interface BedFieldProps {
  readonly field: FieldMetadata<unknown>
  readonly beds: readonly { readonly id: string; readonly label: string }[]
  readonly hint?: string
}

const MOST_CHIPS = 12

/** The free beds to choose from: chips, or a list where there are many. */
export function BedField({ field, beds, hint }: BedFieldProps) {
  const options = Object.fromEntries(beds.map(bed => [bed.id, bed.label]))
  const more = hint === undefined ? {} : { hint }
  if (beds.length <= MOST_CHIPS) return <ChoiceField {...chosenOf(field)} label="Bed" options={options} {...more} />
  return (
    <SelectField key={field.key} {...textOf(field)} label="Bed" options={options} nothing="Choose a bed" {...more} />
  )
}

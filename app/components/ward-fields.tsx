import type { FieldMetadata } from '@conform-to/react'
import { pressureUnits } from '#app/clinical/units.ts'
import { ChoiceField } from './choice-field.tsx'
import { TextArea, TextField } from './text-field.tsx'
import { chosenOf, textOf } from './text-of.ts'

export interface WardFieldsProps {
  readonly fields: Readonly<Record<'name' | 'shiftTimes' | 'pressureUnit' | 'emergencyNumbers', FieldMetadata<unknown>>>
}

/** Name, shifts and pressure unit, as for a new ward and for one that changes. */
export function WardFields({ fields: { name, shiftTimes, pressureUnit, emergencyNumbers } }: WardFieldsProps) {
  return (
    <>
      <TextField key={name.key} {...textOf(name)} label="Name of the ward" autoComplete="off" maxLength={80} />
      <TextField
        key={shiftTimes.key}
        {...textOf(shiftTimes)}
        label="Shifts start at"
        hint="In order, by the 24-hour clock, such as 07:00, 15:00, 23:00"
        autoComplete="off"
      />
      <ChoiceField
        {...chosenOf(pressureUnit)}
        label="Unit that the manometers show"
        options={Object.fromEntries(pressureUnits.map(unit => [unit, unit]))}
      />
      <TextArea
        key={emergencyNumbers.key}
        {...textOf(emergencyNumbers)}
        required={false}
        label="Emergency numbers"
        hint="One a line, such as Airway team: 2222. They are printed on bed-head signs."
        optional
      />
    </>
  )
}

export interface BedFormFieldsProps {
  readonly fields: Readonly<Record<'label' | 'position', FieldMetadata<unknown>>>
  /** Tells the fields of one bed from those of the next to those who hear them. */
  readonly bed: string
}

/** A bed's label and its place on the board. */
export function BedFormFields({ fields: { label, position }, bed }: BedFormFieldsProps) {
  return (
    <>
      <TextField key={label.key} {...textOf(label)} label={`Label of bed ${bed}`} maxLength={16} short />
      <TextField
        key={position.key}
        {...textOf(position)}
        label="Place on the board"
        inputMode="numeric"
        maxLength={3}
        short
      />
    </>
  )
}

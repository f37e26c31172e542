import type { InputHTMLAttributes, SelectHTMLAttributes, TextareaHTMLAttributes } from 'react'
import { describedBy, type FieldProps, HintAndErrors, INPUT, isInvalid, LabelWords } from './field-parts.tsx'

type Own = keyof FieldProps | 'className'

export interface TextFieldProps extends FieldProps, Omit<InputHTMLAttributes<HTMLInputElement>, Own> {
  /** As wide as what is asked for, not as the page. */
  readonly short?: boolean
}

/** One line of text, or a date. */
export function TextField({ label, hint, errors, optional, short = false, ...input }: TextFieldProps) {
  const field = { id: input.id, name: input.name, label, hint, errors, optional }
  const width = short || input.type === 'date' ? 'max-w-48' : 'max-w-xl'
  return (
    <div className="grid gap-1.5">
      <label htmlFor={input.id}>
        <LabelWords field={field} />
      </label>
      <input
        {...input}
        aria-describedby={describedBy(field)}
        aria-invalid={isInvalid(field)}
        className={`${INPUT} ${width}`}
      />
      <HintAndErrors field={field} />
    </div>
  )
}

export interface TextAreaProps extends FieldProps, Omit<TextareaHTMLAttributes<HTMLTextAreaElement>, Own> {}

/** Free words over several lines; grows with them where the browser can. */
export function TextArea({ label, hint, errors, optional, rows = 3, ...area }: TextAreaProps) {
  const field = { id: area.id, name: area.name, label, hint, errors, optional }
  return (
    <div className="grid gap-1.5">
      <label htmlFor={area.id}>
        <LabelWords field={field} />
      </label>
      <textarea
        rows={rows}
        {...area}
        aria-describedby={describedBy(field)}
        aria-invalid={isInvalid(field)}
        className={`${INPUT} field-sizing-content max-h-96 min-h-24 max-w-3xl`}
      />
      <HintAndErrors field={field} />
    </div>
  )
}

export interface SelectFieldProps extends FieldProps, Omit<SelectHTMLAttributes<HTMLSelectElement>, Own> {
  /** Words by value, in order. */
  readonly options: Readonly<Record<string, string>>
  /** First line, which chooses nothing. */
  readonly nothing?: string
}

/** A long list of names. Up to a dozen answers are chips instead: see ChoiceField. */
export function SelectField({ label, hint, errors, optional, options, nothing, ...select }: SelectFieldProps) {
  const field = { id: select.id, name: select.name, label, hint, errors, optional }
  return (
    <div className="grid gap-1.5">
      <label htmlFor={select.id}>
        <LabelWords field={field} />
      </label>
      <select
        {...select}
        aria-describedby={describedBy(field)}
        aria-invalid={isInvalid(field)}
        className={`${INPUT} max-w-xl`}
      >
        {nothing !== undefined && <option value="">{nothing}</option>}
        {Object.entries(options).map(([value, words]) => (
          <option key={value} value={value}>
            {words}
          </option>
        ))}
      </select>
      <HintAndErrors field={field} />
    </div>
  )
}

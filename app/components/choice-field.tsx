import type { MouseEvent } from 'react'
import { describedBy, type FieldProps, HintAndErrors, isInvalid, LabelWords } from './field-parts.tsx'

export interface ChoiceFieldProps extends FieldProps {
  readonly options: Readonly<Record<string, string>>
  /** Values chosen at first; nothing is chosen where a default could be a false record. */
  readonly chosen?: readonly string[]
  /** Any number of answers. */
  readonly several?: boolean
}

/** Answers as chips to tap: radio buttons, or check boxes for several. */
export function ChoiceField({ options, chosen = [], several = false, disabled, ...field }: ChoiceFieldProps) {
  const { id, name, optional = false } = field
  return (
    <fieldset disabled={disabled} aria-describedby={describedBy(field)} className="group grid min-w-0 gap-1.5">
      <legend className="mb-1.5">
        <LabelWords field={field} />
      </legend>
      <HintAndErrors field={field} />
      <div className="flex flex-wrap gap-2">
        {Object.entries(options).map(([value, words], index) => (
          <Chip
            key={value}
            // The first carries the field's own id, so that a link in the error summary lands on it.
            id={index === 0 ? id : `${id}-${index}`}
            type={several ? 'checkbox' : 'radio'}
            name={name}
            value={value}
            words={words}
            defaultChecked={chosen.includes(value)}
            invalid={isInvalid(field)}
          />
        ))}
        {optional && !several && (
          <button
            type="button"
            onClick={unchoose}
            className="hidden min-h-12 px-2 text-sm font-semibold text-ink2 underline underline-offset-3 scripted:group-has-checked:inline-block"
          >
            Clear <span className="sr-only">{field.label}</span>
          </button>
        )}
      </div>
    </fieldset>
  )
}

interface ChipProps {
  readonly id: string
  readonly type: 'radio' | 'checkbox'
  readonly name: string
  readonly value: string
  readonly words: string
  readonly defaultChecked: boolean
  readonly invalid?: true | undefined
}

/** Chosen is a fill and a tick, so that it shows without colour. */
export function Chip({ id, type, name, value, words, defaultChecked, invalid }: ChipProps) {
  return (
    <label
      htmlFor={id}
      className="group/chip relative inline-flex min-h-12 min-w-12 items-center justify-center gap-2 rounded-control border border-edge bg-surface px-4 py-1.5 leading-tight font-semibold hover:bg-sunk has-checked:border-brand has-checked:bg-brand has-checked:text-brand-ink has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-focus has-aria-invalid:not-has-checked:border-late has-disabled:opacity-60"
    >
      <input
        id={id}
        type={type}
        name={name}
        value={value}
        defaultChecked={defaultChecked}
        aria-invalid={invalid}
        className="absolute inset-0 m-0 cursor-pointer opacity-0"
      />
      <svg
        aria-hidden="true"
        viewBox="0 0 16 16"
        className="hidden size-4 flex-none fill-none stroke-current stroke-2 group-has-checked/chip:block"
      >
        <path d="M2 8.5l4 4 8-9" />
      </svg>
      {words}
    </label>
  )
}

/** A radio button cannot be taken back by itself. Says so to the form, as a tap would. */
function unchoose(event: MouseEvent<HTMLButtonElement>): void {
  const group = event.currentTarget.closest('fieldset')
  const radio = group?.querySelector<HTMLInputElement>('input:checked')
  if (!radio) return
  radio.checked = false
  radio.dispatchEvent(new Event('input', { bubbles: true }))
  group?.querySelector<HTMLInputElement>('input')?.focus()
}

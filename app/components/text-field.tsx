import type { InputHTMLAttributes, ReactNode, TextareaHTMLAttributes } from 'react'

interface Labelled {
  readonly id: string
  readonly label: string
  readonly hint?: ReactNode
  readonly errors?: readonly string[] | undefined
}
export interface TextFieldProps extends Labelled, Omit<InputHTMLAttributes<HTMLInputElement>, 'id' | 'className'> {}
export interface TextAreaProps
  extends Labelled,
    Omit<TextareaHTMLAttributes<HTMLTextAreaElement>, 'id' | 'className'> {}

const BOX = 'w-full rounded-control border bg-surface px-3 text-ink aria-invalid:border-late border-edge'

/** One line of text with its label above and what is wrong with it below. */
export function TextField({ id, label, hint, errors, ...input }: TextFieldProps) {
  return (
    <Field id={id} label={label} hint={hint} errors={errors}>
      <input {...input} {...described(id, hint, errors)} className={`${BOX} min-h-12`} />
    </Field>
  )
}

/** Several lines of text. */
export function TextArea({ id, label, hint, errors, rows = 3, ...input }: TextAreaProps) {
  return (
    <Field id={id} label={label} hint={hint} errors={errors}>
      <textarea rows={rows} {...input} {...described(id, hint, errors)} className={`${BOX} py-2`} />
    </Field>
  )
}

function Field({ id, label, hint, errors, children }: Labelled & { readonly children: ReactNode }) {
  return (
    <div className="grid gap-1">
      <label htmlFor={id} className="font-semibold">
        {label}
      </label>
      {hint && (
        <p id={`${id}-hint`} className="text-ink2">
          {hint}
        </p>
      )}
      {children}
      <FieldErrors id={id} errors={errors} />
    </div>
  )
}

/** What is wrong with a field, under it. */
export function FieldErrors({ id, errors }: Pick<Labelled, 'id' | 'errors'>) {
  if (!errors?.length) return null
  return (
    <p id={`${id}-error`} className="font-semibold text-late">
      {errors.join(' ')}
    </p>
  )
}

function described(id: string, hint: ReactNode, errors: readonly string[] | undefined) {
  const parts = [hint ? `${id}-hint` : '', errors?.length ? `${id}-error` : ''].filter(part => part !== '')
  return {
    id,
    ...(parts.length > 0 ? { 'aria-describedby': parts.join(' ') } : {}),
    ...(errors?.length ? { 'aria-invalid': true as const } : {}),
  }
}

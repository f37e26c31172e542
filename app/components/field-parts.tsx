import type { ReactNode } from 'react'

/** What every field of a form takes. Ids of hint and error follow from `id`, as conform makes them. */
export interface FieldProps {
  readonly id: string
  readonly name: string
  readonly label: string
  readonly hint?: ReactNode
  readonly errors?: readonly string[] | undefined
  /** Adds "(optional)" to the label. */
  readonly optional?: boolean | undefined
  /** Not submitted: its question does not arise. */
  readonly disabled?: boolean | undefined
}

export const INPUT =
  'min-h-12 w-full rounded-control border border-edge bg-surface px-3 py-2 text-ink aria-invalid:border-2 aria-invalid:border-late disabled:opacity-60'

/** What `aria-describedby` of a field's control names: hint, error, and whatever else stands beside it. */
export function describedBy({ id, hint, errors }: FieldProps, ...others: readonly string[]): string | undefined {
  const ids = [...(hint ? [`${id}-description`] : []), ...(errors?.length ? [`${id}-error`] : []), ...others]
  return ids.length === 0 ? undefined : ids.join(' ')
}

export const isInvalid = ({ errors }: FieldProps): true | undefined => (errors?.length ? true : undefined)

interface LabelWordsProps {
  readonly field: FieldProps
}

/** The label's words, for a `label` or a `legend`. */
export function LabelWords({ field: { label, optional = false } }: LabelWordsProps) {
  return (
    <>
      <span className="font-semibold">{label}</span>
      {optional && <span className="text-sm text-ink2"> (optional)</span>}
    </>
  )
}

interface HintAndErrorsProps {
  readonly field: FieldProps
}

export function HintAndErrors({ field: { id, hint, errors } }: HintAndErrorsProps) {
  return (
    <>
      {hint && (
        <p id={`${id}-description`} className="text-sm text-ink2">
          {hint}
        </p>
      )}
      <FieldErrors id={id} errors={errors} />
    </>
  )
}

/** What is wrong with a field, under it. */
export function FieldErrors({ id, errors }: Pick<FieldProps, 'id' | 'errors'>) {
  if (!errors?.length) return null
  return (
    <p id={`${id}-error`} className="flex gap-1.5 font-semibold text-late">
      <svg aria-hidden="true" viewBox="0 0 12 12" className="mt-1.5 size-3 flex-none fill-current">
        <path d="M6 0l6 11H0z" />
      </svg>
      {errors.join('. ')}
    </p>
  )
}

import { useEffect, useRef } from 'react'
import { JumpLink } from './jump-link.tsx'

export interface FormError {
  /** Id of the field it belongs to; absent for an error of the whole form. */
  readonly fieldId?: string
  readonly says: string
}
export interface ErrorSummaryProps {
  readonly errors: readonly FormError[]
  readonly title?: string
}

/** What must be put right before the form can be kept. Takes the focus when it appears; each line leads to its field. */
export function ErrorSummary({ errors, title = 'Not charted yet. Please check:' }: ErrorSummaryProps) {
  const box = useRef<HTMLDivElement>(null)
  const words = errors.map(error => error.says).join('\n')
  useEffect(() => {
    if (words !== '') box.current?.focus()
  }, [words])
  if (errors.length === 0) return null
  return (
    <div ref={box} tabIndex={-1} className="rounded-card border-2 border-late bg-surface p-4" id="errors">
      {/* The alert is a child: a focused alert is read twice by some screen readers. */}
      <div role="alert">
        <h2 className="text-lg text-late">{title}</h2>
        <ul className="mt-1.5 grid gap-1">
          {errors.map(({ fieldId, says }) => (
            <li key={`${fieldId} ${says}`} className="font-semibold">
              {fieldId ? (
                <JumpLink
                  to={fieldId}
                  className="inline-flex min-h-11 items-center text-late underline underline-offset-3"
                >
                  {says}
                </JumpLink>
              ) : (
                says
              )}
            </li>
          ))}
        </ul>
      </div>
    </div>
  )
}

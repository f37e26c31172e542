import type { WarningLevel } from '#app/care/warning.ts'
import type { WhyWarning } from '#app/rules/why-warnings.ts'
import { Notice } from './notice.tsx'
import { WhyValues } from './why-values.tsx'

interface WarningsProps {
  readonly title?: string
  readonly warnings: readonly {
    readonly name: string
    readonly level: WarningLevel
    readonly action: string
    readonly cause: string
    readonly why?: WhyWarning | undefined
  }[]
}

/** Warnings, most urgent first: what to do, then why. */
export function Warnings({ title, warnings }: WarningsProps) {
  if (!title && warnings.length === 0) return null
  return (
    <section aria-label={title ? 'Charted just now' : 'Warnings'} className="grid gap-2">
      {title && (
        <p className="rounded-card border border-line bg-brand-tint px-4 py-3 font-semibold text-brand">{title}</p>
      )}
      {warnings.map(({ name, level, action, cause, why }) => (
        <Notice key={name} tone={level} action={action} answer={why && <WhyWarned why={why} about={action} />}>
          {cause}
        </Notice>
      ))}
    </section>
  )
}

interface WhyProps {
  readonly why: WhyWarning
  readonly about: string
}

/** "Why?" of a warning: its source, the policy, and the numbers that this care was judged by. */
export function WhyWarned({ why: { source, policy, values }, about }: WhyProps) {
  return (
    <details className="text-sm open:w-full">
      <summary className="inline-flex min-h-11 min-w-11 items-center font-semibold text-ink2 underline underline-offset-3">
        Why? <span className="sr-only">{about}</span>
      </summary>
      <div className="grid max-w-prose gap-1.5 text-ink2">
        <p>{source}.</p>
        <WhyValues values={values} />
        <p>{policy}</p>
      </div>
    </details>
  )
}

import { wordsOf } from '#app/care/kind.ts'
import type { ExplainedWarning } from '#app/rules/why-warnings.ts'
import { Notice } from './notice.tsx'
import { WhyDetails } from './why.tsx'

interface WarningsProps {
  readonly title?: string
  readonly warnings: readonly ExplainedWarning[]
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
        <Notice key={name} tone={level} action={action} answer={why && <WhyDetails why={why} about={wordsOf(name)} />}>
          {cause}
        </Notice>
      ))}
    </section>
  )
}

import type { WarningLevel } from '#app/care/warning.ts'
import { Notice } from './notice.tsx'

interface WarningsProps {
  readonly title?: string
  readonly warnings: readonly {
    readonly name: string
    readonly level: WarningLevel
    readonly action: string
    readonly cause: string
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
      {warnings.map(({ name, level, action, cause }) => (
        <Notice key={name} tone={level} action={action}>
          {cause}
        </Notice>
      ))}
    </section>
  )
}

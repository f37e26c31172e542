import { useLocation } from 'react-router'
import type { TaskStatus } from '#app/rules/status.ts'
import type { ExplainedWarning } from '#app/rules/why-warnings.ts'
import { withUsual } from '#app/scanning/form-address.ts'
import { Button, LinkButton } from './button.tsx'
import { useHydrated } from './hydrated.ts'
import { toneOf } from './status-look.ts'
import { Tag } from './tag.tsx'
import { Warnings } from './warnings.tsx'

interface ChartHeadProps {
  readonly title: string
  readonly due: { readonly says: string; readonly status: TaskStatus } | null
  readonly recently: string | null
  readonly warnings: readonly ExplainedWarning[]
  readonly isRestored: boolean
}

/** What is being charted, how it stands, and what to know before it is. */
export function ChartHead({ title, due, recently, warnings, isRestored }: ChartHeadProps) {
  return (
    <header className="mb-5 grid gap-3 px-4 md:px-6">
      <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1">
        <h1 className="text-2xl">{title}</h1>
        {due && <Tag tone={toneOf[due.status]}>{due.says}</Tag>}
      </div>
      {recently && <p className="rounded-control border border-line bg-sunk px-3 py-2">{recently}</p>}
      {isRestored && (
        <p className="rounded-control border border-line bg-brand-tint px-3 py-2 text-brand">
          What you had typed when you were signed out is filled in again. Nothing of it was charted.
        </p>
      )}
      <Warnings warnings={warnings} />
    </header>
  )
}

interface UsualActProps {
  readonly words: string
  readonly onFill: () => void
}

/** The usual act as one tap: fills what need not be looked at, and charts nothing. What a scan has filled in stays. */
export function UsualAct({ words, onFill }: UsualActProps) {
  const isHydrated = useHydrated()
  const { search } = useLocation()
  const says = `As usual: ${words}`
  return (
    <div>
      {isHydrated ? (
        <Button type="button" size={48} onClick={onFill}>
          {says}
        </Button>
      ) : (
        <LinkButton href={withUsual(search)} size={48} reload>
          {says}
        </LinkButton>
      )}
    </div>
  )
}

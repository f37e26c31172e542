import type { ReactNode } from 'react'
import type { Why, WhyValue } from '#app/rules/why.ts'
import { Tag } from './tag.tsx'

interface WhyDetailsProps {
  readonly why: Why
  /** What is asked about, for those who hear it alone. */
  readonly about: string
  /** What follows from it, such as a way to put it off. */
  readonly children?: ReactNode
}

/** "Why?" of a task, a warning or a band: the rule, every number with its source, and the policy. Opens without scripts. */
export function WhyDetails({ why: { rule, values, policy }, about, children }: WhyDetailsProps) {
  return (
    <details className="text-sm open:w-full">
      <summary className="inline-flex min-h-11 min-w-11 items-center font-semibold text-ink2 underline underline-offset-3">
        Why? <span className="sr-only">{about}</span>
      </summary>
      <div className="grid max-w-prose gap-1.5 pb-1 text-ink2">
        {rule.map(says => (
          <p key={says}>{says}</p>
        ))}
        {values.length > 0 && <Numbers values={values} />}
        <p>{policy}</p>
        {children}
      </div>
    </details>
  )
}

function Numbers({ values }: { readonly values: readonly WhyValue[] }) {
  return (
    <ul className="grid gap-1">
      {values.map(({ label, value, origin, source, standing }) => (
        <li key={label}>
          <b className="font-semibold text-ink">
            {label}: {value}.
          </b>{' '}
          {origin}. {source}. <Tag>{standing}</Tag>
        </li>
      ))}
    </ul>
  )
}

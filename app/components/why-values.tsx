import type { WhyValue } from '#app/rules/why.ts'
import { Tag } from './tag.tsx'

/** Numbers in force with where each came from. */
export function WhyValues({ values }: { readonly values: readonly WhyValue[] }) {
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

import type { PolicyDifference } from '#app/rules/policy-values.ts'

/** What differs between two versions, setting by setting, in words. */
export function DifferenceList({ differences }: { readonly differences: readonly PolicyDifference[] }) {
  if (differences.length === 0) return <p>No setting differs.</p>
  return (
    <ul className="grid gap-2">
      {differences.map(({ name, section, label, says, affects }) => (
        <li key={name}>
          <b className="font-semibold">
            {label}: {says}.
          </b>{' '}
          <span className="text-ink2">
            {section}. {affects}
          </span>
        </li>
      ))}
    </ul>
  )
}

import { Link } from 'react-router'
import { LinkButton } from './button.tsx'
import { Card } from './card.tsx'

interface ChartOtherProps {
  readonly patientId: string
  readonly kinds: readonly { readonly slug: string; readonly title: string }[]
  readonly stayLinks: readonly { readonly href: string; readonly words: string }[]
}

/** What can be charted without being due, and what can be changed about the stay. */
export function ChartOther({ patientId, kinds, stayLinks }: ChartOtherProps) {
  return (
    <Card title="Chart something else">
      <ul className="flex flex-wrap gap-2">
        {kinds.map(({ slug, title }) => (
          <li key={slug}>
            <LinkButton href={`/patients/${patientId}/chart/${slug}`}>{title}</LinkButton>
          </li>
        ))}
      </ul>
      {stayLinks.length > 0 && (
        <p className="mt-3 flex flex-wrap gap-x-6">
          {stayLinks.map(({ href, words }) => (
            <Link key={href} to={href} className="inline-flex min-h-11 items-center font-semibold underline">
              {words}
            </Link>
          ))}
        </p>
      )}
    </Card>
  )
}

import { Link } from 'react-router'
import type { ChartableKinds } from '#app/rules/views.ts'
import { LinkButton } from './button.tsx'
import { Card } from './card.tsx'

interface ChartOtherProps {
  readonly patientId: string
  readonly chapters: readonly ChartableKinds[]
  readonly stayLinks: readonly { readonly href: string; readonly words: string }[]
}

/** What can be charted without being due, and what can be changed about the stay. */
export function ChartOther({ patientId, chapters, stayLinks }: ChartOtherProps) {
  return (
    <Card title="Chart something else">
      <div className="grid gap-4">
        {chapters.map(({ chapter, kinds }) => (
          <section key={chapter} aria-label={chapter}>
            <h3 className="mb-2 text-sm font-semibold text-ink2">{chapter}</h3>
            <ul className="flex flex-wrap gap-2">
              {kinds.map(({ slug, title }) => (
                <li key={slug}>
                  <LinkButton href={`/patients/${patientId}/chart/${slug}`}>{title}</LinkButton>
                </li>
              ))}
            </ul>
          </section>
        ))}
      </div>
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

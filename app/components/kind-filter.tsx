import { Link } from 'react-router'

interface KindFilterProps {
  readonly kinds: readonly { readonly slug: string; readonly title: string }[]
  /** The kind shown, or null for all. */
  readonly current: string | null
  readonly href: (name: string, value: string) => string
}

/** All care or one kind of it, as links: they work without scripts and can be kept. */
export function KindFilter({ kinds, current, href }: KindFilterProps) {
  const choices = [{ slug: '', title: 'All care' }, ...kinds]
  return (
    <details className="relative print:hidden">
      <summary className="inline-flex min-h-11 items-center rounded-control border border-edge px-4 font-semibold text-ink">
        {choices.find(({ slug }) => slug === (current ?? ''))?.title}
      </summary>
      <ul className="absolute right-0 z-20 mt-1 w-64 rounded-card border border-line bg-surface p-2 shadow-float">
        {choices.map(({ slug, title }) => (
          <li key={slug}>
            <Link
              to={href('kind', slug)}
              preventScrollReset
              aria-current={slug === (current ?? '') ? 'true' : undefined}
              className="flex min-h-11 items-center rounded-control px-3 text-base font-semibold text-ink hover:bg-sunk aria-[current=true]:bg-brand-tint aria-[current=true]:text-brand"
            >
              {title}
            </Link>
          </li>
        ))}
      </ul>
    </details>
  )
}

import { Link } from 'react-router'

export interface SectionLink {
  readonly label: string
  readonly href: string
  readonly current: boolean
}

interface SectionsProps {
  readonly sections: readonly SectionLink[]
}

/** The sections in the top bar, from the tablet upwards. */
export function TopSections({ sections }: SectionsProps) {
  return (
    <nav aria-label="Sections" className="hidden self-stretch md:flex">
      {sections.map(section => (
        <Link
          key={section.href}
          to={section.href}
          aria-current={section.current ? 'page' : undefined}
          className="flex min-h-11 min-w-11 items-center justify-center border-y-3 border-transparent px-1 text-center text-sm leading-tight font-semibold text-ink2 hover:text-ink aria-[current]:border-b-brand aria-[current]:text-ink lg:px-2 xl:px-2.5 xl:text-base xl:whitespace-nowrap"
        >
          {section.label}
        </Link>
      ))}
    </nav>
  )
}

const TAB =
  'flex min-h-14 flex-1 flex-col items-center justify-center border-t-3 border-transparent px-1 text-center text-xs leading-tight font-semibold text-ink2'
const SHOWN = 4

/** The sections at the foot of a phone: up to four in reach of the thumb, all are in the menu. A form's final bar takes their place. */
export function BottomSections({ sections }: SectionsProps) {
  if (sections.length === 0) return null
  return (
    <nav
      aria-label="Sections, at the foot"
      className="fixed inset-x-0 bottom-0 z-20 flex border-t border-line bg-surface pb-[env(safe-area-inset-bottom)] md:hidden group-has-[[data-final-bar]]/page:hidden print:hidden"
    >
      {sections.slice(0, SHOWN).map(section => (
        <Link
          key={section.href}
          to={section.href}
          aria-current={section.current ? 'page' : undefined}
          className={`${TAB} aria-[current]:border-brand aria-[current]:text-brand`}
        >
          {section.label}
        </Link>
      ))}
    </nav>
  )
}

/** Every section, in the menu of a phone: what the bar at its foot has no room for is here. */
export function MenuSections({ sections }: SectionsProps) {
  return (
    <nav aria-label="All sections" className="grid border-b border-hair pb-2 md:hidden">
      {sections.map(section => (
        <Link
          key={section.href}
          to={section.href}
          aria-current={section.current ? 'page' : undefined}
          className="flex min-h-11 items-center rounded-control px-3 font-semibold hover:bg-sunk aria-[current]:bg-brand-tint aria-[current]:text-brand"
        >
          {section.label}
        </Link>
      ))}
    </nav>
  )
}

import type { ReactNode } from 'react'
import { Link } from 'react-router'
import type { Zone } from '#app/time/zone.ts'
import { Clock } from './clock.tsx'
import { Mark } from './mark.tsx'
import { BottomSections, type SectionLink, TopSections } from './page-nav.tsx'
import { type Person, PersonMenu } from './person-menu.tsx'
import { SafetyLine } from './safety-line.tsx'
import type { Theme } from './theme.ts'

export interface AppPageProps {
  readonly person: Person
  readonly ward?: { readonly name: string }
  readonly now: Date
  readonly zone: Zone
  /** What this person may open, most used first: a phone shows the first four at its foot. */
  readonly sections: readonly SectionLink[]
  readonly theme: Theme
  /** Who reviewed the policy of the ward, and when. */
  readonly reviewed?: string | null
  readonly children: ReactNode
}

/** A page inside the application: bar, content, safety line. The content brings its own `h1`. */
export function AppPage({ person, ward, now, zone, sections, theme, reviewed = null, children }: AppPageProps) {
  return (
    <div className="group/page flex min-h-dvh flex-col pb-18 has-[[data-final-bar]]:pb-0 md:pb-0 print:block print:pb-0">
      <header className="border-b border-line bg-surface print:hidden">
        <div className="mx-auto flex min-h-15 max-w-360 items-center gap-3 px-4 md:max-lg:gap-2 lg:gap-5 lg:px-6">
          <Link
            to="/"
            className="inline-flex min-h-11 items-center gap-2.5 text-xl font-bold tracking-tight text-brand"
          >
            <Mark />
            <span className="max-[22rem]:sr-only md:max-lg:sr-only">Cannulary</span>
          </Link>
          <TopSections sections={sections} />
          <div className="ml-auto flex items-center gap-3 md:max-lg:gap-2">
            {ward && (
              <span className="hidden rounded-tag border border-line px-2 py-0.5 text-sm font-semibold whitespace-nowrap xl:inline">
                {ward.name}
              </span>
            )}
            <Clock now={now} zone={zone} className="text-xl" />
            <PersonMenu person={person} theme={theme} sections={sections} />
          </div>
        </div>
      </header>
      <main id="main" tabIndex={-1} className="mx-auto w-full max-w-360 flex-1 outline-none">
        {children}
      </main>
      <SafetyLine reviewed={reviewed} />
      <BottomSections sections={sections} />
    </div>
  )
}

import { useEffect, useRef } from 'react'
import { Form, Link, useLocation } from 'react-router'
import { Button } from './button.tsx'
import { MenuSections, type SectionLink } from './page-nav.tsx'
import { type Theme, themeNames, themes } from './theme.ts'

export interface Person {
  readonly name: string
  readonly role: string
}

export interface PersonMenuProps {
  readonly person: Person
  readonly theme: Theme
  readonly sections: readonly SectionLink[]
}

/** Who is signed in; opens to the theme and the way out. A plain `details`, so it opens without scripts. */
export function PersonMenu({ person, theme, sections }: PersonMenuProps) {
  const { pathname, search } = useLocation()
  const menu = useRef<HTMLDetailsElement>(null)
  useEffect(() => {
    const here = pathname + search
    if (menu.current && here) menu.current.open = false
  }, [pathname, search])
  return (
    <details ref={menu} className="relative">
      <summary className="flex min-h-11 list-none items-center gap-2 rounded-control border border-edge px-3 font-semibold hover:bg-sunk [&::-webkit-details-marker]:hidden">
        <span className="hidden max-w-44 text-sm leading-tight lg:grid">
          <span className="truncate">{person.name}</span>
          <span className="truncate text-xs font-normal text-ink2">{person.role}</span>
        </span>
        <span className="lg:hidden">Menu</span>
        <svg viewBox="0 0 12 8" className="h-2 w-3 flex-none fill-none stroke-current stroke-2" aria-hidden="true">
          <path d="M1 1.5l5 5 5-5" />
        </svg>
      </summary>
      <div className="absolute right-0 z-30 mt-2 grid w-72 max-w-[calc(100vw-2rem)] gap-3 rounded-card border border-line bg-surface p-4 shadow-float">
        <p>
          <b className="block font-semibold">{person.name}</b>
          <span className="text-ink2">{person.role}</span>
        </p>
        <Link
          to="/account"
          className="inline-flex min-h-11 items-center font-semibold text-brand underline underline-offset-3"
        >
          Your password and sessions
        </Link>
        <MenuSections sections={sections} />
        <ThemeForm theme={theme} back={pathname + search} />
        <Form method="post" action="/sign-out">
          <Button className="w-full">Sign out</Button>
        </Form>
      </div>
    </details>
  )
}

interface ThemeFormProps {
  readonly theme: Theme
  readonly back: string
}

function ThemeForm({ theme, back }: ThemeFormProps) {
  return (
    <Form method="post" action="/theme" preventScrollReset>
      <input type="hidden" name="back" value={back} />
      <fieldset className="grid gap-1.5">
        <legend className="mb-1.5 text-sm text-ink2">Colours</legend>
        {themes.map(name => (
          <Button
            key={name}
            name="theme"
            value={name}
            aria-pressed={name === theme}
            className="aria-pressed:border-brand aria-pressed:bg-brand-tint aria-pressed:text-brand"
          >
            {themeNames[name]}
          </Button>
        ))}
      </fieldset>
    </Form>
  )
}

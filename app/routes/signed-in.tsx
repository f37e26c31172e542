import { Outlet, useLocation } from 'react-router'
import { IDLE_LIMIT_MINUTES, WARNING_MINUTES } from '#app/auth/limits.ts'
import { type Act, authorOf, can } from '#app/auth/permissions.ts'
import { ownSession, signedIn, signedInOnly } from '#app/auth/signed-in.server.ts'
import { IdleWatch } from '#app/components/idle-watch.tsx'
import { Notice } from '#app/components/notice.tsx'
import { AppPage } from '#app/components/page.tsx'
import { themeOf } from '#app/components/theme.ts'
import { env } from '#app/env.server.ts'
import { reviewOfWards } from '#app/views/policy-overview.server.ts'
import type { Route } from './+types/signed-in.ts'

export const middleware: Route.MiddlewareFunction[] = [signedInOnly]

interface Section {
  readonly label: string
  readonly href: string
  /** Addresses that belong to the section. */
  readonly under: string
}

export async function loader({ context, request }: Route.LoaderArgs) {
  const user = signedIn(context)
  const { wards, endsAt } = ownSession(context)
  const ward = wards[0] ?? null
  const sectionsOf = (act: Act, sections: readonly Section[]) => (can(user, act) ? sections : [])
  return {
    person: { name: user.name, role: authorOf(user).role },
    ...(await reviewOfWards(wards, new Date())),
    ward: ward && { name: ward.name },
    now: Date.now(),
    endsAt,
    zone: env.hospitalTimeZone,
    theme: themeOf(request.headers.get('cookie')),
    sections: [
      ...sectionsOf('see ward', [
        { label: 'My round', href: '/round', under: '/round' },
        ...(ward ? [{ label: 'Ward board', href: `/wards/${ward.id}/board`, under: '/wards/' }] : []),
        { label: 'Patients', href: '/patients', under: '/patients' },
      ]),
      ...sectionsOf('see tubes of wards', [{ label: 'Tubes', href: '/tubes', under: '/tubes' }]),
      ...sectionsOf('see catalogue', [{ label: 'Catalogue', href: '/catalogue', under: '/catalogue' }]),
      { label: 'Scan', href: '/scan', under: '/scan' },
      ...sectionsOf('trace lots', [{ label: 'Lots', href: '/lots', under: '/lots' }]),
      ...sectionsOf('see competence gaps', [{ label: 'Competence', href: '/competence', under: '/competence' }]),
      ...sectionsOf('see policy', [{ label: 'Policy', href: '/policy', under: '/policy' }]),
      ...sectionsOf('manage people', [{ label: 'People', href: '/admin/people', under: '/admin/people' }]),
      ...sectionsOf('manage wards', [{ label: 'Wards', href: '/admin/wards', under: '/admin/wards' }]),
    ],
  }
}

/** Everything behind the sign-in: bar, sections, safety line. */
export default function SignedIn({ loaderData }: Route.ComponentProps) {
  const { pathname } = useLocation()
  const { sections, now, endsAt, person, zone, theme, ward, reviewed, unreviewed } = loaderData
  return (
    <AppPage
      person={person}
      {...(ward ? { ward } : {})}
      now={new Date(now)}
      zone={zone}
      theme={theme}
      reviewed={reviewed}
      sections={sections.map(({ label, href, under }) => ({ label, href, current: pathname.startsWith(under) }))}
    >
      {unreviewed.length > 0 && (
        <div className="px-4 pt-3 md:px-6">
          <Notice tone="amber" action={`No reviewed policy: ${unreviewed.join(', ')}.`}>
            Nothing is computed there, no due care and no warnings, until the clinical lead has reviewed one.
          </Notice>
        </div>
      )}
      <Outlet />
      <IdleWatch
        idleMinutes={IDLE_LIMIT_MINUTES}
        warningMinutes={WARNING_MINUTES}
        now={new Date(now)}
        endsAt={endsAt}
        zone={zone}
      />
    </AppPage>
  )
}

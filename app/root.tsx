import type { ReactNode } from 'react'
import { Links, Meta, Outlet, Scripts, ScrollRestoration, useRouteLoaderData } from 'react-router'
import { loadUser, sameOriginOnly } from '#app/auth/signed-in.server.ts'
import { ErrorPage } from '#app/components/error-page.tsx'
import { JumpLink } from '#app/components/jump-link.tsx'
import { type Theme, themeOf } from '#app/components/theme.ts'
import type { Route } from './+types/root.ts'
import '#app/zod.ts'
import '../tailwind.css'

const colorScheme: Readonly<Record<Theme, string>> = { system: 'light dark', day: 'light', night: 'dark' }

export const middleware: Route.MiddlewareFunction[] = [sameOriginOnly, loadUser]

export const links: Route.LinksFunction = () => [{ rel: 'icon', href: '/favicon.svg', type: 'image/svg+xml' }]

export const meta: Route.MetaFunction = () => [{ title: 'Cannulary' }]

/** `reference` names this request in the server's log; the server puts it into the request's `x-request-id`. */
export function loader({ request }: Route.LoaderArgs) {
  return { theme: themeOf(request.headers.get('cookie')), reference: request.headers.get('x-request-id') }
}

export function Layout({ children }: { readonly children: ReactNode }) {
  // Absent when this very loader failed: the page is then drawn as the device prefers.
  const theme = useRouteLoaderData<typeof loader>('root')?.theme ?? 'system'
  return (
    <html lang="en" data-theme={theme}>
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1, interactive-widget=resizes-content" />
        <meta name="color-scheme" content={colorScheme[theme]} />
        <meta name="robots" content="noindex, nofollow" />
        <Meta />
        <Links />
      </head>
      <body>
        <JumpLink
          to="main"
          className="absolute top-2 left-2 z-50 -translate-y-20 rounded-control bg-brand px-4 py-3 font-semibold text-brand-ink focus:translate-y-0 print:hidden"
        >
          Skip to the content
        </JumpLink>
        {children}
        <ScrollRestoration />
        <Scripts />
      </body>
    </html>
  )
}

export default function Root() {
  return <Outlet />
}

export function ErrorBoundary({ error, loaderData }: Route.ErrorBoundaryProps) {
  return <ErrorPage error={error} reference={loaderData?.reference ?? null} />
}

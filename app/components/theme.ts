export const themes = ['system', 'day', 'night'] as const
export type Theme = (typeof themes)[number]

export const themeNames: Readonly<Record<Theme, string>> = { system: 'As the device', day: 'Day', night: 'Night' }

/** The theme a cookie header asks for; `system` when there is none, or an unknown one. */
export function themeOf(cookieHeader: string | null): Theme {
  const value = cookieHeader?.match(/(?:^|;\s*)theme=([a-z]+)/)?.[1]
  return themes.find(theme => theme === value) ?? 'system'
}

/** A `Set-Cookie` value that keeps the choice for a year. Not a secret, so scripts may read it. */
export function themeCookie(theme: Theme): string {
  return `theme=${theme}; Path=/; Max-Age=31536000; SameSite=Lax`
}

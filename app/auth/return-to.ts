const SOMEWHERE_ON_THIS_SITE = 'https://here.invalid'

/**
 * Where to go after signing in: a path of this site with its search, or `otherwise`.
 * Read as a browser reads it, so that `//elsewhere.example`, `/\elsewhere.example` and tabs inside do not get through.
 */
export function returnPath(wanted: unknown, otherwise = '/'): string {
  if (typeof wanted !== 'string' || !wanted.startsWith('/')) return otherwise
  if (!URL.canParse(wanted, SOMEWHERE_ON_THIS_SITE)) return otherwise
  const url = new URL(wanted, SOMEWHERE_ON_THIS_SITE)
  if (url.origin !== SOMEWHERE_ON_THIS_SITE || url.pathname.startsWith('//')) return otherwise
  return url.pathname + url.search
}

/** The sign-in page that comes back to `path` afterwards. */
export function signInPath(path: string): string {
  const returnTo = returnPath(path)
  return returnTo === '/' ? '/sign-in' : `/sign-in?${new URLSearchParams({ returnTo })}`
}

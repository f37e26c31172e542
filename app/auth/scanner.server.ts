import { createCookie } from 'react-router'
import { z } from 'zod'
import { env } from '#app/env.server.ts'

/** What is known of the scanner at a workstation. */
export interface Scanner {
  /** Separators came through when the test code was scanned here. */
  readonly isTrusted: boolean
  /** The key it sends for the separator, besides Ctrl+]. */
  readonly separatorKey: string | null
}

/** Keys that a scanner may be set to, none of which a label has or a form needs. */
export const separatorKeys = ['F8', 'F9', 'F10', '|', '~', '^', '{'] as const

const stored = z.strictObject({ isTrusted: z.boolean(), separatorKey: z.enum(separatorKeys).nullable() })
const NONE: Scanner = { isTrusted: false, separatorKey: null }

// Of the workstation and not of a person, so it outlives the session; signed, so that it is not set by hand.
const cookie = createCookie('scanner', {
  secrets: [env.sessionSecret],
  httpOnly: true,
  sameSite: 'lax',
  path: '/',
  maxAge: 365 * 86_400,
})

/** The scanner of the workstation that a request comes from. */
export async function scannerOf(request: Request): Promise<Scanner> {
  const found = stored.safeParse(await cookie.parse(request.headers.get('Cookie')))
  return found.success ? found.data : NONE
}

/** A `Set-Cookie` value that keeps this for a year on this workstation. */
export function scannerCookie(scanner: Scanner): Promise<string> {
  return cookie.serialize(scanner)
}

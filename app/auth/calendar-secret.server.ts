import { createHash, randomBytes } from 'node:crypto'

/** A new secret of 32 random bytes for an address, and its hash, which alone is stored. */
export function newCalendarSecret(): { readonly secret: string; readonly hash: string } {
  const secret = randomBytes(32).toString('base64url')
  return { secret, hash: calendarHash(secret) }
}

/** The hash that a secret is stored under. */
export function calendarHash(secret: string): string {
  return createHash('sha256').update(`calendar:${secret}`).digest('hex')
}

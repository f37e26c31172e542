/** What has been counted for an account or an address: attempts without success, and when the last one was. */
export type Attempts = { readonly misses: number; readonly lastMissedAt: Date }

/** Misses before the first wait. A whole ward can share one address, so an address is given more. */
export const FREE_MISSES = { account: 5, address: 20 } as const

const LONGEST_WAIT_S = 60
const FORGOTTEN_AFTER_MS = 15 * 60_000

/** The misses that still count at `now`: none once nobody has missed for a quarter of an hour. */
export function missesThatCount(attempts: Attempts, now: Date): number {
  return now.getTime() - attempts.lastMissedAt.getTime() >= FORGOTTEN_AFTER_MS ? 0 : attempts.misses
}

/**
 * Whole seconds until the next attempt is heard: 0, or 1, 2, 4 ... 60 counted from the last miss.
 * It is never a lock: OWASP ASVS 5.0, 6.3.1 warns of locking somebody out by guessing at their account.
 */
export function secondsToWait(attempts: Attempts, freeMisses: number, now: Date): number {
  const beyond = missesThatCount(attempts, now) - freeMisses
  if (beyond < 0) return 0
  const waitMs = Math.min(2 ** beyond, LONGEST_WAIT_S) * 1000
  return Math.max(0, Math.ceil((attempts.lastMissedAt.getTime() + waitMs - now.getTime()) / 1000))
}

import { createHash } from 'node:crypto'
import { transact } from '#database/sequelize.server.ts'
import {
  clearAttempts,
  countAttempts,
  hasSignedInFrom,
  lockedAttempts,
  uncountAttempt,
} from '#database/sign-in-attempts.server.ts'
import { FREE_MISSES, missesThatCount, secondsToWait } from './throttle.ts'

/** An attempt that was counted before its password was looked at, so that many at once are many. */
export type Attempt = { readonly account: string; readonly address: string }

const subject = (...words: readonly string[]): string =>
  createHash('sha256').update(JSON.stringify(words)).digest('hex')

/**
 * Counts an attempt to sign in, or says how many seconds to wait first; a wait is not counted again.
 * Where this account has been signed in to lately it has a count of its own, so that a stranger who guesses at it from
 * elsewhere all night does not keep the night nurse waiting.
 */
export async function takeAttempt(email: string, address: string | null): Promise<Attempt | number> {
  const isKnownThere = await hasSignedInFrom(email, address)
  const attempt = {
    account: isKnownThere ? subject('account at', email, address ?? '') : subject('account', email),
    address: subject('address', address ?? ''),
  }
  const free = new Map([
    [attempt.account, FREE_MISSES.account],
    [attempt.address, FREE_MISSES.address],
  ])
  return transact(async transaction => {
    const counted = await lockedAttempts([...free.keys()], transaction)
    const waits = counted.map(one => secondsToWait(one, free.get(one.subject) ?? 0, one.now))
    const longest = Math.max(...waits)
    if (longest > 0) return longest
    for (const one of counted) await countAttempts(one.subject, missesThatCount(one, one.now) + 1, transaction)
    return attempt
  })
}

/** The attempt succeeded: the account's count starts again, and the address has one miss less. */
export async function forgiveAttempt({ account, address }: Attempt): Promise<void> {
  await clearAttempts(account)
  await uncountAttempt([address])
}

/** The attempt was not looked at, and so is no miss. */
export async function returnAttempt({ account, address }: Attempt): Promise<void> {
  await uncountAttempt([account, address])
}

import { logAccess, type Trace } from '#database/access-log.server.ts'
import { credentialsById } from '#database/users.server.ts'
import { PasswordsBusy, passwordMatches } from './password.server.ts'
import { LONGEST_PASSWORD } from './password-rules.ts'
import { forgiveAttempt, returnAttempt, takeAttempt } from './sign-in-throttle.server.ts'

/** What came of asking somebody for their password outside the sign-in page. `busy`: nobody looked at it. */
export type Confirmation =
  | { readonly is: 'right' }
  | { readonly is: 'wrong' }
  | { readonly is: 'to wait'; readonly seconds: number }
  | { readonly is: 'busy' }

/**
 * Whether this is the password of that account, guessed at no faster than on the sign-in page: the same counts by account and
 * address, the same hash, the same time for an account that is not there. A miss is logged as a refused sign-in.
 */
export async function confirmed(userId: string, password: string, by: Trace): Promise<Confirmation> {
  const account = await credentialsById(userId)
  const attempt = await takeAttempt(account?.email ?? userId, by.address)
  if (typeof attempt === 'number') return { is: 'to wait', seconds: attempt }
  const isRight = await matches(password, account?.passwordHash ?? null)
  if (isRight === null) {
    await returnAttempt(attempt)
    return { is: 'busy' }
  }
  if (!isRight || account?.mayEnter !== 1) {
    const resource = { type: 'user', id: userId }
    await logAccess({ action: 'signed an entry', outcome: 'refused', purpose: 'SIGN-IN', by, resource })
    return { is: 'wrong' }
  }
  await forgiveAttempt(attempt)
  return { is: 'right' }
}

/** Null when too many wait for theirs. What is too long for a password is compared as none. */
async function matches(password: string, hash: string | null): Promise<boolean | null> {
  const isPossible = password.length <= LONGEST_PASSWORD * 4
  try {
    return (await passwordMatches(isPossible ? password : '', hash)) && isPossible
  } catch (error) {
    if (error instanceof PasswordsBusy) return null
    throw error
  }
}

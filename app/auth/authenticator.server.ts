import { Authenticator } from 'remix-auth'
import { FormStrategy } from 'remix-auth-form'
import { z } from 'zod'
import { logAccess, type Trace } from '#database/access-log.server.ts'
import { type Credentials, credentialsOf, storeRehashed } from '#database/users.server.ts'
import { isOutdated, PasswordsBusy, passwordHash, passwordMatches } from './password.server.ts'
import { LONGEST_PASSWORD } from './password-rules.ts'
import type { CurrentUser } from './permissions.ts'
import { forgiveAttempt, returnAttempt, takeAttempt } from './sign-in-throttle.server.ts'

/** Why somebody is not let in, in words for them; `email` is what they had typed. */
export class SignInRefused extends Error {
  override readonly name = 'SignInRefused'
  readonly status: 400 | 429 | 503
  readonly email: string

  constructor(message: string, status: 400 | 429 | 503, email: string) {
    super(message)
    this.status = status
    this.email = email
  }
}

/** Somebody whose password was right. */
export type Authenticated = Pick<CurrentUser, 'id' | 'role'>

const typed = z.object({
  email: z.string().trim().toLowerCase().max(254),
  // Composed characters can shrink under NFKC but hardly grow; far more than that is no password.
  password: z
    .string()
    .min(1)
    .max(LONGEST_PASSWORD * 4),
})

const WRONG = 'The e-mail address or the password is not right.'

/** Checks the sign-in form of one request. Throws `SignInRefused`. */
export function authenticator(by: Trace): Authenticator<Authenticated> {
  return new Authenticator<Authenticated>().use(new FormStrategy(({ form }) => authenticated(form, by)), 'form')
}

async function authenticated(form: FormData, by: Trace): Promise<Authenticated> {
  const { data, success } = typed.safeParse(Object.fromEntries(form))
  if (!success) throw new SignInRefused('Enter your e-mail address and your password.', 400, textOf(form, 'email'))
  const { email, password } = data
  const attempt = await takeAttempt(email, by.address)
  if (typeof attempt === 'number') throw new SignInRefused(waitWords(attempt), 429, email)
  const account = await credentialsOf(email)
  const isRight = await passwordMatches(password, account?.passwordHash ?? null).catch(async error => {
    if (!(error instanceof PasswordsBusy)) throw error
    await returnAttempt(attempt)
    throw new SignInRefused(error.data, 503, email)
  })
  if (account === null || !isRight || account.mayEnter !== 1) {
    await logAccess({ action: 'signed in', outcome: 'refused', purpose: 'SIGN-IN', by, ...about(account) })
    throw new SignInRefused(WRONG, 400, email)
  }
  await forgiveAttempt(attempt)
  if (isOutdated(account.passwordHash)) await renewHash(account.id, password)
  return { id: account.id, role: account.role }
}

/** Stores the hash of today's parameters; when too many people wait for theirs, the next sign-in does. */
async function renewHash(userId: string, password: string): Promise<void> {
  try {
    await storeRehashed(userId, await passwordHash(password))
  } catch (error) {
    if (!(error instanceof PasswordsBusy)) throw error
  }
}

const about = (account: Credentials | null) => (account ? { resource: { type: 'user', id: account.id } } : {})

const waitWords = (seconds: number): string =>
  `Too many tries. Wait ${seconds} ${seconds === 1 ? 'second' : 'seconds'}, then try again.`

function textOf(form: FormData, name: string): string {
  const value = form.get(name)
  return typeof value === 'string' ? value : ''
}

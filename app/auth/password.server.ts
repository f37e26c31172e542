import { randomBytes, randomInt } from 'node:crypto'
import { existsSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { Tinypool } from 'tinypool'

/** argon2id, OWASP ASVS 5.0 appendix C: at least 19456 KiB with two passes, one lane. */
const strength = { memoryKib: 19_456, passes: 2 }
const PARAMETERS = `$argon2id$v=19$m=${strength.memoryKib},t=${strength.passes},p=1$`

/**
 * Too many sign-ins at once: try again, and nobody was refused. React Router takes its three last fields for those of a
 * thrown `data()`, so that wherever it is thrown it becomes the page of a 503.
 */
export class PasswordsBusy extends Error {
  override readonly name = 'PasswordsBusy'
  readonly type = 'DataWithResponseInit'
  readonly data = 'Many people are signing in at this moment. Try again in a few seconds.'
  readonly init = { status: 503 }
}

/** The worker is a file of its own wherever this module was bundled to, so it is looked for upwards from here. */
function workerFile(): string {
  let folder = dirname(fileURLToPath(import.meta.url))
  while (!existsSync(join(folder, 'app/auth/password-worker.cjs'))) {
    if (folder === dirname(folder)) throw new Error('app/auth/password-worker.cjs is missing from this installation')
    folder = dirname(folder)
  }
  return join(folder, 'app/auth/password-worker.cjs')
}

// On globalThis, because a development server runs this module again after each edit and would leave threads behind.
const kept = globalThis as typeof globalThis & { cannularyPasswords?: Tinypool }

function pool(): Tinypool {
  kept.cannularyPasswords ??= new Tinypool({ filename: workerFile(), minThreads: 1, maxThreads: 2, maxQueue: 64 })
  return kept.cannularyPasswords
}

async function inWorker<Result>(name: 'hash' | 'matches', task: object): Promise<Result> {
  try {
    return await pool().run(task, { name })
  } catch (error) {
    if (error instanceof Error && error.message.includes('queue is at limit')) throw new PasswordsBusy(error.message)
    throw error
  }
}

/** The stored form of a password. Throws `PasswordsBusy` when too many wait. */
export function passwordHash(password: string): Promise<string> {
  return inWorker('hash', { password: password.normalize('NFKC'), salt: randomBytes(16), ...strength })
}

let decoy: Promise<string> | undefined

/**
 * Whether this is the password behind `hash`. For an account that is not there (`null`) it takes as long and says no, so
 * that an answer's time tells nobody which accounts exist. Throws `PasswordsBusy`.
 */
export async function passwordMatches(password: string, hash: string | null): Promise<boolean> {
  decoy ??= passwordHash(randomBytes(16).toString('hex'))
  const decoyHash = await decoy.catch(error => {
    decoy = undefined
    throw error
  })
  const same = await inWorker<boolean>('matches', {
    password: password.normalize('NFKC'),
    encoded: hash ?? decoyHash,
  })
  return same && hash !== null
}

/** Whether a stored hash was made with other numbers than today's and should be made again at this sign-in. */
export const isOutdated = (hash: string): boolean => !hash.startsWith(PARAMETERS)

const EASY_TO_READ = 'ABCDEFGHJKLMNPQRSTUVWXYZ23456789' // 32 letters and digits, none of them taken for another

/** A password to be used once, in four groups of four: 80 bits. */
export function oneTimePassword(): string {
  const letters = Array.from({ length: 16 }, () => EASY_TO_READ[randomInt(EASY_TO_READ.length)]).join('')
  return letters.replace(/(.{4})(?=.)/g, '$1-')
}

/** Ends the worker threads, so that a command can finish. */
export async function closePasswords(): Promise<void> {
  const running = kept.cannularyPasswords
  delete kept.cannularyPasswords
  await running?.destroy()
}

import '../environment.ts'
import { parseArgs } from 'node:util'
import { z } from 'zod'
import { emailField } from '#app/auth/email.ts'
import { ONE_TIME_PASSWORD_HOURS } from '#app/auth/limits.ts'
import { closePasswords, oneTimePassword, passwordHash } from '#app/auth/password.server.ts'
import { personSchema } from '#app/auth/person-schema.ts'
import { sequelize } from '../sequelize.server.ts'
import { addPerson, EmailTaken } from '../user-changes.server.ts'
import { people } from '../users.server.ts'

const USAGE = 'Say who: npm run admin -- create --name "Given Family" --email name@hospital.example'

try {
  console.log(await answer(process.argv.slice(2)))
} catch (error) {
  console.error(error instanceof Error ? error.message : error)
  process.exitCode = 1
} finally {
  await Promise.all([sequelize.close(), closePasswords()])
}

/** Makes the first administrator of an installation that has none; every later person is added on the pages for people. */
async function answer(words: readonly string[]): Promise<string> {
  const { name, email } = asked(words)
  const known = await people()
  if (known.some(({ role, disabledAt }) => role === 'administrator' && disabledAt === null)) {
    throw new Error('There is an administrator already. People are added by an administrator, on the page People.')
  }
  const password = oneTimePassword()
  const oneTime = { passwordHash: await passwordHash(password), hours: ONE_TIME_PASSWORD_HOURS }
  const nobody = { actor: null, path: null, address: null, userAgent: 'npm run admin', requestId: null }
  await addPerson({ name, email, role: 'administrator', wardIds: [], supervised: false }, oneTime, nobody).catch(
    error => {
      throw error instanceof EmailTaken ? new Error(`${email} has an account already.`) : error
    },
  )
  return [
    `${name} is an administrator. Sign in with ${email} and this one-time password, within ${ONE_TIME_PASSWORD_HOURS} hours:`,
    password,
  ].join('\n')
}

function asked(words: readonly string[]): { name: string; email: string } {
  const { values, positionals } = parseArgs({
    args: [...words],
    allowPositionals: true,
    options: { name: { type: 'string' }, email: { type: 'string' } },
  })
  const person = z.object({ name: personSchema.shape.name, email: emailField }).safeParse(values)
  if (positionals[0] !== 'create' || !person.success) throw new Error(USAGE)
  return person.data
}

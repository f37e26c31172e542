import type { SubmissionResult } from '@conform-to/react'
import { readForm } from '#app/sent-form.server.ts'
import type { Trace } from '#database/access-log.server.ts'
import { passwordHashOf, setOwnPassword } from '#database/users.server.ts'
import { allWards } from '#database/wards.server.ts'
import { newPasswordSchema } from './new-password.ts'
import { PasswordsBusy, passwordHash, passwordMatches } from './password.server.ts'
import { passwordFault } from './password-rules.ts'
import type { CurrentUser } from './permissions.ts'
import { forgiveAttempt, returnAttempt, takeAttempt } from './sign-in-throttle.server.ts'

// What was typed in them does not go back to the browser.
const hideFields: ('currentPassword' | 'newPassword')[] = ['currentPassword', 'newPassword']

/**
 * Replaces somebody's password by the one in the form, or returns what the form is to say. The current password is asked
 * for even in a fresh session (OWASP ASVS 5.0, 6.2.3), and guessed at no faster than at sign-in.
 */
export async function replacedPassword(
  user: CurrentUser,
  form: FormData,
  by: Trace,
): Promise<SubmissionResult<string[]> | null> {
  const submission = readForm(form, newPasswordSchema)
  if (submission.status !== 'success') return submission.reply({ hideFields })
  const { currentPassword, newPassword, keepOthers = false } = submission.value
  const says = (field: 'currentPassword' | 'newPassword', words: string) =>
    submission.reply({ hideFields, fieldErrors: { [field]: [words] } })
  const attempt = await takeAttempt(user.email, by.address)
  if (typeof attempt === 'number') return says('currentPassword', `Too many tries. Wait ${attempt} s, then try again`)
  const hash = await passwordHashOf(user.id)
  const isRight = await passwordMatches(currentPassword, hash).catch(async error => {
    if (error instanceof PasswordsBusy) await returnAttempt(attempt)
    throw error
  })
  if (!isRight) return says('currentPassword', 'This is not your password')
  await forgiveAttempt(attempt)
  if (currentPassword === newPassword) return says('newPassword', 'Choose another one than before')
  const wardNames = (await allWards()).map(ward => ward.name)
  const fault = passwordFault(newPassword, { name: user.name, email: user.email, wardNames })
  if (fault !== null) return says('newPassword', fault)
  await setOwnPassword(user.id, await passwordHash(newPassword), by, keepOthers)
  return null
}

import type { SubmissionResult } from '@conform-to/react'
import { data } from 'react-router'
import { readForm } from '#app/sent-form.server.ts'
import type { Trace } from '#database/access-log.server.ts'
import {
  addPerson,
  changePerson,
  disablePerson,
  EmailTaken,
  enablePerson,
  LastAdministrator,
  resetPassword,
} from '#database/user-changes.server.ts'
import { allWards } from '#database/wards.server.ts'
import { ONE_TIME_PASSWORD_HOURS } from './limits.ts'
import { oneTimePassword, passwordHash } from './password.server.ts'
import { personSchema } from './person-schema.ts'

/** What came of something an administrator did. `password` is to be shown this once; `reply` goes back to the form. */
export type PersonOutcome = {
  readonly status: 200 | 400
  readonly says?: string
  readonly password?: string
  readonly name?: string
  readonly reply?: SubmissionResult<string[]>
}

/** Adds the person a form describes. */
export async function addedPerson(form: FormData, by: Trace): Promise<PersonOutcome> {
  const submission = readForm(form, personSchema)
  if (submission.status !== 'success') return { status: 400, reply: submission.reply() }
  if (await hasUnknownWard(submission.value)) return { status: 400, reply: submission.reply(unknownWard) }
  const { password, oneTime } = await freshOneTime()
  return kept(submission, async () => {
    await addPerson(submission.value, oneTime, by)
    return { status: 200, password, name: submission.value.name }
  })
}

/** Does what a form's `intent` says to somebody: `details`, `reset`, `disable` or `enable`. */
export async function changedPerson(id: string, form: FormData, by: Trace): Promise<PersonOutcome> {
  switch (form.get('intent')) {
    case 'details': {
      const submission = readForm(form, personSchema)
      if (submission.status !== 'success') return { status: 400, reply: submission.reply() }
      if (await hasUnknownWard(submission.value)) return { status: 400, reply: submission.reply(unknownWard) }
      return kept(submission, async () => {
        await changePerson(id, submission.value, by)
        return { status: 200, says: 'Saved. It counts from their next page on.' }
      })
    }
    case 'reset': {
      const { password, oneTime } = await freshOneTime()
      await resetPassword(id, oneTime, by)
      return { status: 200, password }
    }
    case 'disable':
      return disabled(id, by)
    case 'enable':
      await enablePerson(id, by)
      return { status: 200, says: 'They may sign in again.' }
    default:
      throw data('This form is not from this page.', 400)
  }
}

const unknownWard = { fieldErrors: { wardIds: ['Choose the wards from the list'] } }

async function hasUnknownWard({ wardIds }: { readonly wardIds: readonly string[] }): Promise<boolean> {
  const known = new Set((await allWards()).map(({ id }) => id))
  return wardIds.some(id => !known.has(id.toLowerCase()))
}

const LAST = 'This is the only administrator: make somebody else one first'

async function disabled(id: string, by: Trace): Promise<PersonOutcome> {
  try {
    await disablePerson(id, by)
    return { status: 200, says: 'Disabled. They are signed out everywhere.' }
  } catch (error) {
    if (error instanceof LastAdministrator) return { status: 400, says: `${LAST}.` }
    throw error
  }
}

type Sent = { reply(refusal: { fieldErrors: Record<string, string[]> }): SubmissionResult<string[]> }

/** Turns what the database refuses into words at the field they belong to. */
async function kept(submission: Sent, work: () => Promise<PersonOutcome>): Promise<PersonOutcome> {
  try {
    return await work()
  } catch (error) {
    const fieldErrors = refusal(error)
    if (fieldErrors === null) throw error
    return { status: 400, reply: submission.reply({ fieldErrors }) }
  }
}

function refusal(error: unknown): Record<string, string[]> | null {
  if (error instanceof EmailTaken) return { email: ['Somebody has this e-mail address already'] }
  return error instanceof LastAdministrator ? { role: [LAST] } : null
}

async function freshOneTime() {
  const password = oneTimePassword()
  return { password, oneTime: { passwordHash: await passwordHash(password), hours: ONE_TIME_PASSWORD_HOURS } }
}

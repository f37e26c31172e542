import type { SubmissionResult } from '@conform-to/react'
import type { CurrentUser } from '#app/auth/permissions.ts'
import type { ChartSpine } from '#app/charting/chart-form.ts'
import { performedAt } from '#app/charting/performed-at.ts'
import { env } from '#app/env.server.ts'

/** What comes of a form: where to go on, or what to put right on the same page. */
export type FormOutcome =
  | { readonly to: string }
  | { readonly status: 400 | 409 | 422; readonly reply: SubmissionResult<string[]> }

/** A form that was read, and can be sent back with everything typed. */
export type Sent = {
  reply(refusal: { fieldErrors?: Record<string, string[]>; formErrors?: string[] }): SubmissionResult<string[]>
}

/** Words at one field, with everything typed kept. */
export function refusedAt(field: string, says: string, submission: Sent): FormOutcome {
  return { status: 400, reply: submission.reply({ fieldErrors: { [field]: [says] } }) }
}

/** Words on the form as a whole, with everything typed kept. */
export function refusedForm(status: 409 | 422, says: string, submission: Sent): FormOutcome {
  return { status, reply: submission.reply({ formErrors: [says] }) }
}

/** The moment that a form names (UTC, whole minute), or the form with what is wrong with it. */
export function momentOf(
  spine: ChartSpine,
  asked: { readonly user: CurrentUser; readonly now: Date; readonly beganAt: Date },
  submission: Sent,
): { readonly at: Date } | FormOutcome {
  if (spine.openedBy !== asked.user.id) {
    return refusedForm(
      409,
      `You are signed in as ${asked.user.name}; somebody else opened this form. Open it again.`,
      submission,
    )
  }
  const { now, beganAt } = asked
  const moment = performedAt(spine, { zone: env.hospitalTimeZone, now, beganAt, endedAt: null })
  return moment.ok ? { at: moment.at } : refusedAt(moment.field, moment.message, submission)
}

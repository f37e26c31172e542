import { parseWithZod } from '@conform-to/zod/v4'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { env } from '#app/env.server.ts'
import { onlyFields } from '#app/sent-form.server.ts'
import { localDay } from '#app/time/zone.ts'
import { changePatient } from '#database/patients.server.ts'
import { type FormOutcome, refusedAt, refusedForm } from './moment.server.ts'
import { detailsOf, detailsSchema, namesIn, person, personProblem } from './patient-schema.ts'

/** Changes what is known of a patient as a form says. */
export async function detailsChangedBy(
  sent: FormData,
  { user, patientId, now }: { readonly user: CurrentUser; readonly patientId: string; readonly now: Date },
): Promise<FormOutcome> {
  const form = onlyFields(sent, ['version', ...namesIn('person', person)])
  const submission = parseWithZod(form, { schema: detailsSchema })
  if (submission.status !== 'success') return { status: 400, reply: submission.reply() }
  const { version, person: answers } = submission.value
  const problem = personProblem(answers, localDay(now, env.hospitalTimeZone))
  if (problem) return refusedAt(problem.field, problem.says, submission)
  const { outcome } = await changePatient(patientId, version, detailsOf(answers), user.id)
  switch (outcome) {
    case 'saved':
      return { to: `/patients/${patientId}/details?saved` }
    case 'number taken':
      return refusedAt('person.recordNumber', 'Somebody else has this record number', submission)
    case 'changed by others':
      return refusedForm(409, 'Somebody changed these details while you had them open. Open them again.', submission)
    case 'not there':
      return refusedForm(409, 'This patient is not there any more.', submission)
  }
}

import { parseWithZod } from '@conform-to/zod/v4'
import { v7 as uuidv7 } from 'uuid'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { type ChartSpine, momentFields } from '#app/charting/chart-form.ts'
import { env } from '#app/env.server.ts'
import { onlyFields } from '#app/sent-form.server.ts'
import { localDay } from '#app/time/zone.ts'
import { type Admission, type Admitted, admit } from '#database/admissions.server.ts'
import { type FormOutcome, momentOf, refusedAt, refusedForm, type Sent } from './moment.server.ts'
import { detailsOf, knownPerson, namesIn, person, personProblem } from './patient-schema.ts'
import { knownAdmission, newAdmission } from './stay-forms.ts'

/** What an admission came to: the stay, when they were admitted now or by the same form before. */
export type AdmissionOutcome = FormOutcome | { readonly stayId: string; readonly patientId: string }

interface Asked {
  readonly user: CurrentUser
  readonly wardId: string
  readonly now: Date
  /** The form is the short one, for somebody who was here before. */
  readonly known: boolean
}

/** Nothing says when a stay may have begun at the earliest: people lay here before the ward began to chart with this. */
const EVER = new Date(0)

const spineNames = [...Object.keys(momentFields), 'bedId']

/** Admits the person whom a form describes to a bed of this ward. */
export async function admission(sent: FormData, asked: Asked): Promise<AdmissionOutcome> {
  return asked.known ? admissionOfKnown(sent, asked) : admissionOfNew(sent, asked)
}

async function admissionOfNew(sent: FormData, asked: Asked): Promise<AdmissionOutcome> {
  const form = onlyFields(sent, [...spineNames, ...namesIn('person', person)])
  const submission = parseWithZod(form, { schema: newAdmission })
  if (submission.status !== 'success') return { status: 400, reply: submission.reply() }
  const answers = submission.value.person
  return admitted(submission, { ...detailsOf(answers), id: uuidv7() }, answers, asked)
}

async function admissionOfKnown(sent: FormData, asked: Asked): Promise<AdmissionOutcome> {
  const form = onlyFields(sent, [...spineNames, ...namesIn('person', knownPerson)])
  const submission = parseWithZod(form, { schema: knownAdmission })
  if (submission.status !== 'success') return { status: 400, reply: submission.reply() }
  const identifiers = submission.value.person
  return admitted(submission, identifiers, identifiers, asked)
}

type Accepted = Sent & { readonly value: ChartSpine & { readonly bedId: string } }

async function admitted(
  submission: Accepted,
  patient: Admission['patient'],
  answers: Parameters<typeof personProblem>[0],
  asked: Asked,
): Promise<AdmissionOutcome> {
  const { id: stayId, bedId } = submission.value
  const moment = momentOf(submission.value, { ...asked, beganAt: EVER }, submission)
  if (!('at' in moment)) return moment
  const problem = personProblem(answers, localDay(moment.at, env.hospitalTimeZone))
  if (problem) return refusedAt(problem.field, problem.says, submission)
  const outcome = await admit({ stayId, bedId, wardId: asked.wardId, admittedAt: moment.at, patient }, asked.user.id)
  if (!('stayId' in outcome)) return refusal(outcome, submission)
  return { stayId: outcome.stayId, patientId: outcome.patientId }
}

type Refused = Exclude<Admitted, { stayId: string }>

function refusal(outcome: Refused, submission: Sent): FormOutcome {
  switch (outcome.outcome) {
    case 'is admitted': {
      const says = `They are in bed ${outcome.bedLabel} of ${outcome.wardName}. Move them from there instead`
      return refusedAt('person.recordNumber', says, submission)
    }
    case 'other body under this id':
      return refusedForm(422, 'This form was used before, with other answers. Open it again.', submission)
    case 'bed taken':
    case 'bed not in use':
      return refusedAt('bedId', 'This bed is not free any more. Choose another', submission)
    case 'number taken':
      return refusedAt(
        'person.recordNumber',
        'Somebody who was here before has this number. Check it, and who it is',
        submission,
      )
    case 'number unknown':
      return refusedAt('person.recordNumber', 'Nobody with this number and date of birth was here before', submission)
    case 'before the last discharge':
      return refusedAt('when', 'They were still in an earlier stay at that time', submission)
  }
}

import type { CurrentUser } from '#app/auth/permissions.ts'
import { env } from '#app/env.server.ts'
import { readForm } from '#app/sent-form.server.ts'
import { showDateTime } from '#app/time/display.ts'
import { freeBeds } from '#database/beds.server.ts'
import { type Discharged, discharge, type Moved, move } from '#database/stay-changes.server.ts'
import type { Stay } from '#database/stays.server.ts'
import { type FormOutcome, momentOf, refusedAt, refusedForm, type Sent } from './moment.server.ts'
import { dischargeSchema, moveSchema } from './stay-forms.ts'

type Asked = { readonly user: CurrentUser; readonly stay: Stay; readonly now: Date }

const board = (stay: Stay) => ({ to: `/wards/${stay.wardId}/board` })
const shown = (at: Date) => showDateTime(at, env.hospitalTimeZone)

/** Moves the patient of a stay to the bed that a form names, in any ward that takes patients. */
export async function moveBy(sent: FormData, { user, stay, now }: Asked): Promise<FormOutcome> {
  const submission = readForm(sent, moveSchema)
  if (submission.status !== 'success') return { status: 400, reply: submission.reply() }
  const { value } = submission
  const moment = momentOf(value, { user, now, beganAt: stay.admittedAt }, submission)
  if (!('at' in moment)) return moment
  const bed = (await freeBeds()).find(({ id }) => id === value.bedId)
  const wardId = bed?.wardId ?? stay.wardId
  const to = { id: value.id, stayId: stay.id, wardId, bedId: value.bedId, movedAt: moment.at }
  return afterMove(await move(to, user.id), stay, submission)
}

function afterMove(moved: Moved, stay: Stay, submission: Sent): FormOutcome {
  switch (moved.outcome) {
    case 'moved':
    case 'already moved':
      return board(stay)
    case 'bed taken':
    case 'bed not in use':
      return refusedAt('bedId', 'This bed is not free any more. Choose another', submission)
    case 'same bed':
      return refusedAt('bedId', 'They are in this bed already', submission)
    case 'before':
      return refusedAt(
        'when',
        `They came to the present bed on ${shown(moved.at)}. Enter a time after that`,
        submission,
      )
    case 'stay not open':
      return refusedForm(409, 'This stay has ended.', submission)
    case 'other body under this id':
      return refusedForm(422, 'This form was used before, for another bed. Open it again.', submission)
  }
}

/** Ends a stay as a form says. */
export async function dischargeBy(sent: FormData, { user, stay, now }: Asked): Promise<FormOutcome> {
  const submission = readForm(sent, dischargeSchema)
  if (submission.status !== 'success') return { status: 400, reply: submission.reply() }
  const { reason, note = null, careAfter, ...spine } = submission.value
  const moment = momentOf(spine, { user, now, beganAt: stay.admittedAt }, submission)
  if (!('at' in moment)) return moment
  const end = { stayId: stay.id, dischargedAt: moment.at, reason, note, careAfter: careAfter === 'yes' }
  return afterDischarge(await discharge(end, user.id), stay, submission)
}

function afterDischarge(ended: Discharged, stay: Stay, submission: Sent): FormOutcome {
  switch (ended.outcome) {
    case 'discharged':
    case 'already discharged':
      return board(stay)
    case 'before':
      return refusedAt(
        'when',
        `They came to the present bed on ${shown(ended.at)}. Enter a time after that`,
        submission,
      )
    case 'care after': {
      const says = `Care was charted for ${shown(ended.at)}, after this time. Check the time, or discharge all the same`
      return refusedAt('careAfter', says, submission)
    }
    case 'discharged by others':
      return refusedForm(409, `They were discharged on ${shown(ended.at)} already. Nothing was changed.`, submission)
    case 'not there':
      return refusedForm(409, 'This stay is not there any more.', submission)
  }
}

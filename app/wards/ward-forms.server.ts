import type { SubmissionResult } from '@conform-to/react'
import { data } from 'react-router'
import { readForm } from '#app/sent-form.server.ts'
import { addBed, type BedChange, changeBed } from '#database/beds.server.ts'
import { addWard, changeWard, type Ward, type WardChange, wardById } from '#database/wards.server.ts'
import { bedChangeSchema, bedSchema, useSchema, wardSchema } from './ward-schema.ts'

/** What came of a form about a ward or its beds: `saved`, or the form with what is wrong with it. `intent` names the form. */
export type WardOutcome =
  | { readonly intent: string; readonly saved: string; readonly reply?: never }
  | { readonly intent: string; readonly reply: SubmissionResult<string[]>; readonly saved?: never }

type Sent = { reply(refusal: { fieldErrors?: Record<string, string[]> }): SubmissionResult<string[]> }

/** Adds the ward that a form describes, and gives its id. */
export async function wardAddedBy(
  sent: FormData,
  userId: string,
): Promise<{ readonly wardId: string } | { readonly reply: SubmissionResult<string[]> }> {
  const submission = readForm(sent, wardSchema)
  if (submission.status !== 'success') return { reply: submission.reply() }
  const { reply } = afterWard(await addWard(submission.value, userId), 'ward', submission)
  return reply ? { reply } : { wardId: submission.value.id }
}

/** Does what a form's `intent` says to a ward: `ward`, `use`, `add bed`, or `bed` for one of its beds. */
export async function wardChangedBy(sent: FormData, wardId: string, userId: string): Promise<WardOutcome> {
  const ward = await wardById(wardId)
  if (!ward) throw data('There is no such ward.', 404)
  switch (sent.get('intent')) {
    case 'ward':
      return settingsChanged(sent, ward, userId)
    case 'use':
      return putInUse(sent, ward, userId)
    case 'add bed':
      return bedAdded(sent, wardId, userId)
    case 'bed':
      return bedChanged(sent, wardId, userId)
    default:
      throw data('This form is not from this page.', 400)
  }
}

async function settingsChanged(sent: FormData, ward: Ward, userId: string): Promise<WardOutcome> {
  const submission = readForm(sent, wardSchema.omit({ id: true }))
  if (submission.status !== 'success') return { intent: 'ward', reply: submission.reply() }
  return afterWard(await changeWard({ ...ward, ...submission.value }, userId), 'ward', submission)
}

async function putInUse(sent: FormData, ward: Ward, userId: string): Promise<WardOutcome> {
  const submission = readForm(sent, useSchema)
  if (submission.status !== 'success') return { intent: 'use', reply: submission.reply() }
  const retired = submission.value.retired === 'yes'
  return afterWard(await changeWard({ ...ward, retired }, userId), 'use', submission)
}

async function bedAdded(sent: FormData, wardId: string, userId: string): Promise<WardOutcome> {
  const submission = readForm(sent, bedSchema)
  if (submission.status !== 'success') return { intent: 'add bed', reply: submission.reply() }
  return afterBed(await addBed({ ...submission.value, wardId }, userId), 'add bed', submission)
}

async function bedChanged(sent: FormData, wardId: string, userId: string): Promise<WardOutcome> {
  const id = sent.get('id')
  const intent = `bed ${typeof id === 'string' ? id : ''}`
  const submission = readForm(sent, bedChangeSchema)
  if (submission.status !== 'success') return { intent, reply: submission.reply() }
  const { retired, ...bed } = submission.value
  return afterBed(await changeBed({ ...bed, wardId, retired: retired === 'yes' }, userId), intent, submission)
}

function afterWard({ outcome }: WardChange, intent: string, submission: Sent): WardOutcome {
  if (outcome === 'saved') return { intent, saved: 'Saved.' }
  if (outcome === 'not there') throw data('There is no such ward.', 404)
  const words = {
    'name taken': { name: ['Another ward has this name'] },
    'has patients': { retired: ['There are patients on this ward: move or discharge them first'] },
  }
  return { intent, reply: submission.reply({ fieldErrors: words[outcome] }) }
}

function afterBed({ outcome }: BedChange, intent: string, submission: Sent): WardOutcome {
  if (outcome === 'saved') return { intent, saved: 'Saved.' }
  if (outcome === 'not there') throw data('There is no such bed on this ward.', 404)
  const words = {
    'label taken': { label: ['Another bed of this ward has this label'] },
    occupied: { retired: ['Somebody lies in this bed: move or discharge them first'] },
  }
  return { intent, reply: submission.reply({ fieldErrors: words[outcome] }) }
}

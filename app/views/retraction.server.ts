import { validate as isUuid, v7 as uuidv7 } from 'uuid'
import { authorOf } from '#app/auth/permissions.ts'
import { readRetraction } from '#app/charting/retract-form.ts'
import { showDateTime } from '#app/time/display.ts'
import { retractEntry } from '#database/entries.server.ts'
import type { Charting } from '#database/entry-outcome.server.ts'
import { person } from '#database/users.server.ts'
import type { OpenedEntry } from './opened-entry.server.ts'

/** Why an entry was not retracted; the reason that was typed is kept. */
export interface NotRetracted {
  readonly is: 'not retracted'
  readonly status: number
  readonly id: string
  readonly openedBy: string
  readonly reason: string
  readonly reasonErrors: readonly string[]
  readonly problems: readonly { readonly fieldId?: string; readonly says: string }[]
  readonly see?: { readonly says: string; readonly href: string }
}

/** Retracts an entry by a form, or says why not. */
export async function retracted(opened: OpenedEntry, sent: FormData): Promise<'retracted' | NotRetracted> {
  const { user, entry } = opened
  const form = readRetraction(sent)
  const kept = keptOf(sent, user.id)
  if (!form.ok) {
    const problems = Object.entries(form.errors).flatMap(([name, messages]) =>
      messages.map(says => (name === 'reason' ? { fieldId: 'reason', says } : { says })),
    )
    return { ...kept, status: 400, reasonErrors: form.errors.reason ?? [], problems }
  }
  const { id, openedBy, reason } = form.value
  if (openedBy !== user.id) {
    const owner = (await person(openedBy))?.name ?? 'somebody else'
    const says = `You are signed in as ${user.name}; this form was opened by ${owner}. If you mean to retract the entry, send it again.`
    return { ...kept, status: 409, problems: [{ says }] }
  }
  const charting = await retractEntry({ id, recordedBy: authorOf(user), reason }, entry)
  if (charting.outcome === 'charted' || charting.outcome === 'already charted') return 'retracted'
  return { ...kept, ...refusal(charting, opened) }
}

function refusal(charting: Charting, { care, entry }: OpenedEntry) {
  if (charting.outcome === 'already corrected') {
    const says = `${charting.by} corrected or retracted this entry on ${showDateTime(charting.at, care.ward.zone)}.`
    return { status: 409, problems: [{ says }], see: { says, href: `/entries/${charting.entryId}` } }
  }
  if (charting.outcome === 'other body under this id') {
    return {
      status: 422,
      id: uuidv7(),
      problems: [{ says: 'This form was sent before, with another reason. Send it again.' }],
    }
  }
  throw new Error(`The retraction of entry ${entry.id} was ${charting.outcome}`)
}

function keptOf(sent: FormData, userId: string) {
  const id = sent.get('id')
  const reason = sent.get('reason')
  return {
    is: 'not retracted' as const,
    id: typeof id === 'string' && isUuid(id) ? id : uuidv7(),
    openedBy: userId,
    reason: typeof reason === 'string' ? reason : '',
    reasonErrors: [],
  }
}

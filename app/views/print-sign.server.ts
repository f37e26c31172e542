import { isDeepStrictEqual } from 'node:util'
import { validate as isUuid } from 'uuid'
import { z } from 'zod'
import { authorOf, type CurrentUser } from '#app/auth/permissions.ts'
import { bedHeadSigns, type SignData } from '#app/care/bed-head-sign/schema.ts'
import { readForm } from '#app/sent-form.server.ts'
import { addEntry } from '#database/entries.server.ts'
import { entryWithHistory } from '#database/timeline.server.ts'
import { signOf } from './bed-head-sign.server.ts'
import type { PatientCare } from './patient-context.server.ts'

const lost = 'This form has lost a part of itself. Open it again.'

/** What the buttons of the sign's page send. The id was minted when the page was opened: twice is one act. */
const signForm = z.object({
  id: z.string(lost).refine(isUuid, lost),
  act: z.enum(['printed', 'downloaded', 'taken down'], lost),
  /** What the page showed, so that what is noted is what comes out of the printer. */
  shows: z.string(lost),
})

/** What came of a button of the sign's page. */
export type SignOutcome =
  | { readonly done: SignData['act']; readonly entryId: string }
  | { readonly problem: string; readonly status: number }

/** Notes on the record that the sign was printed as it stands now, or taken down. */
export async function signNoted(
  sent: FormData,
  { care, user, now }: { readonly care: PatientCare; readonly user: CurrentUser; readonly now: Date },
): Promise<SignOutcome> {
  const submission = readForm(sent, signForm)
  if (submission.status !== 'success') return { problem: lost, status: 400 }
  const { id, act, shows } = submission.value
  const { sign, facts, none } = await signOf(care, now)
  if (act !== 'taken down' && sign === null) return { problem: none, status: 409 }
  if (shows !== shownBy(facts)) return { problem: CHANGED, status: 409 }
  const stayId = care.record.stay.id
  const entry = {
    id,
    kind: bedHeadSigns,
    stayId,
    performedAt: now,
    recordedBy: authorOf(user),
    data: { act, ...facts },
  }
  const charting = await addEntry(entry)
  if (charting.outcome === 'charted' || charting.outcome === 'already charted') return { done: act, entryId: id }
  if (charting.outcome !== 'other body under this id') return { problem: GONE, status: 409 }
  // A second press comes at a later moment, and is the same act all the same.
  const known = (await entryWithHistory(id))?.entry
  const isAgain = known?.recordedById === user.id && isDeepStrictEqual(known.raw, { act, ...facts })
  return isAgain ? { done: act, entryId: id } : { problem: NOTED, status: 422 }
}

/** What a page shows of a sign, as the page's form carries it. */
export function shownBy(facts: Omit<SignData, 'act'>): string {
  return JSON.stringify(facts)
}

const CHANGED =
  'The tube or the airway was charted anew since this page was opened. Look at the sign again, then print it.'
const GONE = 'The patient is not here any more. Nothing was noted.'
const NOTED = 'This was noted before. Open the page again to print once more.'

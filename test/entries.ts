import { v7 as uuidv7 } from 'uuid'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { cuffPressure } from '#app/care/cuff-pressure/kind.ts'
import { action as correctAction, loader as correctLoader } from '#app/routes/correct.tsx'
import { loader as entryLoader } from '#app/routes/entry.tsx'
import { action as retractAction, loader as retractLoader } from '#app/routes/retract.tsx'
import { addEntry } from '#database/entries.server.ts'
import { changed, daysAgo, type Sent, sentRequest, wholeForm } from './charting.ts'
import { answerOf, contextOf, site } from './people.ts'

/** A cuff pressure of 26 cmH2O, charted on time yesterday as far as the record is concerned. */
export async function aChartedPressure(stayId: string, by: CurrentUser): Promise<string> {
  const id = uuidv7()
  const data = { found: 26, unit: 'cmH2O', method: 'manometer' } as const
  await addEntry({ id, kind: cuffPressure, stayId, performedAt: daysAgo(0), recordedBy: by, data })
  return id
}

/** A correction of a pressure to 24 cmH2O, with a reason. */
export function aCorrectionForm(user: CurrentUser, changes: Readonly<Record<string, string | undefined>> = {}): Sent {
  const form = wholeForm(cuffPressure, user, { found: 24, unit: 'cmH2O', method: 'manometer' })
  return changed(form, { reason: 'Read the wrong line of the gauge', ...changes })
}

/** The form of a retraction. */
export function aRetractionForm(user: CurrentUser, reason = 'Charted on the wrong patient'): Sent {
  return [
    ['id', uuidv7()],
    ['openedBy', user.id],
    ['reason', reason],
  ]
}

function args(user: CurrentUser, entryId: string, page: string, form?: Sent) {
  const path = `/entries/${entryId}${page}`
  const request = form ? sentRequest(path, form) : new Request(`${site}${path}`)
  return { params: { entryId }, request, url: new URL(request.url), context: contextOf(user) }
}

/** What comes of opening or sending the pages of an entry. */
export const entryPages = {
  see: (user: CurrentUser, id: string) =>
    answerOf(() => entryLoader({ ...args(user, id, ''), pattern: '/entries/:entryId' })),
  openCorrect: (user: CurrentUser, id: string) =>
    answerOf(() => correctLoader({ ...args(user, id, '/correct'), pattern: '/entries/:entryId/correct' })),
  correct: (user: CurrentUser, id: string, form: Sent) =>
    answerOf(() => correctAction({ ...args(user, id, '/correct', form), pattern: '/entries/:entryId/correct' })),
  openRetract: (user: CurrentUser, id: string) =>
    answerOf(() => retractLoader({ ...args(user, id, '/retract'), pattern: '/entries/:entryId/retract' })),
  retract: (user: CurrentUser, id: string, form: Sent) =>
    answerOf(() => retractAction({ ...args(user, id, '/retract', form), pattern: '/entries/:entryId/retract' })),
}

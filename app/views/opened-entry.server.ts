import { data, type RouterContextProvider } from 'react-router'
import { validate as isUuid } from 'uuid'
import { keepingForm, logPatientLook, type OpenedPatient, patientGate } from '#app/auth/patient-access.server.ts'
import { type Act, type CurrentUser, can, canByGrant } from '#app/auth/permissions.ts'
import { isWrite } from '#app/auth/request-kind.ts'
import { ownSession, signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import type { StoredEntry } from '#app/care/kind.ts'
import { findKind } from '#app/care/kinds.ts'
import type { Trace } from '#database/access-log.server.ts'
import { type EntryHistory, entryWithHistory } from '#database/timeline.server.ts'
import { type PatientCare, patientCare } from './patient-context.server.ts'

/** A request for the page of one entry. */
export interface EntryRequest {
  readonly params: { readonly entryId: string }
  readonly request: Request
  readonly url: URL
  readonly context: Readonly<RouterContextProvider>
}

/** What somebody wants with an entry. */
export type EntryAct = 'see' | 'correct' | 'retract'

/** An entry that this person may do this with, with its history and its patient. */
export interface OpenedEntry extends EntryHistory {
  readonly user: CurrentUser
  readonly opened: OpenedPatient
  readonly care: PatientCare
  /** The last link of its chain: what counts today. */
  readonly latest: StoredEntry
  readonly now: Date
  /** When this person signed in, and from where. */
  readonly signedInAt: Date
  readonly by: Trace
}

/**
 * One entry, if this person may do this with it: the gate is that of its patient. Throws a 404 for an entry that does not
 * exist for them, a 403 for an act that is not theirs, and a redirect where a reason is asked for first.
 */
export async function openedEntry(asked: EntryRequest, act: EntryAct): Promise<OpenedEntry> {
  const { params, request, url } = asked
  const user = signedIn(asked.context)
  const by = traceOf(asked)
  const path = url.pathname + url.search
  const gated = await entryGate(user, params.entryId, { act, path, by }).catch(keepingForm({ user, request, url }))
  if (!isWrite(request)) await logPatientLook(gated.opened, by)
  const now = new Date()
  const signedInAt = ownSession(asked.context).startedAt
  return { ...gated, user, now, signedInAt, by, care: await patientCare(gated.entry.stayId, now) }
}

/** The gate of `openedEntry`, for whatever else is done with an entry; `path` is where to go on after a reason was given. */
export async function entryGate(
  user: CurrentUser,
  entryId: string,
  { act, path, by }: { readonly act: EntryAct; readonly path: string; readonly by: Trace },
): Promise<EntryHistory & Pick<OpenedEntry, 'latest' | 'opened'>> {
  const history = isUuid(entryId) ? await entryWithHistory(entryId) : undefined
  const latest = history?.chain.at(-1)
  if (!history || !latest) throw data('There is no such entry.', 404)
  // Of an entry that somebody corrected meanwhile, its own author is told so: nothing can be done to it any more.
  const [first = 'see patients', ...others] = actsFor(act, history.entry, user)
  const opened = await patientGate(user, history.patientId, { path, act: first, by })
  for (const other of others) await patientGate(user, history.patientId, { path, act: other, by })
  // What takes an entry out of the record is not itself put right: that would bring the entry back under another name.
  if (act !== 'see' && history.entry.status === 'retracted') throw data('A retraction stays. Chart the care anew.', 403)
  return { ...history, latest, opened }
}

/** Every act that somebody must be allowed to, to do this with an entry. */
function actsFor(act: EntryAct, entry: StoredEntry, user: CurrentUser): readonly Act[] {
  if (act === 'see') return ['see patients']
  const isOwn = entry.recordedById === user.id
  return [isOwn ? `${act} own entries` : `${act} entries`, findKind(entry.kind)?.act ?? 'chart care']
}

/** Whether a page may offer this to this person. */
export function mayDo(act: EntryAct, { latest, user, opened }: OpenedEntry): boolean {
  const isAllowed = (one: Act) => (opened.via === 'ward' ? can(user, one, opened.wardId) : canByGrant(user, one))
  return actsFor(act, latest, user).every(isAllowed)
}

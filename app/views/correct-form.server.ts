import { v7 as uuidv7 } from 'uuid'
import { takeDraft } from '#app/auth/draft.server.ts'
import type { AnyCareKind, StoredEntry } from '#app/care/kind.ts'
import { readEntry } from '#app/care/record.ts'
import { type Typed, typedFrom } from '#app/charting/chart-form.ts'
import { restored } from '#app/charting/drafts.ts'
import { wholeMinute } from '#app/charting/performed-at.ts'
import { daysBetween, instantsOf, localDay, localTime, type Zone } from '#app/time/zone.ts'
import { frameOf, scannedAnswers } from './chart-form.server.ts'
import { witnessesFor } from './chart-lists.server.ts'
import type { OpenedEntry } from './opened-entry.server.ts'

/** The form of an entry's kind, filled in with the entry. */
export async function correctForm(kind: AnyCareKind, { entry, care, user, now, signedInAt }: OpenedEntry, url: URL) {
  const { zone } = care.ward
  const witnesses = await witnessesFor(care.ward.id, user)
  const frame = await frameOf(kind, { care, user, now, signedInAt })
  const draft = await takeDraft(user.id, url.pathname)
  const data = readEntry(kind, entry)[0]?.data as Readonly<Record<string, unknown>> | undefined
  const asCharted = { ...typedFrom(data ?? {}), ...momentOf(entry.performedAt, zone), ...witnessOf(entry, witnesses) }
  return {
    ...frame,
    id: uuidv7(),
    witnesses,
    typed: draft ? restored(kind, draft, zone) : { ...asCharted, ...scannedAnswers(kind, url) },
    isRestored: draft !== null,
    isReadable: data !== undefined,
    daysBack: Math.max(frame.daysBack, daysBetween(localDay(entry.performedAt, zone), localDay(now, zone))),
  }
}

/** When it was done, as a day and time of its own. */
function momentOf(performedAt: Date, zone: Zone): Typed {
  const day = localDay(performedAt, zone)
  const time = localTime(performedAt, zone)
  const instants = instantsOf(day, time, zone)
  const isFirst = instants.kind === 'two' && instants.first.getTime() === wholeMinute(performedAt).getTime()
  return {
    when: ['other'],
    day: [day],
    time: [time],
    ...(instants.kind === 'two' ? { occurrence: [isFirst ? 'first' : 'second'] } : {}),
  }
}

/** The second person, where exactly one of those on the ward has that name. */
function witnessOf({ witnessName }: StoredEntry, witnesses: Readonly<Record<string, string>>): Typed {
  if (witnessName === null) return {}
  const same = Object.keys(witnesses).filter(id => witnesses[id]?.startsWith(`${witnessName}, `))
  return same.length === 1 ? { witness: same } : {}
}

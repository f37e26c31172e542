import { authorOf, type CurrentUser, can } from '#app/auth/permissions.ts'
import { entryWords } from '#app/rules/entry-words.ts'
import { showDateTime } from '#app/time/display.ts'
import type { Zone } from '#app/time/zone.ts'
import { countersign, MOST_TO_COUNTERSIGN, toCountersign } from '#database/countersignatures.server.ts'

/** The wards on which somebody may countersign. */
export function countersigningWards(user: CurrentUser): readonly string[] {
  return user.wardIds.filter(wardId => can(user, 'countersign', wardId))
}

/** Entries to countersign, as they are read before they are; oldest first, and not all when there are very many. */
export async function countersignList(user: CurrentUser, named: boolean, zone: Zone) {
  const found = await toCountersign(user.id, countersigningWards(user), named)
  const entries = found.map(({ entry, patientId, familyName, bed, wardId, wardName }) => ({
    id: entry.id,
    wardId,
    patient: { href: `/patients/${patientId}`, says: `${wardName}, bed ${bed}, ${familyName}` },
    ...entryWords(entry),
    author: `${entry.recordedByName}, ${entry.recordedRole}`,
    done: showDateTime(entry.performedAt, zone),
    second: entry.witnessName,
  }))
  return { entries, isWhole: found.length < MOST_TO_COUNTERSIGN }
}

/** What came of the form: what was wrong with it, or how many entries it countersigned and how many it could not. */
export type Countersigned =
  | { readonly ok: false; readonly says: string; readonly fieldId: string; readonly chosen: readonly string[] }
  | { readonly ok: true; readonly signed: number; readonly left: number }

/** Countersigns the chosen entries, as far as this person may: what is not on their list is not theirs to sign. */
export async function countersigned(user: CurrentUser, form: FormData): Promise<Countersigned> {
  const chosen = form.getAll('entry').filter(id => typeof id === 'string')
  if (chosen.length === 0) {
    return { ok: false, says: 'Choose the entries that you countersign', fieldId: 'entries', chosen }
  }
  if (form.get('supervised') !== 'yes') {
    const says = 'Confirm that you supervised this care: nobody vouches for what they did not see to'
    return { ok: false, says, fieldId: 'supervised', chosen }
  }
  const open = await toCountersign(user.id, countersigningWards(user))
  const theirs = open.map(({ entry }) => entry.id).filter(id => chosen.includes(id))
  const signed = theirs.length === 0 ? 0 : await countersign(theirs, authorOf(user))
  return { ok: true, signed, left: chosen.length - signed }
}

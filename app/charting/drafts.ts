import type { AnyCareKind } from '../care/kind.ts'
import { localDay, localTime, type Zone } from '../time/zone.ts'
import { ownFields, readSpine, type Typed, typedIn } from './chart-form.ts'
import { statedMoment } from './performed-at.ts'

/**
 * A form that waited for its author, as it opens again. What was "now" then is by now a time of its own, and the id that it
 * was sent under is left behind: nothing was charted under it.
 */
export function restored(kind: AnyCareKind, draft: Typed, zone: Zone): Typed {
  const sent = new FormData()
  for (const [name, values] of Object.entries(draft)) for (const value of values) sent.append(name, value)
  const { id: _id, openedBy: _openedBy, at: _at, ...typed } = typedIn(kind, sent)
  const spine = readSpine(ownFields(kind, sent).form)
  if (!spine || spine.when === 'other') return typed
  const at = statedMoment(spine)
  return { ...typed, when: ['other'], day: [localDay(at, zone)], time: [localTime(at, zone)] }
}

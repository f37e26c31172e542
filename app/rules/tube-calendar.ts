import { showDay } from '../time/display.ts'
import type { CalendarDay } from '../time/icalendar.ts'
import type { TubeRow } from './tube-row.ts'

/** A tube as a calendar may know it: its bed and the initials, never a name. */
export type CalendarTube = TubeRow & {
  readonly wardName: string
  readonly bed: string
  readonly familyName: string
  readonly givenName: string
}

/** Two days of each tube: the one it is to be changed by, and the one its change is planned for. */
export function tubeDays(tubes: readonly CalendarTube[]): readonly CalendarDay[] {
  return tubes.flatMap(tube => {
    const who = `${tube.bed} ${initials(tube)}`
    const text = `${tube.wardName}. ${tube.words}. Day ${tube.day} of ${tube.limit}; change by ${showDay(tube.changeBy)}.`
    const limit = {
      uid: `${tube.tubeId}-change-by@cannulary`,
      on: tube.changeBy,
      title: `${who}: tube change by`,
      text,
    }
    if (tube.plannedOn === null) return [limit]
    const planned = `${who}: tube change planned`
    return [{ uid: `${tube.tubeId}-planned@cannulary`, on: tube.plannedOn, title: planned, text }, limit]
  })
}

/** `M. T.`: the first letters of given and family name. */
function initials({ givenName, familyName }: Pick<CalendarTube, 'givenName' | 'familyName'>): string {
  return [givenName, familyName].map(name => `${[...name.trim()][0]?.toUpperCase() ?? '?'}.`).join(' ')
}

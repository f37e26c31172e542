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
    const { tubeId, plannedOn, changeBy } = tube
    const who = `${tube.bed} ${initials(tube)}`
    const by = changeBy === null ? '' : ` of ${tube.limit}; change by ${showDay(changeBy)}`
    const text = `${tube.wardName}. ${tube.words}. Day ${tube.day}${by}.`
    return [
      ...(plannedOn === null
        ? []
        : [{ uid: `${tubeId}-planned@cannulary`, on: plannedOn, title: `${who}: tube change planned`, text }]),
      ...(changeBy === null
        ? []
        : [{ uid: `${tubeId}-change-by@cannulary`, on: changeBy, title: `${who}: tube change by`, text }]),
    ]
  })
}

/** `M. T.`: the first letters of given and family name. */
function initials({ givenName, familyName }: Pick<CalendarTube, 'givenName' | 'familyName'>): string {
  return [givenName, familyName].map(name => `${[...name.trim()][0]?.toUpperCase() ?? '?'}.`).join(' ')
}

import { addDays, daysBetween, type LocalDay } from '../time/zone.ts'

export type DwellStage = 'quiet' | 'notice' | 'strong' | 'limit day' | 'past limit'

/** How many days before the limit a tube change is first mentioned, and when it is pressed. */
export interface DwellNotice {
  readonly noticeDays: number
  readonly strongDays: number
}

/** The last day on which a tube may still be in: a 28-day tube from 02-Mar-2026 must be out on or before 30-Mar-2026. */
export function changeByDay(insertedOn: LocalDay, limitDays: number): LocalDay {
  return addDays(insertedOn, limitDays)
}

/** Days that a tube has been in, by the calendar: the day of insertion is day 0. */
export function dwellDay(insertedOn: LocalDay, today: LocalDay): number {
  return daysBetween(insertedOn, today)
}

/** Days until the change-by day: 0 on that day, negative once it has passed. */
export function daysLeft(insertedOn: LocalDay, limitDays: number, today: LocalDay): number {
  return limitDays - dwellDay(insertedOn, today)
}

/** How pressing a tube change is by the days left. A dwell limit has no grace: the day after it is past limit. */
export function dwellStage(left: number, { noticeDays, strongDays }: DwellNotice): DwellStage {
  if (left < 0) return 'past limit'
  if (left === 0) return 'limit day'
  if (left <= strongDays) return 'strong'
  return left <= noticeDays ? 'notice' : 'quiet'
}

import { utcDate } from './calendar.ts'
import { type LocalDay, localDay, localTime, offsetMinutes, type Zone } from './zone.ts'

// Own names: Intl writes "Sept" for en-GB, and the NHS Common User Interface asks for three letters (D+Ta-0002).
const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec']
const WEEKDAYS = ['Sun', 'Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat']

/** A calendar day as '01-Dec-2026' (NHS Common User Interface, D+Ta). */
export function showDay(day: LocalDay): string {
  return `${day.slice(8, 10)}-${MONTHS[Number(day.slice(5, 7)) - 1]}-${day.slice(0, 4)}`
}

/** The day of an instant as '01-Dec-2026'. */
export function showDate(at: Date, zone: Zone): string {
  return showDay(localDay(at, zone))
}

/** The time of an instant as '14:06', by the 24-hour clock; midnight is '00:00' of the new day (D+Tb). */
export function showTime(at: Date, zone: Zone): string {
  return localTime(at, zone)
}

/** An instant as '01-Dec-2026 14:06'. */
export function showDateTime(at: Date, zone: Zone): string {
  return `${showDate(at, zone)} ${showTime(at, zone)}`
}

/** The day of an instant with its weekday, as 'Tue 01-Dec-2026'. */
export function showWeekdayDate(at: Date, zone: Zone): string {
  const day = localDay(at, zone)
  return `${WEEKDAYS[utcDate(day).day()]} ${showDay(day)}`
}

/**
 * A length of time in words: 'less than 1 min', '36 min', '1 h 52 min', '2 d 3 h'. Whole minutes or hours are cut, not rounded;
 * a part of zero is left out. Shows the size only: whether it lies ahead or behind is for the sentence around it.
 */
export function showDuration(ms: number): string {
  const minutes = Math.floor(Math.abs(ms) / 60_000)
  const hours = Math.floor(minutes / 60)
  if (minutes === 0) return 'less than 1 min'
  if (hours === 0) return `${minutes} min`
  if (hours < 24) return withRest(`${hours} h`, minutes % 60, 'min')
  return withRest(`${Math.floor(hours / 24)} d`, hours % 24, 'h')
}

/** The offset of a zone from UTC at an instant, as '+01:00'. */
export function showOffset(at: Date, zone: Zone): string {
  const offset = offsetMinutes(at, zone)
  const size = Math.abs(offset)
  return `${offset < 0 ? '-' : '+'}${twoDigits(Math.floor(size / 60))}:${twoDigits(Math.floor(size % 60))}`
}

/** Completed years of age on a day. Born on 29 February, a person turns a year older on 1 March of a common year. */
export function ageOn(bornOn: LocalDay, on: LocalDay): number {
  const years = Number(on.slice(0, 4)) - Number(bornOn.slice(0, 4))
  return on.slice(5) < bornOn.slice(5) ? years - 1 : years
}

function withRest(large: string, rest: number, unit: string): string {
  return rest === 0 ? large : `${large} ${rest} ${unit}`
}

function twoDigits(n: number): string {
  return String(n).padStart(2, '0')
}

import { showDay } from '../time/display.ts'
import { isLocalDay, type LocalDay } from '../time/zone.ts'

/** A date as a label gives it. When the label gives the month only, `on` is the last day of that month. */
export interface LabelDate {
  readonly on: LocalDay
  readonly monthOnly: boolean
}

/**
 * The year meant by the two digits of a label, which reach 49 years back and 50 ahead (GS1 General Specifications 7.12):
 * in 2026, 76 is 2076 and 77 is 1977.
 */
export function fullYear(twoDigits: number, thisYear: number): number {
  const century = thisYear - (thisYear % 100)
  const ahead = twoDigits - (thisYear % 100)
  if (ahead >= 51) return century - 100 + twoDigits
  return ahead <= -50 ? century + 100 + twoDigits : century + twoDigits
}

/**
 * The date in the six digits YYMMDD of a label, or null when the calendar has no such day. Day 00 stands for the last day of the month.
 * New healthcare labels must give the day since 2025 (GSCN 21-040), but older stock is still on the shelf.
 */
export function labelDate(digits: string, today: LocalDay): LabelDate | null {
  const [, yy, mm, dd] = /^(\d\d)(\d\d)(\d\d)$/.exec(digits) ?? []
  if (yy === undefined || mm === undefined || dd === undefined) return null
  const year = fullYear(Number(yy), Number(today.slice(0, 4)))
  const monthOnly = dd === '00'
  const day = monthOnly ? String(daysInMonth(year, Number(mm))) : dd
  const on = `${year}-${mm}-${day}`
  return isLocalDay(on) ? { on, monthOnly } : null
}

/** A label's date as '30-Nov-2027', with the remark that the label gives the month only where it does. */
export function showLabelDate(date: LabelDate): string {
  return date.monthOnly ? `${showDay(date.on)} (label gives month only)` : showDay(date.on)
}

function daysInMonth(year: number, month: number): number {
  return new Date(Date.UTC(year, month, 0)).getUTCDate()
}

import { showDay, showDuration, showTime, showWeekdayDate } from '../time/display.ts'
import { addDays, daysBetween, type LocalDay, localDay, type Zone } from '../time/zone.ts'
import { isLate, type LiveBoardTask } from './board.ts'

/** How a task stands, in a few words: `52 min late`, `due by 14:36`, `due 16:06`, `by 19-Dec-2026`, `deferred to 17:00`. */
export function standingWords(task: LiveBoardTask, now: number, zone: Zone): string {
  if (task.status === 'suspended' || !task.window) return 'suspended'
  if (isLate(task.status)) return task.byDay ? daysLate(task.byDay, now, zone) : `${showDuration(task.lateBy)} late`
  if (task.byDay) return dayWords(task.byDay, now, zone)
  if (task.status === 'deferred')
    return `deferred to ${momentWords(task.deferredUntil ?? task.window.dueAt, now, zone)}`
  if (task.status === 'due') return `due by ${momentWords(task.window.closesAt, now, zone)}`
  return `due ${momentWords(task.window.dueAt, now, zone)}`
}

function daysLate(day: LocalDay, now: number, zone: Zone): string {
  const days = daysBetween(day, localDay(new Date(now), zone))
  return `${days} ${days === 1 ? 'day' : 'days'} late`
}

function dayWords(day: LocalDay, now: number, zone: Zone): string {
  const today = localDay(new Date(now), zone)
  if (day === today) return 'due today'
  return day === addDays(today, 1) ? 'due tomorrow' : `by ${showDay(day)}`
}

/** A moment as a time, with its day when that is not today: `16:06`, `tomorrow 06:00`, `Thu 03-Dec-2026 06:00`. */
export function momentWords(at: number, now: number, zone: Zone): string {
  const moment = new Date(at)
  const day = localDay(moment, zone)
  const today = localDay(new Date(now), zone)
  const time = showTime(moment, zone)
  if (day === today) return time
  if (day === addDays(today, 1)) return `tomorrow ${time}`
  return day === addDays(today, -1) ? `yesterday ${time}` : `${showWeekdayDate(moment, zone)} ${time}`
}

import { showDate, showDateTime, showDay, showOffset, showTime } from '../time/display.ts'
import { earlier, minutes } from '../time/duration.ts'
import { type Instants, instantsOf, localDay, type Zone } from '../time/zone.ts'
import type { ChartSpine } from './chart-form.ts'

/** What "when" is held against: the ward's clock and the patient's stay. */
export interface Calendar {
  readonly zone: Zone
  readonly now: Date
  readonly beganAt: Date
  /** When the patient left; null while they are here. */
  readonly endedAt: Date | null
}

/** The two readings of a time that the clocks show twice, in words. */
export interface TwoReadings {
  readonly first: string
  readonly second: string
}

export type PerformedAt =
  | { readonly ok: true; readonly at: Date }
  | { readonly ok: false; readonly field: string; readonly message: string; readonly asks?: TwoReadings }

// Domain section 10: future times are refused past two minutes, which device clocks may be off; the database repeats it.
const AHEAD_MINUTES = 2

/**
 * When the care was done (UTC, whole minutes, as it is shown), or what is wrong with the answer and at which field.
 * A time that the clocks show twice is asked about; one that they jump past is refused.
 */
export function performedAt(spine: ChartSpine, calendar: Calendar): PerformedAt {
  const moment = spine.when === 'other' ? otherTime(spine, calendar.zone) : stated(statedMoment(spine))
  if (!moment.ok) return moment
  return withinStay(moment.at, calendar, spine.when === 'other' ? 'time' : 'when')
}

const minutesAgo = { now: 0, '10 min ago': 10, '30 min ago': 30, other: 0 } as const

/** The moment (UTC, whole minute) that "now" or "10 min ago" stood for on the form. */
export function statedMoment({ when, at }: ChartSpine): Date {
  return earlier(wholeMinute(new Date(at)), minutes(minutesAgo[when]))
}

function otherTime({ day, time, occurrence }: ChartSpine, zone: Zone): PerformedAt {
  if (day === undefined) return wrong('day', 'Enter the day on which it was done')
  if (time === undefined) return wrong('time', 'Enter the time at which it was done')
  const instants = instantsOf(day, time, zone)
  if (instants.kind === 'one') return { ok: true, at: instants.at }
  if (instants.kind === 'none') return wrong('time', jumpedPast(day, time, instants, zone))
  if (occurrence !== undefined) return { ok: true, at: instants[occurrence] }
  const asks = { first: reading('First', instants.first, zone), second: reading('Second', instants.second, zone) }
  return { ...wrong('occurrence', `Clocks went back on ${showDay(day)} and showed ${time} twice. Choose which.`), asks }
}

function reading(which: string, at: Date, zone: Zone): string {
  return `${which} ${showTime(at, zone)} (UTC ${showOffset(at, zone)})`
}

function jumpedPast(day: string, time: string, { before, after }: Instants & { kind: 'none' }, zone: Zone): string {
  const either = `${showTime(before, zone)} or ${showTime(after, zone)}`
  return `Clocks went forward on ${showDay(day)} and never showed ${time}. It may have been ${either}.`
}

function withinStay(at: Date, { zone, now, beganAt, endedAt }: Calendar, field: string): PerformedAt {
  if (at.getTime() > now.getTime() + minutes(AHEAD_MINUTES)) {
    return wrong(field, `That time has not come yet: it is ${showDateTime(now, zone)}.`)
  }
  // The stay may have begun within the minute that is shown.
  if (at < wholeMinute(beganAt)) {
    return wrong(field, `The stay began on ${showDateTime(beganAt, zone)}. Enter a time after that.`)
  }
  if (endedAt !== null && at > endedAt) {
    return wrong(field, `The stay ended on ${showDateTime(endedAt, zone)}. Enter a time before that.`)
  }
  return { ok: true, at: at < beganAt ? beganAt : at }
}

const stated = (at: Date) => ({ ok: true, at }) as const
const wrong = (field: string, message: string) => ({ ok: false, field, message }) as const

/** An instant with its seconds cut, as a wall clock shows it. */
export function wholeMinute(at: Date): Date {
  return new Date(Math.floor(at.getTime() / 60_000) * 60_000)
}

/** `14:06` today, `30-Nov-2026 23:50` on another day: how a moment stands in front of a sentence. */
export function shortMoment(at: Date, now: Date, zone: Zone): string {
  const time = showTime(at, zone)
  return localDay(at, zone) === localDay(now, zone) ? time : `${showDate(at, zone)} ${time}`
}

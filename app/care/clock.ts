import { type Duration, earlier, later, minutes, since } from '../time/duration.ts'
import { nextShift, type Shift, shiftAt } from '../time/shift.ts'
import { addDays, type LocalDay, startOfDay } from '../time/zone.ts'
import type { Entry, WardFacts } from './kind.ts'
import { lateness, seriousWithin } from './lateness.ts'
import type { Values } from './policy.ts'
import { daySerious, eventSerious } from './tolerance-settings.ts'

/** The moments of one due task (UTC): it is due from `opensAt` to `closesAt`, overdue after, seriously overdue after `seriousAt`. */
export interface DueWindow {
  readonly dueAt: Date
  readonly soonAt: Date
  readonly opensAt: Date
  readonly closesAt: Date
  readonly seriousAt: Date
}

/** What a task's clock says: it does not concern this patient, it is suspended, or it runs towards a window. */
export type Clock =
  | { readonly state: 'none' }
  | { readonly state: 'suspended'; readonly because: string }
  | {
      readonly state: 'running'
      readonly window: DueWindow
      /** The act that the clock counts from; undefined when it counts from admission or insertion. */
      readonly last: Entry | undefined
      /** The moment it counts from: act, event or start. What was put off before it was other care. */
      readonly from: Date
      /** Why it is due sooner than the plain interval. */
      readonly because?: string
      /** By calendar date (dwell), not by the hour. */
      readonly byDay?: LocalDay
      /** The interval, of a clock that runs by one. */
      readonly every?: Duration
    }

export const noClock: Clock = { state: 'none' }

/** A clock that stands still, with the reason to show. */
export function suspended(because: string): Clock {
  return { state: 'suspended', because }
}

/** Due `interval` of elapsed time after the last qualifying act, or after `start` when there was none. */
export function intervalClock(options: {
  readonly last: Entry | undefined
  readonly start: Date
  readonly interval: Duration
  readonly values: Values
  readonly because?: string
}): Clock {
  const from = options.last && options.last.performedAt > options.start ? options.last.performedAt : options.start
  return {
    state: 'running',
    window: windowAround(later(from, options.interval), options.interval, options.values),
    last: options.last,
    from,
    every: options.interval,
    ...(options.because === undefined ? {} : { because: options.because }),
  }
}

/** The window around a due time, by the tolerance that the policy gives the interval. */
export function windowAround(dueAt: Date, interval: Duration, values: Values): DueWindow {
  const { tolerance, soonBefore, seriousAfter } = lateness(interval, values)
  return {
    dueAt,
    soonAt: earlier(dueAt, soonBefore),
    opensAt: earlier(dueAt, tolerance),
    closesAt: later(dueAt, tolerance),
    seriousAt: later(dueAt, seriousAfter),
  }
}

/** Due soon after an event: from the event until `within` has passed; how long after that it is seriously overdue is the policy's. */
export function promptClock(options: {
  readonly event: Date
  readonly within: Duration
  readonly last: Entry | undefined
  readonly because: string
  readonly values: Values
}): Clock {
  const closesAt = later(options.event, options.within)
  return {
    state: 'running',
    window: {
      dueAt: closesAt,
      soonAt: options.event,
      opensAt: options.event,
      closesAt,
      seriousAt: later(closesAt, minutes(options.values.of(eventSerious))),
    },
    last: options.last,
    from: options.event,
    because: options.because,
  }
}

/** Once in each of the ward's shifts: the first shift without a qualifying act is the window. */
export function shiftClock(options: {
  readonly last: Entry | undefined
  readonly start: Date
  readonly ward: WardFacts
  readonly values: Values
}): Clock {
  const { last, start, ward, values } = options
  const done = last !== undefined && last.performedAt >= start
  const shift = done
    ? nextShift(shiftAt(last.performedAt, ward.shiftTimes, ward.zone), ward.shiftTimes, ward.zone)
    : shiftAt(start, ward.shiftTimes, ward.zone)
  const window = shiftWindow(shift, done ? shift.startsAt : start, values)
  return { state: 'running', window, last, from: done ? last.performedAt : start }
}

function shiftWindow(shift: Shift, opensAt: Date, values: Values): DueWindow {
  return {
    dueAt: shift.endsAt,
    soonAt: opensAt,
    opensAt,
    closesAt: shift.endsAt,
    seriousAt: later(shift.endsAt, seriousWithin(since(shift.startsAt, shift.endsAt), values)),
  }
}

/** By calendar date: due on `dueOn`, overdue from the next local midnight, seriously so by the policy's days; `soonDays` before it is due soon. */
export function dayClock(options: {
  readonly dueOn: LocalDay
  readonly soonDays: number
  readonly ward: WardFacts
  /** The act that the days count from, such as the tube going in. */
  readonly last: Entry
  readonly values: Values
  readonly because?: string
}): Clock {
  const { dueOn, ward, values } = options
  const opensAt = startOfDay(dueOn, ward.zone)
  const closesAt = startOfDay(addDays(dueOn, 1), ward.zone)
  return {
    state: 'running',
    window: {
      dueAt: opensAt,
      soonAt: startOfDay(addDays(dueOn, -options.soonDays), ward.zone),
      opensAt,
      closesAt,
      seriousAt: startOfDay(addDays(dueOn, 1 + values.of(daySerious)), ward.zone),
    },
    last: options.last,
    from: options.last.performedAt,
    byDay: dueOn,
    ...(options.because === undefined ? {} : { because: options.because }),
  }
}

/**
 * Of two clocks, the one that falls due first, counting from the later of their moments: what was put off before an event was not
 * that event. A suspended or absent clock yields to one that runs.
 */
export function sooner(a: Clock, b: Clock): Clock {
  if (a.state !== 'running') return b.state === 'none' ? a : b
  if (b.state !== 'running') return a
  const first = b.window.dueAt < a.window.dueAt ? b : a
  const from = Math.max(a.from.getTime(), b.from.getTime())
  return { ...first, from: new Date(from) }
}
